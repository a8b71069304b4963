import type { FieldResult } from "@/lib/engine";

interface Bounded {
  readonly value: number | null;
  readonly lower: number;
  readonly upper: number | null;
}

/** Every resistance of a result: the one between two terminals, or those of the pairs. */
function resistancesOf({ resistance, pairs = [] }: FieldResult): Bounded[] {
  return resistance ? [resistance] : pairs.flatMap(({ floating, grounded }) => [floating, grounded]);
}

/**
 * How a field solution differs from the same one before: (now − before)/before of the resistance, or of that pair which
 * changed most; and whether values and bounds are the same to the last bit.
 */
export function fieldDrift(before: FieldResult, now: FieldResult): { drift: number; identical: boolean } {
  const [was, is] = [resistancesOf(before), resistancesOf(now)];
  const drifts = was.map(({ value }, k) => {
    const other = is[k].value;
    return value === null || other === null ? 0 : (other - value) / value;
  });
  return {
    drift: drifts.reduce((most, drift) => (Math.abs(drift) > Math.abs(most) ? drift : most), 0),
    identical: was.every(
      ({ value, lower, upper }, k) => value === is[k].value && lower === is[k].lower && upper === is[k].upper,
    ),
  };
}
