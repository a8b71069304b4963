import { exampleRequest, type Shape } from "@/lib/engine";
import { type EmbedDefinition, embedDefinition, type InputRule } from "./definition";
import { inputsOf } from "./inputs";

/** What a new widget of a shape starts as: its worked example, every dimension open, the medium fixed. */
export function startDefinition(shape: Shape): EmbedDefinition {
  const example: unknown = exampleRequest(shape);
  const inputs = [...inputsOf(shape).values()].flatMap(({ name, path, place, type }) => {
    const found = at(example, path);
    if (typeof found !== "string" && typeof found !== "number" && typeof found !== "boolean") return [];
    const value = String(found);
    const open = place === "dimension" && type !== "flag";
    const rule: InputRule = open ? { mode: "open", value } : { mode: "fixed", value };
    return [{ name, rule }];
  });
  const graded = at(example, ["medium", "graded"]);
  return embedDefinition.parse({
    shape: shape.id,
    title: shape.title,
    inputs,
    ...(graded === undefined ? {} : { graded }),
    show: { drawing: true, bounds: true, plots: false },
    theme: "host",
    density: "comfortable",
    language: "reader",
  });
}

function at(value: unknown, path: readonly string[]): unknown {
  return path.reduce<unknown>(
    (found, part) =>
      typeof found === "object" && found !== null && part in found ? Reflect.get(found, part) : undefined,
    value,
  );
}
