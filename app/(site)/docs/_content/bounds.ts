import { resistanceBlock } from "./call-blocks";
import type { DocPage } from "./page";

/** Each basis, where its bounds come from, and whether they are proved. */
export const BASES: readonly (readonly [basis: string, from: string, proved: string])[] = [
  ["rounding", "a closed form or a converged series; only the rounding of the computation remains", "yes"],
  [
    "rayleigh",
    "perfectly conducting sheets laid across the flow give the lower value, insulating walls laid along it the upper one",
    "yes",
  ],
  [
    "energy",
    "two field solutions, of the potential and of its conjugate, whose energies lie on either side of the true value",
    "yes",
  ],
  [
    "energy-quadrature",
    "the same where the conductivity varies inside the elements, so that their integrals are estimated",
    "no",
  ],
  ["elements", "of a network: all elements at their lowest and all at their highest", "where all theirs are"],
  ["quadrature", "the error estimate of a numerical integral", "no"],
  ["formula-accuracy", "a published formula and its stated accuracy", "no"],
];

export const bounds: DocPage = {
  slug: "bounds",
  title: "Bounds",
  summary: "Every resistance comes between a lower and an upper value; this says what they promise.",
  sections: ({ origin }) => [
    {
      id: "promise",
      title: "The promise",
      blocks: [
        "`lower ≤ value ≤ upper`, and the interval never has zero width. The bounds are about the stated problem: these dimensions, this medium, perfect terminals, direct current. Whether the drawing and the material data are right is a separate statement.",
        "`proved` tells whether the bounds hold with mathematical certainty up to rounding that is accounted for. Where it is false they are an estimate or a published accuracy, and the answer says so.",
      ],
    },
    {
      id: "bases",
      title: "What each basis means",
      blocks: [
        {
          table: {
            head: ["boundsBasis", "where the bounds come from", "proved"],
            rows: BASES.map(([basis, from, proved]) => [`\`${basis}\``, from, proved]),
          },
        },
      ],
    },
    {
      id: "wide",
      title: "Why some intervals are wide",
      blocks: [
        "A strip that tapers steeply between flat ends has no closed form. Its two Rayleigh bounds are proved, and the steeper the taper the farther they lie apart. If the interval is too wide for your purpose, draw the part as an [outline](/docs/fields): a field solution closes the bracket as far as you ask.",
        resistanceBlock(
          origin,
          {
            shape: "tapered-strip",
            dimensions: { length: "30 mm", startWidth: "5 mm", endWidth: "20 mm", thickness: "1 mm" },
            medium: { material: "copper-annealed" },
          },
          {
            typescript: [
              "const { lower, upper, boundsBasis, proved } = answer.resistance;",
              "console.log(lower, upper, boundsBasis, proved);",
            ],
            python: [
              "found = answer.resistance",
              "print(found.lower, found.upper, found.bounds_basis, found.proved)",
            ],
          },
          "rayleigh",
        ),
      ],
    },
    {
      id: "requirement",
      title: "A requirement and its verdict",
      blocks: [
        '`requirement: { "min": …, "max": … }` in a request adds `verdict`: `met` or `not-met` only if the bounds lie wholly on one side of the limit, else `undecided`. An undecided verdict is an honest one: the limit lies inside the interval.',
      ],
    },
    {
      id: "checks",
      title: "Checks",
      blocks: [
        "Every answer is tested before it leaves. `voltage-independence` integrates the current at two voltages, `current-continuity` compares the current through sections along the flow, `second-route` compares the closed form with the integral. A check that does not apply to a shape says why. One that fails is a defect of the engine: the call is answered with 500 and nothing is stored.",
      ],
    },
  ],
};
