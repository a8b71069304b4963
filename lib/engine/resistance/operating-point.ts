/** The operating point: temperature, and at most one of voltage, current and power, from which the others follow. */
import { pointerTo, type Problems } from "../failure";
import { readQuantity } from "../quantity/parse-quantity";
import type { ResistanceRequest } from "./request-schema";
import type { ResistanceResult } from "./result-schema";

export interface Drive {
  readonly kind: "voltage" | "current" | "power";
  readonly value: number;
}

export interface OperatingInput {
  readonly temperatureC: number;
  readonly drive: Drive | null;
}

/** Temperature of a medium when the request gives none. */
export const DEFAULT_TEMPERATURE_C = 20;
const DRIVES = ["voltage", "current", "power"] as const;

/** Reads the request's operating point, telling `problems` what is wrong. */
export function readOperating(operating: ResistanceRequest["operating"], problems: Problems): OperatingInput {
  let temperatureC = DEFAULT_TEMPERATURE_C;
  let drive: Drive | null = null;
  if (operating?.temperature !== undefined) {
    const reading = readQuantity(operating.temperature, "temperature");
    if (reading.ok) temperatureC = reading.value;
    else problems.add("#/operating/temperature", reading.detail);
  }
  for (const kind of DRIVES) {
    const given = operating?.[kind];
    if (given === undefined) continue;
    const reading = readQuantity(given, kind);
    if (!reading.ok) problems.add(pointerTo("#/operating", kind), reading.detail);
    else if (!(reading.value > 0)) problems.add(pointerTo("#/operating", kind), "must be greater than 0.");
    else drive = { kind, value: reading.value };
  }
  return { temperatureC, drive };
}

/** Voltage, current and power at that resistance; complains where a double cannot hold one of them. */
export function operatingPoint(
  input: OperatingInput,
  resistance: number,
  problems: Problems,
): ResistanceResult["operating"] {
  const { temperatureC: temperature, drive } = input;
  if (!drive) return { temperature };
  const { kind, value } = drive;
  const voltage =
    kind === "voltage"
      ? value
      : kind === "current"
        ? value * resistance
        : Math.sqrt(value) * Math.sqrt(resistance);
  const current =
    kind === "current"
      ? value
      : kind === "voltage"
        ? value / resistance
        : Math.sqrt(value) / Math.sqrt(resistance);
  const power = kind === "power" ? value : voltage * current;
  const sizes = { voltage, current, power };
  for (const name of DRIVES) {
    if (Number.isFinite(sizes[name]) && sizes[name] > 0) continue;
    problems.add(
      pointerTo("#/operating", kind),
      `gives a ${name} that a double cannot hold (${sizes[name]}).`,
    );
  }
  return { temperature, voltage, current, power };
}
