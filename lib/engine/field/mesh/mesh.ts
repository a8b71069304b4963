/**
 * The mesh that outline work hands to the elements.
 *
 * All coordinates are those of the domain: shifted to its middle and scaled by a power of two so that its largest
 * extent lies in (0.5, 1]; a sheet's resistance in squares does not change by that.
 */

/** What a boundary edge belongs to. Edges of one side are contiguous along one ring. */
export interface BoundarySide {
  /** Ring of the outline: 0 is the outer one, 1… the holes in the order given. */
  readonly ring: number;
  /** Index of the terminal in the request, or -1 for an insulated side. */
  readonly terminal: number;
  /** The side lies on the axis x = 0 of an axisymmetric outline; no current passes it. Its terminal is -1. */
  readonly axis?: true;
}

export interface FieldMesh {
  /** Vertex coordinates, interleaved x0, y0, x1, y1, … */
  readonly xy: Float64Array;
  /**
   * Three vertex indices a triangle, counter-clockwise. The refinement edge of newest-vertex bisection is the one
   * opposite the first vertex (from the second to the third).
   */
  readonly triangles: Int32Array;
  /** Medium of each triangle: 0 is the background, k the k-th region. */
  readonly region: Int32Array;
  /** Three integers an edge: vertices a, b with the conductor on the left of a→b, and the index of its side. */
  readonly boundary: Int32Array;
  readonly sides: readonly BoundarySide[];
}
