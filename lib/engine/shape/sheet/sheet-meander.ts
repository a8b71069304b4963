import { AMPACITY_CAUTION } from "../caution";
import { defineShape } from "../define-shape";
import { lengthDimension } from "../dimension";
import type { Drawing, Point } from "../drawing";
import { cornerModes, cornerSquares } from "./corner-law";
import { endingChange, type Leg } from "./leg-modes";
import { FIELD_TAKES_OVER, longLegFactor } from "./long-leg-factor";
import { edge, outline, upwards } from "./sheet-drawing";

interface Meander {
  readonly legs: number;
  readonly legLength: number;
  readonly width: number;
  readonly gap: number;
}

const CORNER = cornerSquares(1, 1);
const MODES = cornerModes(1);
/** Squares of a corner whose flow is forced to be uniform on both faces: ψ = 1 − (1−x)(1−y), ∫|∇ψ|² = 2/3. */
const WALLED_CORNER = 2 / 3;

/** A meander: its legs, its turns and two corners a turn; the bounds hold what the corners' nearness can change. */
export const sheetMeander = defineShape({
  id: "sheet-meander",
  title: "Meander",
  family: "sheet",
  summary:
    "A strip of thin sheet folded into parallel legs with square turns, such as a film resistor or a heater; the current enters across the free end of the first leg and leaves across that of the last.",
  dimensions: {
    legs: {
      type: "integer",
      label: "Legs",
      symbol: "n",
      min: 1,
      max: 100000,
      help: "Number of parallel legs.",
    },
    legLength: lengthDimension(
      "Leg length",
      "ℓ",
      "Length of each leg between the corners, corners excluded; the first and last from their free end to the corner.",
    ),
    width: lengthDimension("Width", "w", "Width of the strip, in legs and turns."),
    gap: lengthDimension("Gap", "g", "Clear distance between neighbouring legs."),
  },
  coordinates: [],
  terminals: { high: "the free end of the first leg", low: "the free end of the last leg" },
  answer: {
    kind: "factor",
    planIsWhole: ({ legs }) => legs <= DRAWN_LEGS,
    factor: ({ legs, legLength, width, gap }) => {
      const turns = legs - 1;
      const [leg, turn] = [legLength / width, gap / width];
      const least = legs * leg + turns * turn;
      return longLegFactor({
        squares: least + 2 * turns * CORNER,
        // Cut half-way between the corners, so half a leg and half a turn count.
        shortest: turns === 0 ? Infinity : Math.min(leg, turn) / 2,
        change: () => nearness(turns, leg, turn),
        least,
      });
    },
    peak: ({ legs, legLength }) =>
      legs === 1
        ? { fieldPerVolt: 1 / legLength, position: "everywhere in the strip" }
        : { fieldPerVolt: null, position: "unbounded at the inner corners of the turns" },
  },
  formula:
    "\\frac{R}{R_\\square}=n\\,\\frac{\\ell}{w}+(n-1)\\left(\\frac gw+2\\left(1-\\tfrac2\\pi\\ln 2\\right)\\right)",
  boundsBasis: "formula-accuracy",
  validity: [
    FIELD_TAKES_OVER,
    "Exact where legs and gap are long against the width; the bounds tell how much the nearness of the corners can change.",
    "The two corners of one turn bend alike and lower the resistance a little, about 0.11·exp(−πg/w) squares a turn.",
  ],
  cautions: [AMPACITY_CAUTION],
  assumptions: ["The sheet is thin and uniform; each free end is at one potential; the corners are sharp."],
  sources: [
    {
      title: "P. M. Hall, Resistance calculations for thin film patterns, Thin Solid Films 1 (1968) 277",
      detail: "corner of equal widths, 1 − (2/π)·ln 2 squares",
      provenance: "from memory",
    },
    {
      title: "Conducting sheets and insulating walls half-way between the corners",
      detail: "bounds for corners that are near to each other",
      provenance: "derived here",
    },
  ],
  example: {
    dimensions: { legs: 8, legLength: "500 um", width: "20 um", gap: "30 um" },
    medium: { sheetResistance: "100 ohm/sq" },
  },
  drawing: drawMeander,
});

/**
 * Most that cutting the meander half-way between its corners can change. Sheets laid there lower R, walls raise it; the
 * free ends are terminals, which only lower it. There is at least one turn.
 */
function nearness(turns: number, leg: number, turn: number): { lowered: number; raised: number } {
  const part = (aspect: number): Leg => ({ modes: MODES, aspect });
  const [inTurn, inLeg, atEnd] = [part(turn / 2), part(leg / 2), part(leg)];
  const endless = part(Infinity);
  const lower = (legs: readonly Leg[]) => Math.min(CORNER, endingChange(legs, CORNER));
  const raise = (legs: readonly Leg[], others: readonly Leg[] = []) =>
    Math.min(WALLED_CORNER - CORNER, endingChange(legs, CORNER, others));
  const inner = 2 * turns - 2;
  return {
    lowered: inner * lower([inTurn, inLeg]) + 2 * lower([inTurn, atEnd]),
    raised: inner * raise([inTurn, inLeg]) + 2 * raise([inTurn], [endless]),
  };
}

/** Most legs that the picture shows one by one. */
const DRAWN_LEGS = 12;

function drawMeander({ legs, legLength, width, gap }: Meander): Drawing {
  const drawn = Math.min(legs, DRAWN_LEGS);
  const pitch = width + gap;
  const last = drawn - 1;
  // Left side of the strip from the first free end on, then back along the other side.
  const there: Point[] = [];
  const back: Point[] = [];
  for (let i = 0; i < drawn; i++) {
    const [left, right] = [i * pitch, i * pitch + width];
    const up = i % 2 === 0;
    const [from, to] = up ? [0, legLength] : [legLength, 0];
    const beyond = (y: number) => (y === 0 ? -width : legLength + width);
    // Seen along the current an upward leg has its left side on the left, a downward one on the right.
    const [near, far] = up ? [left, right] : [right, left];
    there.push([near, i === 0 || up ? from : beyond(from)]);
    there.push([near, i < last && up ? beyond(to) : to]);
    back.push([far, i > 0 && up ? beyond(from) : from]);
    back.push([far, i === last || up ? to : beyond(to)]);
  }
  const start = 0;
  const end = last % 2 === 0 ? legLength : 0;
  return {
    views: [
      {
        title: legs > drawn ? `plan, ${drawn} of ${legs} legs` : "plan",
        conductor: [outline(...there, ...back.reverse())],
        high: [edge([0, start], [width, start])],
        low: [edge([last * pitch, end], [last * pitch + width, end])],
        flow: [
          upwards(0.2 * legLength, 0.6 * legLength, width / 2),
          ...(drawn > 1 ? [upwards(0.8 * legLength, 0.4 * legLength, pitch + width / 2)] : []),
        ],
        dimensions: [
          { name: "legLength", from: [0, 0], to: [0, legLength], kind: "linear", offset: 1 },
          { name: "width", from: [width, 0], to: [0, 0], kind: "linear", offset: 1 },
          ...(drawn > 1
            ? [
                {
                  name: "gap",
                  from: [width, 0.92 * legLength] as Point,
                  to: [pitch, 0.92 * legLength] as Point,
                  kind: "linear" as const,
                  offset: 0,
                },
              ]
            : []),
        ],
      },
    ],
    description: `A meander of ${legs} ${legs === 1 ? "leg" : "parallel legs with square turns"} in plan; the current runs up one leg and down the next from the first free end to the last.`,
  };
}
