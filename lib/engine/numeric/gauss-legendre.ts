/** Gauss–Legendre rules on [0, 1]: exact for polynomials up to degree 2n − 1. */

export interface Rule {
  readonly nodes: Float64Array;
  readonly weights: Float64Array;
}

const rules: (Rule | undefined)[] = [];

/** The n-point rule, 1 ≤ n ≤ 200, computed once by Newton's method on the Legendre polynomial; good to a few ulp. */
export function gaussLegendre(n: number): Rule {
  const known = rules[n];
  if (known) return known;
  if (!Number.isInteger(n) || n < 1 || n > 200) throw new RangeError(`no Gauss–Legendre rule of ${n} points`);
  const nodes = new Float64Array(n);
  const weights = new Float64Array(n);
  for (let i = 0; i < n; i++) {
    let x = Math.cos((Math.PI * (i + 0.75)) / (n + 0.5));
    // The start is within the basin of the root; a few steps reach rounding.
    for (let step = 0; step < 10; step++) {
      const { value, slope } = legendre(n, x);
      const change = value / slope;
      x -= change;
      if (Math.abs(change) < 1e-17) break;
    }
    if (2 * i + 1 === n) x = 0;
    const { slope } = legendre(n, x);
    nodes[n - 1 - i] = (1 + x) / 2;
    weights[n - 1 - i] = 1 / ((1 - x * x) * slope * slope);
  }
  const rule = { nodes, weights };
  rules[n] = rule;
  return rule;
}

function legendre(n: number, x: number): { value: number; slope: number } {
  let before = 1;
  let value = x;
  for (let k = 1; k < n; k++) {
    const next = ((2 * k + 1) * x * value - k * before) / (k + 1);
    before = value;
    value = next;
  }
  if (n === 1) return { value: x, slope: 1 };
  return { value, slope: (n * (x * value - before)) / (x * x - 1) };
}
