"use client";

import { useRef } from "react";
import { textInUnit } from "../../../../_ui/quantity/convert";
import { findUnit, UNITS } from "../../../../_ui/quantity/units";
import { PROFILE_FORMS, readRows, writeRows } from "../../_model/profile-forms";
import type { Parameters } from "../../_model/parameters";
import type { CoordinateSpan } from "../../_server/geometry";
import { useForm } from "../form-context";
import { baseValue } from "../use-medium-switch";
import type { Patch } from "../use-page-state";

/**
 * Changes the law of the profile whose parameters begin with `name`. A law chosen again has its former numbers; a new
 * one starts level, at the first value of the law before, so that the answer does not jump for no reason.
 */
export function useProfileSwitch(name: string, prefix: string): (kind: string) => void {
  const { parameters, change, materials, ranges } = useForm();
  const remembered = useRef(new Map<string, Parameters>());
  return (kind) => {
    const before = parameters[name] ?? "constant";
    if (kind === before) return;
    const own = Object.fromEntries(
      Object.entries(parameters).filter(([key]) => key === name || key.startsWith(`${name}.`)),
    );
    remembered.current.set(before, own);
    const cleared: Patch = Object.fromEntries(Object.keys(own).map((key) => [key, undefined]));
    const span = ranges[parameters[`${prefix}graded`]];
    const start = remembered.current.get(kind) ?? {
      [name]: kind,
      ...levelProfile(name, kind, {
        value: firstValue(name, own),
        material: parameters[`${prefix}profile.material`] ?? materials[0]?.id ?? "",
        temperature: parameters.temperature ?? "20 degC",
        span,
      }),
    };
    change({ ...cleared, ...start });
  };
}

interface Level {
  readonly value: string;
  readonly material: string;
  readonly temperature: string;
  readonly span: CoordinateSpan | undefined;
}

/** The value that the law before has first; empty where it has none of the kind wanted. */
function firstValue(name: string, own: Parameters): string {
  for (const field of ["from", "value", "reference", "peak", "surface"]) {
    const text = own[`${name}.${field}`];
    // A temperature is no value of the medium, an expression no quantity.
    if (text && !/deg|°|\bK\b/.test(text) && /^[\d.]+(?:e[+-]?\d+)?(?:$|\s)/i.test(text)) return text;
  }
  return readRows(own[`${name}.layers`] ?? own[`${name}.table`] ?? "")[0]?.[1] ?? "";
}

function levelProfile(name: string, kind: string, level: Level): Parameters {
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
        fields[`${key}.value`] = "";
        break;
    }
  }
  return fields;
}

/** An expression gives SI values without a unit. */
function plainNumber(value: string): string {
  const number = baseValue(value, "conductivity", "S/m") ?? baseValue(value, "resistivity", "ohm m");
  return number === null ? "" : String(number);
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
