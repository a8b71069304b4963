/**
 * Seeded random numbers, the same on every machine: xoshiro128** by D. Blackman and S. Vigna (2018), its state filled
 * by splitmix32. Not for secrets.
 */
export class Random {
  private a: number;
  private b: number;
  private c: number;
  private d: number;
  private spare = Number.NaN;

  /** @param seed a whole number 0 … 2³² − 1. */
  constructor(seed: number) {
    let state = seed >>> 0;
    const next = (): number => {
      state = (state + 0x9e3779b9) >>> 0;
      let z = state;
      z = Math.imul(z ^ (z >>> 16), 0x21f0aaad);
      z = Math.imul(z ^ (z >>> 15), 0x735a2d97);
      return (z ^ (z >>> 15)) >>> 0;
    };
    this.a = next();
    this.b = next();
    this.c = next();
    this.d = next();
  }

  /** 32 random bits as a whole number. */
  private bits(): number {
    const x = Math.imul(this.b, 5);
    const result = Math.imul((x << 7) | (x >>> 25), 9) >>> 0;
    const t = this.b << 9;
    this.c ^= this.a;
    this.d ^= this.b;
    this.b ^= this.c;
    this.a ^= this.d;
    this.c ^= t;
    this.d = (this.d << 11) | (this.d >>> 21);
    return result;
  }

  /** Uniform in (0, 1), 53 bits; neither end is ever met. */
  uniform(): number {
    const high = this.bits() >>> 5;
    const low = this.bits() >>> 6;
    return (high * 67_108_864 + low + 0.5) / 9_007_199_254_740_992;
  }

  /** Standard normal, by Marsaglia's polar method. */
  normal(): number {
    if (!Number.isNaN(this.spare)) {
      const value = this.spare;
      this.spare = Number.NaN;
      return value;
    }
    for (;;) {
      const x = 2 * this.uniform() - 1;
      const y = 2 * this.uniform() - 1;
      const s = x * x + y * y;
      if (s >= 1 || s === 0) continue;
      const scale = Math.sqrt((-2 * Math.log(s)) / s);
      this.spare = y * scale;
      return x * scale;
    }
  }
}
