/** Which layers of the picture are drawn. */
export interface Shown {
  readonly density: boolean;
  readonly equipotentials: boolean;
  readonly streamlines: boolean;
}
