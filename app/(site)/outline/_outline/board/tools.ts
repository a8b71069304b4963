import type { Point } from "../../_model/sketch";

/** What the pointer does on the board. */
export type Tool = "shape" | "draw" | "terminal" | "read";

export type DrawTarget = "outer" | "hole" | "region";

/** What is read off the finished field. */
export interface Readings {
  readonly probe: Point | null;
  /** Start and end of the profile. */
  readonly line: readonly [Point, Point] | null;
}
