import { copyFileSync, mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { catalogue, exampleRequest } from "@/lib/engine";
import { shapeClassName } from "@/lib/cli/python/shape-classes";
import { snakeCase } from "@/lib/cli/python/names";
import { python } from "../sdk/support/python";
import { type TestServer, startServer } from "../support/server";

let server: TestServer;
let folder: string;
let variables: Record<string, string>;

beforeAll(async () => {
  server = await startServer();
  folder = mkdtempSync(join(tmpdir(), "rhoform-python-"));
  variables = { RHOFORM_URL: server.base, RHOFORM_KEY: server.issue().key };
});

afterAll(async () => {
  rmSync(folder, { recursive: true });
  await server.stop();
});

const PROLOGUE = `import os, rhoform
client = rhoform.Client(os.environ["RHOFORM_URL"], key=os.environ["RHOFORM_KEY"])
`;

async function run(code: string): Promise<string> {
  const ran = await python(["-c", PROLOGUE + code], variables);
  expect(ran.err).toBe("");
  return ran.out.trim();
}

const SQUARE = `{
    "outline": {"unit": "mm", "outer": [[0, 0], [10, 0], [10, 10], [0, 10]]},
    "terminals": [{"name": "a", "segments": [[[0, 0], [0, 10]]]}, {"name": "b", "segments": [[[10, 0], [10, 10]]]}],
    "medium": {"sheetResistance": 50},
}`;

describe("the Python client against the live service", () => {
  it("has a class for every shape, whose example computes", async () => {
    const requests = catalogue.map((shape) => {
      const { dimensions, ...rest } = exampleRequest(shape) as Record<string, unknown> & {
        dimensions: Record<string, unknown>;
      };
      delete rest.shape;
      const members = Object.entries(dimensions).map(
        ([name, value]) => `${snakeCase(name)}=${JSON.stringify(value)}`,
      );
      return `rhoform.request_of(rhoform.${shapeClassName(shape.id)}(${members.join(", ")}), **json.loads(${JSON.stringify(JSON.stringify(rest))}))`;
    });
    const out = await run(`import json
items = client.batch([${requests.join(",\n")}])
print([item for item in items if item.status != 200], len(items))`);
    expect(out).toBe(`[] ${catalogue.length}`);
  });

  it("solves a field, reads its map, stores and replays a record", async () => {
    const out = await run(`
field = client.field(${SQUARE})
found = field.result.resistance
print(field.status, found.lower <= 50 <= found.upper, len(client.read_field_map(field.id).equipotentials) > 3)
print("<svg" in client.read_field_plot(field.id))
bar = rhoform.Bar(length="1 m", width="50 mm", thickness="10 mm")
kept = client.resistance(bar, {"material": "copper-annealed"}, record={"label": "Python"})
replay = client.replay_record(kept.record.id)
listed = [record.label for record in client.pages(client.list_records, search="Python") if record.id == kept.record.id]
client.delete_record(kept.record.id)
print(replay.identical, listed)
`);
    expect(out).toBe("done True True\nTrue\nTrue ['Python']");
  });

  it("answers a table in a shell, and an address with free names", async () => {
    const table = join(folder, "parts.csv");
    writeFileSync(table, "shape,length,width/mm,thickness/mm,material\nbar,1 m,50,10,copper-annealed\n");
    const batch = await python(["-m", "rhoform", "batch", table], variables);
    expect(batch).toMatchObject({ code: 0, err: "" });
    expect(batch.out.split("\n")[1]).toMatch(
      /^bar,1 m,50,10,copper-annealed,0\.0000\d+|^bar,1 m,50,10,copper-annealed,\d/,
    );
    const out = await run(
      `print(client.read_resistance("cylindrical-shell", inner_radius="2mm", outer_radius="5mm", length="1m", resistivity=1).resistance.text)`,
    );
    expect(out).toMatch(/Ω$/);
  });

  it("installs from its folder, and runs as one file beside a script", async () => {
    const copy = join(folder, "rhoform.py");
    copyFileSync("sdk/python/rhoform.py", copy);
    const ran = await python([copy, "shapes", "bar"], { ...variables, PYTHONPATH: "" });
    expect(ran).toMatchObject({ code: 0, err: "" });
    expect(ran.out).toContain("Rectangular bar");
    const built = await python([
      "-c",
      "import wheel_backend, sys; print(wheel_backend.build_wheel(sys.argv[1]))",
      folder,
    ]);
    expect(built).toMatchObject({ code: 0, err: "" });
    const wheel = join(folder, built.out.trim());
    const inside = await python(["-c", "import rhoform; print(rhoform.__file__)"], { PYTHONPATH: wheel });
    expect(inside.out).toContain(wheel);
    const pip = await python(["-m", "pip", "--version"], { PYTHONPATH: "" });
    // Debian's Python comes without pip; where it is, the folder must install.
    if (pip.code !== 0) return;
    const site = join(folder, "site");
    const args = ["-m", "pip", "install", "--quiet", "--no-index", "--target", site, "./sdk/python"];
    const installed = await python(args, { PYTHONPATH: "", PIP_DISABLE_PIP_VERSION_CHECK: "1" });
    expect(installed).toMatchObject({ code: 0 });
    const found = await python(["-c", "import rhoform; print(rhoform.__file__)"], { PYTHONPATH: site });
    expect(found.out).toContain(site);
  }, 60_000);
});
