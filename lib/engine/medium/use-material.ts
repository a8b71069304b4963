/** Looking a material up for a request, and holding a temperature against its range. */
import type { Problems } from "../failure";
import { formatQuantity } from "../quantity/format-quantity";
import { suggestion } from "../shape/nearest-names";
import { libraryMaterials } from "./library/materials";
import { coversTemperature, resistivityAt, type Material } from "./material";

/** What reading a medium needs to know and to tell. */
export interface MaterialUse {
  readonly problems: Problems;
  readonly material: (id: string) => Material | undefined;
  readonly use: (material: Material) => void;
  readonly caution: (sentence: string) => void;
}

/** The material of that id, or null after a complaint. */
export function findMaterial(id: string, pointer: string, use: MaterialUse): Material | null {
  const material = use.material(id);
  if (!material) {
    const near = suggestion(
      id,
      libraryMaterials.map((entry) => entry.id),
    );
    use.problems.add(pointer, `"${id}" is no material of the library or of your team.${near}`);
    return null;
  }
  use.use(material);
  return material;
}

/**
 * Whether the material may be used at that temperature (°C): inside its range, or outside of it with `extrapolate`
 * and a caution, as long as the law still gives a resistivity.
 */
export function checkTemperature(
  material: Material,
  temperatureC: number,
  extrapolate: boolean | undefined,
  pointer: string,
  use: MaterialUse,
): boolean {
  if (coversTemperature(material, temperatureC)) return true;
  const { from, to } = material.range;
  const shown = (t: number): string => formatQuantity(t, "degC", { digits: 7 });
  const range = from === to ? `holds at ${shown(from)}` : `holds from ${shown(from)} to ${shown(to)}`;
  if (!extrapolate) {
    use.problems.add(
      pointer,
      `is ${shown(temperatureC)}, but ${material.name} ${range}; "extrapolate": true beside the material allows it, with a caution.`,
    );
    return false;
  }
  const resistivity = resistivityAt(material, temperatureC);
  if (!(resistivity > 0) || !Number.isFinite(resistivity)) {
    use.problems.add(
      pointer,
      `is ${shown(temperatureC)}, where the law of ${material.name} gives no resistivity.`,
    );
    return false;
  }
  use.caution(`Extrapolated: ${material.name} is used at ${shown(temperatureC)}, but ${range}.`);
  return true;
}
