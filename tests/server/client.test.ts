import { execFileSync } from "node:child_process";
import { mkdtempSync, readFileSync, readdirSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import {
  RhoformProblem,
  computeResistance,
  listMaterials,
  listShapes,
  readHealth,
  readResistance,
  readUsage,
  rhoform,
} from "@/sdk/typescript/src/index";
import { packedClient } from "@/app/(site)/docs/_content/client-files";
import { base } from "../browser/browser";
import { type TestServer, startServer } from "../support/server";

let server: TestServer;
let key: string;

beforeAll(async () => {
  server = await startServer();
  key = server.issue().key;
});

afterAll(() => server.stop());

const SLEEVE = {
  shape: "cylindrical-shell",
  dimensions: { innerRadius: "2 mm", outerRadius: "5 mm", length: "1 m" },
  medium: { conductivity: "1e-12 S/m" },
} as const;

describe("the client against the live service", () => {
  it("reads the catalogue without a key", async () => {
    const { items } = await listShapes({ client: rhoform({ baseUrl: server.base }) });
    expect(items.map(({ id }) => id)).toContain("cylindrical-shell");
  });

  it("computes", async () => {
    const client = rhoform({ baseUrl: server.base, key });
    const { resistance } = await computeResistance({ client, body: SLEEVE });
    // R = ln(5/2)/(2π·1e-12·1), closed form by hand.
    expect(resistance.value / (Math.log(2.5) / (2e-12 * Math.PI))).toBeCloseTo(1, 12);
    expect(resistance.lower).toBeLessThan(resistance.value);
    expect(resistance.upper).toBeGreaterThan(resistance.value);
  });

  it("reads the bare number as text", async () => {
    const client = rhoform({ baseUrl: server.base, key });
    const query = {
      length: "1 m",
      width: "1 m",
      thickness: "1 m",
      resistivity: "2",
      format: "text",
    } as const;
    const text: unknown = await readResistance({ client, path: { shape: "bar" }, query });
    expect(Number(text)).toBeCloseTo(2, 12);
  });

  it("lists materials and the key's own usage", async () => {
    const client = rhoform({ baseUrl: server.base, key });
    expect((await listMaterials({ client, query: { limit: 2 } })).items).toHaveLength(2);
    expect((await readUsage({ client })).scopes).toContain("compute");
  });

  it.each([
    [401, "invalid-key", `rho_${"x".repeat(16)}_${"y".repeat(43)}`, SLEEVE],
    [422, "invalid-input", undefined, { ...SLEEVE, dimensions: { ...SLEEVE.dimensions, length: "5 kg" } }],
  ] as const)("%i is a problem", async (status, code, other, body) => {
    const client = rhoform({ baseUrl: server.base, key: other ?? key });
    const error: unknown = await computeResistance({ client, body }).then(
      () => null,
      (reason: unknown) => reason,
    );
    expect(error).toBeInstanceOf(RhoformProblem);
    expect(error).toMatchObject({ status, code });
  });

  it("403 where the key lacks the scope", async () => {
    const client = rhoform({ baseUrl: server.base, key: server.issue({ scopes: ["records:read"] }).key });
    await expect(computeResistance({ client, body: SLEEVE })).rejects.toMatchObject({
      status: 403,
      code: "insufficient-scope",
    });
  });

  it("429 where the minute is used up, with the seconds to wait", async () => {
    const { key: poor } = server.issue({ quotas: { minute: 1, month: 100 } });
    const client = rhoform({ baseUrl: server.base, key: poor, retries: 0 });
    await computeResistance({ client, body: SLEEVE });
    await expect(computeResistance({ client, body: SLEEVE })).rejects.toMatchObject({
      status: 429,
      code: "too-many-requests",
      retryAfter: expect.any(Number),
    });
  });
});

describe("the packed client", () => {
  it("installs from the docs into an empty project, asking no other host, and runs", async () => {
    const folder = mkdtempSync(join(tmpdir(), "rhoform-client-"));
    const run = (program: string, args: string[], cwd: string) =>
      execFileSync(program, args, { cwd, encoding: "utf8", stdio: ["ignore", "pipe", "pipe"] });
    const page = await (await fetch(`${base()}/docs/clients`)).text();
    const [path] = /\/docs\/clients\/rhoform-client-[\d.]+\.tgz/.exec(page) ?? expect.fail("no link");
    // No registry answers at that address, and nothing of an earlier install is left in this store.
    run(
      "npm",
      [
        ...["install", base() + path, "--registry", "http://127.0.0.1:9", "--cache", join(folder, "store")],
        ...["--fetch-retries", "0", "--no-audit", "--no-fund"],
      ],
      folder,
    );
    writeFileSync(
      join(folder, "call.mjs"),
      `import { computeResistance, rhoform } from "@rhoform/client";
const client = rhoform({ baseUrl: process.env.BASE, key: process.env.KEY });
const answer = await computeResistance({ client, body: ${JSON.stringify(SLEEVE)} });
console.log(answer.resistance.text);`,
    );
    const printed = execFileSync(process.execPath, ["call.mjs"], {
      cwd: folder,
      encoding: "utf8",
      env: { ...process.env, BASE: server.base, KEY: key },
    });
    expect(printed.trim()).toBe("145.83\u2009GΩ");

    // Its types hold: a wrong dimension does not compile.
    const compiler = join(process.cwd(), "node_modules/typescript/bin/tsc");
    writeFileSync(
      join(folder, "tsconfig.json"),
      JSON.stringify({
        compilerOptions: {
          noEmit: true,
          strict: true,
          target: "es2022",
          module: "nodenext",
          lib: ["es2022", "dom", "dom.iterable"],
          types: [],
        },
        files: ["use.mts"],
      }),
    );
    const compile = (dimension: string) => {
      writeFileSync(
        join(folder, "use.mts"),
        `import { computeResistance, rhoform } from "@rhoform/client";
export const text: Promise<string> = computeResistance({
  client: rhoform({ baseUrl: "http://127.0.0.1" }),
  body: { shape: "bar", dimensions: { length: 1, width: 1, ${dimension}: 1 }, medium: { resistivity: 1 } },
}).then((answer) => answer.resistance.text);`,
      );
      return () => run(process.execPath, [compiler, "-p", "tsconfig.json"], folder);
    };
    expect(compile("thickness")).not.toThrow();
    expect(compile("thicknes")).toThrow();
    rmSync(join(folder, "use.mts"));

    // What the README tells of widgets compiles against the package, and so do the examples that come with it.
    const readme = readFileSync(join(folder, "node_modules/@rhoform/client/README.md"), "utf8");
    const told = (language: string) =>
      new RegExp("```" + language + "\\n([\\s\\S]*?)```").exec(readme)?.[1] ?? expect.fail(language);
    writeFileSync(join(folder, "page.mts"), told("js"));
    writeFileSync(join(folder, "widget.tsx"), told("tsx"));
    const examples = join(folder, "node_modules/@rhoform/client/examples");
    for (const name of readdirSync(examples)) {
      const copy = name.endsWith(".tsx") ? name : name.replace(/\.ts$/, ".mts");
      writeFileSync(join(folder, copy), readFileSync(join(examples, name)));
    }
    const types = join(process.cwd(), "node_modules/@types");
    writeFileSync(join(folder, "package.json"), JSON.stringify({ type: "module" }));
    writeFileSync(
      join(folder, "tsconfig.json"),
      JSON.stringify({
        compilerOptions: {
          ...{ noEmit: true, strict: true, target: "es2022", module: "nodenext", jsx: "react-jsx" },
          // Node runs the examples without a compiler, by leaving out their types.
          ...{ erasableSyntaxOnly: true, verbatimModuleSyntax: true, skipLibCheck: true },
          lib: ["es2023", "dom", "dom.iterable"],
          typeRoots: [types],
          types: ["node"],
          paths: {
            react: [join(types, "react/index.d.ts")],
            "react/*": [join(types, "react/*.d.ts")],
            "react-dom/*": [join(types, "react-dom/*.d.ts")],
          },
        },
        include: ["*.mts", "*.tsx"],
      }),
    );
    expect(run(process.execPath, [compiler, "-p", "tsconfig.json"], folder)).toBe("");
    rmSync(folder, { recursive: true });
  }, 120_000);

  it("is the same whenever it is packed, and another name is not found", async () => {
    const folder = mkdtempSync(join(tmpdir(), "rhoform-client-"));
    const served = await fetch(`${base()}/docs/clients/${packedClient()}`);
    expect(served.headers.get("Content-Disposition")).toContain(packedClient());
    const bytes = Buffer.from(await served.arrayBuffer());
    for (const other of ["rhoform-client-0.0.0.tgz", "..%2F..%2Fpackage.json"])
      expect((await fetch(`${base()}/docs/clients/${other}`)).status).toBe(404);
    execFileSync("npm", ["pack", "./sdk/typescript", "--silent", "--pack-destination", folder]);
    expect(readdirSync(folder)).toEqual([packedClient()]);
    expect(readFileSync(join(folder, packedClient())).equals(bytes)).toBe(true);
    rmSync(folder, { recursive: true });
  }, 120_000);

  it("health answers", async () => {
    expect(await readHealth({ client: rhoform({ baseUrl: server.base }) })).toMatchObject({ status: "ok" });
  });
});
