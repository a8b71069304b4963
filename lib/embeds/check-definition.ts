import {
  CheckFailure,
  computeResistance,
  findShape,
  InputError,
  type Material,
  Problems,
  type Problem,
  readQuantity,
} from "@/lib/engine";
import { accentContrasts, LEAST_CONTRAST } from "./contrast";
import type { EmbedDefinition, InputRule } from "./definition";
import { refusalOf, sizeOf, widgetComplaints, widgetRequest } from "./enforce";
import { type InputFacts, inputsOf } from "./inputs";

/**
 * What stands in the way of publishing a version: inputs that the shape has not, ranges that contradict themselves or
 * their default, an accent that cannot be seen, and what the engine says of the defaults. Pointers go into the definition.
 */
export function definitionProblems(
  definition: EmbedDefinition,
  material: (id: string) => Material | undefined,
): readonly Problem[] {
  const problems = new Problems();
  const shape = findShape(definition.shape);
  if (!shape) return [{ pointer: "#/shape", detail: "is not a shape of the catalogue." }];
  const facts = inputsOf(shape);
  definition.inputs.forEach(({ name, rule }, index) => {
    const pointer = `#/inputs/${index}`;
    const input = facts.get(name);
    if (!input) problems.add(`${pointer}/name`, `${name} is not an input of this shape.`);
    else checkRule(rule, input, pointer, problems, material);
  });
  if (definition.graded && definition.inputs.some(({ name }) => facts.get(name)?.place === "medium")) {
    problems.add("#/graded", "stands beside other members of the medium; give one or the other.");
  }
  checkRequirement(definition, problems);
  checkAccent(definition, problems);
  if (!problems.any) checkDefaults(definition, problems, material);
  return problems.list;
}

function checkRule(
  rule: InputRule,
  input: InputFacts,
  pointer: string,
  problems: Problems,
  material: (id: string) => Material | undefined,
): void {
  if (rule.mode !== "open") return;
  const ranged = rule.min !== undefined || rule.max !== undefined;
  if (ranged && input.type !== "quantity" && input.type !== "integer") {
    problems.add(pointer, "cannot have a range: give a list.");
    return;
  }
  if (ranged && rule.choices)
    problems.add(`${pointer}/choices`, "stands beside a range; give one or the other.");
  for (const end of ["min", "max"] as const) {
    const text = rule[end];
    if (text !== undefined && sizeOf(text, input) === undefined) {
      problems.add(`${pointer}/${end}`, unreadable(text, input));
    }
  }
  const [min, max] = [rule.min, rule.max].map((text) =>
    text === undefined ? undefined : sizeOf(text, input),
  );
  if (min !== undefined && max !== undefined && min > max) {
    problems.add(`${pointer}/max`, "must not be below the smallest value.");
  }
  if (input.type === "material") {
    if (!rule.choices)
      problems.add(`${pointer}/choices`, "An open material needs the list of those allowed.");
    for (const [place, choice] of (rule.choices ?? []).entries()) {
      if (!material(choice.value)) {
        problems.add(
          `${pointer}/choices/${place}`,
          `${choice.value} is not a material that this team may use.`,
        );
      }
    }
  }
  if (input.type === "flag") problems.add(pointer, "can be fixed, but not left open.");
  const refused = refusalOf(rule.value, rule, input);
  if (refused !== undefined) problems.add(`${pointer}/value`, refused);
}

function unreadable(text: string, input: InputFacts): string {
  if (input.kind === null) return "must be a whole number.";
  const reading = readQuantity(text, input.kind, input.gauge ? { gauge: input.gauge } : {});
  return reading.ok ? "cannot be read." : reading.detail;
}

function checkRequirement({ requirement }: EmbedDefinition, problems: Problems): void {
  for (const end of ["min", "max"] as const) {
    const text = requirement?.[end];
    if (text === undefined) continue;
    const reading = readQuantity(text, "resistance");
    if (!reading.ok) problems.add(`#/requirement/${end}`, reading.detail);
  }
}

function checkAccent({ accent, theme }: EmbedDefinition, problems: Problems): void {
  if (accent === undefined) return;
  for (const { ground, contrast, enough } of accentContrasts(accent, theme)) {
    if (enough) continue;
    const found = (Math.floor(contrast * 10) / 10).toFixed(1);
    problems.add(
      "#/accent",
      `has a contrast of ${found} on the ${ground} ground; ${LEAST_CONTRAST} is the least that can be seen.`,
    );
  }
}

/** The widget must answer as it opens. */
function checkDefaults(
  definition: EmbedDefinition,
  problems: Problems,
  material: (id: string) => Material | undefined,
): void {
  try {
    computeResistance(widgetRequest(definition, { values: {} }), { material });
  } catch (error) {
    if (error instanceof CheckFailure) {
      problems.add("#/inputs", "The engine's own checks fail for these values. Please report this widget.");
      return;
    }
    if (!(error instanceof InputError)) throw error;
    for (const { pointer, detail } of widgetComplaints(definition, error.errors)) {
      const name = decodeURIComponent(pointer.replace(/^#\/values\//, ""));
      const index = definition.inputs.findIndex((input) => input.name === name);
      problems.add(index < 0 ? "#/inputs" : `#/inputs/${index}/value`, detail);
    }
  }
}
