import { defineShape } from "../define-shape";
import { lengthDimension } from "../dimension";
import { polyline, rectangle } from "../drawing";
import { EARTHING_CAUTIONS, REMOTE_EARTH, SOIL_ASSUMPTION } from "./earthing-texts";
import { downArrows, groundLine } from "./ground-drawing";

/** A buried grid of bare conductors: Sverak's formula as in IEEE Std 80, with the factor for its depth. */
export const earthGrid = defineShape({
  id: "earth-grid",
  title: "Earth grid",
  family: "earthing",
  summary:
    "A horizontal grid of bare conductors under a site, joined where they cross; estimated from its area, its depth and the length of its conductors.",
  dimensions: {
    area: {
      type: "quantity",
      kind: "area",
      label: "Area",
      symbol: "A",
      help: "Area that the grid encloses.",
    },
    conductorLength: lengthDimension(
      "Conductor length",
      "L",
      "Total length of buried bare conductors; for a rectangle of m by n meshes (m+1) lengths and (n+1) widths.",
    ),
    depth: lengthDimension("Depth", "h", "Depth of the grid below the surface."),
  },
  coordinates: [],
  terminals: { high: "the grid", low: REMOTE_EARTH },
  answer: {
    kind: "factor",
    factor: ({ area, conductorLength, depth }) => {
      const value = sverak(area, conductorLength, depth);
      const density = conductorLength / Math.sqrt(area);
      const { below, above } = accuracyAt(density);
      return {
        value,
        relativeError: 4e-15,
        lower: value / (1 + above),
        upper: value / (1 - below),
        boundsBasis: "formula-accuracy",
        proved: false,
        method: "closed-form",
        accuracy:
          "Against square grids of 5 to 400 m solved with many segments the formula is up to 27 % high (small grids of thick conductors) and up to 9 % low (large, wide-meshed ones) at 4 by 4 meshes, 18 % and 4 % at 8 by 8; the bounds follow the conductor length over the root of the area.",
        cautions: gridCautions(density, depth),
      };
    },
  },
  formula:
    "R = \\rho\\left[\\frac{1}{L}+\\frac{1}{\\sqrt{20A}}\\left(1+\\frac{1}{1+h\\sqrt{20/A}}\\right)\\right]",
  boundsBasis: "formula-accuracy",
  validity: [
    "For depths of 0.25 m to 2.5 m, as IEEE Std 80 states.",
    "For square and nearly square grids of at least 4 by 4 meshes (sides up to about 3 to 2); long narrow grids have a lower resistance: a strip of 20 to 1 about a third lower than this formula.",
    "Without driven rods; rods that are part of the grid may be counted in the conductor length only as a rough guide.",
  ],
  cautions: EARTHING_CAUTIONS,
  assumptions: [
    SOIL_ASSUMPTION,
    "The conductors are joined where they cross and are one equipotential in contact with the soil.",
  ],
  sources: [
    {
      title:
        "J. G. Sverak, Simplified analysis of electrical gradients above a ground grid, IEEE Trans. PAS-103 (1984) 7",
      detail: "also in IEEE Std 80, Guide for Safety in AC Substation Grounding",
      provenance: "from memory",
    },
  ],
  example: {
    dimensions: { area: 4900, conductorLength: "1540 m", depth: "0.5 m" },
    medium: { resistivity: "400 ohm m" },
  },
  drawing: ({ area, depth }) => {
    const side = Math.sqrt(area);
    // A symbol of a grid: area and conductor length do not tell how its meshes lie.
    const meshes = 4;
    const steps = Array.from({ length: meshes + 1 }, (_, i) => (side * i) / meshes);
    const wires = steps.flatMap((at) => [
      polyline([
        [at, 0],
        [at, side],
      ]),
      polyline([
        [0, at],
        [side, at],
      ]),
    ]);
    return {
      views: [
        {
          title: "plan",
          conductor: [],
          lines: wires.map((wire) => ({ ...wire, style: "thin" as const })),
          high: [rectangle(0, 0, side, side), ...wires],
          low: [],
          flow: [],
          dimensions: [
            { name: "area", from: [side / 2, side / 2], to: [side, side], kind: "leader" },
            { name: "conductorLength", from: [side / 2, side / 2], to: [side, side / 2], kind: "leader" },
          ],
        },
        {
          title: "section",
          conductor: [],
          lines: [groundLine(-0.15 * side, 1.15 * side)],
          high: [
            polyline([
              [0, -depth],
              [side, -depth],
            ]),
          ],
          low: [],
          flow: downArrows(0, side, -depth, 0.25 * side),
          dimensions: [{ name: "depth", from: [side, 0], to: [side, -depth], kind: "linear", offset: 1 }],
        },
      ],
      description: `An earth grid in plan, drawn as a square of ${meshes} by ${meshes} meshes whatever the conductor length, and in section; the current spreads from it into the soil below the surface.`,
    };
  },
});

/** Sverak's resistance over resistivity, 1/m. */
function sverak(area: number, conductorLength: number, depth: number): number {
  const root = Math.sqrt(20 * area);
  return 1 / conductorLength + (1 + 1 / (1 + (20 * depth) / root)) / root;
}

/**
 * How far the formula was found above and below the true value, by conductor length over √area (4, 6, 10, 18 and 26 are
 * 1, 2, 4, 8 and 12 meshes a side): square grids of 5 to 400 m, depths 0.25 to 2.5 m, conductors 5 to 24 mm thick.
 */
const ACCURACY: readonly (readonly [number, number, number])[] = [
  [26, 0.02, 0.15],
  [18, 0.04, 0.19],
  [10, 0.09, 0.27],
  [6, 0.16, 0.36],
  [4, 0.23, 0.43],
];

function accuracyAt(density: number): { below: number; above: number } {
  const found = ACCURACY.find(([least]) => density >= least * (1 - 1e-12));
  return found ? { below: found[1], above: found[2] } : { below: 0.5, above: 0.5 };
}

function gridCautions(density: number, depth: number): string[] {
  const cautions: string[] = [];
  if (depth < 0.25 || depth > 2.5) {
    cautions.push("The depth lies outside 0.25 m to 2.5 m, for which IEEE Std 80 states the formula.");
  }
  if (density < 3.54) {
    cautions.push(
      "So little conductor cannot enclose that area: even a ring of it takes 3.54 times the root of the area. Check area and conductor length.",
    );
  } else if (density < 10) {
    cautions.push(
      "The grid has fewer meshes than about 4 by 4; the formula is rough there, and its bounds are wider.",
    );
  }
  return cautions;
}
