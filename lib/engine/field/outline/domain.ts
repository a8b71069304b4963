import type { BoundarySide } from "../mesh/mesh";

/**
 * What is meshed: a planar graph of straight segments in the domain's frame (see `Frame`), every terminal end, region
 * vertex and ring vertex being one of its points.
 */
export interface Domain {
  /** Point coordinates, interleaved. */
  readonly xy: Float64Array;
  /** Two points a segment; a boundary segment a→b has the conductor on its left. */
  readonly segments: Int32Array;
  /** Side of each segment, or -1 for a border between regions inside the conductor. */
  readonly segmentSide: Int32Array;
  readonly sides: readonly BoundarySide[];
  /** Two integers a segment: the region on its left and on its right whose border it is, or 0. */
  readonly segmentRegion: Int32Array;
  /** Length of one unit of the domain, in metres. */
  readonly unitM: number;
  /** Point of the outline, in its own unit, that is the domain's origin. */
  readonly origin: readonly [number, number];
  /** Length of one unit of the domain, in the outline's unit: a power of two. */
  readonly scale: number;
  readonly axisymmetric: boolean;
}
