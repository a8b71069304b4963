import { describe, expect, it } from "vitest";
import {
  exampleParameters,
  mediumPrefixes,
  ofMedium,
  type Parameters,
} from "@/app/(site)/calculate/_model/parameters";
import { PROFILE_FORMS } from "@/app/(site)/calculate/_model/profile-forms";
import {
  firstValue,
  levelProfile,
  movedProfile,
  type ProfileValues,
  reciprocalProfile,
  START_VALUES,
} from "@/app/(site)/calculate/_model/profile-starts";
import { plainDimensions, requestBody } from "@/app/(site)/calculate/_model/request";
import { readGeometry } from "@/app/(site)/calculate/_server/geometry";
import { catalogue, computeResistance, libraryMaterial, shapeEntry } from "@/lib/engine";

const KINDS = Object.keys(PROFILE_FORMS);
const gradable = catalogue.filter((shape) => shapeEntry(shape).media.gradable.length > 0);

function resistance(entry: ReturnType<typeof shapeEntry>, parameters: Parameters): number {
  const body = requestBody(entry, parameters);
  return computeResistance(body, { material: libraryMaterial }).resistance.value;
}

/** The example of a shape with a medium that varies along one of its coordinates. */
function graded(shape: (typeof catalogue)[number], coordinate: string) {
  const entry = shapeEntry(shape);
  const example = exampleParameters(entry);
  const reading = readGeometry(shape, plainDimensions(entry, example));
  if (!reading.ok) throw new Error(`The example of ${entry.id} cannot be drawn.`);
  const span = reading.geometry.ranges[coordinate];
  const [prefix] = mediumPrefixes(entry);
  const rest = Object.fromEntries(Object.entries(example).filter(([name]) => !ofMedium(name, prefix, entry)));
  const base = { ...rest, [`${prefix}graded`]: coordinate, [`${prefix}quantity`]: "conductivity" };
  return { entry, span, base, profile: `${prefix}profile` };
}

type Span = ReturnType<typeof graded>["span"];

const starts = (kind: string, span: Span, name = "profile", values: ProfileValues = "conductivity") => ({
  [name]: kind,
  ...levelProfile(name, kind, {
    value: START_VALUES[values],
    material: "copper-annealed",
    temperature: "20 degC",
    span,
  }),
});

describe("a law of a graded medium", () => {
  it.each(gradable.map((shape) => [shape.id, shape] as const))(
    "of %s computes from its first moment, whatever its kind",
    (_, shape) => {
      for (const coordinate of shapeEntry(shape).media.gradable) {
        const { entry, span, base, profile } = graded(shape, coordinate);
        if (!span) continue;
        for (const kind of KINDS) {
          const value = resistance(entry, { ...base, ...starts(kind, span, profile) });
          expect([coordinate, kind, value > 0 && Number.isFinite(value)]).toEqual([coordinate, kind, true]);
        }
      }
    },
  );

  it("of a dopant computes with every law of its density", () => {
    const [shape] = gradable.filter(({ id }) => id === "bar");
    const { entry, span, base } = graded(shape, shapeEntry(shape).media.gradable[0]);
    for (const kind of KINDS.filter((own) => own !== "temperature" && own !== "dopant")) {
      const dopant = { ...base, ...starts("dopant", span) };
      const value = resistance(entry, {
        ...dopant,
        ...starts(kind, span, "profile.profile", "density"),
      });
      expect([kind, value]).toEqual([kind, expect.closeTo(resistance(entry, dopant), 3)]);
    }
  });

  it("goes on from the first value of the law before, where that is a quantity", () => {
    expect(firstValue("profile", { profile: "linear", "profile.from": "2 MS/m" })).toBe("2 MS/m");
    expect(firstValue("profile", { profile: "expression", "profile.value": "1+s" })).toBe("");
    expect(firstValue("profile", { profile: "temperature", "profile.from": "20 degC" })).toBe("");
    expect(firstValue("profile", { profile: "dopant", "profile.profile.value": "1e16 1/cm^3" })).toBe("");
  });

  it("told in resistivities describes the same medium", () => {
    const [shape] = gradable.filter(({ id }) => id === "bar");
    const { entry, span, base } = graded(shape, shapeEntry(shape).media.gradable[0]);
    const laws: Readonly<Record<string, Parameters>> = {
      constant: {},
      exponential: { "profile.to": "5 MS/m" },
      layers: {},
      expression: { "profile.value": "1e6*(1+3*u)" },
    };
    for (const [kind, changed] of Object.entries(laws)) {
      const own: Parameters = { ...starts(kind, span), ...changed };
      const turned = reciprocalProfile("profile", own, "resistivity");
      const before = resistance(entry, { ...base, ...own });
      const after = resistance(entry, { ...base, ...own, ...turned, quantity: "resistivity" });
      expect([kind, after / before]).toEqual([kind, expect.closeTo(1, 9)]);
    }
    const power = { profile: "power", "profile.reference": "2 MS/m", "profile.exponent": "2" };
    expect(reciprocalProfile("profile", power, "resistivity")).toEqual({
      "profile.reference": "500 nohm m",
      "profile.exponent": "-2",
    });
    const back = reciprocalProfile(
      "profile",
      { profile: "expression", "profile.value": "1/(3+u)" },
      "conductivity",
    );
    expect(back).toEqual({ "profile.value": "3+u" });
  });
});

describe("movedProfile", () => {
  const radius = { unit: "m", start: 0.002, extent: 0.003 } as const;
  const angle = { unit: "deg", start: 0, extent: 360 } as const;

  it.each([
    ["power", { at: "5 mm" }, { at: "360 deg" }],
    ["gaussian", { center: "3.5 mm", spread: "0.75 mm" }, { center: "180 deg", spread: "90 deg" }],
    ["complementary-error", { length: "0.001" }, { length: "120 deg" }],
    ["layers", { layers: "1 mm:58 MS/m,2 mm:30 MS/m" }, { layers: "120 deg:58 MS/m,240 deg:30 MS/m" }],
    ["table", { table: "2 mm:1 S/m,5 mm:2 S/m" }, { table: "0 deg:1 S/m,360 deg:2 S/m" }],
  ])("keeps the parts of the range at which a %s law has its places", (kind, before, after) => {
    const named = (fields: object) =>
      Object.fromEntries(Object.entries(fields).map(([field, text]) => [`profile.${field}`, text]));
    const own = { profile: kind, ...named(before) };
    const moved = movedProfile("profile", own, radius, angle);
    expect(moved).toEqual(named(after));
    expect(movedProfile("profile", { ...own, ...moved }, angle, angle)).toEqual(named(after));
  });

  it("leaves what is no position, and everything where a range is not known", () => {
    const own = { profile: "gaussian", "profile.peak": "58 MS/m", "profile.center": "about half" };
    expect(movedProfile("profile", own, radius, angle)).toEqual({ "profile.center": "about half" });
    expect(movedProfile("profile", own, undefined, angle)).toEqual({});
  });

  it.each(gradable.filter((shape) => shapeEntry(shape).media.gradable.length > 1))(
    "has an answer along each coordinate of $id, whatever the law",
    (shape) => {
      const [first, ...others] = shapeEntry(shape).media.gradable;
      const { entry, span, base, profile } = graded(shape, first);
      const material = "copper-annealed";
      for (const kind of ["power", "gaussian", "complementary-error", "layers", "table"]) {
        const level = { value: "2 kS/m", material, temperature: "20 degC", span };
        const own = { [profile]: kind, ...levelProfile(profile, kind, level) };
        for (const coordinate of others) {
          const moved = movedProfile(profile, own, span, graded(shape, coordinate).span);
          const turned = { ...base, ...own, ...moved, [profile.replace("profile", "graded")]: coordinate };
          expect(resistance(entry, turned), `${kind} along ${coordinate}`).toBeGreaterThan(0);
        }
      }
    },
  );
});
