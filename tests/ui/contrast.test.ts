import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";

/** Tokens as the stylesheet has them: light and dark value of each. */
const TOKENS = new Map(
  [
    ...readFileSync("app/_ui/tokens.css", "utf8").matchAll(
      /--([a-z-]+): light-dark\((#[0-9a-f]{6}), (#[0-9a-f]{6})\)/g,
    ),
  ].map(([, name, light, dark]) => [name, { light, dark }]),
);

type Mode = "light" | "dark";

function color(token: string, mode: Mode): string {
  const pair = TOKENS.get(token);
  if (!pair) throw new Error(`There is no token ${token}.`);
  return pair[mode];
}

/** Relative luminance, WCAG 2.2 (https://www.w3.org/TR/WCAG22/#dfn-relative-luminance). */
function luminance(hex: string): number {
  const [red, green, blue] = [1, 3, 5].map((at) => {
    const share = Number.parseInt(hex.slice(at, at + 2), 16) / 255;
    return share <= 0.04045 ? share / 12.92 : ((share + 0.055) / 1.055) ** 2.4;
  });
  return 0.2126 * red + 0.7152 * green + 0.0722 * blue;
}

function contrast(a: string, b: string): number {
  const [dark, light] = [luminance(a), luminance(b)].sort((x, y) => x - y);
  return (light + 0.05) / (dark + 0.05);
}

const GROUNDS = ["paper", "sheet"];
/** 1.4.3 Contrast (Minimum), level AA: 4.5:1 for text. */
const TEXT = ["ink", "ink-soft", "copper", "verdigris", "amber", "oxide"];
/** 1.4.11 Non-text Contrast, level AA: 3:1 for controls, focus and graphics. */
const GRAPHICS = ["edge", "copper", "verdigris", "amber", "oxide"];
/** Text on a filled ground: primary and destructive buttons, the chosen theme, a button under the pointer. */
const ON_FILL = [
  ["sheet", "copper"],
  ["sheet", "oxide"],
  ["paper", "ink"],
  ["sheet", "ink"],
];

describe.each<Mode>(["light", "dark"])("contrast of the tokens, %s", (mode) => {
  it.each(TEXT.flatMap((token) => GROUNDS.map((ground) => [token, ground])))(
    "%s as text on %s",
    (token, ground) => {
      expect(contrast(color(token, mode), color(ground, mode))).toBeGreaterThanOrEqual(4.5);
    },
  );

  it.each(GRAPHICS.flatMap((token) => GROUNDS.map((ground) => [token, ground])))(
    "%s as a line on %s",
    (token, ground) => {
      expect(contrast(color(token, mode), color(ground, mode))).toBeGreaterThanOrEqual(3);
    },
  );

  it.each(ON_FILL)("%s as text on %s", (token, ground) => {
    expect(contrast(color(token, mode), color(ground, mode))).toBeGreaterThanOrEqual(4.5);
  });
});

it("knows the formula: black on white is 21", () => {
  expect(contrast("#000000", "#ffffff")).toBeCloseTo(21, 10);
});
