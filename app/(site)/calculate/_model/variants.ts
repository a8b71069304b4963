/** One to four calculations side by side, and how an address keeps them: the first whole, the others by what differs. */
import type { ShapeEntry } from "@/lib/engine";
import {
  compactValue,
  mediumPrefixes,
  ofMedium,
  orderedPairs,
  type Parameters,
  queryText,
  readParameters,
} from "./parameters";

export const VARIANT_NAMES = ["A", "B", "C", "D"] as const;
export type VariantName = (typeof VARIANT_NAMES)[number];

export interface PageState {
  /** One to four, the first called A. */
  readonly variants: readonly Parameters[];
  /** Index of the one whose fields are shown. */
  readonly active: number;
}

/** The query of a page: readable, stable, complete. */
export function stateQuery({ variants, active }: PageState, entry: ShapeEntry): string {
  const [first, ...others] = variants;
  const pairs = orderedPairs(first, entry).map(([name, value]) => [name, compactValue(name, value)] as const);
  const differences = others.flatMap((variant, index) => {
    const label = VARIANT_NAMES[index + 1];
    const changed = orderedPairs(variant, entry)
      .filter(([name, value]) => first[name] !== value)
      .map(([name, value]) => [`${label}.${name}`, compactValue(name, value)] as const);
    const left = Object.keys(first).filter((name) => !(name in variant));
    return [
      [label, ""] as const,
      ...changed,
      ...(left.length > 0 ? [[`${label}.without`, left.join(",")] as const] : []),
    ];
  });
  const shown = active > 0 ? [["show", VARIANT_NAMES[active]] as const] : [];
  return queryText([...pairs, ...differences, ...shown]);
}

/** The state that an address tells; the example where it tells nothing. */
export function readState(
  pairs: Iterable<readonly [string, string]>,
  entry: ShapeEntry,
  example: Parameters,
): PageState {
  const all = [...pairs];
  const first = completed(readParameters(all, entry), entry, example);
  const variants: Parameters[] = [first];
  for (const label of VARIANT_NAMES.slice(1)) {
    if (!all.some(([name]) => name === label)) break;
    const own = all
      .filter(([name]) => name.startsWith(`${label}.`))
      .map(([name, value]) => [name.slice(label.length + 1), value] as const);
    const without = new Set((own.find(([name]) => name === "without")?.[1] ?? "").split(","));
    const kept = Object.fromEntries(Object.entries(first).filter(([name]) => !without.has(name)));
    variants.push({ ...kept, ...readParameters(own, entry) });
  }
  const show = all.find(([name]) => name === "show")?.[1];
  const active = VARIANT_NAMES.findIndex((name) => name === show);
  return { variants, active: active > 0 && active < variants.length ? active : 0 };
}

/** An address without any dimension, or without a medium, means the example's: an emptied field stands in it. */
function completed(told: Parameters | null, entry: ShapeEntry, example: Parameters): Parameters {
  if (!told) return example;
  const isDimension = (name: string) => entry.dimensions.some((dimension) => dimension.name === name);
  const isMedium = (name: string) => mediumPrefixes(entry).some((prefix) => ofMedium(name, prefix, entry));
  const missing = [isDimension, isMedium].filter((kind) => !Object.keys(told).some(kind));
  const added = Object.entries(example).filter(([name]) => missing.some((kind) => kind(name)));
  return { ...Object.fromEntries(added), ...told };
}

/** Names whose texts are not the same in all variants, in the order of the page. */
export function differingNames(variants: readonly Parameters[], entry: ShapeEntry): readonly string[] {
  const all = Object.assign({}, ...variants) as Parameters;
  return orderedPairs(all, entry)
    .map(([name]) => name)
    .filter((name) => variants.some((variant) => variant[name] !== variants[0][name]));
}
