import "server-only";
import Papa from "papaparse";
import { z } from "zod";
import { csv, type PageAnswer } from "../../_server/page-call";

/** Rows of one exported table. */
export const MOST_EXPORTED = 100_000;

/** Query of a list of the console; `columns` may be sorted by, the first of `sort` where nothing is said. */
export function listQuery<Names extends string>(
  columns: readonly [Names, ...Names[]],
  usual: `-${Names}` | Names,
) {
  const orders = columns.flatMap((name): (Names | `-${Names}`)[] => [name, `-${name}`]);
  return z.object({
    page: z.coerce.number().int().min(1).max(1_000_000).default(1),
    size: z.coerce.number().int().min(1).max(200).default(50),
    sort: z
      .string()
      .default(usual)
      .refine((text): text is Names | `-${Names}` => orders.some((order) => order === text), {
        message: `must be one of ${orders.join(", ")}.`,
      }),
    q: z.string().trim().max(200).default(""),
    csv: z.enum(["1"]).optional(),
  });
}

interface Paging {
  readonly page: number;
  readonly size: number;
  readonly sort: string;
  readonly csv?: "1";
}

/** How a query reads its page: an export takes all rows there may be. */
export function paging({ page, size, sort, csv: exported }: Paging) {
  return {
    order: { by: sort.replace(/^-/, ""), descending: sort.startsWith("-") },
    limit: exported ? MOST_EXPORTED : size,
    offset: exported ? 0 : (page - 1) * size,
  };
}

/** A table as a file: a row a line, the titles first. A cell that a spreadsheet would run as a formula is text. */
export function csvAnswer<Row>(
  fileName: string,
  columns: Readonly<Record<string, (row: Row) => string | number | boolean | null>>,
  rows: readonly Row[],
): PageAnswer {
  const titles = Object.keys(columns);
  const lines = rows.map((row) => titles.map((title) => columns[title](row) ?? ""));
  return csv(Papa.unparse([titles, ...lines], { escapeFormulae: true }), fileName);
}
