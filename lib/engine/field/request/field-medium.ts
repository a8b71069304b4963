/** A request's medium to conductances of the outline: siemens per square (plan) or S/m (axisymmetric). */
import { type Problems, pointerTo } from "../../failure";
import type { Collected } from "../../medium/collected";
import { compileExpression } from "../../medium/expression/compile-expression";
import type { Material } from "../../medium/material";
import { resolveUniform, type UniformSite } from "../../medium/resolve-medium";
import { readQuantity } from "../../quantity/parse-quantity";
import type { CheckedOutline } from "../outline/check-outline";
import type { SheetConductance } from "../solve-field";
import type { FieldMediumInput } from "./field-request-schema";

export interface FieldMedium {
  /** The background first, then the regions in their order. */
  readonly conductance: readonly SheetConductance[];
  /** Largest relative rounding error of a number in `conductance`. */
  readonly relativeError: number;
}

export interface FieldMediumSite {
  readonly axisymmetric: boolean;
  readonly temperatureC: number;
  readonly material: (id: string) => Material | undefined;
  readonly collected: Collected;
  readonly problems: Problems;
}

/** Rounding of a reciprocal beside that of the value itself. */
const RECIPROCAL = 2e-16;
/** Places along each side at which an expression is looked at before a solution starts. */
const LOOKS = 48;

/** Resolves the medium; null after complaints. */
export function resolveFieldMedium(medium: FieldMediumInput, site: FieldMediumSite): FieldMedium | null {
  const { expression, regions = [] } = medium;
  const uniformSite = (pointer: string): UniformSite => ({
    subject: "an axisymmetric outline",
    pointer,
    temperatureC: site.temperatureC,
    sheet: !site.axisymmetric,
    problems: site.problems,
    material: site.material,
    use: (material) => site.collected.use(material),
    caution: (sentence) => site.collected.caution(sentence),
  });
  const conductance: (SheetConductance | null)[] = [];
  let relativeError = RECIPROCAL;
  const addUniform = (input: Parameters<typeof resolveUniform>[0], pointer: string): void => {
    const found = resolveUniform(input, uniformSite(pointer));
    conductance.push(found && 1 / found.value);
    if (found) relativeError = Math.max(relativeError, found.relativeError + RECIPROCAL);
  };
  if (expression !== undefined) conductance.push(resolveExpression(medium, expression, site));
  else addUniform(medium, "#/medium");
  regions.forEach((region, k) => addUniform(region.medium, `#/medium/regions/${k}/medium`));
  const whole = conductance.filter((entry) => entry !== null);
  return whole.length === conductance.length ? { conductance: whole, relativeError } : null;
}

function resolveExpression(
  medium: FieldMediumInput,
  text: string,
  { axisymmetric, problems }: FieldMediumSite,
): SheetConductance | null {
  const reading = compileExpression(text, ["x", "y"]);
  if (!reading.ok) problems.add("#/medium/expression", reading.detail);
  if (medium.quantity === undefined) {
    problems.add("#/medium/quantity", 'is required: "conductivity" or "resistivity".');
  }
  const thickness = resolveThickness(medium, axisymmetric, problems);
  if (!reading.ok || medium.quantity === undefined || thickness === null) return null;
  const { evaluate } = reading.expression;
  return medium.quantity === "conductivity"
    ? (x, y) => evaluate(x, y) * thickness
    : (x, y) => thickness / evaluate(x, y);
}

function resolveThickness(
  { thickness }: FieldMediumInput,
  axisymmetric: boolean,
  problems: Problems,
): number | null {
  const pointer = pointerTo("#/medium", "thickness");
  if (axisymmetric) {
    if (thickness === undefined) return 1;
    problems.add(pointer, "goes with plan outlines only; an axisymmetric one is solid.");
    return null;
  }
  if (thickness === undefined) {
    problems.add(pointer, "is required beside an expression on a plan outline.");
    return null;
  }
  const reading = readQuantity(thickness, "length", { gauge: "foil" });
  if (reading.ok && reading.value > 0) return reading.value;
  problems.add(pointer, reading.ok ? "must be greater than 0." : reading.detail);
  return null;
}

/** Looks at an expression on a grid inside the outline and on its border, so that a complaint comes before any work. */
export function checkExpression(
  outline: CheckedOutline,
  conductance: readonly SheetConductance[],
  problems: Problems,
): void {
  const [law] = conductance;
  if (typeof law === "number") return;
  const { frame, rings } = outline;
  const perUnit = frame.unitM / frame.scale;
  const toMetres = (x: number, y: number): [number, number] => [
    (x * frame.scale + frame.originX) * perUnit,
    (y * frame.scale + frame.originY) * perUnit,
  ];
  const fails = (x: number, y: number): boolean => {
    const [xM, yM] = toMetres(x, y);
    const value = law(xM, yM);
    if (value > 0 && value < Infinity) return false;
    problems.add(
      "#/medium/expression",
      `must give a positive number everywhere on the outline; at x = ${short(xM)} m, y = ${short(yM)} m it does not.`,
    );
    return true;
  };
  let [minX, minY, maxX, maxY] = [Infinity, Infinity, -Infinity, -Infinity];
  for (const { xy } of rings) {
    for (let i = 0; i < xy.length; i += 2) {
      minX = Math.min(minX, xy[i]);
      maxX = Math.max(maxX, xy[i]);
      minY = Math.min(minY, xy[i + 1]);
      maxY = Math.max(maxY, xy[i + 1]);
      if (fails(xy[i], xy[i + 1])) return;
    }
  }
  for (let i = 0; i < LOOKS; i++) {
    const y = minY + ((i + 0.5) / LOOKS) * (maxY - minY);
    const crossings = crossingsAt(rings, y);
    for (let k = 0; k + 1 < crossings.length; k += 2) {
      const step = (maxX - minX) / LOOKS;
      const count = Math.max(1, Math.round((crossings[k + 1] - crossings[k]) / step));
      for (let j = 0; j < count; j++) {
        const x = crossings[k] + ((j + 0.5) / count) * (crossings[k + 1] - crossings[k]);
        if (fails(x, y)) return;
      }
    }
  }
}

/** Where a horizontal line crosses the rings' chords, from left to right. */
function crossingsAt(rings: CheckedOutline["rings"], y: number): number[] {
  const found: number[] = [];
  for (const { xy } of rings) {
    for (let i = 0; i < xy.length; i += 2) {
      const j = (i + 2) % xy.length;
      if (xy[i + 1] > y === xy[j + 1] > y) continue;
      found.push(xy[i] + ((y - xy[i + 1]) / (xy[j + 1] - xy[i + 1])) * (xy[j] - xy[i]));
    }
  }
  return found.sort((a, b) => a - b);
}

function short(value: number): string {
  return String(Number(value.toPrecision(6)));
}
