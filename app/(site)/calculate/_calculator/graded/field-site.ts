import type { ProfileValues } from "../../_model/profile-starts";
import type { CoordinateSpan } from "../../_server/geometry";

/** Where a profile's fields stand: what its values measure, and the range of its coordinate once it is known. */
export interface FieldSite {
  readonly values: ProfileValues;
  readonly span: CoordinateSpan | undefined;
  /** Prefix of the medium's parameters. */
  readonly prefix: string;
}

/** Units of values and positions without unit. */
export const VALUE_UNITS = { conductivity: "S/m", resistivity: "ohm m", density: "1/cm^3" } as const;

export function positionKind(span: CoordinateSpan | undefined): "length" | "angle" {
  return span?.unit === "deg" ? "angle" : "length";
}
