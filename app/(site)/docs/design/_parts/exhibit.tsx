import type { ReactNode } from "react";

interface ExhibitProps {
  readonly title: string;
  readonly note: string;
  readonly children: ReactNode;
}

/** One kind of control with what to know about it. */
export function Exhibit({ title, note, children }: ExhibitProps) {
  const id = `exhibit-${title.toLowerCase().replaceAll(" ", "-")}`;
  return (
    <section aria-labelledby={id} className="border-t border-rule pt-2">
      <h2 id={id}>{title}</h2>
      <p className="mb-1.5 text-table text-ink-soft">{note}</p>
      {children}
    </section>
  );
}
