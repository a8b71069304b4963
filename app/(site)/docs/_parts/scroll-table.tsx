import type { ReactNode } from "react";
import { ScrollFrame } from "../../../_ui/scroll-frame";

/** A table of the docs; where it is too wide it scrolls, and shows that it does. In print it is shown whole. */
export function ScrollTable({ label, children }: { readonly label: string; readonly children: ReactNode }) {
  return (
    <ScrollFrame label={label} className="print:overflow-visible print:border-0">
      <table className="w-full [&_:is(th,td):first-child]:ps-1">{children}</table>
    </ScrollFrame>
  );
}

/** The row of a table's heads. */
export function TableHead({ columns }: { readonly columns: readonly string[] }) {
  return (
    <thead>
      <tr>
        {columns.map((column) => (
          <th key={column} scope="col" className="font-semibold">
            {column}
          </th>
        ))}
      </tr>
    </thead>
  );
}
