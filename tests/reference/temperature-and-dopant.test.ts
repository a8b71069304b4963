/** tests/fixtures/values.json, groups K and L. */
import { describe, expect, it } from "vitest";
import { erfc } from "@/lib/engine/numeric/error-function";
import { compute, deviation, graded } from "../support/compute";
import { reference } from "./values";

/** Resistance of a cube of 1 m with that medium at a temperature: its resistivity. */
function resistivity(medium: Record<string, unknown>, temperatureC: number): number {
  const dimensions = { length: 1, area: 1 };
  return compute({ shape: "prism", dimensions, medium, operating: { temperature: temperatureC } }).resistance
    .value;
}

describe("temperature coefficients", () => {
  it("K-lin-1: R(T) = R20·(1 + α(T − 20))", () => {
    const { value, n, tolerance } = reference("K-lin-1");
    const medium = { resistivity: n.R20, temperatureCoefficient: n.alpha };
    expect(deviation(resistivity(medium, n.T), value)).toBeLessThan(tolerance);
  });

  it("K-chain-1: the temperature at which R1 at T1 has become R2", () => {
    const { value, n } = reference("K-chain-1");
    const medium = { resistivity: 1, temperatureCoefficient: n.alpha };
    const ratio = resistivity(medium, value) / resistivity(medium, n.T1);
    expect(deviation(n.R1 * ratio, n.R2)).toBeLessThan(1e-15);
  });

  it("K-alpha-1: the coefficient referred to another temperature gives the same resistivity", () => {
    const { value, n } = reference("K-alpha-1");
    const at20 = { resistivity: 1, temperatureCoefficient: n.alpha };
    const atT = {
      resistivity: resistivity(at20, n.T),
      temperatureCoefficient: value,
      referenceTemperature: n.T,
    };
    for (const t of [-40, 0, 20, 75, 150]) {
      expect(deviation(resistivity(atT, t), resistivity(at20, t))).toBeLessThan(2e-15);
    }
  });

  it.each([
    ["K-iec-cu-1", 254.5],
    ["K-iec-al-1", 248],
    ["K-al2281-1", 248.1],
  ])("%s: the factor to 20 °C of IEC 60228 (from memory) is that of the coefficient 1/%d", (id, constant) => {
    const { value, n } = reference(id);
    const medium = { conductivity: 1, temperatureCoefficient: 1 / constant };
    expect(deviation(1 / resistivity(medium, n.t), value)).toBeLessThan(1e-15);
  });
});

/** erfc⁻¹ by bisection, for the diffusion length that puts the junction where the case has it. */
function inverseErfc(y: number): number {
  let low = 0;
  let high = 10;
  for (let i = 0; i < 200; i++) {
    const middle = (low + high) / 2;
    if (erfc(middle) > y) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}

describe("sheet resistance of a diffused layer (Masetti 1983, boron), in a bar one metre square", () => {
  const layer = (
    id: string,
    profile: (n: Readonly<Record<string, number>>) => Record<string, unknown>,
  ): void => {
    const { value, n } = reference(id);
    const junctionM = n.xj_cm / 100;
    const { resistance } = graded(
      "bar",
      { length: 1, width: 1, thickness: junctionM },
      "thickness",
      undefined,
      {
        kind: "dopant",
        type: "p",
        model: "masetti",
        background: n.Nb_cm3,
        profile: profile(n),
      },
    );
    expect(deviation(resistance.value, value)).toBeLessThan(1e-11);
    expect(resistance.lower).toBeLessThan(value * (1 + 1e-12));
    expect(resistance.upper).toBeGreaterThan(value * (1 - 1e-12));
  };

  it("L-sheet-g-1: Gaussian", () => {
    layer("L-sheet-g-1", (n) => ({
      kind: "gaussian",
      peak: n.Ns_cm3,
      center: 0,
      spread: n.xj_cm / 100 / Math.sqrt(2 * Math.log(n.Ns_cm3 / n.Nb_cm3)),
    }));
  });

  it("L-sheet-e-1: complementary error function", () => {
    layer("L-sheet-e-1", (n) => ({
      kind: "complementary-error",
      surface: n.Ns_cm3,
      length: n.xj_cm / 100 / inverseErfc(n.Nb_cm3 / n.Ns_cm3),
      from: "start",
    }));
  });
});
