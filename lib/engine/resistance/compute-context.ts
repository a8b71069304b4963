import type { Material } from "../medium/material";

/** What a computation may ask of the world outside the engine. */
export interface ComputeContext {
  /** The material of that id which the caller may use, or undefined. */
  readonly material: (id: string) => Material | undefined;
  /** Asked now and then in long work; true ends it with a complaint. The engine itself has no clock. */
  readonly overdue?: () => boolean;
}
