/** Short ways to the laws of shapes in tests: R/ρ in 1/m, squares for sheets, without a medium. */
import Decimal from "decimal.js";
import { readFileSync } from "node:fs";
import { findShape } from "@/lib/engine/shape/catalogue";
import type { Dimensions, Factor, FlowTubes, Resolved, Shape } from "@/lib/engine/shape/define-shape";
import { resolveDimensions } from "@/lib/engine/shape/resolve-dimensions";
import { involve, note } from "./accuracy";

export type Given = Readonly<Record<string, number | string>>;

/** Decimal numbers of 60 digits. */
export const D = Decimal.clone({ precision: 60, defaults: true });

/** The very number that a double is, not its shortest decimal text. */
export function exact(value: number): Decimal {
  return new D(value.toPrecision(100));
}

export function shapeOf(id: string): Shape {
  const shape = findShape(id);
  if (!shape) throw new Error(`no shape ${id}`);
  return shape;
}

export function resolve(id: string, given: Given): Resolved<Dimensions> {
  involve(id);
  return resolveDimensions(shapeOf(id), given);
}

/** R/ρ with its bounds; a flow shape's closed form is its own value. */
export function factor(id: string, given: Given): Factor {
  const { answer } = shapeOf(id);
  const d = resolve(id, given);
  if (answer.kind === "factor") return answer.factor(d);
  if (answer.kind === "flow") {
    const value = answer.uniform(d);
    return { value, relativeError: 0, boundsBasis: "rounding", proved: true, method: "closed-form" };
  }
  throw new Error(`${id} has two media`);
}

export function law(id: string, given: Given): number {
  return factor(id, given).value;
}

export function tubes(id: string, given: Given): FlowTubes {
  const { answer } = shapeOf(id);
  if (answer.kind !== "flow") throw new Error(`${id} has no flow`);
  return answer.flow(resolve(id, given));
}

/** Relative deviation of a double from a number of many digits. */
export function deviationFrom(found: number, expected: Decimal | string): number {
  return note(exact(found).div(expected).minus(1).abs().toNumber());
}

interface ReferenceValue {
  readonly id: string;
  readonly inputs: Readonly<Record<string, number>>;
  readonly value: string;
  readonly condition?: number;
}

/** An entry of tests/fixtures/values.json, by its id. */
export function referenceValue(id: string): ReferenceValue {
  const path = new URL("../fixtures/values.json", import.meta.url);
  const entries = JSON.parse(readFileSync(path, "utf8")) as readonly ReferenceValue[];
  const entry = entries.find((candidate) => candidate.id === id);
  if (!entry) throw new Error(`no reference value ${id}`);
  return entry;
}
