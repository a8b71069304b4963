/** A perceptually even ramp between two colours, by straight lines in OKLab (B. Ottosson, 2020; from memory). */

type Triple = readonly [number, number, number];

/** Paper to copper: light for little current, deep for much; lines stay legible on both. */
const PAPER = "#f6f1e7";
const COPPER = "#c0733f";

/** Colours at `count` even places, as #rrggbb. */
export function densityRamp(count: number): string[] {
  const from = toLab(PAPER);
  const to = toLab(COPPER);
  return Array.from({ length: count }, (_, k) => {
    const t = count === 1 ? 0 : k / (count - 1);
    return toHex([0, 1, 2].map((i) => from[i] + t * (to[i] - from[i])) as unknown as Triple);
  });
}

function toLab(hex: string): Triple {
  const [r, g, b] = [1, 3, 5].map((i) => linear(parseInt(hex.slice(i, i + 2), 16) / 255));
  const l = Math.cbrt(0.4122214708 * r + 0.5363325363 * g + 0.0514459929 * b);
  const m = Math.cbrt(0.2119034982 * r + 0.6806995451 * g + 0.1073969566 * b);
  const s = Math.cbrt(0.0883024619 * r + 0.2817188376 * g + 0.6299787005 * b);
  return [
    0.2104542553 * l + 0.793617785 * m - 0.0040720468 * s,
    1.9779984951 * l - 2.428592205 * m + 0.4505937099 * s,
    0.0259040371 * l + 0.7827717662 * m - 0.808675766 * s,
  ];
}

function toHex([L, a, b]: Triple): string {
  const l = (L + 0.3963377774 * a + 0.2158037573 * b) ** 3;
  const m = (L - 0.1055613458 * a - 0.0638541728 * b) ** 3;
  const s = (L - 0.0894841775 * a - 1.291485548 * b) ** 3;
  const channels = [
    4.0767416621 * l - 3.3077115913 * m + 0.2309699292 * s,
    -1.2684380046 * l + 2.6097574011 * m - 0.3413193965 * s,
    -0.0041960863 * l - 0.7034186147 * m + 1.707614701 * s,
  ];
  return `#${channels.map((c) => hexByte(gamma(Math.min(1, Math.max(0, c))))).join("")}`;
}

function hexByte(value: number): string {
  return Math.round(255 * value)
    .toString(16)
    .padStart(2, "0");
}

/** sRGB transfer function (IEC 61966-2-1). */
function linear(c: number): number {
  return c <= 0.04045 ? c / 12.92 : ((c + 0.055) / 1.055) ** 2.4;
}

function gamma(c: number): number {
  return c <= 0.0031308 ? 12.92 * c : 1.055 * c ** (1 / 2.4) - 0.055;
}
