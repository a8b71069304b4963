/** One request's resistance as a function of some of its inputs, fast enough for a hundred thousand values. */
import { InputError, Problems, type Problem } from "../failure";
import { Collected } from "../medium/collected";
import type { Material } from "../medium/material";
import type { MediumInput } from "../medium/medium-schema";
import type { ProfileLaw } from "../medium/profile";
import type { ResolvedMedium } from "../medium/resolve-medium";
import type { Dimensions, Resolved, Shape } from "../shape/define-shape";
import { VaryingDimensions } from "../shape/vary-dimensions";
import { isRepresentable } from "./bounds";
import type { ComputeContext } from "./compute-context";
import { readMedia, type Media } from "./read-media";
import type { ResistanceRequest } from "./request-schema";
import { solve } from "./solve";
import type { InputSite } from "./uncertainty/input";

/** A request that has been read without complaint, plain quantities only. */
export interface EvaluatorSource {
  readonly shape: Shape;
  readonly body: Pick<ResistanceRequest, "dimensions" | "medium" | "media">;
  readonly temperatureC: number;
}

type Holder = Record<string, unknown>;
interface Member {
  readonly index: number;
  readonly holder: Holder;
  readonly key: string;
  readonly bare: (value: number) => number;
}

/** Evaluates a request at other values of its inputs. Formulas alone: no field solution takes their place. */
export class Evaluator {
  private readonly dimensionIndices: readonly number[];
  private readonly dimensionValues: Float64Array;
  private readonly varying: VaryingDimensions;
  private readonly fixedDimensions: Resolved<Dimensions> | null;
  private readonly temperatureIndex: number;
  private readonly members: readonly Member[];
  private readonly materials: readonly { readonly index: number; readonly medium: string | null }[];
  private readonly fixedMedia: Media | null;
  private readonly medium: MediumInput | undefined;
  private readonly media: Record<string, MediumInput> | undefined;
  private readonly context: ComputeContext;
  private readonly ignored = new Collected();

  constructor(
    private readonly source: EvaluatorSource,
    sites: readonly InputSite[],
    context: ComputeContext,
  ) {
    const { shape, body } = source;
    const known = new Map<string, Material | undefined>();
    this.context = {
      material: (id) => {
        if (!known.has(id)) known.set(id, context.material(id));
        return known.get(id);
      },
    };
    const indexed = [...sites.entries()];
    const names = indexed.flatMap(([index, site]) =>
      site.kind === "dimension" ? [{ index, name: site.name }] : [],
    );
    this.dimensionIndices = names.map(({ index }) => index);
    this.dimensionValues = new Float64Array(names.length);
    this.varying = new VaryingDimensions(
      shape,
      body.dimensions,
      names.map(({ name }) => name),
    );
    this.fixedDimensions = names.length === 0 ? this.varying.at([]) : null;
    this.temperatureIndex = sites.findIndex(({ kind }) => kind === "temperature");
    this.materials = indexed.flatMap(([index, site]) =>
      site.kind === "material" ? [{ index, medium: site.medium }] : [],
    );
    const written = indexed.flatMap(([index, site]) => (site.kind === "member" ? [{ index, ...site }] : []));
    const copy = written.length > 0 ? structuredClone({ medium: body.medium, media: body.media }) : body;
    this.medium = copy.medium;
    this.media = copy.media;
    this.members = written.map(({ index, path, bare }) => ({
      index,
      bare,
      holder: holderAt(copy, path),
      key: String(path[path.length - 1]),
    }));
    const graded = [this.medium, ...Object.values(this.media ?? {})].some((medium) => medium?.graded);
    const steady = this.temperatureIndex < 0 && this.members.length === 0 && (!graded || names.length === 0);
    this.fixedMedia = steady
      ? this.readMedia(this.fixedDimensions, source.temperatureC, new Problems())
      : null;
  }

  /** The resistance in ohms at these values (as many as sites, SI); NaN where the request would be refused. */
  at(values: ArrayLike<number>): number {
    const dimensions = this.fixedDimensions ?? this.varying.at(this.takeDimensions(values));
    if (!dimensions) return Number.NaN;
    const media = this.fixedMedia ?? this.mediaAt(values, dimensions, new Problems());
    if (!media) return Number.NaN;
    return this.solved(dimensions, media, values);
  }

  /** Why the request is refused at these values, one complaint; null where it is not. */
  refusal(values: ArrayLike<number>): Problem | null {
    const taken = this.takeDimensions(values);
    const dimensions = this.fixedDimensions ?? this.varying.at(taken);
    if (!dimensions) return this.varying.complain(taken)[0] ?? { pointer: "#", detail: "is refused." };
    const problems = new Problems();
    const media = this.fixedMedia ?? this.mediaAt(values, dimensions, problems);
    if (!media) return problems.list[0] ?? { pointer: "#", detail: "is refused." };
    try {
      const value = solve(this.source.shape, dimensions, scaled(media, this.materials, values), false).value;
      if (isRepresentable(value)) return null;
      return { pointer: "#", detail: `gives a resistance of ${value} ohm, which a double cannot hold.` };
    } catch (error) {
      if (error instanceof InputError) return error.errors[0];
      throw error;
    }
  }

  /** Evaluations of a graded medium's law that one call costs; 0 for a closed form. */
  costAt(values: ArrayLike<number>): number {
    const dimensions = this.fixedDimensions ?? this.varying.at(this.takeDimensions(values));
    const media = dimensions && (this.fixedMedia ?? this.mediaAt(values, dimensions, new Problems()));
    if (!dimensions || !media) return 0;
    return solve(this.source.shape, dimensions, media, false).integral?.evaluations ?? 0;
  }

  private takeDimensions(values: ArrayLike<number>): Float64Array {
    for (let k = 0; k < this.dimensionIndices.length; k++) {
      this.dimensionValues[k] = values[this.dimensionIndices[k]];
    }
    return this.dimensionValues;
  }

  private mediaAt(
    values: ArrayLike<number>,
    dimensions: Resolved<Dimensions>,
    problems: Problems,
  ): Media | null {
    for (const { index, holder, key, bare } of this.members) holder[key] = bare(values[index]);
    const temperatureC = this.temperatureIndex < 0 ? this.source.temperatureC : values[this.temperatureIndex];
    if (!(temperatureC >= ABSOLUTE_ZERO_C)) {
      problems.add("#/operating/temperature", "is below absolute zero (-273.15 °C).");
      return null;
    }
    return this.readMedia(dimensions, temperatureC, problems);
  }

  private readMedia(
    dimensions: Resolved<Dimensions> | null,
    temperatureC: number,
    problems: Problems,
  ): Media | null {
    const body = { medium: this.medium, media: this.media };
    const media = readMedia(
      this.source.shape,
      body,
      dimensions,
      temperatureC,
      this.context,
      this.ignored,
      problems,
    );
    return problems.any ? null : media;
  }

  private solved(dimensions: Resolved<Dimensions>, media: Media, values: ArrayLike<number>): number {
    try {
      // Of one medium the resistance is proportional to the resistivity, whatever its law.
      let factor = 1;
      let used = media;
      if (this.materials.length > 0) {
        if ("single" in media) factor = values[this.materials[0].index];
        else used = scaled(media, this.materials, values);
      }
      const value = factor * solve(this.source.shape, dimensions, used, false).value;
      return isRepresentable(value) ? value : Number.NaN;
    } catch (error) {
      if (error instanceof InputError) return Number.NaN;
      throw error;
    }
  }
}

const ABSOLUTE_ZERO_C = -273.15;

function holderAt(root: object, path: readonly (string | number)[]): Holder {
  let here = root as Holder;
  for (const part of path.slice(0, -1)) here = here[part] as Holder;
  return here;
}

/** The media with their materials' resistivities multiplied by the ratios among the values. */
function scaled(
  media: Media,
  materials: readonly { readonly index: number; readonly medium: string | null }[],
  values: ArrayLike<number>,
): Media {
  if (materials.length === 0) return media;
  if ("single" in media) return { single: scaledMedium(media.single, values[materials[0].index]) };
  const named: Record<string, ResolvedMedium> = { ...media.named };
  for (const { index, medium } of materials) {
    if (medium !== null) named[medium] = scaledMedium(named[medium], values[index]);
  }
  return { named };
}

function scaledMedium(medium: ResolvedMedium, ratio: number): ResolvedMedium {
  if (medium.kind === "uniform") return { ...medium, value: medium.value * ratio };
  const { law } = medium;
  const factor = law.quantity === "resistivity" ? ratio : 1 / ratio;
  const scaledLaw: ProfileLaw = { ...law, at: (piece, t) => factor * law.at(piece, t) };
  return { ...medium, law: scaledLaw };
}
