"use client";

import { type ReactNode, useEffect, useRef, useState } from "react";

/** How far outside the window a place counts as near, px. A phone's page is longer, and is thrown past faster. */
const AHEAD = 400;
const AHEAD_NARROW = 1500;
const NARROW = 768;

/** Shows its content once its place comes near the window, so that what nobody looks at is not loaded. */
export function WhenSeen({
  children,
  fallback,
}: {
  readonly children: ReactNode;
  readonly fallback: ReactNode;
}) {
  const place = useRef<HTMLDivElement>(null);
  const [seen, setSeen] = useState(false);
  useEffect(() => {
    const element = place.current;
    if (!element || seen) return;
    const observer = new IntersectionObserver(
      ([entry]) => {
        if (entry.isIntersecting) setSeen(true);
      },
      { rootMargin: `${window.innerWidth < NARROW ? AHEAD_NARROW : AHEAD}px` },
    );
    observer.observe(element);
    return () => observer.disconnect();
  }, [seen]);
  return <div ref={place}>{seen ? children : fallback}</div>;
}
