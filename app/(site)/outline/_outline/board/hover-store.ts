import type { Point } from "../../_model/sketch";

/** Where the pointer reads, kept outside of React, so that only what shows it is drawn anew. */
export class HoverStore {
  private point: Point | null = null;
  private readonly listeners = new Set<() => void>();

  readonly subscribe = (listener: () => void): (() => void) => {
    this.listeners.add(listener);
    return () => this.listeners.delete(listener);
  };

  readonly get = (): Point | null => this.point;

  readonly set = (point: Point | null): void => {
    if (point === this.point) return;
    this.point = point;
    this.listeners.forEach((listener) => listener());
  };
}
