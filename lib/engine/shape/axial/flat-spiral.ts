import { AMPACITY_CAUTION } from "../caution";
import { defineShape } from "../define-shape";
import { polyline, rectangle, type Drawing, type Point } from "../drawing";

/** A strip in an Archimedean spiral: exact arc length of its centre line over its section, bounded by the curvature. */
export const flatSpiral = defineShape({
  id: "flat-spiral",
  title: "Flat spiral",
  family: "axial",
  summary:
    "A strip of constant width laid out as an Archimedean spiral; the current follows the strip from the inner end to the outer one.",
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
    innerRadius: {
      type: "quantity",
      kind: "length",
      label: "Inner radius",
      symbol: "r₀",
      diameter: "innerDiameter",
      help: "Radius of the centre line at the inner end: inner edge plus half the width.",
    },
    pitch: {
      type: "quantity",
      kind: "length",
      label: "Pitch",
      symbol: "p",
      help: "Growth of the radius per turn: width plus gap.",
    },
    width: { type: "quantity", kind: "length", label: "Width", symbol: "w", help: "Width of the strip." },
    thickness: {
      type: "quantity",
      kind: "length",
      label: "Thickness",
      symbol: "t",
      help: "Thickness of the strip; a copper foil may be given by weight, such as 1 oz/ft^2.",
    },
  },
  constraints: [
    {
      names: ["width", "innerRadius", "pitch"],
      text: "half the width less than the radius of curvature of the centre line at the inner end",
      holds: (d) => d.width / 2 < innerCurvatureRadius(d),
    },
  ],
  coordinates: [
    {
      name: "length",
      role: "along",
      unit: "m",
      label: "Distance along the centre line from the inner end",
      start: "0",
      end: "length of the centre line",
    },
  ],
  terminals: { high: "the inner end of the strip", low: "the outer end of the strip" },
  answer: {
    kind: "flow",
    flow: (d) => ({
      along: {
        coordinate: "length",
        start: 0,
        extent: arcLength(d),
        section: () => d.width * d.thickness,
        line: "on the centre line; it is larger on the inner edge",
      },
      across: [],
    }),
    uniform: (d) => arcLength(d) / d.width / d.thickness,
    accuracy: (d) => ({
      lowerRatio: curvatureFactor(d),
      upperRatio: 1,
      accuracy:
        "The upper value is the centre-line length in a straight strip; the lower one gives the whole strip the arc law at its tightest curvature, that of the inner end.",
      cautions:
        d.turns > 1 && d.width >= d.pitch
          ? [
              "The width is not less than the pitch: neighbouring turns would touch, and the current would take a shorter way.",
            ]
          : [],
    }),
  },
  formula:
    "R = \\frac{\\rho\\,\\ell}{w\\,t},\\qquad \\ell = \\int_0^{2\\pi N}\\!\\sqrt{r^2+b^2}\\,d\\varphi,\\quad r=r_0+b\\varphi,\\ b=\\frac{p}{2\\pi}",
  boundsBasis: "formula-accuracy",
  validity: [
    "Turns insulated from each other: width less than pitch.",
    "The law of the centre line; the bounds show what the curvature can change: x/ln((1+x/2)/(1−x/2)) with x = width over radius of curvature.",
  ],
  cautions: [
    AMPACITY_CAUTION,
    "A winding that carries current heats itself: give the temperature that it reaches.",
  ],
  assumptions: [
    "The ends are cut square to the strip; leads and the bridge from the inner end are not included.",
  ],
  sources: [
    {
      title: "Arc length of an Archimedean spiral",
      detail: "exact, in a form free of cancellation",
      provenance: "derived here",
    },
    {
      title: "Conducting sheets across the strip and insulating walls along it",
      detail:
        "sheets can only lower R and give the arc law piece by piece; walls along parallel curves can only raise it",
      provenance: "derived here",
    },
  ],
  example: {
    dimensions: {
      turns: 13.25,
      innerRadius: "2.1 mm",
      pitch: "0.57 mm",
      width: "0.3 mm",
      thickness: "1 oz/ft^2",
    },
    medium: { material: "copper-annealed" },
  },
  drawing: (d) => drawSpiral(d),
});

interface Spiral {
  readonly turns: number;
  readonly innerRadius: number;
  readonly pitch: number;
  readonly width: number;
}

/**
 * Length of r = r₀ + bφ over N turns in m: ℓ = Q(r₀²+r₁²+b²)/(r₁s₁+r₀s₀) + (b/2)·asinh(2bQ/(r₁s₀+r₀s₁)) with
 * s = √(r²+b²), Q = πN(r₀+r₁). Sums of positive terms only; all lengths are taken over the outer radius.
 */
function arcLength({ turns, innerRadius, pitch }: Spiral): number {
  const outer = innerRadius + pitch * turns;
  const r0 = innerRadius / outer;
  const b = pitch / outer / (2 * Math.PI);
  const s0 = Math.hypot(r0, b);
  const s1 = Math.hypot(1, b);
  const q = Math.PI * turns * (1 + r0);
  const first = q * ((r0 * r0 + s1 * s1) / (s1 + r0 * s0));
  return outer * (first + (b / 2) * Math.asinh((2 * b * q) / (s0 + r0 * s1)));
}

/** Radius of curvature at the inner end, the tightest: (r²+b²)^(3/2)/(r²+2b²). */
function innerCurvatureRadius({ innerRadius, pitch }: Pick<Spiral, "innerRadius" | "pitch">): number {
  const b = pitch / (2 * Math.PI);
  const s = Math.hypot(innerRadius, b);
  const [r, c] = [innerRadius / s, b / s];
  return s / (r * r + 2 * c * c);
}

/** Resistance of a strip bent to the inner end's curvature over that of a straight one: x/ln((1+x/2)/(1−x/2)). */
function curvatureFactor(d: Spiral): number {
  const half = d.width / 2 / innerCurvatureRadius(d);
  return half < 1e-4 ? 1 - (half * half) / 3 : half / Math.atanh(half);
}

/** At most so many whole turns are drawn, with the part of a turn that is left; the picture says how many there are. */
const DRAWN_TURNS = 5;

function drawSpiral({
  turns,
  innerRadius,
  pitch,
  width,
  thickness,
}: Spiral & { readonly thickness: number }): Drawing {
  const drawn = turns < DRAWN_TURNS + 1 ? turns : DRAWN_TURNS + (turns % 1);
  const b = pitch / (2 * Math.PI);
  const edge = (turn: number, side: number): Point => {
    const phi = 2 * Math.PI * turn;
    const r = innerRadius + b * phi;
    const s = Math.hypot(r, b);
    // Outward normal of the centre line, in the polar frame: (r, −b)/s.
    const radial = r + (side * width * r) / (2 * s);
    const around = (-side * width * b) / (2 * s);
    return [radial * Math.cos(phi) - around * Math.sin(phi), radial * Math.sin(phi) + around * Math.cos(phi)];
  };
  const count = Math.max(8, Math.ceil(drawn * 48));
  const turnsAlong = Array.from({ length: count + 1 }, (_, i) => (drawn * i) / count);
  const end = (turn: number) => polyline([edge(turn, -1), edge(turn, 1)]);
  const arrow = Math.min(0.08, drawn / 4);
  return {
    views: [
      {
        title: "plan",
        conductor: [
          polyline(
            [
              ...turnsAlong.map((turn) => edge(turn, -1)),
              ...turnsAlong.map((turn) => edge(turn, 1)).reverse(),
            ],
            true,
          ),
        ],
        high: [end(0)],
        low: [end(drawn)],
        flow: [{ from: edge(drawn / 2 - arrow / 2, 0), to: edge(drawn / 2 + arrow / 2, 0) }],
        dimensions: [
          { name: "innerRadius", from: [0, 0], to: edge(0, 0), kind: "linear", offset: 0 },
          ...(drawn >= 1
            ? [
                {
                  name: "pitch",
                  from: edge(drawn - 1, 0),
                  to: edge(drawn, 0),
                  kind: "linear" as const,
                  offset: 0,
                },
              ]
            : []),
        ],
      },
      {
        title: "section",
        conductor: [rectangle(0, 0, width, thickness)],
        high: [],
        low: [],
        flow: [],
        dimensions: [
          { name: "width", from: [width, 0], to: [0, 0], kind: "linear", offset: 1 },
          { name: "thickness", from: [width, thickness], to: [width, 0], kind: "linear", offset: 1 },
        ],
      },
    ],
    description: `A flat spiral of ${turns} turns in plan${turns > drawn ? `, the inner ${DRAWN_TURNS} or so of them drawn` : ""}; the current follows the strip from the inner end to the outer one.`,
  };
}
