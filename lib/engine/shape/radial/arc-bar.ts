import { defineShape } from "../define-shape";
import { arc, polyline, rectangle, type DrawingPath, type Point } from "../drawing";

/** A bar bent to an arc, with the current around the bend: R = ρφ/(t ln(b/a)). */
export const arcBar = defineShape({
  id: "arc-bar",
  title: "Bar bent to an arc",
  family: "radial",
  summary:
    "A bar of rectangular section bent to a circular arc; the current runs around the bend between the two radial end faces and crowds towards the inner edge.",
  dimensions: {
    innerRadius: {
      type: "quantity",
      kind: "length",
      label: "Inner radius",
      symbol: "a",
      diameter: "innerDiameter",
      help: "Radius of the inner edge of the bend.",
    },
    outerRadius: {
      type: "quantity",
      kind: "length",
      label: "Outer radius",
      symbol: "b",
      diameter: "outerDiameter",
      help: "Radius of the outer edge of the bend; or give the width.",
    },
    width: {
      type: "quantity",
      kind: "length",
      label: "Width",
      symbol: "w",
      help: "Width of the bar in the plane of the bend, outer less inner radius.",
    },
    thickness: {
      type: "quantity",
      kind: "length",
      label: "Thickness",
      symbol: "t",
      help: "Thickness of the bar along the axis of the bend.",
    },
    angle: {
      type: "quantity",
      kind: "angle",
      label: "Angle",
      symbol: "φ",
      max: 2 * Math.PI,
      help: "Angle of the bend between the two end faces.",
    },
  },
  alternatives: [
    {
      names: ["outerRadius", "width"],
      derive: {
        outerRadius: ({ innerRadius, width }) => innerRadius + width,
        width: ({ innerRadius, outerRadius }) => outerRadius - innerRadius,
      },
    },
  ],
  constraints: [
    {
      names: ["outerRadius", "innerRadius"],
      text: "outer radius greater than inner radius",
      holds: ({ width }) => width > 0,
    },
  ],
  coordinates: [
    { name: "angle", role: "along", unit: "rad", label: "Angle from the high end", start: "0", end: "angle" },
    {
      name: "radius",
      role: "across",
      unit: "m",
      label: "Distance from the axis of the bend",
      start: "innerRadius",
      end: "outerRadius",
    },
    {
      name: "thickness",
      role: "across",
      unit: "m",
      label: "Distance through the thickness",
      start: "0",
      end: "thickness",
    },
  ],
  terminals: { high: "one end face", low: "the other end face" },
  answer: {
    kind: "flow",
    flow: ({ innerRadius, width, thickness, angle }) => {
      const logarithm = Math.log1p(width / innerRadius);
      const section = thickness * logarithm;
      return {
        along: {
          coordinate: "angle",
          start: 0,
          extent: angle,
          section: () => section,
          // The scale factor of the angle is the radius: the field is largest where that is smallest.
          scale: () => innerRadius,
          line: "at the inner edge",
        },
        across: [
          {
            coordinate: "radius",
            start: innerRadius,
            extent: width,
            tube: (x) => thickness / angle / (innerRadius + x),
            fieldPerVolt: (x) => 1 / angle / (innerRadius + x),
          },
          {
            coordinate: "thickness",
            start: 0,
            extent: thickness,
            tube: () => logarithm / angle,
            fieldPerVolt: () => 1 / angle / innerRadius,
          },
        ],
      };
    },
    uniform: ({ innerRadius, width, thickness, angle }) =>
      angle / thickness / Math.log1p(width / innerRadius),
  },
  formula: "R = \\frac{\\rho\\,\\varphi}{t\\,\\ln(b/a)}",
  boundsBasis: "rounding",
  validity: ["Exact where both end faces are radial planes and equipotentials."],
  cautions: [],
  assumptions: ["The whole of each end face is at one potential; contact resistance is not included."],
  sources: [{ title: "Flow around an axis", detail: "G = ∫σt dr/(φr)", provenance: "derived here" }],
  example: {
    dimensions: { innerRadius: "13 mm", width: "40 mm", thickness: "5 mm", angle: "90 deg" },
    medium: { material: "copper-annealed" },
  },
  drawing: ({ innerRadius: a, outerRadius: b, width, thickness, angle }) => {
    const at = (radius: number, phi: number): Point => [radius * Math.cos(phi), radius * Math.sin(phi)];
    const body: DrawingPath = {
      from: at(a, 0),
      steps: [
        { to: at(b, 0) },
        ...arc([0, 0], b, 0, angle).steps,
        { to: at(a, angle) },
        ...arc([0, 0], a, angle, 0).steps,
      ],
      closed: true,
    };
    const middle = a + width / 2;
    return {
      views: [
        {
          title: "plan",
          conductor: [body],
          high: [polyline([at(a, 0), at(b, 0)])],
          low: [polyline([at(a, angle), at(b, angle)])],
          flow: [0.2, 0.6].map((part) => ({
            from: at(middle, part * angle),
            to: at(middle, (part + 0.15) * angle),
          })),
          dimensions: [
            { name: "innerRadius", from: [0, 0], to: at(a, angle * 0.35), kind: "leader" },
            { name: "outerRadius", from: [0, 0], to: at(b, angle * 0.65), kind: "leader" },
            { name: "width", from: at(b, 0), to: at(a, 0), kind: "linear", offset: 1 },
            { name: "angle", from: at(b, 0), to: at(b, angle), kind: "angle", center: [0, 0] },
          ],
        },
        {
          title: "section",
          conductor: [rectangle(0, 0, width, thickness)],
          high: [],
          low: [],
          flow: [],
          dimensions: [
            { name: "thickness", from: [width, thickness], to: [width, 0], kind: "linear", offset: 1 },
          ],
        },
      ],
      description:
        "A bar bent to an arc, in plan and in section; the current runs around the bend from one radial end face to the other.",
    };
  },
});
