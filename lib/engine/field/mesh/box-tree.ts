const LEAF = 8;

/**
 * Boxes in an implicit binary tree over leaves of eight, for items that lie near each other when their numbers do. A box is
 * four numbers: minX, minY, maxX, maxY.
 */
export class BoxTree {
  private readonly boxes: Float64Array;
  private readonly leaves: number;

  constructor(
    private readonly count: number,
    boxOf: (item: number, box: Float64Array) => void,
  ) {
    let leaves = 1;
    while (leaves * LEAF < count) leaves *= 2;
    this.leaves = leaves;
    this.boxes = new Float64Array(8 * leaves);
    const { boxes } = this;
    for (let k = 0; k < boxes.length; k += 4) {
      boxes[k] = boxes[k + 1] = Infinity;
      boxes[k + 2] = boxes[k + 3] = -Infinity;
    }
    const box = new Float64Array(4);
    for (let i = 0; i < count; i++) {
      boxOf(i, box);
      this.grow(leaves + Math.floor(i / LEAF), box, 0);
    }
    for (let node = leaves - 1; node >= 1; node--) {
      this.grow(node, boxes, 8 * node);
      this.grow(node, boxes, 8 * node + 4);
    }
  }

  private grow(node: number, from: Float64Array, at: number): void {
    const { boxes } = this;
    const k = 4 * node;
    boxes[k] = Math.min(boxes[k], from[at]);
    boxes[k + 1] = Math.min(boxes[k + 1], from[at + 1]);
    boxes[k + 2] = Math.max(boxes[k + 2], from[at + 2]);
    boxes[k + 3] = Math.max(boxes[k + 3], from[at + 3]);
  }

  /** Distance from a point to the box of a node; Infinity for an empty one. */
  private distance(node: number, x: number, y: number): number {
    const { boxes } = this;
    const k = 4 * node;
    const dx = Math.max(0, boxes[k] - x, x - boxes[k + 2]);
    const dy = Math.max(0, boxes[k + 1] - y, y - boxes[k + 3]);
    return dx > dy ? dx * Math.sqrt(1 + (dy / dx) ** 2) : dy === 0 ? 0 : dy * Math.sqrt(1 + (dx / dy) ** 2);
  }

  /**
   * Visits the items of every leaf whose box comes within reach of the point, near ones first. `visit` answers the new reach:
   * the same for all items within a distance, a shrinking one for the nearest item, negative to stop.
   */
  search(x: number, y: number, reach: number, visit: (item: number) => number): void {
    const stack = [1];
    let limit = reach;
    while (stack.length > 0) {
      const node = stack.pop() as number;
      if (!(this.distance(node, x, y) <= limit)) continue;
      if (node >= this.leaves) {
        const first = (node - this.leaves) * LEAF;
        const last = Math.min(first + LEAF, this.count);
        for (let i = first; i < last; i++) limit = visit(i);
        continue;
      }
      const near = this.distance(2 * node, x, y) <= this.distance(2 * node + 1, x, y) ? 0 : 1;
      stack.push(2 * node + 1 - near, 2 * node + near);
    }
  }
}
