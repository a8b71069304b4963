/**
 * Bundles what is loaded as one file: by worker threads, whatever the server was started with, and by the pages of other
 * teams, which load a widget.
 */
import { build } from "esbuild";
import { ROOT } from "./setup.mjs";

await build({
  absWorkingDir: ROOT,
  entryPoints: ["lib/jobs/field-worker.ts"],
  outdir: "dist/workers",
  outExtension: { ".js": ".mjs" },
  bundle: true,
  platform: "node",
  format: "esm",
  target: "node20",
  alias: { "@": "." },
  logLevel: "warning",
});

await build({
  absWorkingDir: ROOT,
  entryPoints: {
    v1: "app/embed/_loader/main.ts",
    "react-example": "sdk/typescript/examples/embed-react.tsx",
  },
  outdir: "dist/embed",
  bundle: true,
  minify: true,
  platform: "browser",
  format: "iife",
  jsx: "automatic",
  alias: { "@rhoform/client/react": "./sdk/typescript/src/embed-react.ts" },
  define: { "process.env.NODE_ENV": '"production"' },
  target: "es2022",
  charset: "utf8",
  logLevel: "warning",
});
