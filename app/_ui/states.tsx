import type { ReactNode } from "react";

interface EmptyProps {
  readonly title: string;
  /** What to do first. */
  readonly children?: ReactNode;
  readonly action?: ReactNode;
}

/** Nothing is here yet: says what would be, and what to do first. */
export function EmptyState({ title, children, action }: EmptyProps) {
  return (
    <div className="rounded border border-dashed border-edge px-2 py-4 text-center">
      <p className="font-medium">{title}</p>
      {children ? (
        <div className="mx-auto mt-0.5 max-w-[52ch] text-table text-ink-soft">{children}</div>
      ) : null}
      {action ? <div className="mt-2">{action}</div> : null}
    </div>
  );
}

interface LoadingProps {
  /** What is on its way: "the plots". */
  readonly what: string;
  /** Takes the height that the full state will have, so that nothing moves when it comes. */
  readonly className?: string;
}

/** Something is on its way; keeps its place. */
export function Loading({ what, className = "" }: LoadingProps) {
  return (
    <div
      role="status"
      className={`grid place-items-center rounded border border-rule text-table text-ink-soft ${className}`}
    >
      <span className="animate-pulse motion-reduce:animate-none">Loading {what} …</span>
    </div>
  );
}
