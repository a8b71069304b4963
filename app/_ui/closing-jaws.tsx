interface JawsProps {
  /** Relative width of the bracket now, at first, and as it is wanted. */
  readonly width: number;
  readonly first: number;
  readonly goal: number;
  /** What it shows, in words. */
  readonly label: string;
}

/** A bracket closing in: two jaws, as far apart as digits are missing. */
export function ClosingJaws({ width, first, goal, label }: JawsProps) {
  const jaw = 42 * (1 - openShare(width, first, goal));
  return (
    <svg
      viewBox="0 0 100 12"
      preserveAspectRatio="none"
      className="block h-3 w-full"
      role="img"
      aria-label={label}
    >
      <rect x="0" y="0" width="100" height="12" className="fill-rule" opacity="0.5" />
      <rect x="0" y="0" width={8 + jaw} height="12" className="fill-copper transition-[width]" />
      <rect x={92 - jaw} y="0" width={8 + jaw} height="12" className="fill-verdigris transition-[width,x]" />
    </svg>
  );
}

/** 1 at the first bracket, 0 at the wanted one, in digits. */
function openShare(width: number, first: number, goal: number): number {
  if (!(width > goal)) return 0;
  if (!(first > goal)) return 0.5;
  return Math.min(1, Math.log(width / goal) / Math.log(first / goal));
}
