import { resistanceBlock } from "./call-blocks";
import { CALL_LIMITS } from "./call-limits";
import type { DocPage } from "./page";

const shell = { innerRadius: "2 mm", outerRadius: "5 mm", length: "1 m" };

export const media: DocPage = {
  slug: "media",
  title: "Media and graded profiles",
  summary: "What fills a shape: a material, a plain resistivity, a sheet resistance, or a law of the place.",
  sections: ({ origin }) => [
    {
      id: "medium",
      title: "The medium",
      blocks: [
        "`medium` is exactly one of these:",
        {
          table: {
            head: ["member", "meaning"],
            rows: [
              [
                '`{ "material": "copper-annealed" }`',
                "a material of the library or of your team, at the operating temperature",
              ],
              ['`{ "resistivity": "1.72e-8 ohm m" }`', "a plain resistivity"],
              ['`{ "conductivity": "58 MS/m" }`', "a plain conductivity"],
              ['`{ "sheetResistance": "50 ohm/sq" }`', "for sheet shapes"],
              ['`{ "graded": { … } }`', "a law of one coordinate, below"],
            ],
          },
        },
        "A plain resistivity or conductivity may have a temperature coefficient, `temperatureCoefficient` in 1/K, and the `referenceTemperature` at which it holds. Sheet shapes take a `thickness` beside a material, resistivity or conductivity. A temperature outside the material’s range is refused unless `extrapolate` is true, and then it is a caution of the answer.",
        resistanceBlock(
          origin,
          {
            shape: "sheet-strip",
            dimensions: { length: "40 mm", width: "2 mm" },
            medium: { material: "copper-annealed", thickness: "35 um" },
            operating: { temperature: "75 degC" },
          },
          undefined,
          "Ω",
        ),
        'Shapes of two media, such as a clad wire or a layered earth, take `media` in place of `medium`: `{ "core": …, "cladding": … }`, `{ "upper": …, "lower": … }`.',
      ],
    },
    {
      id: "graded",
      title: "Graded media",
      blocks: [
        "A shape has coordinates; each runs along the flow or across it. A graded medium names one of them, says whether its values are conductivities or resistivities, and gives a profile. Positions are values of that coordinate, in metres (or degrees) with the coordinate’s own start and end: a radius runs from the inner to the outer radius.",
        resistanceBlock(
          origin,
          {
            shape: "cylindrical-shell",
            dimensions: shell,
            medium: {
              graded: {
                coordinate: "radius",
                quantity: "conductivity",
                profile: { kind: "exponential", from: "1e-12 S/m", to: "1e-10 S/m" },
              },
            },
            include: ["profile"],
          },
          {
            typescript: [
              "console.log(answer.resistance.text, answer.method, answer.profile?.conductivity.length);",
            ],
            python: ["print(answer.resistance.text, answer.method, len(answer.profile.conductivity))"],
          },
          "Ω",
        ),
      ],
    },
    {
      id: "profiles",
      title: "Profiles",
      blocks: [
        {
          table: {
            head: ["kind", "members", "law"],
            rows: [
              ["`constant`", "`value`", "the same everywhere"],
              ["`linear`", "`from`, `to`", "a straight line between the two ends"],
              ["`exponential`", "`from`, `to`", "geometric between the two ends"],
              ["`power`", "`reference`, `at`, `exponent`", "reference·(s/at)^exponent"],
              [
                "`gaussian`",
                "`peak`, `center`, `spread`, `background`",
                "background + (peak − background)·exp(−(s − center)²/(2·spread²))",
              ],
              [
                "`complementary-error`",
                "`surface`, `length`, `background`, `from`: `start` or `end`",
                "background + (surface − background)·erfc(d/length), d the depth from that end",
              ],
              [
                "`layers`",
                "`layers: [{ thickness, value }]`",
                "thicknesses must add up to the coordinate’s range",
              ],
              [
                "`table`",
                "`positions`, `values`, `interpolation`: `linear`, `log`, `monotone-cubic`",
                "must cover the coordinate’s range",
              ],
              ["`expression`", "`value`", "a formula; `s` is the position in SI, `u` runs from 0 to 1"],
              [
                "`temperature`",
                "`material`, `from`, `to`",
                "that material at a temperature linear between the ends",
              ],
              ["`dopant`", "`type`: `n` or `p`, `profile`", "silicon by its dopant density in 1/cm³"],
            ],
          },
        },
        "`temperature` and `dopant` need no `quantity`. `background` is 0 where left out. `log` interpolates the logarithm of the value, `monotone-cubic` follows Fritsch and Carlson.",
      ],
    },
    {
      id: "expressions",
      title: "Expressions",
      blocks: [
        `An expression knows numbers, \`s\`, \`u\`, \`pi\`, \`e\`, the signs \`+ - * / ^\`, comparisons inside \`if(c, a, b)\`, and abs, sqrt, cbrt, exp, log, log10, the trigonometric and hyperbolic functions with sin, cos and tan inverted, min, max, erf and erfc. Multiplication is always written. It may have ${CALL_LIMITS.expression} characters. A value that is no positive number is a 422 that names the place.`,
        resistanceBlock(
          origin,
          {
            shape: "bar",
            dimensions: { length: "100 mm", width: "20 mm", thickness: "2 mm" },
            medium: {
              graded: {
                coordinate: "length",
                quantity: "conductivity",
                profile: { kind: "expression", value: "58e6/(1+3*u^2)" },
              },
            },
          },
          undefined,
          "Ω",
        ),
      ],
    },
    {
      id: "bounds",
      title: "What grading does to bounds",
      blocks: [
        "Along the flow the resistance is an integral of the resistivity, across it the conductance is one of the conductivity. Where the law has no closed form the engine integrates numerically; the bounds are then its error estimate, with `boundsBasis` `quadrature`, and not proved. See [bounds](/docs/bounds).",
      ],
    },
  ],
};
