import { describe, expect, it } from "vitest";
import { joinAddress, splitAddress } from "@/app/(site)/calculate/_model/address";
import { addressCall } from "@/app/(site)/calculate/_model/address-call";
import { parameterAt, sortComplaints } from "@/app/(site)/calculate/_model/complaints";
import { exampleParameters, type Parameters } from "@/app/(site)/calculate/_model/parameters";
import { readRows, writeRows } from "@/app/(site)/calculate/_model/profile-forms";
import { requestBody } from "@/app/(site)/calculate/_model/request";
import { differingNames, readState, stateQuery } from "@/app/(site)/calculate/_model/variants";
import { matches, searchText } from "@/app/(site)/calculate/_catalogue/search";
import {
  catalogue,
  computeResistance,
  exampleRequest,
  findShape,
  libraryMaterial,
  shapeEntry,
} from "@/lib/engine";

function entryOf(id: string) {
  const shape = findShape(id);
  if (!shape) throw new Error(`${id} is not in the catalogue.`);
  return shapeEntry(shape);
}

const shell = entryOf("cylindrical-shell");
const bar = entryOf("bar");
const clad = entryOf("clad-wire");

/** A state through its address and back. */
function throughAddress(variants: readonly Parameters[], entry = shell, active = 0) {
  const query = stateQuery({ variants, active }, entry);
  return { query, state: readState(new URLSearchParams(query), entry, exampleParameters(entry)) };
}

describe("the example of every shape", () => {
  it.each(catalogue.map(({ id }) => id))("%s makes the same request, also through an address", (id) => {
    const shape = findShape(id);
    if (!shape) return;
    const entry = shapeEntry(shape);
    const parameters = exampleParameters(entry);
    const context = { material: libraryMaterial };
    const wanted = computeResistance(exampleRequest(shape), context).resistance;
    expect(computeResistance(requestBody(entry, parameters), context).resistance).toEqual(wanted);
    const { state } = throughAddress([parameters], entry);
    expect(state.variants).toEqual([parameters]);
    expect(computeResistance(requestBody(entry, state.variants[0]), context).resistance).toEqual(wanted);
  });
});

describe("the address", () => {
  it("is readable, and keeps what was typed", () => {
    const parameters = {
      innerDiameter: "4 mm",
      wall: "3 mm",
      length: "1 m",
      graded: "radius",
      quantity: "conductivity",
      profile: "layers",
      "profile.layers": "1 mm:1 pS/m,2 mm:5e-12",
      temperature: "75 degC",
      min: "1 Gohm",
    };
    const { query, state } = throughAddress([parameters]);
    expect(query).toBe(
      "innerDiameter=4mm&wall=3mm&length=1m&graded=radius&quantity=conductivity&profile=layers&profile.layers=1mm:1pS/m,2mm:5e-12&temperature=75degC&min=1Gohm",
    );
    expect(state.variants).toEqual([parameters]);
  });

  it("keeps an expression letter by letter", () => {
    const parameters = {
      length: "1 m",
      graded: "radius",
      quantity: "conductivity",
      profile: "expression",
      "profile.value": "if(u < 0.5, 58e6, min(3e7, 1/s)) + 1e6*u^2",
    };
    expect(throughAddress([parameters]).state.variants).toEqual([parameters]);
  });

  it("keeps variants by what differs, and which one is shown", () => {
    const first = { innerRadius: "2 mm", outerRadius: "5 mm", length: "1 m", conductivity: "1e-12 S/m" };
    const second = { innerRadius: "2 mm", wall: "3 mm", length: "1 m", conductivity: "1e-12 S/m" };
    const third = { ...first, length: "2 m" };
    const { query, state } = throughAddress([first, second, third], shell, 2);
    expect(query).toContain("&B=&B.wall=3mm&B.without=outerRadius&C=&C.length=2m&show=C");
    expect(state).toEqual({ variants: [first, second, third], active: 2 });
    expect(differingNames([first, second, third], shell)).toEqual(["outerRadius", "wall", "length"]);
  });

  it("shows the example where it says nothing, and drops what it does not know", () => {
    expect(readState(new URLSearchParams("utm=1&nonsense"), bar, exampleParameters(bar)).variants).toEqual([
      exampleParameters(bar),
    ]);
    const example = exampleParameters(bar);
    expect(readState(new URLSearchParams("width=1mm&depth=2"), bar, example).variants).toEqual([
      { width: "1 mm", material: example.material },
    ]);
    expect(readState(new URLSearchParams("current=2A"), bar, example).variants).toEqual([
      { ...example, current: "2 A" },
    ]);
    expect(readState(new URLSearchParams("length=&resistivity="), bar, example).variants).toEqual([
      { length: "", resistivity: "" },
    ]);
  });

  it("moves long tables behind the #", () => {
    const rows = Array.from({ length: 900 }, (_, i) => [`${i} um`, "1 S/m"] as const);
    const parameters = { graded: "radius", profile: "table", "profile.table": writeRows(rows) };
    const query = stateQuery({ variants: [parameters], active: 0 }, shell);
    const parts = splitAddress(query);
    expect(parts.query.length).toBeLessThan(200);
    expect(readState(joinAddress(parts.query, parts.behind), shell, {}).variants).toEqual([parameters]);
    expect(splitAddress("a=1&b=2")).toEqual({ query: "a=1&b=2", behind: "" });
  });
});

describe("requestBody", () => {
  it("leaves empty fields out, but not the choice of a medium", () => {
    expect(requestBody(bar, { length: "1 m", width: " ", thickness: "", resistivity: "" })).toEqual({
      shape: "bar",
      dimensions: { length: "1 m" },
      medium: { resistivity: "" },
    });
  });

  it("does not take a shape's thickness for its medium's", () => {
    const body = requestBody(bar, {
      length: "1 m",
      width: "1 mm",
      thickness: "1 mm",
      material: "copper-annealed",
    });
    expect(body.medium).toEqual({ material: "copper-annealed" });
  });

  it("builds two media, one of them graded by dopants", () => {
    const body = requestBody(clad, {
      "core.material": "copper-annealed",
      "cladding.graded": "length",
      "cladding.profile": "dopant",
      "cladding.profile.type": "p",
      "cladding.profile.profile": "gaussian",
      "cladding.profile.profile.peak": "1e19",
      "cladding.profile.profile.center": "0 mm",
      "cladding.profile.profile.spread": "1 um",
    });
    expect(body.media).toEqual({
      core: { material: "copper-annealed" },
      cladding: {
        graded: {
          coordinate: "length",
          profile: {
            kind: "dopant",
            type: "p",
            model: "f723",
            profile: { kind: "gaussian", peak: "1e19", center: "0 mm", spread: "1 um" },
          },
        },
      },
    });
  });
});

describe("complaints", () => {
  it.each([
    ["#/dimensions/innerRadius", "innerRadius"],
    ["#/operating/voltage", "voltage"],
    ["#/requirement/max", "max"],
    ["#/medium", "medium"],
    ["#/medium/material", "material"],
    ["#/media/core/material", "core.material"],
    ["#/media/core", "core.medium"],
    ["#/medium/graded/coordinate", "graded"],
    ["#/medium/graded/quantity", "quantity"],
    ["#/medium/graded/profile", "profile"],
    ["#/medium/graded/profile/kind", "profile"],
    ["#/medium/graded/profile/from", "profile.from"],
    ["#/medium/graded/profile/layers", "profile.layers"],
    ["#/medium/graded/profile/layers/2/value", "profile.layers/2/value"],
    ["#/medium/graded/profile/positions/3", "profile.table/3/position"],
    ["#/medium/graded/profile/values", "profile.table"],
    ["#/media/core/graded/profile/profile/peak", "core.profile.profile.peak"],
  ])("%s belongs to %s", (pointer, name) => {
    expect(parameterAt(pointer)).toBe(name);
  });

  it("stand at their fields, the first of each; others elsewhere", () => {
    const { atField, elsewhere } = sortComplaints([
      { pointer: "#/dimensions/width", detail: "must be greater than 0." },
      { pointer: "#/dimensions/width", detail: "is odd." },
      { pointer: "#", detail: "is strange." },
      { detail: "no pointer." },
    ]);
    expect([...atField]).toEqual([["width", "Must be greater than 0."]]);
    expect(elsewhere.map(({ detail }) => detail)).toEqual(["is strange.", "no pointer."]);
  });
});

describe("rows of a table", () => {
  it("go to a text and back, whatever is typed into a cell", () => {
    expect(readRows("1 mm:58 MS/m,2 mm:")).toEqual([
      ["1 mm", "58 MS/m"],
      ["2 mm", ""],
    ]);
    expect(readRows("")).toEqual([]);
    expect(readRows(writeRows([["1,5 mm", "a:b"]]))).toEqual([["1 5 mm", "a b"]]);
  });
});

describe("addressCall", () => {
  it("is refused where the query form cannot say it", () => {
    const plain = { length: "1 m", width: "1 mm", thickness: "1 mm", resistivity: "2e-8" };
    expect(addressCall("https://r.example", bar, plain)).toMatchObject({ ok: true });
    const beyond: readonly Parameters[] = [{ max: "1 ohm" }, { temperatureCoefficient: "0.004" }];
    for (const more of beyond) {
      expect(addressCall("https://r.example", bar, { ...plain, ...more })).toMatchObject({ ok: false });
    }
  });

  it("has no text longer than a spreadsheet takes", () => {
    const call = addressCall(`https://${"long".repeat(60)}.example`, bar, exampleParameters(bar));
    expect(call.ok && [...call.formula.matchAll(/"([^"]*)"/g)].every(([, text]) => text.length <= 255)).toBe(
      true,
    );
  });
});

describe("search of the catalogue", () => {
  const found = (search: string) =>
    catalogue.filter((shape) => matches(search, searchText(shapeEntry(shape)))).map(({ id }) => id);

  it("finds by words, by parts of words, by symbols", () => {
    expect(found("cylindrical shell")).toContain("cylindrical-shell");
    expect(found("TUBE")).toContain("tube");
    expect(found("φ")).toContain("cylindrical-shell");
    expect(found("φ")).not.toContain("bar");
    expect(found("w t")).toContain("bar");
    expect(found("w1")).toContain("tapered-strip");
    // Words of the trade that the pages do not use.
    expect(found("busbar")).toContain("bar");
    expect(found("pcb via")).toEqual(["via-barrel"]);
    expect(found("ground rod")).toContain("earth-rod");
    expect(found("no such thing")).toEqual([]);
    expect(found("  ")).toHaveLength(catalogue.length);
    expect(() => found("([.*")).not.toThrow();
  });

  it("finds by the symbols of a medium, by names of Greek letters, with or without a subscript's mark", () => {
    for (const symbol of ["σ", "ρ", "rho", "conductivity"])
      expect(found(symbol)).toHaveLength(catalogue.length);
    const sheets = catalogue.filter(({ family }) => family === "sheet").map(({ id }) => id);
    expect(found("R□")).toEqual(sheets);
    expect(found("R_s")).toEqual(sheets);
    expect(found("phi")).toEqual(found("φ"));
    expect(found("w_1")).toEqual(found("w₁"));
  });

  it("takes no short word for a part of another", () => {
    const rings = found("ring");
    expect(rings).toEqual(expect.arrayContaining(["earth-ring", "torus-arc"]));
    // Not in "tapering", "spring" nor "earthing".
    for (const other of ["tapered-strip", "helical-winding", "earth-rod"]) expect(rings).not.toContain(other);
    expect(found("sphere")).toContain("earth-hemisphere");
    // A letter is a symbol before it is the start of any word.
    const a = found("a").map((id) => shapeEntry(findShape(id) ?? catalogue[0]));
    expect(a.length).toBeLessThan(catalogue.length / 2);
    expect(
      a.every(
        ({ title, dimensions }) => /\ba/i.test(title) || dimensions.some(({ symbol }) => /^a$/i.test(symbol)),
      ),
    ).toBe(true);
  });
});
