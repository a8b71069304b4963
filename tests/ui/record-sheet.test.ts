import { describe, expect, it } from "vitest";
import { recordContent } from "@/app/(site)/records/_content/build-content";
import { readRecordCode, recordCode } from "@/app/(site)/records/_content/record-code";
import type { Draw } from "@/app/(site)/records/_content/content";
import { sheetPdf } from "@/app/(site)/records/_sheet/sheet-pdf";
import { inNetwork, inOutline } from "@/app/(site)/records/_content/open-again";
import { networkSvg } from "@/app/(site)/records/_content/network-svg";
import { outlineSvg, storedOutline } from "@/app/(site)/records/_content/outline-svg";
import { sketchFromHash } from "@/app/(site)/outline/_model/address";
import { networkBody } from "@/app/(site)/network/_model/body";
import { networkFromHash } from "@/app/(site)/network/_model/network";
import { fieldBody } from "@/app/(site)/outline/_model/field-body";
import { EMPTY_SKETCH } from "@/app/(site)/outline/_model/start-outlines";
import {
  computeNetwork,
  computeResistance,
  computeSizing,
  exampleRequest,
  findShape,
  libraryMaterial,
  PAPER_COLOURS,
  type PlotLook,
} from "@/lib/engine";
import type { RecordView } from "@/lib/records/records";
import { BEND, polygon } from "../support/field";
import { pdfPages, pdfTitle } from "../support/pdf-text";

const INCLUDE = ["steps", "profile", "checks", "peak"];
const lookUp = (id: string) => libraryMaterial(id);

function recordOf(request: Readonly<Record<string, unknown>>, label = "Main bar, panel 2"): RecordView {
  const result = computeResistance({ ...request, include: INCLUDE }, { material: libraryMaterial });
  return {
    id: "rec_0000000000000001",
    operation: "resistance",
    label,
    createdAt: "2026-03-04T05:06:07.000Z",
    by: { kind: "person", id: "per_1", name: "Ines Hartwell" },
    request,
    result,
    materials: result.materials,
    engine: result.engine,
    catalogue: result.catalogue,
  };
}

const contentOf = (record: RecordView, plot: Draw | null = null) =>
  recordContent(record, { origin: "https://rho.merrow-pike.example", team: "Busbar", lookUp, plot });

const LOOK = { width: 640, tallest: 400, titled: false, ground: false, colours: PAPER_COLOURS, id: "test" };
const BAR = {
  shape: "bar",
  dimensions: { length: "250 mm", width: { value: "40 mm", tolerance: "0.1 mm" }, thickness: "5 mm" },
  medium: { material: "copper-annealed" },
  operating: { temperature: "75 degC", current: "630 A" },
  requirement: { max: "1 mohm" },
  uncertainty: { method: "propagation" },
};
const SHELL = {
  shape: "cylindrical-shell",
  dimensions: { innerRadius: "2 mm", outerRadius: "5 mm", length: "1 m" },
  medium: {
    graded: {
      coordinate: "radius",
      quantity: "conductivity",
      profile: {
        kind: "layers",
        layers: [
          { thickness: "1 mm", value: "1 pS/m" },
          { thickness: "2 mm", value: "3 pS/m" },
        ],
      },
    },
  },
};

describe("a record's code", () => {
  it("has eight characters that nobody mistakes", () => {
    expect(recordCode("rec_0000000000000001")).toMatch(/^[0-9A-HJKMNP-TV-Z]{4}-[0-9A-HJKMNP-TV-Z]{4}$/);
    expect(recordCode("rec_0000000000000001")).not.toBe(recordCode("rec_0000000000000002"));
  });

  it("is read however it was typed", () => {
    const code = recordCode("rec_0000000000000001");
    expect(readRecordCode(code.toLowerCase())).toBe(code);
    expect(readRecordCode(code.replace("-", ""))).toBe(code);
    expect(readRecordCode("rec_0000000000000001")).toBeNull();
  });
});

describe("what a record tells", () => {
  const content = contentOf(recordOf(BAR));
  const cells = content.sections.flatMap(({ blocks }) =>
    blocks.flatMap((block) => (block.kind === "table" ? block.rows : [])),
  );

  it("has the inputs as typed and in SI", () => {
    expect(cells).toContainEqual(["Length", "L", "250 mm", "0.25\u2009m"]);
    expect(cells).toContainEqual(["Width", "w", "40 mm ± 0.1 mm", "0.04\u2009m"]);
    expect(cells).toContainEqual(["Current", "630 A", "630\u2009A"]);
    expect(cells).toContainEqual(["Required, at most", "1 mohm", "0.001\u2009Ω"]);
  });

  it("has the material with version, source and provenance", () => {
    const facts = content.sections
      .find(({ id }) => id === "medium")
      ?.blocks.flatMap((block) => (block.kind === "facts" ? block.facts : []));
    expect(facts?.map(({ name }) => name)).toEqual(["Material", "Range", "True resistivity", "Source"]);
    expect(facts?.[0].note).toMatch(/^copper-annealed, version \d+$/);
  });

  it("has number, bounds, their basis, verdict and the drawing", () => {
    expect(content.headline.bracket).toMatch(/^\[[\d.]+ … [\d.]+\] µΩ$/);
    expect(content.headline.statements[0]).toContain("bounds proved");
    expect(content.headline.verdict?.outcome).toBe("met");
    expect(content.picture?.kind).toBe("shape");
    expect(content.sections.map(({ id }) => id)).toEqual(
      expect.arrayContaining([
        "inputs",
        "medium",
        "uncertainty",
        "steps",
        "checks",
        "assumptions",
        "sources",
        "versions",
      ]),
    );
  });

  it("gives bare places in a profile their unit, and names what strays in it", () => {
    const layers = [
      { thickness: 0.1, value: { value: "58 MS/m", tolerance: "1 %" } },
      { thickness: "150 mm", value: "30 MS/m" },
    ];
    const graded = { coordinate: "length", quantity: "conductivity", profile: { kind: "layers", layers } };
    const { sections } = contentOf(recordOf({ ...BAR, medium: { graded } }));
    const table = sections
      .flatMap(({ blocks }) => blocks)
      .find((block) => block.kind === "table" && block.label === "Layers");
    expect(table?.kind === "table" && table.rows.map((row) => row[1])).toEqual(["0.1\u2009m", "150 mm"]);
    const budget = sections
      .find(({ id }) => id === "uncertainty")
      ?.blocks.find(({ kind }) => kind === "table");
    expect(budget?.kind === "table" && budget.rows.map(([name]) => name)).toEqual([
      "Profile: layer 1, value",
      "Width",
    ]);
    const arc = findShape("arc-bar");
    const bell = { kind: "gaussian", peak: "58 MS/m", center: 30, spread: "10 deg", background: "1 MS/m" };
    const turned = { coordinate: "angle", quantity: "conductivity", profile: bell };
    const medium = contentOf(
      recordOf({ ...(arc && exampleRequest(arc)), medium: { graded: turned } }),
    ).sections.find(({ id }) => id === "medium")?.blocks[0];
    expect(medium?.kind === "table" && medium.rows.find(([name]) => name === "Centre")).toEqual([
      "Centre",
      "30°",
      "30°",
    ]);
  });

  it("opens again with the same inputs", () => {
    expect(content.openAgain?.href).toBe(
      "/calculate/bar?length=250mm&width=40mm&width.tolerance=0.1mm&thickness=5mm&material=copper-annealed&temperature=75degC&current=630A&max=1mohm&uncertainty=propagation",
    );
    const uneven = { ...BAR, dimensions: { ...BAR.dimensions, width: { value: "40 mm", plus: "1 mm" } } };
    expect(contentOf(recordOf(uneven)).openAgain?.href).toContain("width=40mm&width.plus=1mm&");
  });

  it("opens again with the unit that a bare tolerance has in the API", () => {
    const queryOf = (request: Readonly<Record<string, unknown>>) =>
      new URL(contentOf(recordOf(request)).openAgain?.href ?? "", "http://x.example").searchParams;
    const query = queryOf({
      ...BAR,
      dimensions: { ...BAR.dimensions, width: { value: "40 mm", plus: 0.0005, minus: "1 %" } },
      medium: { resistivity: { value: "17 nohm m", tolerance: "1e-9" } },
      operating: { temperature: { value: "68 degF", tolerance: 2 } },
    });
    expect(
      ["width.plus", "width.minus", "resistivity.tolerance", "temperature.tolerance"].map((name) =>
        query.get(name),
      ),
    ).toEqual(["0.0005m", "1%", "1e-9ohm m", "2K"]);
    const profile = {
      kind: "gaussian",
      peak: { value: "58 MS/m", tolerance: 1e6 },
      center: { value: "125 mm", tolerance: 0.01 },
      spread: "50 mm",
      background: 1e6,
    };
    const graded = queryOf({
      ...BAR,
      medium: { graded: { coordinate: "length", quantity: "conductivity", profile } },
    });
    expect(
      ["profile.peak", "profile.peak.tolerance", "profile.center.tolerance"].map((name) => graded.get(name)),
    ).toEqual(["58MS/m", "1000000S/m", "0.01m"]);
  });

  it("does not open again without the tolerance of a layer", () => {
    const layers = [{ thickness: "250 mm", value: { value: "58 MS/m", tolerance: "1 %" } }];
    const graded = { coordinate: "length", quantity: "conductivity", profile: { kind: "layers", layers } };
    expect(contentOf(recordOf({ ...BAR, medium: { graded } })).openAgain).toBeUndefined();
  });

  it("shows what was stored as it is where it does not know the form", () => {
    const odd = contentOf({ ...recordOf(BAR), operation: "sizing", result: { solutions: [] } });
    expect(odd.sections.map(({ id }) => id)).toEqual(["request", "result", "versions"]);
  });
});

describe("a sizing's record", () => {
  const sizing = (request: Readonly<Record<string, unknown>>, result: unknown) =>
    contentOf({ ...recordOf(BAR, "Width of the link"), operation: "sizing", request, result });

  it("has the dimension found, what was looked for, and the shape with it", () => {
    const { requirement: _requirement, uncertainty: _uncertainty, ...rest } = BAR;
    const request = {
      ...rest,
      dimensions: { length: "250 mm", thickness: "5 mm" },
      solveFor: "width",
      target: "20 uohm",
    };
    const result = computeSizing(request, { material: libraryMaterial });
    const content = sizing(request, result);
    expect(content.headline.title).toBe("Width for 20\u2009µΩ");
    expect(content.headline.text).toBe(result.solutions[0].dimension.text);
    expect(content.picture?.kind).toBe("shape");
    expect(content.sections.map(({ id }) => id)).toEqual(
      expect.arrayContaining(["solutions", "inputs", "checks"]),
    );
    // Opened again the found width stands in the form, and what was looked for below it.
    const query = new URL(content.openAgain?.href ?? "", "http://x.example").searchParams;
    expect(query.get("width")).toMatch(/mm$/);
    expect([query.get("solveFor"), query.get("target")]).toEqual(["width", "20uohm"]);
  });

  it("draws the outline that was scaled", () => {
    const { solutions, ...rest } = computeSizing(
      {
        shape: "bar",
        dimensions: { length: 1, thickness: 1 },
        medium: { resistivity: 1 },
        solveFor: "width",
        target: 1,
      },
      { material: libraryMaterial },
    );
    const result = { ...rest, shape: undefined, solveFor: "scaleX", solutions };
    const content = sizing({ ...BEND, solveFor: "scaleX", target: "400 ohm" }, result);
    expect(content.subject).toBe("Outline: sizing");
    expect(content.picture?.kind === "svg" && content.picture.draw(LOOK)).toContain("<tspan");
    const sources = content.sections.find(({ id }) => id === "sources")?.blocks[0];
    expect(sources?.kind === "lines" && sources.lines[0]).toContain("Dirichlet and Thomson");
  });
});

describe("a network's record", () => {
  it("has the range that its tolerances leave, and the budget by element", async () => {
    const request = {
      elements: [
        { name: "bolts", between: ["in", "m"], resistance: { value: "6 uohm", plus: "2 uohm" } },
        {
          name: "bar",
          between: ["m", "out"],
          request: {
            shape: "bar",
            dimensions: BAR.dimensions,
            medium: { resistivity: { value: "17 nohm m", tolerance: "3 %" } },
          },
        },
      ],
      ports: ["in", "out"],
      uncertainty: { method: "worst-case" },
    };
    const result = computeNetwork(request, { material: libraryMaterial });
    const content = contentOf({ ...recordOf(BAR), operation: "network", request, result });
    const { sections } = content;
    const inputs = sections.find(({ id }) => id === "inputs")?.blocks[0];
    expect(inputs?.kind === "table" && inputs.rows.map((row) => row[2])).toEqual([
      "6 uohm + 2 uohm, − 0\u2009Ω",
      "Rectangular bar, length 250 mm, width 40 mm ± 0.1 mm, thickness 5 mm, 17 nohm m ± 3 %",
    ]);
    const stray = sections.find(({ id }) => id === "uncertainty");
    const facts = stray?.blocks.flatMap((block) => (block.kind === "facts" ? block.facts : [])) ?? [];
    // 21.25 µΩ of the bar × 0.97 / 1.0025 + 6 µΩ, and × 1.03 / 0.9975 + 8 µΩ.
    expect(facts[1]).toEqual({
      name: "Range",
      value: expect.stringMatching(/^26\.56\sµΩ … 29\.94\sµΩ$/u),
      note: "covers every value inside the tolerances",
    });
    const budget = stray?.blocks.find((block) => block.kind === "table");
    expect(budget?.kind === "table" && budget.rows.map(([name]) => name)).toEqual(["bolts", "bar"]);
    const paper = pdfPages(await sheetPdf(content, "a4")).join("\n");
    for (const said of ["Tolerances of the elements", "covers every value inside the tolerances"]) {
      expect(paper).toContain(said);
    }
  });
});

describe("a network's record, opened again", () => {
  const asked = {
    elements: [
      { name: "bolts", between: ["in", "m"], resistance: { value: "6 uohm", plus: "2 uohm" } },
      { name: "bar", between: ["m", "out"], request: { shape: "bar", dimensions: BAR.dimensions } },
    ],
    ports: ["in", "out"],
    operating: { temperature: "40 degC", current: "630 A" },
    requirement: { max: "40 uohm" },
    uncertainty: { method: "worst-case" },
  };

  it("has all that was asked", () => {
    const again = inNetwork(asked);
    expect(again?.page).toBe("Network");
    const { pathname, hash } = new URL(again?.href ?? "", "https://rho.example");
    expect(pathname).toBe("/network");
    const network = networkFromHash(hash.slice(1));
    expect(network && networkBody(network, new Map())).toEqual(asked);
    const result = computeNetwork(
      { ...asked, elements: asked.elements.slice(0, 1), ports: ["in", "m"] },
      { material: libraryMaterial },
    );
    const content = contentOf({ ...recordOf(BAR), operation: "network", request: asked, result });
    expect(content.openAgain).toEqual(again);
  });

  it("is not offered where no address holds it, or the page has no field for it", () => {
    const many = Array.from({ length: 400 }, (_, k) => ({ ...asked.elements[0], name: `bolt ${k}` }));
    expect(inNetwork({ ...asked, elements: many })).toBeUndefined();
    expect(inNetwork({ ...asked, weather: "wet" })).toBeUndefined();
  });
});

describe("a network's picture", () => {
  const drawn = [
    { name: "bar <A>", from: "in", to: "joint", resistance: "42 µΩ" },
    { name: "bolts", from: "joint", to: "out", resistance: "6 µΩ" },
    { name: "bypass", from: "in", to: "out", resistance: "1 mΩ" },
  ];

  it.each([400, 880])("has every node and element inside its %i px", (width) => {
    const svg = networkSvg(drawn, ["in", "out"], { ...LOOK, width });
    for (const words of ["bar &#60;A&#62;", "42 µΩ", "bolts", "6 µΩ", "bypass", "1 mΩ", "joint"]) {
      expect(svg).toContain(`>${words}</text>`);
    }
    const height = Number(/viewBox="0 0 \d+ ([\d.]+)"/.exec(svg)?.[1]);
    const places = [...svg.matchAll(/<text x="([\d.-]+)" y="([\d.-]+)"/g)];
    for (const [, x, y] of places) {
      expect(Number(x) > 0 && Number(x) < width && Number(y) > 10 && Number(y) < height).toBe(true);
    }
  });

  it("keeps the words of elements side by side apart on a phone", () => {
    const pair = ["braid left", "braid right"].map((name) => ({
      name,
      from: "in",
      to: "out",
      resistance: "36 µΩ",
    }));
    const chain = ["joint", "lug", "out"].map((to, k) => ({
      name: `bar ${k}`,
      from: ["in", "joint", "lug"][k],
      to,
      resistance: "6 µΩ",
    }));
    const doubled = [...chain, ...chain.map((each) => ({ ...each, name: `${each.name}′` }))];
    for (const elements of [pair, doubled]) {
      const svg = networkSvg(elements, ["in", "out"], { ...LOOK, width: 310 });
      const places = [...svg.matchAll(/<text x="([\d.-]+)" y="([\d.-]+)"/g)].map(([, x, y]) => [+x, +y]);
      for (const [k, [x, y]] of places.entries()) {
        for (const [otherX, otherY] of places.slice(k + 1)) {
          if (Math.abs(x - otherX) < 1) expect(Math.abs(y - otherY)).toBeGreaterThan(13);
        }
      }
    }
  });
});

describe("a field's record", () => {
  const result = {
    method: "field",
    resistance: {
      value: 327.94,
      unit: "ohm",
      text: "327.94\u2009Ω",
      lower: 327.93,
      upper: 327.95,
      boundsBasis: "energy",
      proved: true,
    },
    operating: { temperature: 20 },
    mesh: { triangles: 64, unknowns: 436, refinements: 1 },
    seconds: 0.5,
    checks: [],
    repairs: [],
    cautions: [],
    assumptions: [],
    materials: [],
    engine: "1.0.0",
  };
  const sources = (outline: object) => {
    const request = { ...BEND, outline };
    const { sections } = contentOf({ ...recordOf(BAR), operation: "field", request, result });
    const [block] = sections.find(({ id }) => id === "sources")?.blocks ?? [];
    return block?.kind === "lines" ? block.lines : [];
  };

  it("counts holes as the page and the complaints of the API do", () => {
    const hole = [
      [0.2, 0.2],
      [0.8, 0.2],
      [0.8, 0.8],
    ];
    const terminals = [BEND.terminals[0], { name: "b", parts: [{ ring: 1, edge: 0, from: 0, to: 1 }] }];
    const request = { ...BEND, outline: { ...BEND.outline, holes: [hole] }, terminals };
    const { sections } = contentOf({ ...recordOf(BAR), operation: "field", request, result });
    const cells = sections.flatMap(({ blocks }) =>
      blocks.flatMap((block) => (block.kind === "table" ? block.rows.flat() : [])),
    );
    expect(cells).toContain("hole 0");
    expect(cells).toContain("hole 0, edge 0");
  });

  it("names the sources of the method, and that of arcs where it has any", () => {
    expect(sources(BEND.outline)).toEqual([
      expect.stringMatching(/^Principles of Dirichlet and Thomson: The energy of any potential/),
      expect.stringMatching(/by finite elements .* \(derived here\)$/),
    ]);
    const arc = { arcTo: [4, 1], center: [4, 0.5] };
    const rounded = [[0, 0], [4, 0], arc, [1, 1], [1, 4], [0, 4]];
    expect(sources({ unit: "mm", outer: rounded })[2]).toMatch(/^Lord Rayleigh/);
  });
});

describe("a field's record, opened again in Outline", () => {
  const opened = async (body: object) => {
    const again = inOutline(body);
    if (!again) throw new Error("There is no way back.");
    expect(again.page).toBe("Outline");
    const sketch = await sketchFromHash(
      new URL(again.href, "https://rho.example").hash.slice(1),
      EMPTY_SKETCH,
    );
    return { href: again.href, body: sketch && fieldBody(sketch) };
  };

  it("has the outline, terminals, medium, accuracy, operating point and requirement of the record", async () => {
    const asked = {
      outline: {
        ...BEND.outline,
        symmetry: "plan",
        holes: [
          [
            [0.4, 0.4],
            [0.6, 0.4],
            [0.5, 0.6],
          ],
        ],
      },
      terminals: BEND.terminals,
      medium: {
        sheetResistance: "50 ohm/sq",
        regions: [
          {
            ring: [
              [2, 0],
              [3, 0],
              [3, 1],
              [2, 1],
            ],
            medium: { sheetResistance: 5 },
          },
        ],
      },
      accuracy: 3e-5,
      operating: { voltage: "5 V" },
      requirement: { max: "400 ohm" },
    };
    const { href, body } = await opened(asked);
    expect(href).toMatch(/^\/outline#body=/);
    expect(body).toMatchObject({
      outline: { unit: "mm", outer: BEND.outline.outer, holes: asked.outline.holes },
      terminals: [
        { name: "in", parts: [{ ring: 0, edge: 1 }] },
        { name: "out", parts: [{ ring: 0, edge: 4 }] },
      ],
      medium: { sheetResistance: "50 ohm/sq", regions: [{ medium: { sheetResistance: "5" } }] },
      accuracy: 3e-5,
      operating: { voltage: "5 V" },
      requirement: { max: "400 ohm" },
    });
  });

  it("is packed where it is long", async () => {
    const outer = polygon(0, 0, 10, 200);
    const asked = {
      ...BEND,
      outline: { unit: "mm", outer },
      terminals: [
        { name: "a", parts: [{ ring: 0, edge: 0 }] },
        { name: "b", parts: [{ ring: 0, edge: 100 }] },
      ],
    };
    const { href, body } = await opened(asked);
    expect(href).toMatch(/^\/outline#packed=[\w-]+$/);
    expect(body?.outline.outer).toEqual(outer);
  });

  it("is not offered where the page has no field for what was asked", () => {
    expect(inOutline({ ...BEND, medium: { ...BEND.medium, weather: "wet" } })).toBeUndefined();
  });
});

describe.each(["a4", "letter"] as const)("the printed sheet on %s", (paper) => {
  it("says on paper what the page says", async () => {
    const content = contentOf(recordOf(BAR));
    const pdf = await sheetPdf(content, paper);
    const pages = pdfPages(pdf);
    const all = pages.join("\n");
    expect(pdfTitle(pdf)).toBe(`Main bar, panel 2 · ${content.code}`);
    expect(Buffer.from(pdf).toString("latin1")).toContain(
      paper === "a4" ? "[0 0 595.28 841.89]" : "[0 0 612 792]",
    );
    const figure = content.headline.text.replace("\u2009", "\u00a0");
    for (const text of [figure, content.headline.bracket, "630 A", "Ines Hartwell", "250 mm"]) {
      expect(all).toContain(text);
    }
    pages.forEach((page, index) => {
      expect(page).toContain(content.code);
      expect(page).toContain(`page ${index + 1} of ${pages.length}`);
    });
    for (const { title } of content.sections) expect(all).toContain(title);
  });

  it("draws a field over the width of the text, on white, its words at 7 points or more", async () => {
    let look: PlotLook | undefined;
    const draw = (asked: PlotLook) => {
      look = asked;
      return outlineSvg(storedOutline.parse(BEND.outline), BEND.terminals, asked);
    };
    const content = { ...contentOf(recordOf(BAR)), picture: { kind: "svg" as const, draw, description: "" } };
    await sheetPdf(content, paper);
    const textWidth = (paper === "a4" ? 595.28 : 612) - 92;
    const points = textWidth / (look?.width ?? 0);
    expect(14 * points).toBeGreaterThanOrEqual(7);
    // A square conductor covers more than half of the paper's width.
    expect((look?.tallest ?? 0) * points).toBeGreaterThan(textWidth / 2 + 46);
    expect([look?.ground, look?.colours.sheet]).toEqual([false, "#ffffff"]);
  });

  it("carries a graded shell with its layers", async () => {
    const pages = pdfPages(await sheetPdf(contentOf(recordOf(SHELL, "Sleeve “Ω”, rev Č")), paper));
    expect(pages.join("\n")).toContain("3 pS/m");
    expect(pages[0]).toContain("Sleeve “Ω”, rev Č");
  });
});

describe("an odd record", () => {
  it("of ten thousand layers, or with a label without end, has a sheet of few pages", async () => {
    const layers = Array.from({ length: 10_000 }, (_, k) => ({ thickness: 3e-7, value: 1 + (k % 7) }));
    const request = {
      ...SHELL,
      medium: {
        graded: { coordinate: "radius", quantity: "conductivity", profile: { kind: "layers", layers } },
      },
    };
    const label = `${"Ω".repeat(99)}\ud800\u0000${"字".repeat(99)}`;
    const pages = pdfPages(await sheetPdf(contentOf(recordOf(request, label)), "a4"));
    expect(pages.length).toBeLessThan(10);
    expect(pages[0]).toContain("ΩΩΩ");
  });
});

describe("every shape's record", () => {
  it("has a sheet", async () => {
    for (const id of ["earth-rod-layered", "clad-wire", "sheet-meander", "eccentric-cylinders"]) {
      const shape = findShape(id);
      if (!shape) throw new Error(`The catalogue lacks ${id}.`);
      const pages = pdfPages(await sheetPdf(contentOf(recordOf(exampleRequest(shape), shape.title)), "a4"));
      expect(pages[0], id).toContain(shape.title);
    }
  });
});
