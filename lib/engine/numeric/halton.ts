/** Points spread evenly through the unit cube (J. H. Halton, Numer. Math. 2 (1960) 84), one prime an axis. */
const PRIMES = primes(64);

/** Point number k ≥ 1 in n ≤ 64 dimensions, each coordinate inside (0, 1). */
export function haltonPoint(k: number, n: number): Float64Array {
  const point = new Float64Array(n);
  for (let i = 0; i < n; i++) {
    const base = PRIMES[i];
    let value = 0;
    for (let rest = k, part = 1 / base; rest > 0; rest = Math.floor(rest / base), part /= base) {
      value += (rest % base) * part;
    }
    point[i] = value;
  }
  return point;
}

function primes(count: number): readonly number[] {
  const found: number[] = [];
  for (let n = 2; found.length < count; n++) if (found.every((p) => n % p !== 0)) found.push(n);
  return found;
}
