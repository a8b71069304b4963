import { describe, expect, test } from "vitest";
import { changesLine, toldChanges } from "@/app/console/activity/_parts/told-changes";
import { msText, shareText } from "@/app/console/_parts/numbers";
import { factsOf, resistivityText } from "@/app/console/materials/_parts/material-facts";
import { libraryMaterials, resistivityAt } from "@/lib/engine";

/** Narrow spaces are plain ones here. */
const plain = (text: string) => text.replace(/[\u2009\u202f\u00a0]/g, " ");

test("shares and latencies stay on one line", () => {
  const texts = [shareText(99, 100), shareText(1, 1000), msText(3.02), msText(1500)];
  expect(texts.map(plain)).toEqual(["99 %", "< 1 %", "3.02 ms", "1.50 s"]);
  expect(texts.join("")).not.toContain(" ");
});

describe("the library's materials in the console", () => {
  test.each([
    ["ptfe", "10 PΩ·m"],
    ["polyethylene", "100 TΩ·m"],
    ["copper-annealed", "17.24 nΩ·m"],
    ["rock", "10 kΩ·m"],
  ])("%s has its resistivity in a unit of its size", (id, text) => {
    const material = libraryMaterials.find((each) => each.id === id);
    if (!material) throw new Error(`The library lacks ${id}.`);
    expect(plain(resistivityText(resistivityAt(material, 20)))).toBe(text);
  });

  test("show no exponent of a program, no stray digit and no number without its unit", () => {
    for (const material of libraryMaterials) {
      const { from, to } = material.range;
      const texts = [
        resistivityText(resistivityAt(material, Math.min(to, Math.max(from, 20)))),
        ...factsOf({
          ...material,
          name: "",
          source: "",
          note: "",
          uncertainty: { ...material.uncertainty, note: "" },
        }).map(([, text]) => text),
      ];
      for (const text of texts) {
        expect(text, material.id).not.toMatch(/\de[+-]?\d|\d{9}|undefined|NaN|\[object/);
      }
      expect(plain(texts[0]), material.id).toMatch(/^\d{1,3}(\.\d+)? [pnµmkMGTPE]?Ω·m$/);
    }
  });

  test("tell their law member by member", () => {
    const facts = (id: string) => {
      const material = libraryMaterials.find((each) => each.id === id);
      return new Map(material ? factsOf(material).map(([title, text]) => [title, plain(text)]) : []);
    };
    expect(facts("copper-annealed").get("Resistivity")).toBe("17.241379 nΩ·m");
    expect(facts("copper-annealed").get("Temperature coefficient")).toBe("0.00393 1/K");
    expect(facts("copper-pure").get("Resistivity")).toBe(
      "15.43 nΩ·m at 0 °C, 16.78 nΩ·m at 20 °C, 17.12 nΩ·m at 25 °C, 22.2 nΩ·m at 100 °C",
    );
    expect(facts("kcl-1").get("Conductivity")).toContain("… (11 in all)");
    expect(facts("silicon-p-1e14").get("Dopant density")).toBe("1×10¹⁴ 1/cm³");
  });
});

describe("what an act changed", () => {
  const bronze = {
    id: "mat-imcx9tpqry7ob7tftab9",
    version: 1,
    owner: "busbar",
    name: "Contact bronze",
    kind: "alloy",
    resistivity: { model: "linear", resistivity: 9.5e-8, coefficient: 0.0011, reference: 20 },
    range: { from: -40, to: 150 },
    uncertainty: { lower: 0.98, upper: 1.02, note: "two lots" },
    source: "own bench",
    provenance: "measured",
    retiredAt: null,
  };
  const told = (kind: string, before: unknown, after: unknown) =>
    toldChanges({ before, after, subject: { kind } }).map((each) => Object.values(each).map(plain));

  test("of a material is told with units and without ids", () => {
    const after = {
      ...bronze,
      version: 2,
      resistivity: { ...bronze.resistivity, resistivity: 9.32e-8 },
      range: { from: -20, to: 150 },
    };
    expect(told("material", bronze, after)).toEqual([
      ["Resistivity", "95 nΩ·m", "93.2 nΩ·m"],
      ["Holds", "−40 °C to 150 °C", "−20 °C to 150 °C"],
      ["Version", "1", "2"],
    ]);
    expect(plain(changesLine({ before: bronze, after, subject: { kind: "material" } }))).toBe(
      "Resistivity: 95 nΩ·m → 93.2 nΩ·m; Holds: −40 °C to 150 °C → −20 °C to 150 °C; 1 more",
    );
    const made = told("material", null, bronze);
    expect(made).toContainEqual(["Resistivity", "", "95 nΩ·m"]);
    expect(JSON.stringify(made)).not.toMatch(/mat-|[{}]/);
  });

  test("of an embed, a key, a setting and a person is told in words", () => {
    const embed = { name: "Bar", origins: [], monthQuota: 10_000 };
    expect(told("embed", embed, { ...embed, origins: ["https://a.example"], monthQuota: 500 })).toEqual([
      ["Origins", "", "https://a.example"],
      ["Quota of the month", "10,000 computations", "500 computations"],
    ]);
    expect(told("embed", { version: null }, { version: 1 })).toEqual([["Version", "none", "1"]]);
    const key = {
      id: "k1",
      state: "active",
      quotas: { minute: 600, month: 10 },
      expiresAt: null,
      lastUsedAt: null,
      lastClient: null,
    };
    const changed = {
      ...key,
      quotas: { minute: 60, month: 10 },
      expiresAt: "2030-01-31T23:59:59.000Z",
      lastClient: "python",
    };
    expect(told("key", key, changed)).toEqual([
      ["Quota", "600 requests a minute", "60 requests a minute"],
      ["Expires", "never", "2030-01-31 23:59 UTC"],
    ]);
    expect(told("setting", { usageDays: 400, mailDays: 30 }, { usageDays: 30, mailDays: 30 })).toEqual([
      ["Single requests are kept", "400 days", "30 days"],
    ]);
    expect(told("person", { role: "viewer", teams: ["busbar"] }, { role: "admin", teams: [] })).toEqual([
      ["Role", "viewer", "admin"],
      ["Teams", "busbar", ""],
    ]);
  });
});
