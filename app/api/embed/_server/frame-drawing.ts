import "server-only";
import type { Geometry } from "@/app/(site)/calculate/_server/geometry";
import { findShape } from "@/lib/engine";
import type { EmbedDefinition } from "@/lib/embeds/definition";

export type FrameDrawing = Pick<Geometry, "drawing" | "toScale" | "labels">;

/** What a frame draws: without the lengths that its version hides, and whatever would tell them. */
export function frameDrawing(definition: EmbedDefinition, geometry: Geometry): FrameDrawing {
  const shape = findShape(definition.shape ?? "");
  const { drawing, toScale, labels } = geometry;
  const hidden = definition.inputs.flatMap(({ name, rule }) => {
    if (rule.mode !== "hidden") return [];
    const twin = Object.entries(shape?.dimensions ?? {}).find(
      ([, dimension]) =>
        dimension.type === "quantity" && (dimension.diameter === name || dimension.radius === name),
    );
    return [name, ...(twin ? [twin[0]] : [])];
  });
  if (hidden.length === 0) return { drawing, toScale, labels };
  const named = new Set(
    definition.inputs.filter(({ rule }) => rule.mode !== "hidden").map(({ name }) => name),
  );
  // Derived lengths could tell a hidden one: only what the visitor gave or sees is labelled with its value.
  return {
    drawing,
    toScale,
    labels: Object.fromEntries(
      Object.entries(labels)
        .filter(([name]) => !hidden.includes(name))
        .map(([name, label]) => [name, named.has(name) ? label : { ...label, value: "" }]),
    ),
  };
}
