import "server-only";
import { coversTemperature, formatQuantity, type Material, resistivityAt } from "@/lib/engine";

/** A material as the picker shows it, with its resistivity at the operating temperature. */
export interface MaterialChoice {
  readonly id: string;
  readonly name: string;
  readonly kind: string;
  readonly version: number;
  readonly owner: string;
  readonly source: string;
  readonly provenance: Material["provenance"];
  readonly note?: string;
  /** Temperatures for which its law holds, °C. */
  readonly range: { readonly from: number; readonly to: number };
  /** Ratios of true to nominal resistivity. */
  readonly uncertainty: Material["uncertainty"];
  /** At the operating temperature; null where the law does not reach it. */
  readonly resistivityOhmM: number | null;
  readonly resistivityText: string | null;
  readonly covered: boolean;
}

/** Materials at a temperature, °C. */
export function materialChoices(
  materials: readonly Material[],
  temperatureC: number,
): readonly MaterialChoice[] {
  return materials.map((material) => {
    const { id, name, kind, version, owner, source, provenance, note, range, uncertainty } = material;
    const value = resistivityAt(material, temperatureC);
    const usable = Number.isFinite(value) && value > 0;
    return {
      id,
      name,
      kind,
      version,
      owner,
      source,
      provenance,
      ...(note === undefined ? {} : { note }),
      range,
      uncertainty,
      resistivityOhmM: usable ? value : null,
      resistivityText: usable ? formatQuantity(value, "ohm m", { digits: 4 }) : null,
      covered: coversTemperature(material, temperatureC),
    };
  });
}
