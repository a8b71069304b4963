import { type Shape, shapeEntry } from "@/lib/engine";
import { csvLine } from "./write-csv";

/**
 * A CSV table to start from for one shape: its columns, and its example as the first row. Of alternatives the one that
 * the example uses has a column.
 */
export function csvTemplate(shape: Shape): string {
  const { header, row } = templateCells(shape);
  return csvLine(header) + csvLine(row);
}

/** The same as cells. */
export function templateCells(shape: Shape): { readonly header: string[]; readonly row: string[] } {
  const { id, dimensions, alternatives, example } = shapeEntry(shape);
  const given = objectAt(example, "dimensions");
  const cells: [string, string][] = [["shape", id]];
  for (const { name } of dimensions) {
    const twins = alternatives.find((group) => group.includes(name));
    const left = twins && !(name in given) && twins.some((twin) => twin in given);
    if (!left) cells.push([name, cellText(given[name])]);
  }
  for (const [name, value] of Object.entries(objectAt(example, "medium"))) {
    if (typeof value !== "object") cells.push([name, cellText(value)]);
  }
  for (const medium of Object.keys(objectAt(example, "media"))) {
    for (const [name, value] of Object.entries(objectAt(objectAt(example, "media"), medium))) {
      if (typeof value !== "object") cells.push([`${medium}.${name}`, cellText(value)]);
    }
  }
  cells.push(["temperature", "20 degC"], ["label", shape.title]);
  return { header: cells.map(([name]) => name), row: cells.map(([, value]) => value) };
}

function cellText(value: unknown): string {
  return value === undefined ? "" : String(value);
}

function objectAt(parent: Readonly<Record<string, unknown>>, name: string): Record<string, unknown> {
  const value = parent[name];
  return typeof value === "object" && value !== null ? { ...value } : {};
}
