import { overLog1p } from "../../numeric/stable-ratios";
import { defineShape } from "../define-shape";
import { taperCautions, taperTexts, taperView } from "./taper";

/** A conical frustum between flat ends: 4ρL/(πd₁d₂) by conducting sheets, times T²/ln(1 + T²) by insulating walls. */
export const coneFrustum = defineShape({
  id: "cone-frustum",
  title: "Conical frustum",
  family: "tapered",
  summary:
    "A straight cone cut off by two flat end faces, through which the current enters and leaves; or a wire whose diameter changes evenly.",
  dimensions: {
    length: {
      type: "quantity",
      kind: "length",
      label: "Length",
      symbol: "L",
      help: "Distance between the two flat end faces.",
    },
    startDiameter: {
      type: "quantity",
      kind: "length",
      label: "Start diameter",
      symbol: "d₁",
      radius: "startRadius",
      help: "Diameter at the high end.",
    },
    endDiameter: {
      type: "quantity",
      kind: "length",
      label: "End diameter",
      symbol: "d₂",
      radius: "endRadius",
      help: "Diameter at the low end.",
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
  terminals: {
    high: "the flat end face of the start diameter",
    low: "the flat end face of the end diameter",
  },
  answer: {
    kind: "flow",
    flow: ({ length, startDiameter, endDiameter }) => ({
      along: {
        coordinate: "length",
        start: 0,
        extent: length,
        section: (x) => {
          const diameter = startDiameter * (1 - x / length) + endDiameter * (x / length);
          return (Math.PI / 4) * diameter * diameter;
        },
      },
      across: [],
    }),
    uniform: ({ length, startDiameter, endDiameter }) =>
      (4 / Math.PI) * (length / startDiameter / endDiameter),
    wallRatio,
    cautions: (d) => taperCautions(wallRatio(d)),
  },
  formula:
    "\\frac{4\\rho L}{\\pi d_1 d_2} \\le R \\le \\frac{4\\rho L}{\\pi d_1 d_2}\\,\\frac{T^2}{\\ln(1 + T^2)},\\quad T = \\frac{|d_2 - d_1|}{2L}",
  boundsBasis: "rayleigh",
  validity: taperTexts.validity,
  cautions: [],
  assumptions: taperTexts.assumptions,
  sources: taperTexts.sources,
  example: {
    dimensions: { length: "21.2 mm", startDiameter: "2.6 mm", endDiameter: "9.4 mm" },
    medium: { material: "copper-annealed" },
  },
  drawing: ({ length, startDiameter, endDiameter }) => ({
    views: [
      taperView({
        length,
        startWidth: startDiameter,
        endWidth: endDiameter,
        names: ["startDiameter", "endDiameter"],
        round: true,
      }),
    ],
    description:
      "A conical frustum seen from the side; the current runs along its axis from one flat end face to the other.",
  }),
});

/** Upper over lower bound: the walls follow the straight lines of the cone. */
function wallRatio(d: {
  readonly length: number;
  readonly startDiameter: number;
  readonly endDiameter: number;
}): number {
  const slope = Math.abs(d.endDiameter - d.startDiameter) / 2 / d.length;
  return overLog1p(slope * slope);
}
