import { AMPACITY_CAUTION } from "../caution";
import { defineShape } from "../define-shape";
import { circle, polyline, rectangle } from "../drawing";

/** The plated wall of a hole through a board, `count` of them side by side: R = ρH/(π·p·(d+p)·n). */
export const viaBarrel = defineShape({
  id: "via-barrel",
  title: "Plated hole",
  family: "axial",
  summary:
    "The plated wall of a hole through a board, or several equal holes in parallel; the current runs along the barrel from one side of the board to the other.",
  dimensions: {
    height: {
      type: "quantity",
      kind: "length",
      label: "Height",
      symbol: "H",
      help: "Length of the barrel between the two layers that it joins; for a through hole the board's thickness.",
    },
    holeDiameter: {
      type: "quantity",
      kind: "length",
      label: "Finished hole diameter",
      symbol: "d",
      radius: "holeRadius",
      help: "Diameter of the FINISHED hole, inside the plating. The drill is larger: drill diameter less twice the plating gives the finished hole.",
    },
    plating: {
      type: "quantity",
      kind: "length",
      label: "Plating",
      symbol: "p",
      help: "Thickness of the plating on the wall of the hole, outside the finished diameter.",
    },
    count: {
      type: "integer",
      label: "Number of holes",
      symbol: "n",
      default: 1,
      min: 1,
      max: 1_000_000,
      help: "Equal holes side by side, each carrying its share.",
    },
  },
  coordinates: [
    {
      name: "height",
      role: "along",
      unit: "m",
      label: "Distance from the high side",
      start: "0",
      end: "height",
    },
    {
      name: "radius",
      role: "across",
      unit: "m",
      label: "Distance from the hole's axis",
      start: "holeDiameter/2",
      end: "holeDiameter/2 + plating",
    },
  ],
  terminals: { high: "the rim of the barrel on one side", low: "the rim on the other side" },
  answer: {
    kind: "flow",
    flow: ({ height, holeDiameter, plating, count }) => {
      const area = Math.PI * plating * (holeDiameter + plating) * count;
      return {
        along: {
          coordinate: "height",
          start: 0,
          extent: height,
          section: () => area,
          line: "anywhere in the plating",
        },
        across: [
          {
            coordinate: "radius",
            start: holeDiameter / 2,
            extent: plating,
            tube: (x) => (Math.PI * (holeDiameter + 2 * x) * count) / height,
            fieldPerVolt: () => 1 / height,
          },
        ],
      };
    },
    uniform: ({ height, holeDiameter, plating, count }) =>
      height / plating / (holeDiameter + plating) / (Math.PI * count),
  },
  formula: "R = \\frac{\\rho H}{\\pi\\,p\\,(d+p)\\,n}",
  boundsBasis: "rounding",
  validity: [
    "Exact for a plating of even thickness whose two rims are equipotentials.",
    "The hole is empty or filled with an insulator; a conducting fill is not included.",
  ],
  cautions: [AMPACITY_CAUTION],
  assumptions: [
    "The current is spread evenly around the rims; the pads and the spreading in the planes are not included.",
    "Several holes are equal and share the current equally.",
  ],
  sources: [
    {
      title: "Uniform field along a round tube",
      detail:
        "R = ρH/(π·p·(d+p)), the exact ring section of the plating, not its thin-wall approximation π·d·p",
      provenance: "derived here",
    },
  ],
  example: {
    dimensions: { height: "1.6 mm", holeDiameter: "0.25 mm", plating: "25 um", count: 4 },
    medium: { material: "copper-annealed" },
  },
  drawing: ({ height, holeDiameter, plating, count }) => {
    const inner = holeDiameter / 2;
    const outer = inner + plating;
    const walls = [rectangle(-outer, 0, plating, height), rectangle(inner, 0, plating, height)];
    const rim = (y: number) =>
      [-outer, inner].map((x) =>
        polyline([
          [x, y],
          [x + plating, y],
        ]),
      );
    return {
      views: [
        {
          title: "section along the axis",
          conductor: walls,
          lines: [
            {
              ...polyline([
                [0, -0.08 * height],
                [0, 1.08 * height],
              ]),
              style: "axis",
            },
          ],
          high: rim(height),
          low: rim(0),
          flow: [-1, 1].map((side) => ({
            from: [side * (inner + plating / 2), 0.65 * height],
            to: [side * (inner + plating / 2), 0.35 * height],
          })),
          dimensions: [
            { name: "height", from: [outer, height], to: [outer, 0], kind: "linear", offset: 1 },
            { name: "holeDiameter", from: [inner, 0], to: [-inner, 0], kind: "linear", offset: 1 },
          ],
        },
        {
          title: "end view",
          conductor: [circle([0, 0], outer), circle([0, 0], inner)],
          high: [],
          low: [],
          flow: [],
          dimensions: [{ name: "plating", from: [inner, 0], to: [outer, 0], kind: "linear", offset: 1 }],
        },
      ],
      description: `The barrel of a plated hole in section and from its end${count > 1 ? `, one of ${count}` : ""}; the current runs along the plating from one rim to the other, the diameter shown is that of the finished hole.`,
    };
  },
});
