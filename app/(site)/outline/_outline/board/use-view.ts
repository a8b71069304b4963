"use client";

import { type RefObject, useEffect, useMemo, useState } from "react";
import { boxOf } from "../../_model/edges";
import type { Sketch } from "../../_model/sketch";
import { fitView, type Size, type View } from "../../_model/view";

/** Size of the board before it is measured, px. */
const FIRST_SIZE: Size = { width: 720, height: 480 };
const MARGIN = 48;

export interface BoardView {
  readonly size: Size;
  readonly view: View;
  /** A view of the reader's own; null fits the drawing again. */
  readonly setView: (view: View | null) => void;
}

/** The window onto the plane: fits the drawing until the reader moves it, and again when another drawing comes. */
export function useView(frame: RefObject<HTMLElement | null>, sketch: Sketch, generation: number): BoardView {
  const [size, setSize] = useState(FIRST_SIZE);
  const [own, setOwn] = useState<{ readonly view: View; readonly generation: number } | null>(null);
  useEffect(() => {
    const element = frame.current;
    if (!element) return;
    const observer = new ResizeObserver(([entry]) => {
      const { width, height } = entry.contentRect;
      if (width > 0 && height > 0) setSize({ width: Math.round(width), height: Math.round(height) });
    });
    observer.observe(element);
    return () => observer.disconnect();
  }, [frame]);
  const fitted = useMemo(
    () => fitView(boxOf([...sketch.rings, ...sketch.regions.map(({ ring }) => ring)]), size, MARGIN),
    [sketch, size],
  );
  return {
    size,
    view: own?.generation === generation ? own.view : fitted,
    setView: (view) => setOwn(view && { view, generation }),
  };
}
