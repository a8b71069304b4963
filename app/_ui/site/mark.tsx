/** The mark: a hatched conductor between its two terminals. */
export function Mark({ className = "" }: { readonly className?: string }) {
  return (
    <svg viewBox="0 0 28 20" aria-hidden className={className}>
      <path d="M5 4h18v12H5z" className="fill-copper/12 stroke-ink" strokeWidth="1" />
      <path d="m6 15 10-10M11 15l10-10M16 15l6-6M6 10l5-5" className="stroke-copper" strokeWidth="1.2" />
      <path d="M4 2v16" className="stroke-copper" strokeWidth="3" />
      <path d="M24 2v16" className="stroke-verdigris" strokeWidth="3" />
    </svg>
  );
}
