/** A field request with its drawing stretched: outline, terminals and regions, and the thickness where that scales too. */
import { readQuantity } from "../../quantity/parse-quantity";
import type { Point, RingElement } from "../outline/schema";
import type { PreparedField } from "../request/prepare-field";

export const SCALES = ["scale", "scaleX", "scaleY"] as const;
export type ScaleName = (typeof SCALES)[number];

export type FieldBody = PreparedField["body"];

/** The body at that scale; arcs are only stretched evenly. */
export function scaledBody(body: FieldBody, name: ScaleName, scale: number): FieldBody {
  const [x, y] = name === "scale" ? [scale, scale] : name === "scaleX" ? [scale, 1] : [1, scale];
  const point = ([a, b]: Point): Point => [a * x, b * y];
  const ring = (elements: readonly RingElement[]): RingElement[] =>
    elements.map((element) =>
      Array.isArray(element)
        ? point(element)
        : { ...element, arcTo: point(element.arcTo), center: point(element.center) },
    );
  const { outline, terminals = [], medium } = body;
  if (!outline) throw new Error("a prepared field has its outline");
  const thickness = <M extends { readonly thickness?: number | string }>(own: M): M =>
    name === "scale" && own.thickness !== undefined
      ? { ...own, thickness: thicker(own.thickness, scale) }
      : own;
  return {
    ...body,
    outline: { ...outline, outer: ring(outline.outer), holes: outline.holes.map(ring) },
    terminals: terminals.map((terminal) => ({
      ...terminal,
      ...(terminal.segments
        ? { segments: terminal.segments.map(([a, b]): [Point, Point] => [point(a), point(b)]) }
        : {}),
    })),
    medium: {
      ...thickness(medium),
      ...(medium.regions
        ? {
            regions: medium.regions.map((region) => ({
              ring: region.ring.map(point),
              medium: thickness(region.medium),
            })),
          }
        : {}),
    },
  };
}

function thicker(thickness: number | string, scale: number): number {
  const reading = readQuantity(thickness, "length", { gauge: "foil" });
  if (!reading.ok) throw new Error("a prepared field's thickness has been read before");
  return reading.value * scale;
}

/** Whether any ring has an arc. */
export function hasArcs({ outline }: FieldBody): boolean {
  return [outline?.outer ?? [], ...(outline?.holes ?? [])].some((ring) =>
    ring.some((element) => !Array.isArray(element)),
  );
}
