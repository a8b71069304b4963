import { callBlock } from "./call-blocks";
import { CALL_LIMITS } from "./call-limits";
import type { DocPage } from "./page";

export const networks: DocPage = {
  slug: "networks",
  title: "Networks",
  summary:
    "Resistances between named nodes: the whole, every node’s voltage, every element’s current and loss.",
  sections: ({ origin }) => [
    {
      id: "call",
      title: "One call",
      blocks: [
        "An element lies between two nodes. It has a `resistance`, or a `request` as `POST /resistance` takes it. `ports` are the two nodes between which the whole is wanted.",
        callBlock(
          origin,
          {
            operation: "solveNetwork",
            method: "POST",
            path: "/networks",
            body: {
              elements: [
                { name: "bar A", between: ["in", "joint"], resistance: "42 uohm" },
                {
                  name: "bar B",
                  between: ["in", "joint"],
                  request: {
                    shape: "bar",
                    dimensions: { length: "1.2 m", width: "50 mm", thickness: "10 mm" },
                    medium: { material: "copper-annealed" },
                  },
                },
                { name: "braid", between: ["joint", "out"], resistance: "18 uohm" },
              ],
              ports: ["in", "out"],
              operating: { current: "630 A", temperature: "65 degC" },
            },
            typescript: [
              "console.log(answer.resistance.text);",
              "for (const { name, share } of answer.elements) console.log(name, share);",
            ],
            python: [
              "print(answer.resistance.text)",
              "for element in answer.elements:",
              "    print(element.name, element.share)",
            ],
          },
          "bar B",
        ),
      ],
    },
    {
      id: "answer",
      title: "What comes back",
      blocks: [
        "`resistance` is that of the whole between the ports. Its bounds come from all elements at their lowest and all at their highest: the whole never falls when an element rises, so the true value lies between.",
        "`nodes` has the voltages, `elements` the current, voltage and power of each and its `share` of the loss: the joint to mend stands out. The operating point’s temperature goes for every element whose request has none of its own.",
      ],
    },
    {
      id: "tolerances",
      title: "How far the whole strays",
      blocks: [
        'An element’s resistance may have a tolerance, `{ "value": "42 uohm", "tolerance": "5 %" }`, and so may the dimensions, media and temperature in its request. With `"uncertainty": { "method": "propagation" }` beside `elements` the answer has an `uncertainty`: the standard uncertainty of the whole, a range of 95 %, and a budget that names the elements, largest share first. Elements count as independent, but those of one material stray together with its stated uncertainty.',
        "`worst-case` is the range between all elements at their lowest and all at their highest; no combination lies outside. A `requirement` is then met only if the whole range meets it. Monte Carlo is for single resistances.",
      ],
    },
    {
      id: "mistakes",
      title: "Mistakes",
      blocks: [
        "An element that nothing joins to the ports, a name used twice or a port that is no node is a 422 that names it, and the nearest name where it looks like a slip. A mistake in an element’s request is told with its pointer, `#/elements/1/request/dimensions/width`.",
      ],
    },
    {
      id: "limits",
      title: "Limits",
      blocks: [
        `At most ${CALL_LIMITS.networkElements} elements and ${CALL_LIMITS.networkBody}. A network costs one computation, or one for each element with a request where there are more.`,
      ],
    },
  ],
};
