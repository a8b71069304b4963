import type { MaterialChoice } from "../_server/material-choices";

/** Ratios of true to nominal resistivity for people. */
export function spreadText({ lower, upper }: MaterialChoice["uncertainty"]): string {
  const below = (1 - lower) * 100;
  const above = (upper - 1) * 100;
  if (below === 0 && above === 0) return "none stated";
  if (above >= 100) return `${round(lower)} to ${round(upper)} times the nominal value`;
  return Math.abs(below - above) < 0.05 * above
    ? `± ${round(above)} % (nominal)`
    : `−${round(below)} … +${round(above)} % (nominal)`;
}

function round(value: number): string {
  return String(Number(value.toPrecision(2)));
}
