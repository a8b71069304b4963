"use client";

import { useEffect, useState } from "react";

/** Width of the frame in pixels, at least 220; text in a plot then has its true size everywhere. */
export function useWidth(frame: { readonly current: HTMLElement | null }): number {
  const [width, setWidth] = useState(600);
  useEffect(() => {
    const element = frame.current;
    if (!element) return;
    const observer = new ResizeObserver(([entry]) =>
      setWidth(Math.max(220, Math.round(entry.contentRect.width))),
    );
    observer.observe(element);
    return () => observer.disconnect();
  }, [frame]);
  return width;
}
