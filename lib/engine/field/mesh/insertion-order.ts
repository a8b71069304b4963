/**
 * An order in which to insert points so that each is near the one before: rounds of doubling size, chosen at random
 * (but always alike), each along a Hilbert curve (N. Amenta, S. Choi, G. Rote, Symposium on Computational Geometry
 * 2003). It keeps insertion near n log n for points on curves, too. Coordinates within [-1, 1]; at most 2^20 points.
 */
export function insertionOrder(xy: Float64Array, count: number): Int32Array {
  const order = new Int32Array(count);
  if (count <= 40) {
    for (let i = 0; i < count; i++) order[i] = i;
    return order;
  }
  const keys = new Float64Array(count);
  const rounds = Math.max(1, Math.floor(Math.log2(count)) - 4);
  let state = 0x2545f491;
  for (let i = 0; i < count; i++) {
    state ^= state << 13;
    state ^= state >>> 17;
    state ^= state << 5;
    // Half of all points go into the last round, a quarter into the one before, and so on.
    const round = Math.max(0, rounds - Math.min(rounds, trailingOnes(state)));
    keys[i] = (round * 0x10000000 + hilbertIndex(xy[2 * i], xy[2 * i + 1])) * 0x100000 + i;
  }
  keys.sort();
  for (let i = 0; i < count; i++) order[i] = keys[i] % 0x100000;
  return order;
}

function trailingOnes(bits: number): number {
  let n = 0;
  while ((bits & 1) === 1 && n < 31) {
    bits >>>= 1;
    n++;
  }
  return n;
}

/** Position along a Hilbert curve of 2^14 by 2^14 cells over [-1, 1]². */
export function hilbertIndex(x: number, y: number): number {
  let column = Math.max(0, Math.min(16383, ((x + 1) * 8192) | 0));
  let row = Math.max(0, Math.min(16383, ((y + 1) * 8192) | 0));
  let index = 0;
  for (let s = 8192; s > 0; s >>= 1) {
    const right = (column & s) > 0 ? 1 : 0;
    const upper = (row & s) > 0 ? 1 : 0;
    index += s * s * ((3 * right) ^ upper);
    if (upper === 0) {
      if (right === 1) {
        column = 16383 - column;
        row = 16383 - row;
      }
      const swap = column;
      column = row;
      row = swap;
    }
  }
  return index;
}
