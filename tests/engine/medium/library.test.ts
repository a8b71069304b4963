/** The shared library against the tables of its sources. */
import { describe, expect, it } from "vitest";
import { materialSchema, coversTemperature, resistivityAt } from "@/lib/engine/medium/material";
import { libraryMaterial, libraryMaterials } from "@/lib/engine/medium/library/materials";
import {
  practicalSalinity,
  seaWaterConductivity,
  STANDARD_CONDUCTIVITY,
} from "@/lib/engine/medium/sea-water";
import { deviation } from "../../support/compute";

function at(id: string, temperatureC: number): number {
  const material = libraryMaterial(id);
  if (!material) throw new Error(`no material ${id}`);
  return resistivityAt(material, temperatureC);
}

describe("every entry", () => {
  it.each(libraryMaterials.map((material) => [material.id, material] as const))(
    "%s is sound",
    (_, material) => {
      expect(materialSchema.parse(material)).toEqual(material);
      expect(material).toMatchObject({ version: 1, owner: "library" });
      const { from, to } = material.range;
      expect(from).toBeLessThan(to);
      // The reference temperature of a request without one.
      expect(coversTemperature(material, 20)).toBe(true);
      let before = NaN;
      for (let i = 0; i <= 40; i++) {
        const rho = resistivityAt(material, from + ((to - from) * i) / 40);
        expect(rho > 0 && Number.isFinite(rho)).toBe(true);
        // No law jumps: a fortieth of the range changes it by a third at most.
        if (i > 0) expect(Math.abs(rho / before - 1)).toBeLessThan(0.34);
        before = rho;
      }
      const { lower, upper } = material.uncertainty;
      expect(lower).toBeLessThan(1);
      expect(upper).toBeGreaterThan(1);
    },
  );

  it("has a name of its own, and the list holds what 3-engine asks for", () => {
    expect(new Set(libraryMaterials.map(({ id }) => id)).size).toBe(libraryMaterials.length);
    for (const id of [
      "copper-annealed",
      "copper-hard-drawn",
      "aluminium-electrical",
      "silver",
      "gold",
      "nickel",
      "platinum",
      "tungsten",
      "iron",
      "brass-70-30",
      "bronze-phosphor",
      "constantan",
      "manganin",
      "nichrome",
      "stainless-304",
      "solder-sn63pb37",
      "solder-sac305",
      "graphite",
      "indium-tin-oxide",
      "kcl-0-01",
      "kcl-0-1",
      "kcl-1",
      "sea-water",
      "soil-clay",
      "concrete-in-ground",
      "silicon-n-1e15",
      "silicon-p-1e18",
    ]) {
      expect(libraryMaterial(id)?.id).toBe(id);
    }
    expect(libraryMaterial("unobtainium")).toBeUndefined();
  });
});

describe("IEC 60028 (from memory)", () => {
  it("annealed copper: 1/58 Ω·mm²/m at 20 °C, 0.00393 1/K", () => {
    expect(deviation(at("copper-annealed", 20), 1e-6 / 58)).toBeLessThan(1e-15);
    expect(deviation(at("copper-annealed", 70), (1e-6 / 58) * (1 + 50 * 0.00393))).toBeLessThan(1e-15);
  });
});

describe("CRC Handbook (seen), 1e-8 Ω·m at 0, 20, 25 and 100 °C", () => {
  it.each([
    ["aluminium-pure", [2.417, 2.65, 2.709, 3.56]],
    ["copper-pure", [1.543, 1.678, 1.712, 2.22]],
    ["constantan", [45.43, 45.38, 45.35, 45.11]],
    ["nichrome", [107.3, 107.5, 107.6, 108.3]],
    ["platinum", [9.6, 10.5, 10.7, 13.6]],
    ["silver", [1.467, 1.587, 1.617, 2.07]],
    ["tungsten", [4.82, 5.28, 5.39, 7.18]],
    ["brass-70-30", [5.87, 6.08, 6.13, 6.91]],
  ] as const)("%s", (id, values) => {
    [0, 20, 25, 100].forEach((t, i) => expect(deviation(at(id, t), values[i] * 1e-8)).toBeLessThan(1e-14));
    expect(libraryMaterial(id)?.provenance).toBe("source at hand");
  });

  it("only those carry that mark", () => {
    const marked = libraryMaterials.filter(({ provenance }) => provenance === "source at hand");
    expect(marked).toHaveLength(8);
  });
});

describe("KCl solutions, CRC (Pratt 2001; seen at 20 and 25 °C), µS/cm", () => {
  it.each([
    ["kcl-0-01", 1408.23, 1273.03],
    ["kcl-0-1", 12824.6, 11615.9],
    ["kcl-1", 108620, 99170],
  ])("%s", (id, warm, cool) => {
    expect(deviation(1e4 / at(id, 25), warm)).toBeLessThan(1e-14);
    expect(deviation(1e4 / at(id, 20), cool)).toBeLessThan(1e-14);
  });

  it.each(["kcl-0-01", "kcl-0-1", "kcl-1"])(
    "%s is smooth: its recalled temperatures hold no slip of a digit",
    (id) => {
      const values = Array.from({ length: 11 }, (_, i) => 1 / at(id, 5 * i));
      for (let i = 0; i + 3 < values.length; i++) {
        const third = values[i + 3] - 3 * values[i + 2] + 3 * values[i + 1] - values[i];
        expect(Math.abs(third / values[i])).toBeLessThan(8e-4);
      }
    },
  );
});

describe("sea water, PSS-78", () => {
  it("C(35, 15, 0) = 42.914 mS/cm (seen)", () => {
    expect(STANDARD_CONDUCTIVITY).toBe(4.2914);
    expect(deviation(1 / at("sea-water", 15), 4.2914)).toBeLessThan(2e-7);
  });

  it("UNESCO 44 p. 9 (seen): R = 0.65, t = 5, p = 1500 gives S = 27.9953479", () => {
    // The printed value is one of single precision: its neighbours lie 1.9e-6 apart.
    expect(Math.abs(practicalSalinity(0.65, 5, 1500) - 27.9953479)).toBeLessThan(1e-6);
  });

  it("UNESCO 36 p. 17 (seen): S = 37.245628, t = 20, p = 2000 gives R = 1.2000001", () => {
    expect(Math.abs(practicalSalinity(1.2000001, 20, 2000) - 37.245628)).toBeLessThan(5e-6);
  });

  it("turns salinity into conductivity and back", () => {
    for (const salinity of [2, 10, 28, 35, 42]) {
      for (const t of [-2, 0, 15, 35]) {
        const ratio = seaWaterConductivity(salinity, t) / STANDARD_CONDUCTIVITY;
        expect(Math.abs(practicalSalinity(ratio, t) - salinity)).toBeLessThan(1e-9);
      }
    }
  });
});

describe("silicon, ASTM F723 (values of 6-checks, Ω·cm, 1e14 … 1e19)", () => {
  it.each([
    ["p", [130.97, 13.306, 1.4434, 0.20215, 0.043555, 0.0088719]],
    ["n", [42.871, 4.4819, 0.52291, 0.083831, 0.023559, 0.0057754]],
  ] as const)("%s-type", (type, values) => {
    values.forEach((value, i) => {
      expect(deviation(at(`silicon-${type}-1e${14 + i}`, 20) * 100, value)).toBeLessThan(5e-5);
    });
  });
});

describe("ranges", () => {
  it.each(["soil-clay", "soil-sand-dry", "rock", "concrete-dry", "graphite", "indium-tin-oxide"])(
    "%s carries its range as an uncertainty",
    (id) => {
      const material = libraryMaterial(id);
      if (!material) throw new Error(id);
      expect(material.uncertainty.upper / material.uncertainty.lower).toBeGreaterThan(2.5);
      expect(material.uncertainty.note).toMatch(/[Ff]rom|run/);
      expect(material.provenance).toBe("from memory");
    },
  );

  it("those without a source say so", () => {
    for (const { source } of libraryMaterials) expect(source.length).toBeGreaterThan(10);
    expect(libraryMaterial("soil-clay")?.source).toBe("Common practice, no source");
  });
});
