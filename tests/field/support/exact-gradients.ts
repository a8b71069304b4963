import type Decimal from "decimal.js";
import { edgeFunction, FIRST_INTERIOR } from "@/lib/engine/field/element/basis";

/** Gradient coefficients of one function of unit scale. */
export interface ExactFunction {
  f: number;
  xi: Decimal[];
  eta: Decimal[];
}

/** A polynomial in x and y: coefficient of x^a y^b at [a][b]. */
type Poly = Decimal[][];

/** Gradient coefficients of all functions of order ≤ p at high precision, by exact polynomial algebra. */
export function exactGradients(D: typeof Decimal, p: number): ExactFunction[] {
  const zero = new D(0);
  const constant = (c: number): Poly => [[new D(c)]];
  const x: Poly = [[zero], [new D(1)]];
  const y: Poly = [[zero, new D(1)]];
  const at = (a: Poly, i: number, j: number): Decimal => a[i]?.[j] ?? zero;
  const combine = (a: Poly, b: Poly, s: Decimal | number): Poly => {
    const n = Math.max(a.length, b.length);
    return Array.from({ length: n }, (_, i) =>
      Array.from({ length: Math.max(a[i]?.length ?? 0, b[i]?.length ?? 0) }, (_, j) =>
        at(a, i, j).plus(at(b, i, j).times(s)),
      ),
    );
  };
  const times = (a: Poly, b: Poly): Poly => {
    const out: Poly = [];
    a.forEach((row, i) =>
      row.forEach((c, j) => {
        if (c.isZero()) return;
        b.forEach((other, k) =>
          other.forEach((d, l) => {
            out[i + k] ??= [];
            out[i + k][j + l] = (out[i + k][j + l] ?? zero).plus(c.times(d));
          }),
        );
      }),
    );
    return Array.from(out, (row) => Array.from(row ?? [], (c) => c ?? zero));
  };
  const scaled = (a: Poly, s: Decimal | number): Poly => a.map((row) => row.map((c) => (c ?? zero).times(s)));
  const byX = (a: Poly): Poly => a.slice(1).map((row, i) => row.map((c) => c.times(i + 1)));
  const byY = (a: Poly): Poly => a.map((row) => row.slice(1).map((c, j) => c.times(j + 1)));
  const integral = (a: Poly): Decimal => {
    const factorial = (n: number): Decimal => (n < 2 ? new D(1) : factorial(n - 1).times(n));
    let sum = zero;
    a.forEach((row, i) =>
      row.forEach((c, j) => {
        sum = sum.plus(
          c
            .times(factorial(i))
            .times(factorial(j))
            .div(factorial(i + j + 2)),
        );
      }),
    );
    return sum;
  };
  /** Scaled Jacobi polynomials t^n P_n(s/t) for n ≤ degree. */
  const jacobi = (degree: number, alpha: number, beta: number, s: Poly, t: Poly): Poly[] => {
    const list: Poly[] = [constant(1)];
    for (let k = 0; k < degree; k++) {
      const sum = alpha + beta;
      let a: Decimal;
      let b: Decimal;
      let c = zero;
      if (k === 0) [a, b] = [new D(sum + 2).div(2), new D(alpha - beta).div(2)];
      else {
        const n = k + 1;
        const m = 2 * n + sum;
        const d = new D(2 * n * (n + sum) * (m - 2));
        a = new D((m - 1) * m * (m - 2)).div(d);
        b = new D((m - 1) * (alpha * alpha - beta * beta)).div(d);
        c = new D(2 * (n + alpha - 1) * (n + beta - 1) * m).div(d);
      }
      let next = combine(scaled(times(s, list[k]), a), times(t, list[k]), b);
      if (k > 0) next = combine(next, times(times(t, t), list[k - 1]), c.neg());
      list.push(next);
    }
    return list;
  };
  const one = constant(1);
  const bary = [combine(combine(one, x, -1), y, -1), x, y];
  const functions: { f: number; poly: Poly; order: number }[] = [];
  for (let i = 0; i < 3; i++) {
    const a = bary[(i + 1) % 3];
    const b = bary[(i + 2) % 3];
    const list = jacobi(p - 2, 1, 1, combine(b, a, -1), one);
    for (let k = 2; k <= p; k++) {
      functions.push({ f: edgeFunction(i, k), poly: times(times(a, b), list[k - 2]), order: k });
    }
  }
  const s = combine(bary[1], bary[0], -1);
  const t = combine(bary[1], bary[0], 1);
  const z = combine(scaled(y, 2), one, -1);
  const bubble = times(times(bary[0], bary[1]), bary[2]);
  const acrossList = jacobi(p - 3, 2, 2, s, t);
  for (let i = 0; i + 3 <= p; i++) {
    const upList = jacobi(p - 3 - i, 2 * i + 5, 2, z, one);
    for (let j = 0; i + j + 3 <= p; j++) {
      const n = i + j + 3;
      const f = FIRST_INTERIOR + ((n - 2) * (n - 3)) / 2 + j;
      functions.push({ f, poly: times(bubble, times(acrossList[i], upList[j])), order: n });
    }
  }
  const modes: Poly[] = [];
  const legendre = jacobi(p - 1, 0, 0, s, t);
  for (let i = 0; i < p; i++) {
    const list = jacobi(p - 1 - i, 2 * i + 1, 0, z, one);
    for (let j = 0; i + j < p; j++) {
      const degree = i + j;
      const scale = new D((2 * i + 1) * (2 * degree + 2)).sqrt();
      modes[(degree * (degree + 1)) / 2 + j] = scaled(times(legendre[i], list[j]), scale);
    }
  }
  return functions.map(({ f, poly, order }) => {
    const count = (order * (order + 1)) / 2;
    const gx = byX(poly);
    const gy = byY(poly);
    return {
      f,
      xi: modes.slice(0, count).map((mode) => integral(times(mode, gx))),
      eta: modes.slice(0, count).map((mode) => integral(times(mode, gy))),
    };
  });
}
