/** A share of a whole, 0 … 1, as a bar with its number beside it. */
export function ShareBar({ share, text }: { readonly share: number; readonly text: string }) {
  return (
    <span className="flex items-center gap-1">
      <span aria-hidden className="h-1.5 grow bg-rule">
        <span className="block h-full bg-(--accent,var(--copper))" style={{ width: `${100 * share}%` }} />
      </span>
      <span className="w-7 text-end font-mono tabular-nums">{text}</span>
    </span>
  );
}
