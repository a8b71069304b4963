import { callBlock } from "./call-blocks";
import type { DocPage } from "./page";

export const sizing: DocPage = {
  slug: "sizing",
  title: "Sizing",
  summary: "The other way round: which dimension gives the resistance you need.",
  sections: ({ origin }) => [
    {
      id: "call",
      title: "One call",
      blocks: [
        "The body is that of `POST /resistance` with one dimension left out. `solveFor` names it, `target` is the resistance, and `within` limits the range to search.",
        callBlock(
          origin,
          {
            operation: "sizeDimension",
            method: "POST",
            path: "/sizing",
            body: {
              shape: "bar",
              dimensions: { length: "1.2 m", thickness: "10 mm" },
              medium: { material: "copper-annealed" },
              operating: { temperature: "65 degC" },
              solveFor: "width",
              target: "50 uohm",
              within: ["10 mm", "200 mm"],
            },
            typescript: [
              "for (const { dimension, resistance } of answer.solutions) console.log(dimension.text, resistance.text);",
            ],
            python: [
              "for solution in answer.solutions:",
              "    print(solution.dimension.text, solution.resistance.text)",
            ],
          },
          "mm",
        ),
      ],
    },
    {
      id: "answer",
      title: "What comes back",
      blocks: [
        "Every value of the dimension in the range that gives the target, smallest first: some shapes have more than one. Each has its `resistance` with bounds and a `sensitivity`, how much the resistance changes with the dimension. `include`, `requirement` and `uncertainty` work as in a resistance.",
        "A dimension that is a whole number rarely gives the target exactly; then the two numbers on either side are answered, with `exact` false.",
        "`resistance` is computed from `dimension.value` as it stands, and `exact` says whether the target lies within its bounds. A wall much thinner than its radius cannot be told by two radii: then `exact` is false, and a caution says how far off the nearest double is and which input resolves it, such as `wall`. `dimension.text` has as many digits as a request needs.",
        "A sizing can be stored as a [record](/docs/records) as well.",
        "A target out of reach is a 422 that states the resistances at both ends of the range, so that you see on which side to look.",
      ],
    },
    {
      id: "outline",
      title: "The scale of an outline",
      blocks: [
        "With the body of [`POST /fields`](/docs/fields) and two terminals, `solveFor` is `scaleX` or `scaleY`, which stretch the drawing one way, or `scale`, which scales it evenly and the thickness with it. A plan sheet under an even `scale` does not change its resistance, and is refused. It needs the scope `field`, and costs a computation for each field solution made, at most 60.",
      ],
    },
  ],
};
