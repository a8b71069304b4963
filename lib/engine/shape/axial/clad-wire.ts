import { AMPACITY_CAUTION } from "../caution";
import { defineShape } from "../define-shape";
import { circle, polyline, rectangle } from "../drawing";

/** A round core in a cladding of another metal, both carrying current along the wire: the two in parallel. */
export const cladWire = defineShape({
  id: "clad-wire",
  title: "Clad wire",
  family: "axial",
  summary:
    "A round wire of one metal clad with another, such as copper on aluminium or on steel; both carry current in parallel along the wire.",
  dimensions: {
    length: {
      type: "quantity",
      kind: "length",
      label: "Length",
      symbol: "L",
      help: "Distance between the two end faces, along the current.",
    },
    coreDiameter: {
      type: "quantity",
      kind: "length",
      label: "Core diameter",
      symbol: "d",
      radius: "coreRadius",
      help: "Diameter of the core alone; the finished wire is thicker by twice the cladding.",
    },
    claddingThickness: {
      type: "quantity",
      kind: "length",
      label: "Cladding thickness",
      symbol: "t",
      help: "Thickness of the cladding around the core, radially.",
    },
  },
  coordinates: [
    {
      name: "length",
      role: "along",
      unit: "m",
      label: "Distance from the high end",
      start: "0",
      end: "length",
    },
  ],
  terminals: { high: "one end face, core and cladding", low: "the other end face, core and cladding" },
  answer: {
    kind: "media",
    media: [
      { name: "core", label: "Core" },
      { name: "cladding", label: "Cladding" },
    ],
    resistance: (d, { core, cladding }) => {
      const { core: coreShare, cladding: claddingShare } = shares(d);
      return {
        value: parallel(core * coreShare, cladding * claddingShare),
        relativeError: 4e-15,
        boundsBasis: "rounding",
        proved: true,
        method: "closed-form",
      };
    },
    parallel: (d) => {
      const area = (Math.PI / 4) * (d.coreDiameter + 2 * d.claddingThickness) ** 2;
      return {
        along: {
          coordinate: "length",
          start: 0,
          extent: d.length,
          section: () => area,
          line: "anywhere in the section",
        },
        shares: shares(d),
      };
    },
  },
  formula:
    "\\frac{1}{R} = \\frac{\\pi d^2}{4\\rho_\\mathrm{core}L} + \\frac{\\pi t\\,(d+t)}{\\rho_\\mathrm{clad}L}",
  boundsBasis: "rounding",
  validity: [
    "Exact where each metal is uniform across its part of the section: the field along the wire is then the same in both.",
  ],
  cautions: [
    AMPACITY_CAUTION,
    "A DC resistance only: at high frequency the current leaves the core for the cladding, and the resistance is another one.",
  ],
  assumptions: ["Core and cladding are concentric, touch everywhere, and are joined at both end faces."],
  sources: [
    {
      title: "Two conductors in parallel between common equipotential faces",
      detail: "1/R = A₁/(ρ₁L) + A₂/(ρ₂L)",
      provenance: "derived here",
    },
  ],
  example: {
    dimensions: { length: "100 m", coreDiameter: "1.97 mm", claddingThickness: "73 um" },
    media: { core: { material: "aluminium-electrical" }, cladding: { material: "copper-annealed" } },
  },
  drawing: ({ length, coreDiameter, claddingThickness }) => {
    const core = coreDiameter / 2;
    const outer = core + claddingThickness;
    const face = (x: number) =>
      polyline([
        [x, -outer],
        [x, outer],
      ]);
    return {
      views: [
        {
          title: "section along the axis",
          conductor: [rectangle(0, -core, length, coreDiameter)],
          second: [
            rectangle(0, core, length, claddingThickness),
            rectangle(0, -outer, length, claddingThickness),
          ],
          lines: [
            {
              ...polyline([
                [-0.05 * length, 0],
                [1.05 * length, 0],
              ]),
              style: "axis",
            },
          ],
          high: [face(0)],
          low: [face(length)],
          flow: [0.2, 0.6].map((part) => ({
            from: [length * part, core / 2],
            to: [length * (part + 0.2), core / 2],
          })),
          dimensions: [
            { name: "length", from: [length, -outer], to: [0, -outer], kind: "linear", offset: 1 },
          ],
        },
        {
          title: "section",
          conductor: [circle([0, 0], core)],
          second: [circle([0, 0], outer), circle([0, 0], core)],
          high: [],
          low: [],
          flow: [],
          dimensions: [
            { name: "coreDiameter", from: [0, 0], to: [0, core], kind: "leader" },
            { name: "claddingThickness", from: [core, 0], to: [outer, 0], kind: "linear", offset: 1 },
          ],
        },
      ],
      description:
        "A clad wire in section along its axis and across it; core and cladding carry the current side by side from one end face to the other.",
    };
  },
});

/** R/ρ of core and cladding, 1/m. */
function shares(d: {
  readonly length: number;
  readonly coreDiameter: number;
  readonly claddingThickness: number;
}) {
  const { length, coreDiameter, claddingThickness } = d;
  return {
    core: (4 / Math.PI) * (length / coreDiameter / coreDiameter),
    cladding: length / claddingThickness / (coreDiameter + claddingThickness) / Math.PI,
  };
}

/** Two resistances in parallel, without overflow of their product. */
function parallel(a: number, b: number): number {
  const [small, large] = a < b ? [a, b] : [b, a];
  return small / (1 + small / large);
}
