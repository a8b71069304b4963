import { resistanceBlock } from "./call-blocks";
import type { DocPage } from "./page";

export const operatingPoint: DocPage = {
  slug: "operating-point",
  title: "Operating point",
  summary: "Temperature, and one of voltage, current and power, from which the others follow.",
  sections: ({ origin }) => [
    {
      id: "members",
      title: "Members",
      blocks: [
        "`operating.temperature` is the temperature at which the medium is evaluated, 20 °C where left out; it is uniform unless the medium has a [temperature profile](/docs/media#profiles). At most one of `voltage`, `current` and `power` may be given; the answer then has all three.",
        resistanceBlock(
          origin,
          {
            shape: "bar",
            dimensions: { length: "1.2 m", width: "50 mm", thickness: "10 mm" },
            medium: { material: "copper-annealed" },
            operating: { temperature: "75 degC", current: "630 A" },
          },
          {
            typescript: [
              "console.log(answer.resistance.text, answer.operating.voltage, answer.operating.power);",
            ],
            python: ["print(answer.resistance.text, answer.operating.voltage, answer.operating.power)"],
          },
          "µΩ",
        ),
      ],
    },
    {
      id: "peak",
      title: "Peak and profile",
      blocks: [
        '`include: ["peak", "profile"]` adds the largest field strength and current density, and 101 samples along the flow from the high terminal. With an operating point they hold there, without one per volt; `per` says which.',
      ],
    },
    {
      id: "not",
      title: "What it is not",
      blocks: [
        {
          caution:
            "The temperature is an input. The service computes no heating: whether a part stays at that temperature under that current, its ampacity and its insulation are for the local code and a competent engineer.",
        },
      ],
    },
  ],
};
