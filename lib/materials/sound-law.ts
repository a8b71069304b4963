import { resistivityAt } from "@/lib/engine";
import { Refusal } from "../service/refusal";
import type { NewMaterial } from "./input";

const ABSOLUTE_ZERO_C = -273.15;
/** Places of the range at which a law is tried; a polynomial of degree 11 turns at most ten times. */
const PLACES = 200;
/** Resistivities that leave a resistance room in a double, ohm m. */
const SMALLEST = 1e-100;
const LARGEST = 1e100;

/**
 * Refuses (422) a material whose range goes below absolute zero, or whose law gives something other than a positive
 * resistivity somewhere in that range: what was stored must be usable wherever it says it holds.
 */
export function requireSoundLaw(material: NewMaterial): void {
  const errors = complaints(material);
  if (errors.length === 0) return;
  const [{ pointer, detail }] = errors;
  throw new Refusal("invalid-input", `${pointer} ${detail}`, { errors });
}

function complaints(material: NewMaterial): { pointer: string; detail: string }[] {
  const { range, resistivity: law } = material;
  if (range.from < ABSOLUTE_ZERO_C) {
    return [{ pointer: "#/range/from", detail: "must not be below absolute zero (-273.15 °C)." }];
  }
  if ("reference" in law && law.reference < ABSOLUTE_ZERO_C) {
    return [{ pointer: "#/resistivity/reference", detail: "must not be below absolute zero (-273.15 °C)." }];
  }
  const tried = { ...material, id: "tried", version: 1, owner: "" };
  for (let i = 0; i <= PLACES; i++) {
    const temperatureC = range.from + ((range.to - range.from) * i) / PLACES;
    const value = resistivityAt(tried, temperatureC);
    if (value >= SMALLEST && value <= LARGEST) continue;
    const what = Number.isNaN(value) ? "no number" : `${value.toPrecision(4)} ohm m`;
    const place = Number(temperatureC.toPrecision(6));
    const detail = `gives ${what} at ${place} °C; over the whole range it must be between ${SMALLEST} and ${LARGEST} ohm m.`;
    return [{ pointer: "#/resistivity", detail }];
  }
  return [];
}
