import {
  CheckFailure,
  computeResistance,
  FEWEST_TRIALS,
  type FieldContext,
  InputError,
  type Material,
  prepareField,
  Problems,
  type Problem,
  readQuantity,
  type StoredOutline,
} from "@/lib/engine";
import { accentContrasts, LEAST_CONTRAST } from "./contrast";
import type { EmbedDefinition, InputRule, ToleranceRule } from "./definition";
import { refusalOf, widgetComplaints, widgetRequest } from "./enforce";
import { definitionInputs, type InputFacts, sizeOf } from "./inputs";
import { takesTolerance } from "./takes-tolerance";
import { readTolerance, toleranceName, toleranceRefusal } from "./tolerances";

/**
 * What stands in the way of publishing a version: inputs that there are not, ranges that contradict themselves or
 * their default, an accent that cannot be seen, and what the engine says of the defaults. Pointers go into the definition.
 */
export function definitionProblems(
  definition: EmbedDefinition,
  material: (id: string) => Material | undefined,
  outline: (id: string) => StoredOutline | undefined = () => undefined,
): readonly Problem[] {
  const problems = new Problems();
  const facts = definitionInputs(definition);
  if (!facts) return [{ pointer: "#/shape", detail: "is not a shape of the catalogue." }];
  definition.inputs.forEach(({ name, rule }, index) => {
    const pointer = `#/inputs/${index}`;
    const input = facts.get(name);
    if (!input) problems.add(`${pointer}/name`, `${name} is not an input of this widget.`);
    else checkRule(rule, input, pointer, problems, material);
  });
  if (definition.graded && definition.inputs.some(({ name }) => facts.get(name)?.place === "medium")) {
    problems.add("#/graded", "stands beside other members of the medium; give one or the other.");
  }
  checkTolerances(definition, facts, problems);
  checkRequirement(definition, problems);
  checkAccent(definition, problems);
  if (definition.outlineId === undefined) checkShapeOnly(definition, problems);
  else checkOutlineOnly(definition, problems);
  if (!problems.any) checkDefaults(definition, problems, { material, outline });
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

function checkTolerances(
  { inputs, tolerances }: EmbedDefinition,
  facts: ReadonlyMap<string, InputFacts>,
  problems: Problems,
): void {
  for (const [index, { name, rule }] of (tolerances?.inputs ?? []).entries()) {
    const pointer = `#/tolerances/inputs/${index}`;
    const input = facts.get(name);
    const about = inputs.find((own) => own.name === name)?.rule.value;
    if (!input || about === undefined) problems.add(`${pointer}/name`, `${name} is no input of this widget.`);
    else if (!takesTolerance(input)) problems.add(`${pointer}/name`, `${name} takes no tolerance.`);
    else checkTolerance(rule, about, input, pointer, problems);
  }
}

function checkTolerance(
  rule: ToleranceRule,
  about: string,
  input: InputFacts,
  pointer: string,
  problems: Problems,
): void {
  const limits = rule.mode === "open" ? (["min", "max"] as const) : [];
  const sizes = limits.map((end) => {
    const text = rule.mode === "open" ? rule[end] : undefined;
    if (text === undefined) return undefined;
    const reading = readTolerance(text, about, input);
    if (!reading.ok) problems.add(`${pointer}/${end}`, reading.detail);
    return reading.ok ? reading.size : undefined;
  });
  const [min, max] = sizes;
  if (min !== undefined && max !== undefined && min > max) {
    problems.add(`${pointer}/max`, "must not be below the smallest tolerance.");
  }
  const refused = toleranceRefusal(rule.value, about, rule, input);
  if (refused !== undefined) problems.add(`${pointer}/value`, refused);
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

function checkShapeOnly({ terminals, accuracy }: EmbedDefinition, problems: Problems): void {
  if (terminals !== undefined) problems.add("#/terminals", "belongs to an outline; a shape has its own.");
  if (accuracy !== undefined)
    problems.add("#/accuracy", "belongs to an outline; a shape has its own bounds.");
}

function checkOutlineOnly({ graded, tolerances }: EmbedDefinition, problems: Problems): void {
  if (graded) problems.add("#/graded", "belongs to a shape; fill the outline by one of the inputs.");
  if (tolerances) problems.add("#/tolerances", "belongs to a shape; a field solution takes no tolerances.");
}

/** The widget must answer as it opens. On an outline everything is checked but the solution itself. */
function checkDefaults(definition: EmbedDefinition, problems: Problems, context: FieldContext): void {
  const request = widgetRequest(definition, { values: {} });
  // Whether there is an answer does not hang on how often it is tried.
  if (definition.tolerances?.uncertainty.method === "monte-carlo") {
    request.uncertainty = { method: "monte-carlo", trials: FEWEST_TRIALS };
  }
  try {
    if (definition.outlineId === undefined) computeResistance(request, context);
    else prepareField(request, context);
  } catch (error) {
    if (error instanceof CheckFailure) {
      problems.add("#/inputs", "The engine's own checks fail for these values. Please report this widget.");
      return;
    }
    if (!(error instanceof InputError)) throw error;
    const [own, others] = divided(error.errors);
    for (const { pointer, detail } of own) problems.add(pointer, detail);
    for (const { pointer, detail } of widgetComplaints(definition, others)) {
      const name = decodeURIComponent(pointer.replace(/^#\/values\//, ""));
      problems.add(placeOf(name, definition), detail);
    }
  }
}

/** Complaints about what the definition itself calls as the request does, and those about inputs. */
function divided(complaints: readonly Problem[]): readonly [readonly Problem[], readonly Problem[]] {
  const own = complaints.filter(({ pointer }) => /^#\/(?:outlineId|terminals)(?:\/|$)/.test(pointer));
  return [own, complaints.filter((complaint) => !own.includes(complaint))];
}

/** Where the definition says what a value of the page starts with. */
function placeOf(name: string, { inputs, tolerances }: EmbedDefinition): string {
  const index = inputs.findIndex((input) => input.name === name);
  if (index >= 0) return `#/inputs/${index}/value`;
  const own = tolerances?.inputs.findIndex((input) => toleranceName(input.name) === name) ?? -1;
  return own < 0 ? "#/inputs" : `#/tolerances/inputs/${own}/value`;
}
