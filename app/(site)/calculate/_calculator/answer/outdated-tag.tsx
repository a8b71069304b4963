interface OutdatedTagProps {
  readonly children: string;
  readonly className?: string;
}

/** Says on what is dimmed why it is: it does not belong to what the fields say. */
export function OutdatedTag({ children, className = "" }: OutdatedTagProps) {
  return (
    <span className={`rounded border border-amber bg-sheet px-0.5 text-small text-amber ${className}`}>
      {children}
    </span>
  );
}

/** The look of an answer that belongs to an earlier input; still easy to read. */
export const OUTDATED = "[&_*]:text-ink-soft!";
