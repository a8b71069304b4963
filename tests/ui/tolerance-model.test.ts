import { describe, expect, it } from "vitest";
import { addressCall } from "@/app/(site)/calculate/_model/address-call";
import { parameterAt } from "@/app/(site)/calculate/_model/complaints";
import { exampleParameters, readParameters } from "@/app/(site)/calculate/_model/parameters";
import { plainDimensions, requestBody } from "@/app/(site)/calculate/_model/request";
import { sizingBody } from "@/app/(site)/calculate/_model/sizing";
import { nominalParameters, toleranceText } from "@/app/(site)/calculate/_model/tolerances";
import { readState, stateQuery } from "@/app/(site)/calculate/_model/variants";
import {
  computeResistance,
  computeSizing,
  findShape,
  InputError,
  libraryMaterial,
  shapeEntry,
} from "@/lib/engine";

const shape = findShape("cylindrical-shell");
if (!shape) throw new Error("the catalogue lacks its sleeve");
const entry = shapeEntry(shape);
const query =
  "innerRadius=2mm&innerRadius.tolerance=0.05mm&innerRadius.distribution=normal&wall=3mm&length=1m&conductivity=58MS/m&conductivity.tolerance=1%&temperature=75degC&temperature.tolerance=5K&uncertainty=monte-carlo&trials=2000&seed=4";
const read = (text: string) => readParameters(new URLSearchParams(text), entry) ?? {};

describe("tolerances of a page", () => {
  it("become the request's objects, which the engine takes", () => {
    const body = requestBody(entry, read(query));
    expect(body.dimensions).toEqual({
      innerRadius: { value: "2 mm", tolerance: "0.05 mm", distribution: "normal" },
      wall: "3 mm",
      length: "1 m",
    });
    expect(body.medium).toEqual({ conductivity: { value: "58 MS/m", tolerance: "1 %" } });
    expect(body.operating).toEqual({ temperature: { value: "75 degC", tolerance: "5 K" } });
    expect(body.uncertainty).toEqual({ method: "monte-carlo", trials: 2000, seed: 4 });
    expect(computeResistance(body, { material: libraryMaterial }).uncertainty?.trials).toBe(2000);
    expect(plainDimensions(entry, read(query))).toEqual({ innerRadius: "2 mm", wall: "3 mm", length: "1 m" });
  });

  it("may differ to both sides, also inside a law of the medium", () => {
    const text =
      "innerRadius=2mm&innerRadius.plus=0.1mm&innerRadius.minus=2%&wall=3mm&length=1m&graded=radius&quantity=conductivity&profile=linear&profile.from=50MS/m&profile.from.tolerance=1%&profile.to=40MS/m&uncertainty=worst-case";
    const body = requestBody(entry, read(text));
    expect(body.dimensions.innerRadius).toEqual({ value: "2 mm", plus: "0.1 mm", minus: "2 %" });
    expect(body.medium).toMatchObject({
      graded: { profile: { kind: "linear", from: { value: "50 MS/m", tolerance: "1 %" }, to: "40 MS/m" } },
    });
    const { uncertainty } = computeResistance(body, { material: libraryMaterial });
    expect(uncertainty?.contributions.map(({ input }) => input).toSorted()).toEqual([
      "dimensions.innerRadius",
      "medium.graded.profile.from",
    ]);
    expect(addressCall("https://rhoform.example", entry, read(text)).ok).toBe(false);
    // What is plotted is the law without them.
    expect(requestBody(entry, nominalParameters(read(text))).medium).toMatchObject({
      graded: { profile: { from: "50 MS/m", to: "40 MS/m" } },
    });
    const state = stateQuery({ variants: [read(text)], active: 0 }, entry);
    const again = readState(new URLSearchParams(state), entry, exampleParameters(entry));
    expect(requestBody(entry, again.variants[0])).toEqual(body);
  });

  it("come back from the address that keeps them", () => {
    const state = { variants: [read(query)], active: 0 };
    const address = stateQuery(state, entry);
    const again = readState(new URLSearchParams(address), entry, exampleParameters(entry));
    expect(requestBody(entry, again.variants[0])).toEqual(requestBody(entry, read(query)));
  });

  it.each([
    ["0.1", "50 mm", "0.1 mm"],
    ["0,1 mm", "50 mm", "0.1 mm"],
    ["1 %", "50 mm", "1 %"],
    ["5", "75 degC", "5"],
    ["2", "90", "2"],
    ["1e-9", "58 MS/m", "1e-9 MS/m"],
  ])("%s at %s is %s", (typed, value, expected) => expect(toleranceText(typed, value)).toBe(expected));

  it("fit an address for spreadsheets while their distribution is uniform", () => {
    const call = addressCall(
      "https://rhoform.example",
      entry,
      read(
        "innerRadius=2mm&innerRadius.tolerance=0.05mm&wall=3mm&length=1m&resistivity=1&uncertainty=worst-case&solveFor=wall&target=5ohm",
      ),
    );
    expect(call.ok && call.address).toContain(
      "innerRadius=2mm%C2%B10.05mm&wall=3mm&length=1m&resistivity=1&uncertainty=worst-case&format=text",
    );
    expect(addressCall("https://rhoform.example", entry, read(query)).ok).toBe(false);
  });

  it("have their complaints at their own fields", () => {
    expect(parameterAt("#/dimensions/innerRadius/tolerance")).toBe("innerRadius.tolerance");
    expect(parameterAt("#/dimensions/innerRadius/minus")).toBe("innerRadius.minus");
    expect(parameterAt("#/medium/graded/profile/from/tolerance")).toBe("profile.from.tolerance");
    expect(parameterAt("#/media/core/resistivity/distribution")).toBe("core.resistivity.tolerance");
    expect(parameterAt("#/operating/temperature")).toBe("temperature");
    expect(parameterAt("#/uncertainty/trials")).toBe("trials");
    expect(parameterAt("#/within/1")).toBe("to");
  });
});

describe("the sizing of a page", () => {
  it("leaves out the dimension with all its other names, and needs a target", () => {
    const parameters = read(`${query}&solveFor=outerDiameter&target=5ohm&from=5mm&to=9mm`);
    const body = sizingBody(entry, parameters);
    expect(body).toMatchObject({ solveFor: "outerDiameter", target: "5 ohm", within: ["5 mm", "9 mm"] });
    expect(Object.keys(body?.dimensions ?? {})).toEqual(["innerRadius", "length"]);
    expect(sizingBody(entry, read(`${query}&solveFor=wall`))).toBeNull();
    // One end alone is not dropped: the API says at the other that it is missing.
    const half = sizingBody(entry, read(`${query}&solveFor=wall&target=5ohm&to=9mm`));
    expect(half?.within).toEqual(["", "9 mm"]);
    expect(() => computeSizing(half, { material: libraryMaterial })).toThrow(InputError);
  });
});
