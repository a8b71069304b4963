/** The rest of an elimination that has grown dense: the same star–mesh steps on a full matrix of conductances. */
import { OPERATIONS_A_STRETCH } from "./sparse-elimination";

export class DenseRest {
  /** Conductances above the diagonal, row by row; row p holds those that p had when it was eliminated. */
  readonly matrix: Float64Array;
  /** Potential of the row's node above the column's, above the diagonal, once `differences` has run. */
  readonly difference: Float64Array;
  roundings = 0;

  /** The last two of the `size` nodes are the ports. */
  constructor(
    readonly size: number,
    private readonly wanted: boolean,
  ) {
    this.matrix = new Float64Array(size * size);
    this.difference = wanted ? new Float64Array(size * size) : new Float64Array();
  }

  /** Conductance between the ports. */
  *reduce(): Generator<void, number> {
    const { size, matrix } = this;
    const ratio = new Float64Array(size);
    let operations = 0;
    for (let p = 0; p < size - 2; p++) {
      const row = p * size;
      let sum = 0;
      for (let j = p + 1; j < size; j++) sum += matrix[row + j];
      for (let j = p + 1; j < size; j++) ratio[j] = matrix[row + j] / sum;
      for (let i = p + 1; i < size - 1; i++) {
        const g = matrix[row + i];
        if (g === 0) continue;
        const target = i * size;
        for (let j = i + 1; j < size; j++) matrix[target + j] += g * ratio[j];
      }
      this.roundings += size - p + 2;
      operations += (size - p) ** 2;
      if (operations > 20 * OPERATIONS_A_STRETCH) {
        operations = 0;
        yield;
      }
    }
    return matrix[(size - 2) * size + size - 1];
  }

  /** Differences of potential between all nodes for one volt between the ports. */
  *differences(): Generator<void, void> {
    const { size, matrix, difference } = this;
    if (!this.wanted) return;
    difference[(size - 2) * size + size - 1] = 1;
    const sums = new Float64Array(size);
    const weights = new Float64Array(size);
    let operations = 0;
    for (let p = size - 3; p >= 0; p--) {
      const row = p * size;
      let total = 0;
      for (let j = p + 1; j < size; j++) total += matrix[row + j];
      for (let j = p + 1; j < size; j++) {
        weights[j] = matrix[row + j] / total;
        sums[j] = 0;
      }
      for (let i = p + 1; i < size; i++) {
        const weight = weights[i];
        const own = i * size;
        let below = 0;
        for (let j = i + 1; j < size; j++) {
          const rise = difference[own + j];
          sums[j] += weight * rise;
          below += weights[j] * rise;
        }
        sums[i] -= below;
      }
      for (let j = p + 1; j < size; j++) difference[row + j] = sums[j];
      operations += (size - p) ** 2;
      if (operations > 20 * OPERATIONS_A_STRETCH) {
        operations = 0;
        yield;
      }
    }
  }
}
