import type { ShapeEntry } from "@/lib/engine";
import { type Column, columnVocabulary, MEDIUM_COLUMNS, OPERATING_COLUMNS } from "./columns";

type Values = Record<string, unknown>;

/** Where a cell goes in the request of its row. */
interface Place {
  readonly at: "dimensions" | "medium" | "media" | "operating";
  /** Name of the medium, for a shape of two. */
  readonly medium: string;
  readonly member: string;
  readonly unit: string | null;
  readonly whole: boolean;
  readonly index: number;
}

/** A cell that is nothing but a number, also a misspelt one: the unit of its column is put behind it. */
const BARE = /^[\d.,'\s+\-−eE]+$/;

/** Turns the rows of one table into requests; what a name means is decided shape by shape. */
export class RowReader {
  private readonly shapeColumn: number;
  private readonly places = new Map<string, readonly Place[]>();

  constructor(private readonly columns: readonly Column[]) {
    this.shapeColumn = columns.findIndex((column) => column.role === "row" && column.name === "shape");
  }

  /** The body of `POST /resistance` that a row stands for, or why it stands for none. */
  request(cells: readonly string[]): { readonly body: Values } | { readonly complaint: string } {
    const width = this.columns.length;
    if (cells.slice(width).some((cell) => cell.trim() !== "")) {
      return { complaint: `has ${cells.length} cells; the header names ${width} columns.` };
    }
    const shape = (cells[this.shapeColumn] ?? "").trim();
    const body: Values = { shape, dimensions: {} };
    const parts: Record<string, Values> = { dimensions: {}, medium: {}, operating: {} };
    const media: Record<string, Values> = {};
    for (const place of this.placesFor(shape)) {
      const text = (cells[place.index] ?? "").trim();
      if (text === "") continue;
      const target = place.at === "media" ? (media[place.medium] ??= {}) : parts[place.at];
      target[place.member] = valueOf(text, place);
    }
    body.dimensions = parts.dimensions;
    if (Object.keys(media).length > 0) body.media = media;
    if (Object.keys(parts.medium).length > 0) body.medium = parts.medium;
    if (Object.keys(parts.operating).length > 0) body.operating = parts.operating;
    return { body };
  }

  private placesFor(shape: string): readonly Place[] {
    let places = this.places.get(shape);
    if (!places) {
      const entry = columnVocabulary().entries.get(shape);
      places = this.columns.flatMap((column, index) =>
        column.role === "input" ? [{ ...placeOf(column.name, entry), unit: column.unit, index }] : [],
      );
      // One entry a shape of the catalogue; what is no shape of it is not kept.
      if (entry) this.places.set(shape, places);
    }
    return places;
  }
}

function placeOf(name: string, entry: ShapeEntry | undefined): Omit<Place, "unit" | "index"> {
  const dimension = entry?.dimensions.find((candidate) => candidate.name === name);
  const whole = dimension?.type === "integer";
  const plain = { medium: "", member: name, whole };
  if (dimension) return { ...plain, at: "dimensions" };
  const [prefix, member] = name.split(".", 2);
  if (member !== undefined) return { at: "media", medium: prefix, member, whole };
  if (Object.hasOwn(MEDIUM_COLUMNS, name)) return { ...plain, at: "medium" };
  if (Object.hasOwn(OPERATING_COLUMNS, name)) return { ...plain, at: "operating" };
  // A dimension of other shapes: the engine says so, and which ones this shape has.
  return { ...plain, at: "dimensions" };
}

function valueOf(text: string, { unit, whole, member }: Place): unknown {
  if (unit !== null) return BARE.test(text) ? `${text} ${unit}` : text;
  if (whole && /^[+-]?\d+$/.test(text)) return Number(text);
  if (member === "extrapolate" && /^(true|false)$/i.test(text)) return text.toLowerCase() === "true";
  return text;
}

/** `#/media/core/material` as the column it came from, `core.material`. */
export function columnOf(pointer: string): string {
  const [place, ...path] = pointer
    .slice(2)
    .split("/")
    .map((part) => decodeURIComponent(part).replaceAll("~1", "/").replaceAll("~0", "~"));
  if (place === "media") return path.join(".");
  return path[0] ?? place;
}
