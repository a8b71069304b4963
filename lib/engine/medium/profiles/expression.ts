import { z } from "zod";
import { pointerTo } from "../../failure";
import { compileExpression, type Evaluate } from "../expression/compile-expression";
import { defineProfile } from "../profile";
import { complaintAt } from "./smooth-law";

const schema = z
  .strictObject({
    kind: z.literal("expression"),
    value: z.string().meta({
      description:
        "An expression in s (the position in SI: metres or radians) and u (0 at the coordinate's start, 1 at its end), giving SI values.",
      example: "58e6/(1+3*u^2)",
    }),
  })
  .meta({
    description:
      "An expression of at most 1,000 characters: numbers, s, u, pi, e, + − * / ^, comparisons inside if(c, a, b), abs, sqrt, cbrt, exp, log, log10, sin, cos, tan, asin, acos, atan, sinh, cosh, tanh, min, max, erf, erfc.",
    example: { kind: "expression", value: "58e6/(1+3*u^2)" },
  });

/** Places where an expression is looked at before it is integrated: even ones, and ones close to both ends. */
const SAMPLES: readonly number[] = (() => {
  const places = Array.from({ length: 201 }, (_, i) => i / 200);
  for (let p = -3; p >= -12; p--) places.push(10 ** p, 1 - 10 ** p);
  return places.sort((a, b) => a - b);
})();

/** Cuts at which the integration starts: an expression may hide a narrow feature anywhere, most often at an end. */
const CUTS: readonly number[] = (() => {
  const places = Array.from({ length: 15 }, (_, i) => (i + 1) / 16);
  for (const d of [1e-2, 1e-3, 1e-5, 1e-8]) places.push(d, 1 - d);
  return places.sort((a, b) => a - b);
})();

/** An expression in the position. */
export const expressionProfile = defineProfile({
  kind: "expression",
  title: "Expression",
  summary: "An expression in s, the position in SI, and u, which runs from 0 to 1 along the coordinate.",
  tex: "f(s) = f(s, u),\\quad u = \\frac{s - s_0}{s_1 - s_0}",
  schema,
  build: (profile, site) => {
    const pointer = pointerTo(site.pointer, "value");
    const reading = compileExpression(profile.value, ["s", "u"]);
    if (!reading.ok) {
      site.problems.add(pointer, reading.detail);
      return null;
    }
    const { evaluate, nodes, switches } = reading.expression;
    const { start, extent } = site;
    const at = (x: number): number => evaluate(start + x, x / extent);
    for (const u of SAMPLES) {
      const x = u === 1 ? extent : extent * u;
      const complaint = complaintAt(site, x, at(x), site.values);
      if (complaint === null) continue;
      site.problems.add(pointer, complaint);
      return null;
    }
    return {
      count: 1,
      from: [0],
      width: [extent],
      at: (_, t) => at(t),
      quantity: site.values,
      rough: true,
      cost: Math.max(1, nodes / 4),
      hints: [...CUTS.map((u) => u * extent), ...switchPlaces(switches, start, extent)],
      tex: "\\text{expression}",
    };
  },
});

/** Most places where an expression may switch; more are left to the adaptive rule. */
const MOST_SWITCHES = 400;

/**
 * Places x where a switch changes sign, to the last digit: a jump must be a border of the integration, since no rule
 * sees one that lies beyond its outermost node.
 */
function switchPlaces(switches: readonly Evaluate[], start: number, extent: number): number[] {
  const places: number[] = [];
  for (const evaluate of switches) {
    const at = (u: number): number => Math.sign(evaluate(start + u * extent, u));
    let before = at(0);
    for (let i = 1; i < SAMPLES.length && places.length < MOST_SWITCHES; i++) {
      const sign = at(SAMPLES[i]);
      if (sign === 0) places.push(SAMPLES[i] * extent);
      else if (before !== 0 && sign !== before)
        places.push(bisect(at, SAMPLES[i - 1], SAMPLES[i], before) * extent);
      before = sign;
    }
  }
  return places;
}

/** Where the sign leaves `before` between low and high. */
function bisect(at: (u: number) => number, low: number, high: number, before: number): number {
  for (let i = 0; i < 60; i++) {
    const middle = (low + high) / 2;
    if (middle <= low || middle >= high) break;
    if (at(middle) === before) low = middle;
    else high = middle;
  }
  return high;
}
