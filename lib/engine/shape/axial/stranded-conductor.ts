import { AMPACITY_CAUTION } from "../caution";
import { defineShape } from "../define-shape";
import { circle, polyline, rectangle, type DrawingPath, type Point } from "../drawing";

/** Equal round strands in parallel, longer than the conductor by the lay: R = 4ρLk/(nπd²). */
export const strandedConductor = defineShape({
  id: "stranded-conductor",
  title: "Stranded conductor",
  family: "axial",
  summary:
    "Equal round strands laid up into one conductor and joined at both ends; each strand is longer than the conductor by the lay factor.",
  dimensions: {
    length: {
      type: "quantity",
      kind: "length",
      label: "Length",
      symbol: "L",
      help: "Length of the finished conductor, not of a strand.",
    },
    strands: {
      type: "integer",
      label: "Strands",
      symbol: "n",
      min: 1,
      max: 1_000_000,
      help: "Number of equal strands.",
    },
    strandDiameter: {
      type: "quantity",
      kind: "length",
      label: "Strand diameter",
      symbol: "d",
      radius: "strandRadius",
      help: "Diameter of the bare metal of one strand, without tin or enamel; a gauge such as AWG 24 may be given.",
    },
    layFactor: {
      type: "number",
      label: "Lay factor",
      symbol: "k",
      default: 1.02,
      min: 1,
      max: 10,
      help: "Mean length of a strand over the length of the conductor: √(1+(π/m)²) for a lay of m mean diameters, averaged over the strands.",
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
  terminals: { high: "all strands at one end", low: "all strands at the other end" },
  answer: {
    kind: "flow",
    flow: ({ length, strands, strandDiameter, layFactor }) => {
      const section = ((Math.PI / 4) * strandDiameter ** 2 * strands) / layFactor;
      return {
        along: {
          coordinate: "length",
          start: 0,
          extent: length,
          section: () => section,
          // A metre of the conductor is layFactor metres of strand.
          scale: () => layFactor,
          line: "anywhere in a strand",
        },
        across: [],
      };
    },
    uniform: ({ length, strands, strandDiameter, layFactor }) =>
      (4 / Math.PI) * (length / strandDiameter / strandDiameter) * (layFactor / strands),
  },
  formula: "R = \\frac{4\\rho L\\,k}{n\\,\\pi d^2}",
  boundsBasis: "rounding",
  validity: [
    "Exact for strands that carry the current along their own length, with the stated lay factor.",
    "The lay factor 1.02 taken by default is common practice for cable classes; measure or compute your own where it matters.",
  ],
  cautions: [AMPACITY_CAUTION],
  assumptions: [
    "No current passes from strand to strand between the ends; the strands are joined perfectly at the ends.",
    "Drawing and tinning change the metal's resistivity; use the medium of the finished wire.",
  ],
  sources: [
    {
      title: "Equal wires in parallel, each of length kL",
      detail: "R = 4ρLk/(nπd²)",
      provenance: "derived here",
    },
    {
      title: "Lay factor 1.02",
      detail: "common practice, no source",
      provenance: "from memory",
    },
  ],
  example: {
    dimensions: { length: "100 m", strands: 7, strandDiameter: "0.67 mm", layFactor: 1.02 },
    medium: { material: "copper-annealed" },
  },
  drawing: ({ length, strands, strandDiameter }) => {
    const centers = layUp(Math.min(strands, 91), strandDiameter);
    const outer = Math.max(...centers.map(([x, y]) => Math.hypot(x, y))) + strandDiameter / 2;
    const end = (x: number): DrawingPath =>
      polyline([
        [x, -outer],
        [x, outer],
      ]);
    return {
      views: [
        {
          title: "side view",
          conductor: [rectangle(0, -outer, length, 2 * outer)],
          lines: Array.from({ length: 9 }, (_, i) => ({
            ...polyline([
              [(length * (i + 0.2)) / 9, -outer],
              [(length * (i + 0.8)) / 9, outer],
            ]),
            style: "thin" as const,
          })),
          high: [end(0)],
          low: [end(length)],
          flow: [0.2, 0.6].map((part) => ({ from: [length * part, 0], to: [length * (part + 0.2), 0] })),
          dimensions: [
            { name: "length", from: [length, -outer], to: [0, -outer], kind: "linear", offset: 1 },
          ],
        },
        {
          title: "section",
          conductor: centers.map((center) => circle(center, strandDiameter / 2)),
          high: [],
          low: [],
          flow: [],
          dimensions: [
            {
              name: "strandDiameter",
              from: [centers[0][0], centers[0][1]],
              to: [centers[0][0] + strandDiameter / 2, centers[0][1]],
              kind: "leader",
            },
          ],
        },
      ],
      description: `A stranded conductor seen from the side, its strands at an angle by their lay, and in section${strands > centers.length ? `, ${centers.length} of its ${strands} strands drawn` : ""}; the current runs along the strands.`,
    };
  },
});

/** Centres of strands in hexagonal layers around a middle one, as many as asked for. */
function layUp(count: number, diameter: number): readonly Point[] {
  const centers: Point[] = [[0, 0]];
  for (let ring = 1; centers.length < count; ring++) {
    for (let side = 0; side < 6; side++) {
      for (let step = 0; step < ring && centers.length < count; step++) {
        const corner = (Math.PI / 3) * side;
        const onward = (Math.PI / 3) * (side + 2);
        centers.push([
          diameter * (ring * Math.cos(corner) + step * Math.cos(onward)),
          diameter * (ring * Math.sin(corner) + step * Math.sin(onward)),
        ]);
      }
    }
  }
  return centers;
}
