/** Axes of plots: units with the prefix that keeps tick labels short, domains, tick labels. */

export interface AxisUnit {
  /** Shown number = value·factor. */
  readonly factor: number;
  readonly label: string;
}

const PREFIXES: readonly (readonly [number, string])[] = [
  [15, "P"],
  [12, "T"],
  [9, "G"],
  [6, "M"],
  [3, "k"],
  [0, ""],
  [-3, "m"],
  [-6, "µ"],
  [-9, "n"],
  [-12, "p"],
  [-15, "f"],
];

/** Units whose name takes a prefix in front; others are shown by a power of ten. */
const PREFIXED = new Set(["m", "V", "V/m", "A/m", "S/m", "Ω·m", "Ω", "A", "W"]);
const MOST_PREFIX: Readonly<Record<string, number>> = { m: 3 };

/** The unit in which the largest of the values reads between 1 and 1000. */
export function axisUnit(values: readonly number[], unit: string): AxisUnit {
  const largest = values.reduce((most, value) => Math.max(most, Math.abs(value)), 0);
  if (!(largest > 0) || !Number.isFinite(largest)) return { factor: 1, label: unit };
  // Engineers quote current densities per square millimetre as soon as they are metallic.
  if (unit === "A/m²" && largest >= 1e5) return powered(largest / 1e6, "A/mm²", 1e-6);
  const exponent = Math.floor(Math.log10(largest) + 1e-12);
  if (PREFIXED.has(unit)) {
    const thousand = Math.min(Math.floor(exponent / 3) * 3, MOST_PREFIX[unit] ?? 15);
    const found = PREFIXES.find(([power]) => power === thousand);
    if (found) return { factor: 10 ** -thousand, label: `${found[1]}${unit}` };
  }
  return powered(largest, unit, 1);
}

function powered(largest: number, unit: string, factor: number): AxisUnit {
  if (largest >= 0.01 && largest < 1e5) return { factor, label: unit };
  const exponent = Math.floor(Math.log10(largest) + 1e-12);
  return { factor: factor * 10 ** -exponent, label: `10${superscript(exponent)} ${unit}` };
}

export function superscript(exponent: number): string {
  return [...String(exponent)].map((c) => (c === "-" ? "⁻" : "⁰¹²³⁴⁵⁶⁷⁸⁹"[Number(c)])).join("");
}

/** A number with four significant digits, as read off a plot. */
export function readOff(value: number): string {
  if (value === 0) return "0";
  const size = Math.abs(value);
  if (size >= 1e-3 && size < 1e6) return String(Number(value.toPrecision(4))).replace("-", "−");
  const [mantissa, exponent] = value.toExponential(3).split("e");
  return `${String(Number(mantissa)).replace("-", "−")}×10${superscript(Number(exponent))}`;
}

/** Label of a tick on a logarithmic axis. */
export function powerLabel(value: number): string {
  const exponent = Math.round(Math.log10(value));
  return exponent >= -2 && exponent <= 3
    ? String(Number(value.toPrecision(3)))
    : `10${superscript(exponent)}`;
}

/** Smallest and largest value; zero is part of a linear axis, so that heights can be compared. */
export function domainOf(values: readonly number[], log: boolean, zero: boolean): readonly [number, number] {
  let [least, most] = [Infinity, -Infinity];
  for (const value of values) {
    if (!Number.isFinite(value) || (log && value <= 0)) continue;
    least = Math.min(least, value);
    most = Math.max(most, value);
  }
  if (least > most) return log ? [0.1, 1] : [0, 1];
  if (log) return least === most ? [least / 2, most * 2] : [least, most];
  if (zero) [least, most] = [Math.min(0, least), Math.max(0, most)];
  return least === most ? [least, least + 1] : [least, most];
}

/** Whether a logarithmic axis can show all of the values. */
export function fitsLog(values: readonly number[]): boolean {
  return values.length > 0 && values.every((value) => value > 0 && Number.isFinite(value));
}
