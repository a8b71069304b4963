/** How far an element's resistance may stray: from the tolerance of its own, or from those of the request that gives it. */
import type { Problems } from "../failure";
import type { ResistanceResult } from "../resistance/result-schema";
import { shiftOf, standardOf } from "../resistance/uncertainty/distribution";
import { ROUGH_PROPAGATION } from "../resistance/uncertainty/find-uncertainty";
import { readSpread } from "../resistance/uncertainty/input";
import type { TolerancedInput } from "../resistance/uncertainty/tolerance-schema";

export interface Stray {
  /** Ends of the tolerance, or of the range that the request's uncertainty gives; greater than 0, ohms. */
  readonly low: number;
  readonly high: number;
  /** Standard uncertainty but for what materials contribute, ohms. */
  readonly own: number;
  /** Expectation less the value, ohms. */
  readonly shift: number;
  /** Whether the request's own propagation is rough. */
  readonly rough: boolean;
  /** By material: what its stated uncertainty does. Every element of the material strays with it together. */
  readonly materials: ReadonlyMap<string, MaterialStray>;
}

export interface MaterialStray {
  /** Ohms per unit of the ratio of true to nominal resistivity. */
  readonly sensitivity: number;
  /** Standard uncertainty of that ratio. */
  readonly standard: number;
}

/** A first-order range may reach below 0; no resistance does. */
const LEAST = 1e-3;

/** Of a resistance that is given with a tolerance; null after a complaint. */
export function strayOfTolerance(
  given: TolerancedInput,
  ohm: number,
  pointer: string,
  problems: Problems,
): Stray | null {
  const spread = readSpread(given, ohm, { kind: "resistance", positive: "yes" }, pointer, problems);
  if (!spread) return null;
  return {
    low: ohm - spread.minus,
    high: ohm + spread.plus,
    own: standardOf({ nominal: ohm, ...spread }),
    shift: shiftOf({ nominal: ohm, ...spread }),
    rough: false,
    materials: new Map(),
  };
}

/** Of an element whose request was computed with its uncertainty. */
export function strayOfResult(
  { resistance, uncertainty, cautions }: ResistanceResult,
  request: Readonly<Record<string, unknown>>,
): Stray | null {
  if (!uncertainty) return null;
  const { value } = resistance;
  const { low, high, standard } = uncertainty;
  const rough = cautions.includes(ROUGH_PROPAGATION);
  const materials = new Map<string, MaterialStray>();
  let shared = 0;
  for (const { input, ...part } of uncertainty.contributions) {
    const material = input.endsWith(".material") ? memberAt(request, input.split(".")) : undefined;
    if (typeof material !== "string") continue;
    shared += (part.sensitivity * part.standard) ** 2;
    const sensitivity = part.sensitivity + (materials.get(material)?.sensitivity ?? 0);
    materials.set(material, { sensitivity, standard: part.standard });
  }
  return {
    low: Math.max(low, LEAST * value),
    high,
    own: Math.sqrt(Math.max(0, standard ** 2 - shared)),
    shift: rough || uncertainty.method !== "propagation" ? 0 : (low + high) / 2 - value,
    rough,
    materials,
  };
}

function memberAt(root: unknown, path: readonly string[]): unknown {
  return path.reduce<unknown>(
    (here, name) =>
      typeof here === "object" && here !== null ? (here as Record<string, unknown>)[name] : undefined,
    root,
  );
}
