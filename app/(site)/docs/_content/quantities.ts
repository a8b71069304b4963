import { resistanceBlock } from "./call-blocks";
import type { DocPage } from "./page";

export const quantities: DocPage = {
  slug: "quantities",
  title: "Quantities and units",
  summary: "How numbers are written: bare in SI, or with the unit the drawing has.",
  sections: ({ origin }) => [
    {
      id: "forms",
      title: "Two ways to write a number",
      blocks: [
        "Every dimensional input is a bare number in SI, or a text with its unit. Two exceptions serve people: a bare temperature is in °C, a bare angle in degrees.",
        {
          table: {
            head: ["quantity", "bare number", "as a text"],
            rows: [
              ["length", "m", '`"0.25 mm"`, `"10 mil"`, `"35 um"`, `"1.5 in"`, `"2 ft"`'],
              ["wire diameter", "m", '`"AWG 24"`'],
              ["foil thickness", "m", '`"1 oz/ft^2"` (34.3 µm an ounce)'],
              ["area", "m²", '`"2.5 mm^2"`, `"250 kcmil"`'],
              ["angle", "degrees", '`"90 deg"`, `"1.57 rad"`'],
              ["temperature", "°C", '`"75 degC"`, `"348.15 K"`, `"167 degF"`'],
              ["resistivity", "Ω·m", '`"1.72e-8 ohm m"`, `"1.7 uohm cm"`, `"0.0172 ohm mm^2/m"`'],
              ["conductivity", "S/m", '`"58 MS/m"`, `"0.58 MS/cm"`, `"100 %IACS"`'],
              ["sheet resistance", "Ω a square", '`"50 ohm/sq"`, `"0.5 mohm"`'],
              ["voltage, current, power", "V, A, W", '`"500 V"`, `"630 A"`, `"1.2 kW"`'],
            ],
          },
        },
        "The usual prefixes go with SI units. `µ`, `μ` and `u`, `Ω` and `ohm`, `°C` and `degC` are the same; the space before the unit may be left out.",
        resistanceBlock(
          origin,
          {
            shape: "round-wire",
            dimensions: { diameter: "AWG 24", length: "100 ft" },
            medium: { conductivity: "100 %IACS" },
          },
          undefined,
          "Ω",
        ),
      ],
    },
    {
      id: "refused",
      title: "What is refused",
      blocks: [
        'A wrong kind of unit (`"5 kg"` for a length), a text that cannot be read, a decimal comma, a thousands separator, NaN and infinities are a 422 that points at the field. A value that overflows a double anywhere on the way is a 422 too, never a silent infinity.',
      ],
    },
    {
      id: "outputs",
      title: "Numbers in answers",
      blocks: [
        "Headline results have the value in SI, its unit and a text for people:",
        {
          snippets: [
            {
              language: "json",
              label: "a resistance",
              code: '{ "value": 0.0012345, "unit": "ohm", "text": "1.2345 mΩ" }',
              shownOnly: true,
            },
          ],
        },
        "Lists and arrays for plots are bare SI numbers; the [reference](/docs/api) names the unit of each. Texts are written for reading: with a thin space before the unit, and with no more digits than the bounds carry. Compute with `value`.",
      ],
    },
    {
      id: "alternatives",
      title: "Two names for one thing",
      blocks: [
        "Some dimensions can be given in more than one way, exactly one of which is used: `outerRadius` or `wall`, `spacing` or `gap`, any radius also as the matching diameter. A thin wall that is given as `wall` keeps its digits, where the difference of two radii would lose them. [Each shape’s page](/docs/shapes) lists its alternatives.",
      ],
    },
  ],
};
