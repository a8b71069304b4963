/** Whether an accent colour can be seen on the grounds that a widget has. */

export type Theme = "host" | "light" | "dark";

/** Paper and sheet of the look, light and dark. */
const GROUNDS = { light: ["#faf8f3", "#ffffff"], dark: ["#14181a", "#1c2124"] } as const;

/** WCAG 2.2, 1.4.11: graphics and focus. The accent never colours text. */
export const LEAST_CONTRAST = 3;

/** Contrast of two colours `#rrggbb` by WCAG 2.2: 1 to 21. */
export function contrastOf(one: string, other: string): number {
  const [dark, light] = [luminance(one), luminance(other)].sort((a, b) => a - b);
  return (light + 0.05) / (dark + 0.05);
}

function luminance(color: string): number {
  const [red, green, blue] = [1, 3, 5].map((at) => {
    const part = Number.parseInt(color.slice(at, at + 2), 16) / 255;
    return part <= 0.04045 ? part / 12.92 : ((part + 0.055) / 1.055) ** 2.4;
  });
  return 0.2126 * red + 0.7152 * green + 0.0722 * blue;
}

export interface AccentContrast {
  readonly ground: "light" | "dark";
  readonly contrast: number;
  readonly enough: boolean;
}

/** The lowest contrast of an accent on each ground that the widget's theme may bring. */
export function accentContrasts(accent: string, theme: Theme): AccentContrast[] {
  const grounds = theme === "host" ? (["light", "dark"] as const) : [theme];
  return grounds.map((ground) => {
    const contrast = Math.min(...GROUNDS[ground].map((color) => contrastOf(accent, color)));
    return { ground, contrast, enough: contrast >= LEAST_CONTRAST };
  });
}
