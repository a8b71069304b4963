import { describe, expect, it } from "vitest";
import fc from "fast-check";
import { convertUnit, textInUnit } from "@/app/_ui/quantity/convert";
import {
  compactQuantity,
  joinQuantity,
  spaceQuantity,
  splitQuantity,
} from "@/app/_ui/quantity/quantity-text";
import { decimalText, rational } from "@/app/_ui/quantity/rational";
import { gaugeMm } from "@/app/_ui/quantity/gauge";
import { readTyped } from "@/app/_ui/quantity/read-typed";
import { FIRST_UNIT, findUnit, UNITS, unitsOf, type UnitKind } from "@/app/_ui/quantity/units";
import { readQuantity } from "@/lib/engine";

const KINDS = Object.keys(UNITS) as UnitKind[];

function typed(text: string, decimalComma = false) {
  const read = readTyped(text, decimalComma);
  return read.kind === "quantity" ? `${read.number}|${read.unit}` : read.kind;
}

describe("readTyped", () => {
  it.each([
    ["12.5 mm", "12.5|mm"],
    ["12,5 mm", "12.5|mm"],
    ["12,5mm", "12.5|mm"],
    ["0,25", "0.25|"],
    ["-40 °C", "-40|°C"],
    ["−40", "-40|"],
    ["1.234,5 mm", "1234.5|mm"],
    ["1,234.5 mm", "1234.5|mm"],
    ["1 234,5 mm", "1234.5|mm"],
    ["1\u202f234,5", "1234.5|"],
    ["1'234.5 m", "1234.5|m"],
    ["1,234,567", "1234567|"],
    ["1/2 in", "0.5|in"],
    ["1/2in", "0.5|in"],
    ["1 1/2 in", "1.5|in"],
    ["1-1/2 in", "1.5|in"],
    ["5½ in", "5.5|in"],
    ['½"', '0.5|"'],
    ["3/8″", "0.375|″"],
    ["1.72e-8 ohm m", "1.72e-8|ohm m"],
    ["1.72×10^-8 Ω·m", "1.72e-8|Ω·m"],
    ["1.72×10⁻⁸ Ω·m", "1.72e-8|Ω·m"],
    ["0.00393 1/K", "0.00393|1/K"],
    ["0.00393/K", "0.00393|/K"],
    ["1e18 1/cm^3", "1e18|1/cm^3"],
    ["58 MS/m", "58|MS/m"],
    ["2,5e3", "2.5e3|"],
    ["12.", "12.|"],
    [".5", ".5|"],
    ["12 mm ", "12|mm"],
  ])("reads %s", (text, expected) => {
    expect(typed(text)).toBe(expected);
  });

  it("leaves a comma that could also group to the reader's language", () => {
    expect(typed("1,234 mm")).toBe("unclear");
    expect(typed("1,234 mm", true)).toBe("1.234|mm");
    expect(typed("0,234 mm")).toBe("0.234|mm");
    expect(typed("1234,567")).toBe("1234.567|");
  });

  it.each(["abc", "1 2", "1,23,456", "1.2.3", "1/0 in", "--1"])("takes %s for no quantity", (text) => {
    expect(typed(text)).toBe("unclear");
  });

  it("knows a wire gauge from a fraction", () => {
    expect(readTyped("AWG 24", false)).toEqual({ kind: "gauge", text: "AWG 24" });
    expect(readTyped("4/0 AWG", false)).toEqual({ kind: "gauge", text: "4/0 AWG" });
    expect(typed("")).toBe("empty");
  });
});

describe("units", () => {
  it("are all read by the API, with the same size", () => {
    for (const kind of KINDS) {
      for (const unit of UNITS[kind]) {
        const reading = readQuantity(`1 ${unit.id}`, kind);
        expect(reading, `${kind} ${unit.id}`).toMatchObject({ ok: true });
        const base = UNITS[kind].find(({ id }) => id === baseOf(kind));
        expect(base, kind).toBeDefined();
        const mine = Number(convertUnit("1", unit, base!));
        const theirs = reading.ok ? reading.value : NaN;
        const expected = kind === "angle" ? (theirs * 180) / Math.PI : theirs;
        expect(Math.abs(mine / expected - 1), `${kind} ${unit.id}`).toBeLessThan(1e-13);
      }
      expect(UNITS[kind].length === 0 || findUnit(FIRST_UNIT[kind], UNITS[kind])).toBeTruthy();
    }
  });

  it("offer a foil's weight as the API reads it", () => {
    const foil = findUnit("oz/ft²", unitsOf("length", true));
    const micrometre = findUnit("um", UNITS.length);
    expect(foil && micrometre && convertUnit("2", foil, micrometre)).toBe("68.6");
    expect(readQuantity("2 oz/ft^2", "length", { gauge: "foil" })).toEqual({ ok: true, value: 68.6e-6 });
  });

  it.each([
    ["µm", "length", "um"],
    ["μm", "length", "um"],
    ['"', "length", "in"],
    ["inches", "length", "in"],
    ["mm²", "area", "mm^2"],
    ["Ω·m", "resistivity", "ohm m"],
    ["Ohm cm", "resistivity", "ohm cm"],
    ["Ω mm²/m", "resistivity", "ohm mm^2/m"],
    ["µΩ·cm", "resistivity", "uohm cm"],
    ["% IACS", "conductivity", "%IACS"],
    ["°C", "temperature", "degC"],
    ["°", "angle", "deg"],
    ["Ω/□", "sheetResistance", "ohm/sq"],
    ["kΩ", "resistance", "kohm"],
    ["cm⁻³", "density", "1/cm^3"],
    ["/K", "temperatureCoefficient", "1/K"],
  ] as const)("knows %s", (spelling, kind, id) => {
    expect(findUnit(spelling, UNITS[kind])?.id).toBe(id);
  });

  it("does not take one unit for another", () => {
    expect(findUnit("kg", UNITS.length)).toBeUndefined();
    expect(findUnit("Mm", UNITS.length)?.id).toBe("Mm");
    expect(findUnit("mOhm", UNITS.resistance)?.id).toBe("mohm");
    expect(findUnit("MOhm", UNITS.resistance)?.id).toBe("Mohm");
  });
});

describe("convertUnit", () => {
  const convert = (number: string, from: string, to: string, kind: UnitKind) => {
    const [a, b] = [findUnit(from, UNITS[kind]), findUnit(to, UNITS[kind])];
    return a && b && convertUnit(number, a, b);
  };

  it.each([
    ["0.25", "mm", "um", "length", "250"],
    ["1", "in", "mm", "length", "25.4"],
    ["12.7", "mm", "in", "length", "0.5"],
    ["10", "mil", "um", "length", "254"],
    ["1", "mm", "in", "length", "0.0393700787401575"],
    ["20", "degC", "K", "temperature", "293.15"],
    ["0", "K", "degC", "temperature", "-273.15"],
    ["20", "degC", "degF", "temperature", "68"],
    ["1", "degF", "degC", "temperature", "-17.2222222222222"],
    ["180", "deg", "rad", "angle", "3.1415926535898"],
    ["1.72e-8", "ohm m", "ohm mm^2/m", "resistivity", "0.0172"],
    ["1.72", "uohm cm", "ohm m", "resistivity", "1.72e-8"],
    ["100", "%IACS", "MS/m", "conductivity", "58"],
    ["1e-12", "S/m", "pS/m", "conductivity", "1"],
    ["3930", "ppm/K", "1/K", "temperatureCoefficient", "0.00393"],
  ] as const)("%s %s is so many %s", (number, from, to, kind, expected) => {
    expect(convert(number, from, to, kind)).toBe(expected);
  });

  it("comes back to the size it started from", () => {
    fc.assert(
      fc.property(
        fc.double({ min: 1e-9, max: 1e9, noNaN: true }),
        fc.constantFrom(...UNITS.length),
        fc.constantFrom(...UNITS.length),
        (value, from, to) => {
          const there = convertUnit(String(value), from, to);
          const back = there && convertUnit(there, to, from);
          expect(Math.abs(Number(back) / value - 1)).toBeLessThan(2e-15 + 1e-14);
        },
      ),
      { seed: 5, numRuns: 500 },
    );
  });
});

describe("gaugeMm", () => {
  it("is the diameter that the API reads", () => {
    for (const gauge of ["AWG 24", "10 AWG", "AWG 0", "AWG 4/0", "awg 36"]) {
      const reading = readQuantity(gauge, "length", { gauge: "wire" });
      expect(reading.ok && Math.abs(Number(gaugeMm(gauge)) / 1000 / reading.value - 1)).toBeLessThan(1e-14);
    }
    expect(gaugeMm("24 mm")).toBeNull();
    expect(gaugeMm("")).toBeNull();
  });
});

describe("decimalText", () => {
  it("is exact where the digits suffice, and rounds half up otherwise", () => {
    fc.assert(
      fc.property(fc.double({ noNaN: true, noDefaultInfinity: true, min: -1e300, max: 1e300 }), (value) => {
        const exact = rational(String(value));
        if (!exact) return;
        expect(Number(decimalText(exact, 17))).toBe(value === 0 ? 0 : value);
      }),
      { seed: 6, numRuns: 500 },
    );
    expect(decimalText(rational("0.5")!, 15)).toBe("0.5");
    expect(decimalText(rational("1e-9")!, 15)).toBe("1e-9");
    expect(decimalText(rational("120000")!, 15)).toBe("120000");
    expect(decimalText(rational("999999999999999.96")!, 15)).toBe("1e15");
  });
});

describe("quantity texts", () => {
  it("split and join", () => {
    const units = UNITS.length;
    const parts = splitQuantity("0.25 mm", units);
    expect([parts.number, parts.unit?.id]).toEqual(["0.25", "mm"]);
    expect(splitQuantity("AWG 24", units)).toEqual({ number: "AWG 24" });
    expect(splitQuantity("3 furlong", units)).toEqual({ number: "3", foreign: "furlong" });
    expect(joinQuantity("0.25", "mm")).toBe("0.25 mm");
    expect(joinQuantity(" ", "mm")).toBe("");
  });

  it("write a double without its noise", () => {
    const millimetre = findUnit("mm", UNITS.length)!;
    expect(textInUnit(0.005 - 0.002, millimetre)).toBe("3");
    expect(textInUnit(0.1 + 0.2, millimetre)).toBe("300");
    expect(textInUnit(293.15 - 273.15, findUnit("K", UNITS.temperature)!)).toBe("293.15");
  });

  it("keep their meaning when the space goes", () => {
    for (const kind of KINDS) {
      for (const unit of UNITS[kind]) {
        const text = `2.5 ${unit.id}`;
        expect(readQuantity(compactQuantity(text), kind)).toEqual(readQuantity(text, kind));
        expect(spaceQuantity(compactQuantity(text))).toBe(text);
      }
    }
    expect(compactQuantity("2.5 mm")).toBe("2.5mm");
    for (const text of ["1e-12", "2.5", "copper-annealed", "AWG 24", "58e6/(1+3*u^2)", "1e3", "1/K"]) {
      expect(compactQuantity(text)).toBe(text);
      expect(spaceQuantity(text)).toBe(text);
    }
    expect(compactQuantity("1.72e-8 ohm m")).toBe("1.72e-8ohm m");
    expect(compactQuantity("0.00393 1/K")).toBe("0.00393 1/K");
  });
});

function baseOf(kind: UnitKind): string | undefined {
  const bases: Partial<Record<UnitKind, string>> = {
    length: "m",
    area: "m^2",
    angle: "deg",
    temperature: "degC",
    temperatureCoefficient: "1/K",
    resistivity: "ohm m",
    conductivity: "S/m",
    sheetResistance: "ohm/sq",
    resistance: "ohm",
    voltage: "V",
    current: "A",
    power: "W",
    density: "1/cm^3",
  };
  return bases[kind];
}
