import { resistanceBlock } from "./call-blocks";
import type { DocPage } from "./page";

export const uncertainty: DocPage = {
  slug: "uncertainty",
  title: "Uncertainty",
  summary: "How far the resistance strays with the tolerances of its inputs, by the GUM.",
  sections: ({ origin }) => [
    {
      id: "tolerances",
      title: "Inputs with a tolerance",
      blocks: [
        "Any quantity may be an object with a tolerance in place of a plain value:",
        {
          table: {
            head: ["form", "meaning"],
            rows: [
              ['`{ "value": "10 mm", "tolerance": "0.1 mm" }`', "the same to both sides"],
              ['`{ "value": "10 mm", "tolerance": "1 %" }`', "relative to the value"],
              ['`{ "value": "10 mm", "plus": "0.2 mm", "minus": "0 mm" }`', "different to the two sides"],
            ],
          },
        },
        '`distribution` is `uniform` where left out, or `normal` (the tolerance is then two standard deviations) or `triangular`. A tolerance on a temperature is a difference: `"5 K"`.',
      ],
    },
    {
      id: "methods",
      title: "Three methods",
      blocks: [
        {
          table: {
            head: ["method", "what it answers"],
            rows: [
              [
                "`propagation`",
                "first-order propagation of the standard uncertainties (GUM, JCGM 100): good for small tolerances",
              ],
              ["`worst-case`", "the smallest and the largest resistance in the whole box of tolerances"],
              [
                "`monte-carlo`",
                "random trials (GUM Supplement 1, JCGM 101): good for large tolerances; `trials` and `seed` make it repeatable",
              ],
            ],
          },
        },
        resistanceBlock(
          origin,
          {
            shape: "bar",
            dimensions: {
              length: "1.2 m",
              width: { value: "50 mm", tolerance: "0.3 mm" },
              thickness: { value: "10 mm", tolerance: "1 %" },
            },
            medium: { material: "copper-annealed" },
            uncertainty: { method: "propagation" },
          },
          {
            typescript: [
              "console.log(answer.uncertainty?.text);",
              "for (const { input, share } of answer.uncertainty?.contributions ?? []) console.log(input, share);",
            ],
            python: [
              "print(answer.uncertainty.text)",
              "for part in answer.uncertainty.contributions:",
              "    print(part.input, part.share)",
            ],
          },
          "dimensions.thickness",
        ),
      ],
    },
    {
      id: "answer",
      title: "Reading the answer",
      blocks: [
        "`low` and `high` are the ends of the range, `coverage` the probability that it holds the resistance (0.95, or 1 for the worst case), `standard` the standard uncertainty in ohms. `contributions` is the budget, the largest share first: the input to tighten stands on top.",
        "A material’s stated uncertainty takes part as an input of its own.",
        "[Bounds](/docs/bounds) say how sure the computation is for the numbers as given, uncertainty how far the numbers themselves may stray. The two are not added up.",
      ],
    },
  ],
};
