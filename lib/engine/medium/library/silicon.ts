/** Silicon at room temperature by dopant density. */
import type { Material } from "../material";
import { libraryEntry, within } from "./library-entry";

/** 1/cm³; the decades for which ASTM F723 prints its fits. */
const DENSITIES = [1e14, 1e15, 1e16, 1e17, 1e18, 1e19];

const NAMES = { n: "phosphorus", p: "boron" } as const;

export const silicon: readonly Material[] = (["n", "p"] as const).flatMap((type) =>
  DENSITIES.map((density) => {
    const exponent = Math.round(Math.log10(density));
    return libraryEntry({
      id: `silicon-${type}-1e${exponent}`,
      name: `Silicon, ${type}-type, 1e${exponent} ${NAMES[type]} atoms per cm³`,
      kind: "semiconductor",
      resistivity: { model: "silicon", type, density },
      range: { from: 18, to: 28 },
      uncertainty: within(
        8,
        "The fit itself about 3 to 5 %; up to 4 % more for 5 K off 23 °C in lightly doped silicon.",
      ),
      source:
        "ASTM F723, conversion between resistivity and dopant density for boron- and phosphorus-doped silicon",
      provenance: "from memory",
      note: "For other densities and for layers use the dopant profile.",
    });
  }),
);
