import { z } from "zod";
import { pointerTo } from "../../failure";
import { siText } from "../../quantity/format-quantity";
import { readQuantity, type QuantityReading } from "../../quantity/parse-quantity";
import { anyQuantitySchema } from "../../quantity/quantity-schema";
import { findInterval, intervalLaw } from "../interpolation";
import { defineProfile, type ProfileLaw, type ProfileSite } from "../profile";
import { valueComplaint } from "./profile-value";

const MOST_POINTS = 100_000;

const schema = z
  .strictObject({
    kind: z.literal("table"),
    positions: z.array(anyQuantitySchema).min(2).max(MOST_POINTS).meta({
      description: "Positions along the coordinate, increasing (bare numbers in m, degrees for an angle).",
    }),
    values: z.array(anyQuantitySchema).min(2).max(MOST_POINTS).meta({
      description: "The value at each position (bare numbers in S/m, ohm m, or 1/cm³ of a dopant).",
    }),
    interpolation: z
      .enum(["linear", "log", "monotone-cubic"])
      .default("linear")
      .meta({ description: "Between the points: the value, its logarithm, or a Fritsch–Carlson cubic." }),
  })
  .meta({
    description: "Measured values; the positions cover the coordinate's range within 1e-9 of it.",
    example: {
      kind: "table",
      positions: [0, 0.1, 0.25],
      values: [5.8e7, 5.5e7, 5.1e7],
      interpolation: "linear",
    },
  });

/** Part of the range that the table may fall short of at either end. */
const COVER_TOLERANCE = 1e-9;

/** Measured values, interpolated. */
export const tableProfile = defineProfile({
  kind: "table",
  title: "Table",
  summary:
    "Measured values at given positions, interpolated linearly, in the logarithm, or by a monotone cubic.",
  tex: "f(s) = \\text{interpolated between } (s_i, f_i)",
  schema,
  build: (profile, site) => {
    const { problems, pointer } = site;
    if (profile.positions.length !== profile.values.length) {
      problems.add(
        pointerTo(pointer, "values"),
        `has ${profile.values.length} entries, but there are ${profile.positions.length} positions.`,
      );
      return null;
    }
    const before = problems.list.length;
    const positions = readAll(profile.positions, "positions", site, (input) =>
      readQuantity(input, site.unit === "rad" ? "angle" : "length"),
    );
    const values = readAll(profile.values, "values", site, (input) => readQuantity(input, site.values));
    if (problems.list.length > before) return null;
    if (!checkIncreasing(positions, site) || !checkValues(values, profile.interpolation, site)) return null;
    return covers(positions, site) ? lawOf(positions, values, profile.interpolation, site) : null;
  },
});

/** Most complaints told about one list; the rest would only repeat them. */
const MOST_COMPLAINTS = 10;

function readAll(
  inputs: readonly unknown[],
  name: string,
  site: ProfileSite,
  read: (input: unknown) => QuantityReading,
): Float64Array {
  const numbers = new Float64Array(inputs.length);
  let complaints = 0;
  for (let i = 0; i < inputs.length; i++) {
    const reading = read(inputs[i]);
    if (reading.ok) numbers[i] = reading.value;
    else if (complaints++ < MOST_COMPLAINTS)
      site.problems.add(pointerTo(site.pointer, name, i), reading.detail);
  }
  return numbers;
}

function checkIncreasing(positions: Float64Array, site: ProfileSite): boolean {
  for (let i = 1; i < positions.length; i++) {
    if (positions[i] > positions[i - 1]) continue;
    site.problems.add(
      pointerTo(site.pointer, "positions", i),
      "must be greater than the position before it.",
    );
    return false;
  }
  return true;
}

function checkValues(values: Float64Array, interpolation: string, site: ProfileSite): boolean {
  const zeroAllowed = site.zeroAllowed && site.values !== "resistivity" && interpolation !== "log";
  for (let i = 0; i < values.length; i++) {
    if (values[i] > 0 || (zeroAllowed && values[i] === 0)) continue;
    const detail =
      interpolation === "log" && values[i] === 0
        ? "must be greater than 0: its logarithm is interpolated."
        : valueComplaint(site, zeroAllowed);
    site.problems.add(pointerTo(site.pointer, "values", i), detail);
    return false;
  }
  return true;
}

function covers(positions: Float64Array, site: ProfileSite): boolean {
  const { start, extent, unit } = site;
  const slack = COVER_TOLERANCE * extent;
  const first = positions[0] - start;
  const last = positions[positions.length - 1] - start;
  if (first <= slack && last >= extent - slack) return true;
  site.problems.add(
    pointerTo(site.pointer, "positions"),
    `must cover the range of ${site.coordinate}, ${siText(start, unit)} to ${siText(start + extent, unit)}; it runs from ${siText(positions[0], unit)} to ${siText(positions[positions.length - 1], unit)}.`,
  );
  return false;
}

/** The intervals that overlap the range; the first and last reach to its ends. */
function lawOf(
  positions: Float64Array,
  values: Float64Array,
  interpolation: "linear" | "log" | "monotone-cubic",
  site: ProfileSite,
): ProfileLaw {
  const { start, extent } = site;
  const law = intervalLaw(positions, values, interpolation);
  const first = findInterval(positions, start);
  let last = findInterval(positions, start + extent);
  // A range that ends on a knot does not reach into the next interval.
  if (last > first && positions[last] - start >= extent) last--;
  const count = last - first + 1;
  const from = new Float64Array(count);
  const width = new Float64Array(count);
  for (let k = 0; k < count; k++) {
    from[k] = k === 0 ? 0 : positions[first + k] - start;
    const end = k === count - 1 ? extent : positions[first + k + 1] - start;
    width[k] = k > 0 && k < count - 1 ? positions[first + k + 1] - positions[first + k] : end - from[k];
  }
  // The first piece begins at the range's start, which may lie inside its interval.
  const offset = start - positions[first];
  return {
    count,
    from,
    width,
    at: first === 0 && offset === 0 ? law : (piece, t) => law(first + piece, piece === 0 ? t + offset : t),
    quantity: site.values,
    spread: (piece) => {
      const a = values[first + piece];
      const b = values[first + piece + 1];
      return a > b ? a / b : b / a;
    },
    smoothness: interpolation === "monotone-cubic" ? "cubic" : "reciprocal",
    tex: `${positions.length} \\text{ points}`,
  };
}
