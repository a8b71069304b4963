/** A request's media against what its shape takes: one medium, or each of two by its name. */
import { pointerTo, type Problems } from "../failure";
import type { Collected } from "../medium/collected";
import {
  resolveMedium,
  type CoordinateRange,
  type MediumSite,
  type ResolvedMedium,
} from "../medium/resolve-medium";
import type { Dimensions, Resolved, Shape } from "../shape/define-shape";
import { shapeMedia } from "../shape/shape-entry";
import type { ComputeContext } from "./compute-context";
import type { ResistanceRequest } from "./request-schema";

export type Media =
  { readonly single: ResolvedMedium } | { readonly named: Readonly<Record<string, ResolvedMedium>> };

/** Resolves the media of a request at that temperature (°C); null after complaints. */
export function readMedia(
  shape: Shape,
  body: Pick<ResistanceRequest, "medium" | "media">,
  dimensions: Resolved<Dimensions> | null,
  temperatureC: number,
  context: ComputeContext,
  collected: Collected,
  problems: Problems,
): Media | null {
  const takes = shapeMedia(shape);
  const site: MediumSite = {
    pointer: "#/medium",
    shape,
    subject: shape.id,
    temperatureC,
    sheet: takes.kind === "sheet",
    gradable: takes.gradable,
    range: (coordinate) => (dimensions ? rangeOf(shape, dimensions, coordinate) : null),
    problems,
    material: context.material,
    use: (material) => collected.use(material),
    caution: (sentence) => collected.caution(sentence),
  };
  if (takes.kind !== "two") {
    if (body.media) problems.add("#/media", `is for shapes of two media; ${shape.id} takes one medium.`);
    if (!body.medium) {
      if (!body.media) problems.add("#/medium", `is required: what fills ${shape.id}.`);
      return null;
    }
    const single = resolveMedium(body.medium, site);
    return single && { single };
  }
  const names = takes.names.map(({ name }) => name);
  if (body.medium)
    problems.add(
      "#/medium",
      `is for shapes of one medium; ${shape.id} has the media ${names.join(" and ")}.`,
    );
  if (!body.media) {
    if (!body.medium)
      problems.add("#/media", `is required: ${shape.id} has the media ${names.join(" and ")}.`);
    return null;
  }
  const named: Record<string, ResolvedMedium> = {};
  for (const name of Object.keys(body.media)) {
    if (!names.includes(name)) {
      problems.add(
        pointerTo("#/media", name),
        `is no medium of ${shape.id}, which has ${names.join(" and ")}.`,
      );
    }
  }
  for (const name of names) {
    const given = body.media[name];
    if (!given) problems.add(pointerTo("#/media", name), "is required.");
    else {
      const medium = resolveMedium(given, { ...site, pointer: pointerTo("#/media", name) });
      if (medium) named[name] = medium;
    }
  }
  return Object.keys(named).length === names.length ? { named } : null;
}

function rangeOf(shape: Shape, dimensions: Resolved<Dimensions>, coordinate: string): CoordinateRange | null {
  const { answer } = shape;
  if (answer.kind === "flow") {
    const { along, across } = answer.flow(dimensions);
    return [along, ...across].find((flow) => flow.coordinate === coordinate) ?? null;
  }
  if (answer.kind === "media" && answer.parallel) {
    const { along } = answer.parallel(dimensions);
    return along.coordinate === coordinate ? along : null;
  }
  return null;
}
