/** What a law of a graded medium starts from, and the same law told in resistivities instead of conductivities. */
import { textInUnit } from "../../../_ui/quantity/convert";
import { findUnit, UNITS } from "../../../_ui/quantity/units";
import type { CoordinateSpan } from "../_server/geometry";
import type { Parameters } from "./parameters";
import { PROFILE_FORMS, readRows, writeRows } from "./profile-forms";
import { baseValue, neatText, plainValue } from "./value-texts";

export type ProfileValues = "conductivity" | "resistivity" | "density";

/** Where no law before has a value to go on from: copper, and silicon of some ohm centimetres. */
export const START_VALUES: Readonly<Record<ProfileValues, string>> = {
  conductivity: "58 MS/m",
  resistivity: "17.2 nohm m",
  density: "1e16 1/cm^3",
};

export interface Level {
  readonly value: string;
  readonly material: string;
  readonly temperature: string;
  readonly span: CoordinateSpan | undefined;
}

/** The value that the law whose parameters begin with `name` has first; empty where it has none that others take. */
export function firstValue(name: string, own: Parameters): string {
  for (const field of ["from", "value", "reference", "peak", "surface"]) {
    const text = own[`${name}.${field}`];
    // A temperature is no value of the medium, an expression no quantity.
    if (text && !/deg|°|\bK\b/.test(text) && /^[\d.]+(?:e[+-]?\d+)?(?:$|\s)/i.test(text)) return text;
  }
  return readRows(own[`${name}.layers`] ?? own[`${name}.table`] ?? "")[0]?.[1] ?? "";
}

/** The fields of a law that has the same value everywhere. */
export function levelProfile(name: string, kind: string, level: Level): Parameters {
  const at = (part: number) => positionText(level.span, part);
  const fields: Record<string, string> = {};
  for (const field of PROFILE_FORMS[kind] ?? []) {
    const key = `${name}.${field.name}`;
    switch (field.type) {
      case "value":
        fields[key] = level.value;
        break;
      case "position":
        fields[key] =
          field.name === "center" ? at(0.5) : field.name === "at" ? at(1) : widthText(level.span, 0.25);
        break;
      case "number":
        fields[key] = "0";
        break;
      case "temperature":
        fields[key] = level.temperature;
        break;
      case "material":
        fields[key] = level.material;
        break;
      case "expression":
        fields[key] = plainNumber(level.value);
        break;
      case "choice":
        fields[key] = field.choices[0].value;
        break;
      case "layers":
        fields[key] = writeRows([0, 1].map(() => [widthText(level.span, 0.5), level.value] as const));
        break;
      case "table":
        fields[key] = writeRows([0, 0.5, 1].map((part) => [at(part), level.value] as const));
        break;
      case "profile":
        fields[key] = "constant";
        fields[`${key}.value`] = START_VALUES.density;
        break;
    }
  }
  return fields;
}

/** An expression gives SI values without a unit, and densities in 1/cm³. */
function plainNumber(value: string): string {
  const number =
    baseValue(value, "conductivity", "S/m") ??
    baseValue(value, "resistivity", "ohm m") ??
    baseValue(value, "density", "1/cm^3");
  return number === null ? "" : String(number);
}

/** The reciprocal of every value of a law, so that it describes the same medium as the other quantity. */
export function reciprocalProfile(
  name: string,
  own: Parameters,
  to: "conductivity" | "resistivity",
): Parameters {
  const [from, unit, unitBefore] =
    to === "resistivity"
      ? (["conductivity", "ohm m", "S/m"] as const)
      : (["resistivity", "S/m", "ohm m"] as const);
  const turned = (text: string) => {
    const value = baseValue(text, from, unitBefore);
    return value === null ? text : neatText(1 / value, to, unit);
  };
  const fields: Record<string, string> = {};
  for (const field of PROFILE_FORMS[own[name] ?? "constant"] ?? []) {
    const key = `${name}.${field.name}`;
    const text = own[key];
    if (!text) continue;
    if (field.type === "value") fields[key] = turned(text);
    else if (field.type === "number") fields[key] = String(0 - Number(text));
    else if (field.type === "expression") fields[key] = turnedExpression(text);
    else if (field.type === "layers" || field.type === "table") {
      fields[key] = writeRows(readRows(text).map(([place, value]) => [place, turned(value)] as const));
    }
  }
  return fields;
}

/** "1/(…)", and back. */
function turnedExpression(text: string): string {
  const inner = /^1\/\(([^()]*)\)$/.exec(text.trim());
  return inner ? inner[1] : `1/(${text.trim()})`;
}

/** Positions at which something lies; the others are lengths. */
const PLACES: readonly string[] = ["center", "at"];

/** The positions of a law at the same parts of another coordinate's range. */
export function movedProfile(
  name: string,
  own: Parameters,
  from: CoordinateSpan | undefined,
  to: CoordinateSpan | undefined,
): Parameters {
  if (!from || !to) return {};
  const kind = from.unit === "deg" ? "angle" : "length";
  const part = (text: string) => plainValue(text, kind, from.unit);
  const width = (text: string) => {
    const size = part(text);
    return size === null ? text : widthText(to, size / from.extent);
  };
  const place = (text: string) => {
    const position = part(text);
    return position === null ? text : positionText(to, (position - from.start) / from.extent);
  };
  const fields: Record<string, string> = {};
  for (const field of PROFILE_FORMS[own[name] ?? "constant"] ?? []) {
    const key = `${name}.${field.name}`;
    const text = own[key];
    if (field.type === "profile") Object.assign(fields, movedProfile(key, own, from, to));
    else if (!text) continue;
    else if (field.type === "position") {
      fields[key] = PLACES.includes(field.name) ? place(text) : width(text);
      for (const member of ["tolerance", "plus", "minus"]) {
        const spread = own[`${key}.${member}`];
        if (spread) fields[`${key}.${member}`] = width(spread);
      }
    } else if (field.type === "layers" || field.type === "table") {
      const moved = field.type === "layers" ? width : place;
      fields[key] = writeRows(readRows(text).map(([cell, value]) => [moved(cell), value] as const));
    }
  }
  return fields;
}

/** A place in the range, as a part of it. */
export function positionText(span: CoordinateSpan | undefined, part: number): string {
  return span ? spanText(span.start + part * span.extent, span) : "";
}

/** A part of the range's length. */
export function widthText(span: CoordinateSpan | undefined, part: number): string {
  return span ? spanText(part * span.extent, span) : "";
}

/** A position or a length in the unit that suits the range. */
export function spanText(value: number, span: CoordinateSpan): string {
  const size = Math.abs(span.start + span.extent);
  const id = span.unit === "deg" ? "deg" : size >= 1 ? "m" : size >= 1e-3 ? "mm" : size >= 1e-6 ? "um" : "nm";
  const unit = findUnit(id, span.unit === "deg" ? UNITS.angle : UNITS.length);
  return unit ? `${textInUnit(value, unit)} ${id}` : String(value);
}
