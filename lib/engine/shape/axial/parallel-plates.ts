import { defineShape } from "../define-shape";
import { polyline, rectangle } from "../drawing";

/** The medium between two parallel plates, with no fringing: R = ρ·g/S. */
export const parallelPlates = defineShape({
  id: "parallel-plates",
  title: "Parallel plates",
  family: "axial",
  summary:
    "The medium that fills the gap between two parallel plates of one area; the current crosses from plate to plate.",
  dimensions: {
    gap: {
      type: "quantity",
      kind: "length",
      label: "Gap",
      symbol: "g",
      help: "Distance between the two plates, the thickness of the medium.",
    },
    area: {
      type: "quantity",
      kind: "area",
      label: "Area",
      symbol: "S",
      help: "Area of each plate.",
    },
  },
  coordinates: [
    { name: "gap", role: "along", unit: "m", label: "Distance from the high plate", start: "0", end: "gap" },
  ],
  terminals: { high: "one plate", low: "the other plate" },
  answer: {
    kind: "flow",
    flow: ({ gap, area }) => ({
      along: {
        coordinate: "gap",
        start: 0,
        extent: gap,
        section: () => area,
        line: "anywhere between the plates",
      },
      across: [],
    }),
    uniform: ({ gap, area }) => gap / area,
  },
  formula: "R = \\frac{\\rho\\,g}{S} = \\frac{g}{\\sigma S}",
  boundsBasis: "rounding",
  validity: [
    "Exact where the medium ends at the edge of the plates; a medium that goes on beyond them carries more current than this (fringing).",
  ],
  cautions: [
    "Insulation: the resistance of a dielectric depends on moisture, temperature and the time under voltage; this is no proof of its strength.",
  ],
  assumptions: [
    "Both plates are perfect conductors in full contact with the medium; no current flows beyond their edges.",
  ],
  sources: [
    { title: "Uniform field between parallel plates", detail: "R = g/(σS)", provenance: "derived here" },
  ],
  example: {
    dimensions: { gap: "25 um", area: "53 cm^2" },
    medium: { resistivity: "1.3e13 ohm m" },
  },
  drawing: ({ gap, area }) => {
    const side = Math.sqrt(area);
    const plate = (x: number) =>
      polyline([
        [x, 0],
        [x, side],
      ]);
    return {
      views: [
        {
          title: "section",
          conductor: [rectangle(0, 0, gap, side)],
          high: [plate(0)],
          low: [plate(gap)],
          flow: [0.25, 0.5, 0.75].map((part) => ({
            from: [gap * 0.2, side * part] as const,
            to: [gap * 0.8, side * part] as const,
          })),
          dimensions: [{ name: "gap", from: [gap, 0], to: [0, 0], kind: "linear", offset: 1 }],
        },
        {
          title: "plan of a plate",
          conductor: [rectangle(0, 0, side, side)],
          high: [],
          low: [],
          flow: [],
          dimensions: [{ name: "area", from: [side / 2, side / 2], to: [side, side], kind: "leader" }],
        },
      ],
      description:
        "Two parallel plates with the medium between them, in section and in plan; the current crosses the gap from one plate to the other.",
    };
  },
});
