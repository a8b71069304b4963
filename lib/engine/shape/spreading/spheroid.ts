import { carlsonRC } from "../../numeric/carlson";
import { ELECTRODE_CAUTION } from "../caution";
import { defineShape } from "../define-shape";
import { lengthDimension } from "../dimension";
import type { Drawing, DrawingPath, Point } from "../drawing";
import { polyline, rectangle } from "../drawing";
import { ellipse, joined, sampled } from "../drawing-curve";
import { exactFactor } from "../exact-factor";
import { segment } from "./circle-views";

interface Spheroid {
  readonly polarDiameter: number;
  readonly equatorialDiameter: number;
  readonly space: string;
}

/**
 * R_C(p², e²) of the semi-axes in its closed forms asinh(t/e)/t and atan(t/p)/t, t² = |p² − e²|: the difference is
 * taken in factors, so nothing cancels near the sphere, at the disc or at the needle.
 */
function integral(p: number, e: number): number {
  const t = Math.sqrt(Math.abs(p - e)) * Math.sqrt(p + e);
  if (t === 0) return 1 / e;
  return (p > e ? Math.asinh(t / e) : Math.atan(t / p)) / t;
}

/** A spheroid in an unbounded medium or cut by an insulating plane: Carlson's R_C of the squared semi-axes. */
export const spheroid = defineShape({
  id: "spheroid",
  title: "Spheroid",
  family: "spreading",
  summary:
    "An ellipsoid of revolution, slender or flat, in a medium without bounds, or half of it below an insulating plane through its centre; the current spreads from it to infinity.",
  dimensions: {
    polarDiameter: lengthDimension("Polar diameter", "dₚ", "Length along the axis of revolution.", {
      radius: "polarRadius",
    }),
    equatorialDiameter: lengthDimension(
      "Equatorial diameter",
      "dₑ",
      "Diameter across the axis of revolution.",
      { radius: "equatorialRadius" },
    ),
    space: {
      type: "choice",
      label: "Space",
      symbol: "n",
      default: "full",
      choices: [
        { value: "full", label: "full space" },
        { value: "half", label: "half space, cut by an insulating plane through the centre" },
      ],
      help: "full: medium on all sides; half: an insulating plane through the centre, such as the ground surface.",
    },
  },
  coordinates: [],
  terminals: { high: "the spheroid", low: "infinity" },
  answer: {
    kind: "factor",
    factor: ({ polarDiameter, equatorialDiameter, space }) =>
      exactFactor(
        ((space === "half" ? 2 : 1) / (4 * Math.PI)) * integral(polarDiameter / 2, equatorialDiameter / 2),
      ),
    peak: ({ polarDiameter, equatorialDiameter }) => {
      const [p, e] = [polarDiameter / 2, equatorialDiameter / 2];
      // E = Q·h/(4πε·e²p), h the distance of the tangent plane from the centre, Q/(4πε) = 1/R_C at one volt.
      const fieldPerVolt = 1 / integral(p, e) / e / (p > e ? e : p);
      const position = p > e ? "at the poles" : p < e ? "along the equator" : "everywhere on the surface";
      return { fieldPerVolt, position };
    },
    secondRoute: ({ polarDiameter, equatorialDiameter, space }) => {
      const [p, e] = [polarDiameter / 2, equatorialDiameter / 2];
      const value = carlsonRC((p / e) * (p / e), 1) / e;
      return { value: ((space === "half" ? 2 : 1) / (4 * Math.PI)) * value, tolerance: 1e-12 };
    },
  },
  formula:
    "R = \\frac{n\\,\\rho}{4\\pi}\\,R_C(p^2,e^2)=\\frac{n\\,\\rho}{4\\pi}\\begin{cases}\\operatorname{arsinh}(t/e)/t & p>e\\\\ \\arctan(t/p)/t & p<e\\end{cases},\\quad t^2=|p^2-e^2|,\\; p=\\tfrac{d_p}2,\\; e=\\tfrac{d_e}2",
  boundsBasis: "rounding",
  validity: [
    "Exact for a uniform medium whose other electrode is far away.",
    "A polar diameter far below the equatorial one is a thin disc, far above it a needle.",
  ],
  cautions: [ELECTRODE_CAUTION],
  assumptions: [
    "The spheroid is at one potential; for half space the plane through its centre carries no current.",
  ],
  sources: [
    {
      title: "Capacitance of a spheroid, and ρε = RC",
      detail: "B. C. Carlson's R_C form (DLMF 19.33)",
      provenance: "from memory",
    },
    {
      title: "Spheroidal coordinates",
      detail: "rederived with factored differences",
      provenance: "derived here",
    },
  ],
  example: {
    dimensions: { polarDiameter: "1.8 m", equatorialDiameter: "60 mm", space: "half" },
    medium: { resistivity: "50 ohm m" },
  },
  drawing: drawSpheroid,
});

function drawSpheroid(d: Spheroid): Drawing {
  const [p, e] = [d.polarDiameter / 2, d.equatorialDiameter / 2];
  const half = d.space === "half";
  const around = 0.9 * Math.max(p, e);
  const wide = e + around;
  const bottom = -p - around;
  const lower = sampled((turn): Point => [e * Math.cos(turn), p * Math.sin(turn)], Math.PI, 2 * Math.PI);
  const mirrored = sampled((turn): Point => [e * Math.cos(turn), p * Math.sin(turn)], 0, Math.PI);
  const body: readonly DrawingPath[] = half
    ? [
        joined([
          segment([-wide, 0], [-e, 0]),
          lower,
          polyline([
            [wide, 0],
            [wide, bottom],
            [-wide, bottom],
          ]),
        ]),
      ]
    : [rectangle(-wide, bottom, 2 * wide, -2 * bottom), ellipse([0, 0], e, p)];
  return {
    views: [
      {
        title: "section through the axis",
        conductor: body,
        lines: [
          { ...segment([0, bottom], [0, half ? 0 : -bottom]), style: "axis" },
          ...(half
            ? [
                { ...segment([-wide, 0], [wide, 0]), style: "ground" as const },
                { ...mirrored, style: "hidden" as const },
              ]
            : []),
        ],
        high: [half ? lower : ellipse([0, 0], e, p)],
        low: half
          ? [
              polyline([
                [-wide, 0],
                [-wide, bottom],
                [wide, bottom],
                [wide, 0],
              ]),
            ]
          : [rectangle(-wide, bottom, 2 * wide, -2 * bottom)],
        flow: (half ? [-0.12, -0.5, -0.88] : [0, 0.5, 1, -0.5]).map((turn) => {
          const [x, y] = [Math.cos(turn * Math.PI), Math.sin(turn * Math.PI)];
          return {
            from: [x * (e + 0.15 * around), y * (p + 0.15 * around)],
            to: [x * (e + 0.7 * around), y * (p + 0.7 * around)],
          };
        }),
        dimensions: [
          { name: "polarDiameter", from: [wide, -p], to: [wide, p], kind: "linear", offset: -1 },
          { name: "equatorialDiameter", from: [-e, bottom], to: [e, bottom], kind: "linear", offset: -1 },
        ],
      },
    ],
    description: half
      ? "The lower half of an ellipsoid of revolution below an insulating plane, in section; the current spreads from it downwards and sideways."
      : "An ellipsoid of revolution in section; the current spreads from it on all sides.",
  };
}
