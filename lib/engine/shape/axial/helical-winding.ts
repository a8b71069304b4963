import { AMPACITY_CAUTION } from "../caution";
import { defineShape } from "../define-shape";
import { circle, polyline, type Drawing, type Point } from "../drawing";

/** A round wire wound into a helix: its centre-line length over its section, bounded by the curvature. */
export const helicalWinding = defineShape({
  id: "helical-winding",
  title: "Helical winding",
  family: "axial",
  summary:
    "A round wire wound into a helix with insulated turns; the current follows the wire from one end to the other.",
  dimensions: {
    turns: {
      type: "number",
      label: "Turns",
      symbol: "N",
      min: 0,
      exclusiveMin: true,
      max: 1e9,
      help: "Number of turns; it need not be whole.",
    },
    meanDiameter: {
      type: "quantity",
      kind: "length",
      label: "Mean diameter",
      symbol: "D",
      radius: "meanRadius",
      help: "Diameter of the helix at the centre of the wire: former diameter plus one wire diameter.",
    },
    pitch: {
      type: "quantity",
      kind: "length",
      label: "Pitch",
      symbol: "p",
      help: "Advance along the axis per turn.",
    },
    wireDiameter: {
      type: "quantity",
      kind: "length",
      label: "Wire diameter",
      symbol: "d",
      radius: "wireRadius",
      help: "Diameter of the bare metal, without enamel; a gauge such as AWG 24 may be given.",
    },
  },
  constraints: [
    {
      names: ["wireDiameter", "meanDiameter"],
      text: "wire diameter less than mean diameter",
      holds: ({ wireDiameter, meanDiameter }) => wireDiameter < meanDiameter,
    },
  ],
  coordinates: [
    {
      name: "length",
      role: "along",
      unit: "m",
      label: "Distance along the wire from the high end",
      start: "0",
      end: "turns·√((π·meanDiameter)² + pitch²)",
    },
  ],
  terminals: { high: "one end face of the wire", low: "the other end face of the wire" },
  answer: {
    kind: "flow",
    flow: (d) => {
      const area = (Math.PI / 4) * d.wireDiameter ** 2;
      return {
        along: {
          coordinate: "length",
          start: 0,
          extent: wireLength(d),
          section: () => area,
          line: "on the centre line of the wire; it is larger on the inner side of the bend",
        },
        across: [],
      };
    },
    uniform: (d) => (4 / Math.PI) * (wireLength(d) / d.wireDiameter / d.wireDiameter),
    accuracy: (d) => {
      const overlapping = d.turns > 1 && d.pitch < d.wireDiameter;
      return {
        lowerRatio: curvatureFactor(d),
        upperRatio: 1,
        accuracy:
          "The upper value is the centre-line length in a straight wire; the lower one adds the shorter path on the inner side of the bend by the torus law at the helix's own curvature.",
        cautions: overlapping
          ? [
              "The pitch is smaller than the wire diameter: the turns of one layer would run into each other. Give the mean pitch of all layers only if that is meant.",
            ]
          : [],
      };
    },
  },
  formula: "R = \\frac{4\\rho\\,\\ell}{\\pi d^2},\\qquad \\ell = N\\sqrt{(\\pi D)^2+p^2}",
  boundsBasis: "formula-accuracy",
  validity: [
    "Turns insulated from each other, wire diameter less than mean diameter.",
    "The law of the centre line; the bounds show what the curvature can change: (1+√(1−(r/R)²))/2 with the radius of curvature R = (D/2)(1+(p/πD)²).",
  ],
  cautions: [
    AMPACITY_CAUTION,
    "A winding that carries current heats itself: give the temperature that it reaches.",
  ],
  assumptions: [
    "The wire keeps its round section when bent; the leads are not included.",
    "DC: the crowding of current at high frequency is not included.",
  ],
  sources: [
    { title: "Length of a helix", detail: "ℓ = N·√((πD)²+p²)", provenance: "derived here" },
    {
      title: "Conducting sheets across the wire and insulating walls along it",
      detail:
        "sheets across the wire turn each piece into a torus piece and can only lower R; walls along parallel curves can only raise it, and their mean length is the centre line's",
      provenance: "derived here",
    },
  ],
  example: {
    dimensions: { turns: 137, meanDiameter: "10.3 mm", pitch: "0.61 mm", wireDiameter: "0.5 mm" },
    medium: { material: "copper-annealed" },
  },
  drawing: (d) => drawHelix(d),
});

interface Helix {
  readonly turns: number;
  readonly meanDiameter: number;
  readonly pitch: number;
  readonly wireDiameter: number;
}

function wireLength({ turns, meanDiameter, pitch }: Helix): number {
  return turns * Math.hypot(Math.PI * meanDiameter, pitch);
}

/** Resistance of a bent round wire over that of its straight centre line: (1+√(1−x²))/2, x = r/R of curvature. */
function curvatureFactor({ meanDiameter, pitch, wireDiameter }: Helix): number {
  const rise = pitch / (Math.PI * meanDiameter);
  const x = wireDiameter / meanDiameter / (1 + rise * rise);
  return (1 + Math.sqrt((1 - x) * (1 + x))) / 2;
}

/** At most so many turns are drawn; the picture says how many there are. */
const DRAWN_TURNS = 8;

function drawHelix({ turns, meanDiameter, pitch, wireDiameter }: Helix): Drawing {
  const drawn = Math.min(turns, DRAWN_TURNS);
  const radius = meanDiameter / 2;
  const half = wireDiameter / 2;
  const perTurn = 32;
  const count = Math.max(2, Math.ceil(drawn * perTurn));
  const at = (turn: number, shift: number): Point => [
    turn * pitch + shift,
    -radius * Math.cos(2 * Math.PI * turn),
  ];
  const turnsAlong = Array.from({ length: count + 1 }, (_, i) => (drawn * i) / count);
  const ribbon = [
    ...turnsAlong.map((turn) => at(turn, -half)),
    ...turnsAlong.map((turn) => at(turn, half)).reverse(),
  ];
  const end = (turn: number) => polyline([at(turn, -half), at(turn, half)]);
  const quarter = Math.min(0.25, drawn / 4);
  return {
    views: [
      {
        title: "side view",
        conductor: [polyline(ribbon, true)],
        lines: [
          {
            ...polyline([
              [-pitch / 2 - half, 0],
              [drawn * pitch + pitch / 2 + half, 0],
            ]),
            style: "axis",
          },
        ],
        high: [end(0)],
        low: [end(drawn)],
        flow: [{ from: at(quarter / 2, 0), to: at(quarter * 1.5, 0) }],
        dimensions: [
          ...(drawn >= 1.5
            ? [{ name: "pitch", from: at(0.5, 0), to: at(1.5, 0), kind: "linear" as const, offset: 1 }]
            : []),
          { name: "meanDiameter", from: [-half, radius], to: [-half, -radius], kind: "linear", offset: 1 },
        ],
      },
      {
        title: "section of the wire",
        conductor: [circle([0, 0], half)],
        high: [],
        low: [],
        flow: [],
        dimensions: [{ name: "wireDiameter", from: [0, 0], to: [half, 0], kind: "leader" }],
      },
    ],
    description: `A helical winding of ${turns} turns seen from the side${turns > DRAWN_TURNS ? `, the first ${DRAWN_TURNS} of them drawn` : ""}, and the round section of its wire; the current follows the wire from end to end.`,
  };
}
