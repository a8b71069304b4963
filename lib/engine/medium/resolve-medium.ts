/** A request's medium to numbers: a resistivity, a sheet resistance or a law, at the operating temperature. */
import { pointerTo, type Problems } from "../failure";
import { texNumber } from "../quantity/format-quantity";
import { readQuantity } from "../quantity/parse-quantity";
import type { QuantityKindName } from "../quantity/quantity-kind";
import type { Coordinate, Shape } from "../shape/define-shape";
import { suggestion } from "../shape/nearest-names";
import { resistivityAt } from "./material";
import type { GradedInput, MediumInput, UniformMediumInput } from "./medium-schema";
import type { ProfileLaw } from "./profile";
import { buildProfile, profileKinds, SELF_DESCRIBING } from "./profiles/profile-kinds";
import { checkTemperature, findMaterial, type MaterialUse } from "./use-material";

/** Range of a coordinate in this shape with these dimensions, SI. */
export interface CoordinateRange {
  readonly start: number;
  readonly extent: number;
}

export interface UniformMedium {
  readonly kind: "uniform";
  /** ohm m, or ohms a square where the shape is a sheet. */
  readonly value: number;
  /** Relative rounding error of `value`. */
  readonly relativeError: number;
  /** How it came about, as TeX; made only when steps are asked for. */
  readonly tex: () => string;
}

export interface GradedMedium {
  readonly kind: "graded";
  readonly coordinate: Coordinate;
  readonly law: ProfileLaw;
  /** Title and general law of the profile. */
  readonly title: string;
  readonly tex: string;
  readonly pointer: string;
}

export type ResolvedMedium = UniformMedium | GradedMedium;

/** Where a uniform medium is asked for. */
export interface UniformSite extends MaterialUse {
  /** What it fills, for complaints: a shape's id, "a plan outline". */
  readonly subject: string;
  readonly pointer: string;
  readonly temperatureC: number;
  /** Whether a sheet resistance is wanted. */
  readonly sheet: boolean;
}

export interface MediumSite extends UniformSite {
  readonly shape: Shape;
  /** Coordinates in which the medium may vary. */
  readonly gradable: readonly string[];
  /** The range of a coordinate; null while the dimensions have complaints of their own. */
  readonly range: (coordinate: string) => CoordinateRange | null;
}

/** Rounding of one conversion and one law, generously. */
const ROUNDING = 2e-15;
const DEFAULT_REFERENCE_C = 20;

/** Resolves a parsed medium; null after complaints. */
export function resolveMedium(medium: MediumInput, site: MediumSite): ResolvedMedium | null {
  if (medium.graded) {
    if (!site.sheet) return resolveGraded(medium.graded, site);
    site.problems.add(
      pointerTo(site.pointer, "graded"),
      `is not known for ${site.shape.id}: its law is for a uniform sheet.`,
    );
    return null;
  }
  return resolveUniform(medium, site);
}

/** A medium without grading: ohm metres, or ohms a square where a sheet is wanted; null after complaints. */
export function resolveUniform(medium: UniformMediumInput, site: UniformSite): UniformMedium | null {
  if (medium.sheetResistance !== undefined) {
    if (site.sheet) {
      const value = read(medium.sheetResistance, "sheetResistance", "sheetResistance", site);
      return value === null ? null : uniform(value, () => `R_\\square = ${texNumber(value)}\\,\\Omega`);
    }
    site.problems.add(
      pointerTo(site.pointer, "sheetResistance"),
      `is for sheets; ${site.subject} needs a material, a resistivity or a conductivity.`,
    );
    return null;
  }
  const bulk = resolveBulk(medium, site);
  const thickness = resolveThickness(medium, site);
  if (bulk === null || thickness === null) return null;
  if (!site.sheet) return bulk;
  const value = bulk.value / thickness;
  return {
    ...uniform(value, () => `R_\\square = \\rho / t = ${texNumber(value)}\\,\\Omega`),
    relativeError: bulk.relativeError + ROUNDING,
  };
}

function uniform(value: number, tex: () => string): UniformMedium {
  return { kind: "uniform", value, relativeError: ROUNDING, tex };
}

function resolveThickness(medium: UniformMediumInput, site: UniformSite): number | null {
  if (!site.sheet) {
    if (medium.thickness === undefined) return 1;
    site.problems.add(
      pointerTo(site.pointer, "thickness"),
      `goes with sheets only; ${site.subject} has its own dimensions.`,
    );
    return null;
  }
  if (medium.thickness === undefined) {
    site.problems.add(
      pointerTo(site.pointer, "thickness"),
      "is required for a sheet, unless a sheetResistance is given instead.",
    );
    return null;
  }
  return read(medium.thickness, "length", "thickness", site, { gauge: "foil" });
}

function read(
  input: unknown,
  kind: QuantityKindName,
  name: string,
  site: UniformSite,
  options: { readonly gauge?: "foil"; readonly any?: boolean } = {},
): number | null {
  const reading = readQuantity(input, kind, { gauge: options.gauge });
  if (!reading.ok) {
    site.problems.add(pointerTo(site.pointer, name), reading.detail);
    return null;
  }
  const { value } = reading;
  if (options.any) return value;
  if (!(value > 0)) {
    site.problems.add(pointerTo(site.pointer, name), "must be greater than 0.");
    return null;
  }
  if (value < 1e-100 || value > 1e100) {
    site.problems.add(pointerTo(site.pointer, name), "must be between 1e-100 and 1e100 in SI units.");
    return null;
  }
  return value;
}

function resolveBulk(medium: UniformMediumInput, site: UniformSite): UniformMedium | null {
  if (medium.material !== undefined) {
    const material = findMaterial(medium.material, pointerTo(site.pointer, "material"), site);
    if (!material) return null;
    const pointer = "#/operating/temperature";
    if (!checkTemperature(material, site.temperatureC, medium.extrapolate, pointer, site)) return null;
    const value = resistivityAt(material, site.temperatureC);
    return uniform(
      value,
      () =>
        `\\rho(${texNumber(site.temperatureC)}\\,^\\circ\\mathrm{C}) = ${texNumber(value)}\\,\\Omega\\,\\mathrm{m}`,
    );
  }
  const name = medium.resistivity !== undefined ? "resistivity" : "conductivity";
  const given = read(medium[name], name, name, site);
  const coefficient =
    medium.temperatureCoefficient === undefined
      ? 0
      : read(medium.temperatureCoefficient, "temperatureCoefficient", "temperatureCoefficient", site, {
          any: true,
        });
  const reference =
    medium.referenceTemperature === undefined
      ? DEFAULT_REFERENCE_C
      : read(medium.referenceTemperature, "temperature", "referenceTemperature", site, { any: true });
  if (given === null || coefficient === null || reference === null) return null;
  const factor = 1 + coefficient * (site.temperatureC - reference);
  if (!(factor > 0) || !Number.isFinite(factor)) {
    site.problems.add(
      pointerTo(site.pointer, "temperatureCoefficient"),
      `makes the resistivity at ${site.temperatureC} °C ${factor === 0 ? "zero" : "negative"}: 1 + coefficient·(temperature − reference) must be greater than 0.`,
    );
    return null;
  }
  const value = (name === "resistivity" ? given : 1 / given) * factor;
  return uniform(value, () => `\\rho = ${texNumber(value)}\\,\\Omega\\,\\mathrm{m}`);
}

function resolveGraded(graded: GradedInput, site: MediumSite): GradedMedium | null {
  const pointer = pointerTo(site.pointer, "graded");
  const { problems, shape } = site;
  const coordinate = shape.coordinates.find(({ name }) => name === graded.coordinate);
  const selfDescribing = SELF_DESCRIBING.includes(graded.profile.kind);
  if (graded.quantity === undefined && !selfDescribing) {
    problems.add(pointerTo(pointer, "quantity"), 'is required: "conductivity" or "resistivity".');
  }
  if (!coordinate || !site.gradable.includes(coordinate.name)) {
    const detail =
      site.gradable.length === 0
        ? `is not known for ${shape.id}: its law is for a uniform medium only.`
        : `is no coordinate in which ${shape.id} may vary; it has ${site.gradable.join(", ")}.${suggestion(graded.coordinate, site.gradable)}`;
    problems.add(site.gradable.length === 0 ? pointer : pointerTo(pointer, "coordinate"), detail);
    return null;
  }
  const range = site.range(coordinate.name);
  if (!range || (graded.quantity === undefined && !selfDescribing)) return null;
  const law = buildProfile(graded.profile, {
    coordinate: coordinate.name,
    unit: coordinate.unit,
    start: range.start,
    extent: range.extent,
    zeroAllowed: coordinate.role === "across",
    values: graded.quantity ?? "conductivity",
    pointer: pointerTo(pointer, "profile"),
    problems,
    material: site.material,
    use: site.use,
    caution: site.caution,
  });
  if (!law) return null;
  const kind = profileKinds.find((entry) => entry.kind === graded.profile.kind);
  return {
    kind: "graded",
    coordinate,
    law,
    title: kind?.title ?? graded.profile.kind,
    tex: kind?.tex ?? "",
    pointer: pointerTo(pointer, "profile"),
  };
}

/** Complaint for a request without any medium. */
export function missingMedium(problems: Problems, shape: Shape, names: readonly string[]): void {
  if (names.length === 0) problems.add("#/medium", `is required: what fills ${shape.id}.`);
  else problems.add("#/media", `is required: ${shape.id} has the media ${names.join(" and ")}.`);
}
