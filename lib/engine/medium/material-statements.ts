/** What a result says about the materials it used: that they are nominal, how sure they are, where they come from. */
import type { Material } from "./material";

export interface MaterialStatements {
  readonly assumptions: readonly string[];
  readonly cautions: readonly string[];
}

/** A library's material is one object for the life of the process, so its sentences are made once. */
const known = new WeakMap<Material, MaterialStatements>();

/** An uncertainty beyond this is a caution, not just an assumption: the material is a range rather than a number. */
const WIDE = 0.1;

export function materialStatements(material: Material): MaterialStatements {
  const before = known.get(material);
  if (before) return before;
  const { lower, upper, note } = material.uncertainty;
  const measured = material.provenance === "measured";
  const assumptions = [
    `${material.name}: ${measured ? "measured" : "nominal"} resistivity; ${sentence(material.source)}`,
  ];
  const cautions: string[] = [];
  if (lower !== 1 || upper !== 1) {
    const text = `The resistivity of ${material.name} may lie between ${percent(lower)} and ${percent(upper)} of the nominal value, which the bounds do not include: ${sentence(note)}`;
    if (lower < 1 - WIDE || upper > 1 + WIDE) cautions.push(text);
    else assumptions.push(text);
  }
  const statements = { assumptions, cautions };
  known.set(material, statements);
  return statements;
}

function sentence(text: string): string {
  return text.endsWith(".") ? text : `${text}.`;
}

function percent(ratio: number): string {
  return `${Number((ratio * 100).toPrecision(4))} %`;
}
