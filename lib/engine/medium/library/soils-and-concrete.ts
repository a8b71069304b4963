/** Ground and concrete: ranges, carried as an uncertainty; a measurement at the site replaces them. */
import type { Material } from "../material";
import { libraryEntry } from "./library-entry";

const MEASURE = "A range, not a property: measure at the site, in the season that matters.";

const ground = (
  id: string,
  name: string,
  resistivity: number,
  from: number,
  to: number,
  source = "Common practice, no source",
): Material =>
  libraryEntry({
    id,
    name,
    kind: "soil",
    resistivity: { model: "constant", resistivity },
    range: { from: 1, to: 40 },
    uncertainty: {
      lower: from / resistivity,
      upper: to / resistivity,
      note: `From ${from} to ${to} Ω·m by moisture, salts and grain.`,
    },
    source,
    provenance: "from memory",
    note: `${MEASURE} Frozen ground is many times higher.`,
  });

const IEEE_RANGES = "IEEE Std 80, Guide for Safety in AC Substation Grounding, range of earth resistivity";

export const soilsAndConcrete: readonly Material[] = [
  ground("soil-wet-organic", "Soil, wet organic", 10, 5, 30, IEEE_RANGES),
  ground("soil-moist", "Soil, moist", 100, 30, 300, IEEE_RANGES),
  ground("soil-dry", "Soil, dry", 1000, 300, 3000, IEEE_RANGES),
  ground("soil-peat", "Peat and garden soil, damp", 40, 10, 150),
  ground("soil-clay", "Clay", 40, 10, 150),
  ground("soil-loam", "Loam", 60, 20, 200),
  ground("soil-sandy-loam", "Sandy loam", 150, 50, 500),
  ground("soil-sand-wet", "Sand, wet", 200, 50, 600),
  ground("soil-sand-dry", "Sand, dry", 2000, 500, 10_000),
  ground("soil-gravel", "Gravel", 1500, 500, 5000),
  ground("rock", "Rock", 10_000, 1000, 50_000, IEEE_RANGES),
  libraryEntry({
    id: "concrete-in-ground",
    name: "Concrete, damp, in the ground",
    kind: "building",
    resistivity: { model: "constant", resistivity: 90 },
    range: { from: 1, to: 40 },
    uncertainty: { lower: 0.3, upper: 3, note: "From 30 to 270 Ω·m by moisture and cement." },
    source: "Common practice, no source",
    provenance: "from memory",
    note: MEASURE,
  }),
  libraryEntry({
    id: "concrete-dry",
    name: "Concrete, dry, indoors",
    kind: "building",
    resistivity: { model: "constant", resistivity: 5000 },
    range: { from: 1, to: 40 },
    uncertainty: { lower: 0.1, upper: 20, note: "From 500 to 100,000 Ω·m by moisture and age." },
    source: "Common practice, no source",
    provenance: "from memory",
    note: MEASURE,
  }),
];
