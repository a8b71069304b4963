import { z } from "zod";
import { pointerTo } from "../../failure";
import { readQuantity } from "../../quantity/parse-quantity";
import { quantitySchema } from "../../quantity/quantity-schema";
import { compensatedConductivity, LARGEST_DENSITY, siliconConductivity, SMALLEST_DENSITY } from "../dopant";
import { defineProfile, type ProfileKind, type ProfileLaw, type ProfileSite } from "../profile";
import { complementaryErrorProfile } from "./complementary-error";
import { constantProfile } from "./constant";
import { exponentialProfile } from "./exponential";
import { expressionProfile } from "./expression";
import { gaussianProfile } from "./gaussian";
import { layersProfile } from "./layers";
import { linearProfile } from "./linear";
import { powerProfile } from "./power";
import { tableProfile } from "./table";

const densityKinds = [
  constantProfile,
  linearProfile,
  exponentialProfile,
  powerProfile,
  gaussianProfile,
  complementaryErrorProfile,
  layersProfile,
  tableProfile,
  expressionProfile,
] as const;

const schema = z
  .strictObject({
    kind: z.literal("dopant"),
    type: z.enum(["n", "p"]).meta({ description: "n: donors (phosphorus), p: acceptors (boron)." }),
    profile: z
      .discriminatedUnion(
        "kind",
        [
          constantProfile.schema,
          linearProfile.schema,
          exponentialProfile.schema,
          powerProfile.schema,
          gaussianProfile.schema,
          complementaryErrorProfile.schema,
          layersProfile.schema,
          tableProfile.schema,
          expressionProfile.schema,
        ],
        {
          error: (issue) =>
            issue.code === "invalid_union"
              ? `must be one of ${densityKinds.map(({ kind }) => `"${kind}"`).join(", ")}.`
              : undefined,
        },
      )
      .meta({ description: "Dopant density in 1/cm³ along the coordinate, by any other kind of profile." }),
    model: z.enum(["f723", "masetti"]).optional().meta({
      description:
        "f723 (default): resistivity by the fits of ASTM F723 at 23 °C. masetti: carriers times the mobilities of Masetti, Severi and Solmi (1983).",
    }),
    background: quantitySchema(
      "density",
      "Density of the other type all over, which the dopant must outweigh; needs the model masetti",
      1e15,
    ).optional(),
  })
  .meta({
    description: "Silicon near room temperature, conductivity from its dopant density.",
    example: {
      kind: "dopant",
      type: "p",
      profile: { kind: "complementary-error", surface: 1e19, length: "0.8 um", from: "start" },
    },
  });

/** Silicon of varying dopant density. */
export const dopantProfile = defineProfile({
  kind: "dopant",
  title: "Dopant density",
  summary:
    "Silicon near room temperature whose conductivity follows from a profile of dopant density in 1/cm³.",
  tex: "\\sigma(s) = \\sigma_\\mathrm{Si}\\bigl(N(s)\\bigr)",
  schema,
  build: (profile, site) => {
    const pointer = pointerTo(site.pointer, "profile");
    const background = readCounterDensity(profile, site);
    const inner = densityKinds.find(({ kind }) => kind === profile.profile.kind) as ProfileKind | undefined;
    const law = inner?.build(profile.profile, { ...site, values: "density", pointer }) ?? null;
    if (law === null || background === null) return null;
    const convert = conversion(profile.type, profile.model ?? "f723", background);
    return checkEnds(law, convert, site, pointer) ? dopedLaw(law, convert) : null;
  },
});

function conversion(
  type: "n" | "p",
  model: "f723" | "masetti",
  background: number,
): (density: number) => number {
  if (model === "f723") return (density) => siliconConductivity(type, density);
  const dopant = type === "p" ? "boron" : "phosphorus";
  return (density) => compensatedConductivity(dopant, density, background);
}

function readCounterDensity(
  profile: { readonly background?: unknown; readonly model?: string },
  site: ProfileSite,
): number | null {
  if (profile.background === undefined) return 0;
  const pointer = pointerTo(site.pointer, "background");
  const reading = readQuantity(profile.background, "density");
  if (!reading.ok || reading.value < 0) {
    site.problems.add(pointer, reading.ok ? "must be 0 or greater." : reading.detail);
    return null;
  }
  if (profile.model === "masetti") return reading.value;
  site.problems.add(pointer, 'needs "model": "masetti": the fits of ASTM F723 know one dopant only.');
  return null;
}

/** Densities beyond the fits are refused where they are seen, and a current may not be interrupted. */
function checkEnds(
  law: ProfileLaw,
  convert: (n: number) => number,
  site: ProfileSite,
  pointer: string,
): boolean {
  let smallest = Infinity;
  const step = Math.max(1, Math.floor(law.count / 2000));
  for (let piece = 0; piece < law.count; piece += step) {
    for (const part of [0, 0.25, 0.5, 0.75, 1]) {
      const density = law.at(piece, law.width[piece] * part);
      if (density > LARGEST_DENSITY) {
        site.problems.add(
          pointer,
          `reaches ${density.toPrecision(3)} 1/cm³; at most ${LARGEST_DENSITY} is covered.`,
        );
        return false;
      }
      smallest = Math.min(smallest, density);
      if (site.zeroAllowed || convert(density) > 0) continue;
      site.problems.add(
        pointer,
        "leaves no carriers somewhere along the flow, which would interrupt the current.",
      );
      return false;
    }
  }
  if (smallest < SMALLEST_DENSITY && !site.zeroAllowed) {
    site.caution(
      `The dopant density falls below ${SMALLEST_DENSITY} 1/cm³, where the mobility is taken as that of light doping.`,
    );
  }
  site.caution(
    "Silicon near 23 °C: the conductivity by dopant density does not follow the operating temperature.",
  );
  return true;
}

function dopedLaw(law: ProfileLaw, convert: (density: number) => number): ProfileLaw {
  return {
    ...law,
    at: (piece, t) => convert(law.at(piece, t)),
    quantity: "conductivity",
    // Conductivity rises a little slower than density; a steep fit wants a finer rule than the density itself.
    spread: law.spread && ((piece) => (law.spread?.(piece) ?? Infinity) ** 2),
    cost: (law.cost ?? 1) + 4,
  };
}
