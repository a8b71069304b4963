import type { CSSProperties, ReactNode } from "react";

interface ScrollFrameProps {
  /** What scrolls in it: it takes the focus, so that keys scroll it. */
  readonly label: string;
  readonly busy?: boolean;
  readonly className?: string;
  readonly style?: CSSProperties;
  readonly children: ReactNode;
}

/** What may be wider than its place scrolls in here; a shade at an edge says that more lies behind it. */
export function ScrollFrame({ label, busy, className = "", style, children }: ScrollFrameProps) {
  return (
    <div
      tabIndex={0}
      role="group"
      aria-label={label}
      aria-busy={busy}
      style={style}
      className={`scroll-shade relative overflow-auto rounded border border-rule ${className}`}
    >
      {children}
    </div>
  );
}
