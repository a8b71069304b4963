import { BASE_PATH } from "../base-path";
import type { Example } from "../documentation";
import type { Operation } from "../operation";

/** Sends one call somewhere: to a dispatcher in this process, or to a server. */
export type Send = (path: string, init: RequestInit) => Promise<Response>;

/** Things that examples speak of: made before, and named by `$record`, `$material` … in their paths. */
export type Fixtures = Readonly<Record<string, string>>;

const FIXTURE_RECORD = {
  shape: "cylindrical-shell",
  dimensions: { innerRadius: "2 mm", outerRadius: "5 mm", length: "1 m" },
  medium: { conductivity: 1e-12 },
  operating: { temperature: "75 degC", voltage: "500 V" },
  record: { label: "Sleeve, rev C" },
};

const FIXTURE_MATERIAL = {
  name: "Contact bronze, lot 6",
  kind: "alloy",
  resistivity: { model: "linear", resistivity: 9.5e-8, coefficient: 0.0011, reference: 20 },
  range: { from: -40, to: 150 },
  uncertainty: { lower: 0.98, upper: 1.02, note: "Four-wire measurement, coverage factor 2." },
  source: "Incoming inspection, lot 6",
  provenance: "measured",
};

const FIXTURE_OUTLINE = {
  unit: "mm",
  outer: [
    [0, 0],
    [40, 0],
    [40, 10],
    [10, 10],
    [10, 40],
    [0, 40],
  ],
};

const FIXTURE_FIELD = {
  outline: FIXTURE_OUTLINE,
  terminals: [
    {
      name: "in",
      segments: [
        [
          [40, 0],
          [40, 10],
        ],
      ],
    },
    {
      name: "out",
      segments: [
        [
          [10, 40],
          [0, 40],
        ],
      ],
    },
  ],
  medium: { sheetResistance: 50 },
};

const FIXTURE_KEY = { name: "Nightly check", scopes: ["compute", "records:read"] };

/** Makes what the examples speak of, by calls of the API itself. */
export async function makeFixtures(send: Send, key: string): Promise<Fixtures> {
  const make = async (path: string, body: unknown, member: (answer: Made) => string | undefined) => {
    const response = await send(BASE_PATH + path, {
      method: "POST",
      headers: { Authorization: `Bearer ${key}`, "Content-Type": "application/json", Prefer: "wait=30" },
      body: JSON.stringify(body),
    });
    const text = await response.text();
    const id = response.ok ? member(JSON.parse(text) as Made) : undefined;
    if (id === undefined) throw new Error(`No fixture from ${path}: ${response.status} ${text}`);
    return id;
  };
  const record = () => make("/resistance", FIXTURE_RECORD, (answer) => answer.record?.id);
  const material = () => make("/materials", FIXTURE_MATERIAL, (answer) => answer.id);
  const fieldRecord = () => {
    const body = { ...FIXTURE_FIELD, record: { label: "Track, rev B" } };
    return make("/fields", body, (answer) => answer.record?.id);
  };
  const field = () => make("/fields", FIXTURE_FIELD, (answer) => answer.id);
  const issued = () => make("/keys", FIXTURE_KEY, (answer) => answer.id);
  return {
    $record: await record(),
    $oldRecord: await record(),
    $material: await material(),
    $oldMaterial: await material(),
    $outline: await make("/outlines", { outline: FIXTURE_OUTLINE }, (answer) => answer.id),
    $field: await field(),
    $oldField: await field(),
    $fieldRecord: await fieldRecord(),
    $key: await issued(),
    $oldKey: await issued(),
  };
}

interface Made {
  readonly id?: string;
  readonly record?: { readonly id: string };
}

/** The address of an example's call, with its path and query filled in. */
export function exampleTarget(operation: Operation, example: Example, fixtures: Fixtures): string {
  const path = operation.path.replace(/\{(\w+)\}/g, (_, name: string) => {
    const value = example.path?.[name] ?? "";
    return encodeURIComponent(fixtures[value] ?? value);
  });
  const query = new URLSearchParams(example.query).toString();
  return BASE_PATH + path + (query === "" ? "" : `?${query}`);
}

/** Makes an example's call. */
export async function performExample(
  send: Send,
  operation: Operation,
  example: Example,
  fixtures: Fixtures,
  key: string | undefined,
): Promise<Response> {
  const headers = new Headers(example.headers);
  if (key !== undefined && operation.scope !== "none") headers.set("Authorization", `Bearer ${key}`);
  if (example.accept !== undefined) headers.set("Accept", example.accept);
  let body: string | undefined;
  if (example.body !== undefined) {
    const text = example.mediaType === undefined;
    headers.set("Content-Type", example.mediaType ?? "application/json");
    body = text ? JSON.stringify(example.body) : String(example.body);
  }
  return await send(exampleTarget(operation, example, fixtures), { method: operation.method, headers, body });
}
