import "server-only";
import { type DimensionEntry, profileKinds, type Shape, type ShapeEntry } from "@/lib/engine";

/** A dimension as a form shows it. */
export interface FormDimension extends DimensionEntry {
  /** The dimension line that shows it: a diameter is marked at its radius. */
  readonly line: string;
  /** Whether a foil's weight (oz/ft²) is a unit for it. */
  readonly foil: boolean;
}

/** What an editor says about a kind of profile. */
export interface ProfileFacts {
  readonly kind: string;
  readonly title: string;
  readonly summary: string;
}

export function formDimensions(shape: Shape, entry: ShapeEntry): readonly FormDimension[] {
  return entry.dimensions.map((dimension) => ({
    ...dimension,
    line: lineOf(shape, dimension.name),
    // As the engine reads it: a foil is a thickness or a plating.
    foil: /(?:thickness|plating)$/i.test(dimension.name),
  }));
}

function lineOf(shape: Shape, name: string): string {
  const found = Object.entries(shape.dimensions).find(
    ([, dimension]) =>
      dimension.type === "quantity" && (dimension.diameter === name || dimension.radius === name),
  );
  return found?.[0] ?? name;
}

export function profileFacts(): readonly ProfileFacts[] {
  return profileKinds.map(({ kind, title, summary }) => ({ kind, title, summary }));
}
