import nextVitals from "eslint-config-next/core-web-vitals";
import nextTypescript from "eslint-config-next/typescript";
import { createTypeScriptImportResolver } from "eslint-import-resolver-typescript";
import importX from "eslint-plugin-import-x";

/**
 * app → api → lib services → db → lib/engine. A zone says what a layer may not import; `except` names what it may.
 * Whatever is not forbidden here is to the right of the layer.
 */
const zones = [
  {
    target: "./lib/engine",
    from: ["./app", "./api", "./db", "./sdk", "./lib"],
    except: ["./engine"],
    message: "lib/engine is pure: it imports nothing of ours.",
  },
  {
    target: "./sdk",
    from: ["./app", "./api", "./db", "./lib"],
    message: "A client stands alone: it imports nothing of ours.",
  },
  {
    target: ["./db/schema", "./db/queries", "./db/client.ts"],
    from: ["./app", "./api", "./sdk", "./lib"],
    except: ["./engine"],
    message: "db knows the engine's types and nothing above it.",
  },
  {
    target: "./db/seed.ts",
    from: ["./app", "./api", "./sdk"],
    message: "The seed may use lib, not the layers above.",
  },
  {
    target: "./lib/!(engine|cli)/**/*",
    from: ["./app", "./api", "./sdk"],
    message: "Services know nothing of the API and the pages.",
  },
  {
    target: ["./app", "./api", "./db", "./sdk", "./lib/!(cli)/**/*", "./*.ts"],
    from: "./lib/cli",
    message: "lib/cli is for the shell: nobody imports it.",
  },
  {
    target: "./lib/cli",
    from: "./app",
    message: "lib/cli may use everything below app.",
  },
  {
    target: ["./app", "./api", "./lib/!(cli)/**/*", "./*.ts"],
    from: "./db/seed.ts",
    message: "The seed is called from lib/cli only.",
  },
  { target: "./api", from: ["./app", "./sdk"], message: "The API knows nothing of the pages." },
  {
    target: "./app",
    from: "./sdk",
    message: "Pages call the API themselves; the client is for other programs.",
  },
  {
    target: "./app/_ui",
    from: ["./api", "./db", "./lib/!(engine)/**/*"],
    message: "app/_ui is presentation: no data, no API.",
  },
];

// `from` as an array with `except` is resolved entry by entry, so each pair becomes a zone of its own.
const pairs = zones.flatMap(({ target, from, except, message }) =>
  [from].flat().map((source) => ({
    target,
    from: source,
    message,
    ...(except && source === "./lib" ? { except } : {}),
  })),
);

const config = [
  {
    ignores: [
      "**/node_modules/**",
      ".next/**",
      "**/dist/**",
      ".data/**",
      "coverage/**",
      "next-env.d.ts",
      // Wrong on purpose, for the test of these rules.
      "tests/fixtures/cycle/**",
      "db/migrations/**",
      "sdk/typescript/src/generated/**",
    ],
  },
  ...nextVitals,
  ...nextTypescript,
  {
    plugins: { "import-x": importX },
    settings: {
      // Without these two the cycle rule would not look into our files.
      "import-x/extensions": [".ts", ".tsx", ".mjs"],
      "import-x/parsers": { "@typescript-eslint/parser": [".ts", ".tsx"] },
      "import-x/resolver-next": [createTypeScriptImportResolver({ project: "./tsconfig.json" })],
    },
    rules: {
      "import-x/no-restricted-paths": ["error", { zones: pairs }],
      "import-x/no-cycle": ["error", { ignoreExternal: true }],
      "import-x/no-self-import": "error",
      "@typescript-eslint/no-explicit-any": "error",
      "@typescript-eslint/consistent-type-imports": ["error", { fixStyle: "inline-type-imports" }],
      "@typescript-eslint/no-unused-vars": ["error", { argsIgnorePattern: "^_", varsIgnorePattern: "^_" }],
      "no-restricted-syntax": [
        "error",
        {
          selector: "ExportAllDeclaration",
          message: "No barrel files: import from the module that defines the name.",
        },
      ],
      eqeqeq: ["error", "always", { null: "ignore" }],
      "no-console": "error",
    },
  },
  {
    files: ["lib/cli/**", "tests/**", "sdk/typescript/scripts/**", "sdk/typescript/examples/**"],
    rules: { "no-console": "off" },
  },
  {
    files: ["lib/engine/index.ts", "sdk/typescript/src/index.ts"],
    rules: { "no-restricted-syntax": "off" },
  },
];

export default config;
