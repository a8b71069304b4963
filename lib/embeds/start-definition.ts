import { type CleanedOutline, exampleRequest, type Shape } from "@/lib/engine";
import { type EmbedDefinition, embedDefinition, type InputRule } from "./definition";
import { inputsOf } from "./inputs";

/**
 * What a new widget of a shape starts as: every dimension open, the rest fixed.
 * @param values Values by the names of inputs, from a calculation page; the shape's worked example where there are none.
 */
export function startDefinition(
  shape: Shape,
  values: Readonly<Record<string, string>> = {},
): EmbedDefinition {
  const given = givenInputs(shape, values);
  const medium = given.some(({ place }) => place === "medium");
  const dimensions = given.some(({ place }) => place === "dimension");
  const example: unknown = exampleRequest(shape);
  const inputs = [...inputsOf(shape).values()].flatMap(({ name, path, place, type }) => {
    const found =
      given.find((input) => input.name === name)?.value ??
      ((place === "dimension" && dimensions) || (place === "medium" && medium)
        ? undefined
        : at(example, path));
    if (typeof found !== "string" && typeof found !== "number" && typeof found !== "boolean") return [];
    const value = String(found);
    const open = place === "dimension" && type !== "flag";
    const rule: InputRule = open ? { mode: "open", value } : { mode: "fixed", value };
    return [{ name, rule }];
  });
  const graded = medium ? undefined : at(example, ["medium", "graded"]);
  return embedDefinition.parse({
    ...LOOK,
    shape: shape.id,
    title: shape.title,
    inputs,
    ...(graded === undefined ? {} : { graded }),
  });
}

const LOOK = {
  show: { drawing: true, bounds: true, plots: false },
  theme: "host",
  density: "comfortable",
  language: "reader",
} as const;

/** What a new widget on a stored outline starts as: copper, of a thickness that visitors set where it is a sheet. */
export function startOnOutline(
  id: string,
  { name, outline }: Pick<CleanedOutline, "name" | "outline">,
): EmbedDefinition {
  const sheet = outline.symmetry !== "axisymmetric";
  return embedDefinition.parse({
    ...LOOK,
    outlineId: id,
    title: name || "Outline",
    inputs: [
      { name: "material", rule: { mode: "fixed", value: "copper-annealed" } },
      ...(sheet ? [{ name: "thickness", rule: { mode: "open", value: "1 mm" } }] : []),
      { name: "temperature", rule: { mode: "open", value: "20 degC" } },
    ],
  });
}

function at(value: unknown, path: readonly string[]): unknown {
  return path.reduce<unknown>(
    (found, part) =>
      typeof found === "object" && found !== null && part in found ? Reflect.get(found, part) : undefined,
    value,
  );
}

function givenInputs(shape: Shape, values: Readonly<Record<string, string>>) {
  const inputs = inputsOf(shape);
  return Object.entries(values).flatMap(([name, value]) => {
    const input = inputs.get(name);
    return input && value.trim() !== "" ? [{ name, value: value.trim(), place: input.place }] : [];
  });
}
