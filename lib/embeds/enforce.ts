import { findShape, InputError, type Problem, Problems, readQuantity } from "@/lib/engine";
import type { EmbedDefinition, InputRule } from "./definition";
import { type InputFacts, inputsOf } from "./inputs";

/** What a widget's page sends: the values of open inputs by name; those left out keep their default. */
export type OpenValues = Readonly<Record<string, string>>;

const LONGEST_VALUE = 120;

type OpenRule = Extract<InputRule, { mode: "open" }>;

/**
 * The whole request that a widget's open values stand for. Everything else comes from the definition, so that no page
 * can change it.
 * @param body What came: `{ "values": { … } }` or nothing in it.
 * @throws InputError for whatever the definition does not leave open, with pointers below `#/values`.
 */
export function widgetRequest(definition: EmbedDefinition, body: unknown): Record<string, unknown> {
  const shape = findShape(definition.shape);
  if (!shape)
    throw new InputError([{ pointer: "#", detail: "The shape of this widget is not in the catalogue." }]);
  const facts = inputsOf(shape);
  const problems = new Problems();
  const values = readValues(body, definition, problems);
  const request: Record<string, unknown> = { shape: definition.shape, dimensions: {} };
  for (const { name, rule } of definition.inputs) {
    const input = facts.get(name);
    if (!input) continue;
    const given = rule.mode === "open" ? values[name] : undefined;
    if (given !== undefined && rule.mode === "open") {
      const complaint = refusalOf(given, rule, input);
      if (complaint !== undefined) problems.add(pointerOf(name), complaint);
    }
    place(request, input, given ?? rule.value);
  }
  problems.throwIfAny();
  if (definition.graded) request.medium = { graded: definition.graded };
  if (definition.requirement) request.requirement = definition.requirement;
  request.include = definition.show.plots ? ["checks", "profile"] : ["checks"];
  return request;
}

function readValues(body: unknown, definition: EmbedDefinition, problems: Problems): OpenValues {
  if (!isObject(body)) {
    problems.add("#", 'must be an object such as { "values": { "width": "20 mm" } }.');
    return {};
  }
  for (const name of Object.keys(body).slice(0, 20)) {
    if (name !== "values") problems.add(`#/${escaped(name)}`, "is not for a widget to say: it sends values.");
  }
  const { values = {} } = body;
  if (!isObject(values)) {
    problems.add("#/values", "must be an object of open inputs by name.");
    return {};
  }
  const open = new Set(definition.inputs.filter(({ rule }) => rule.mode === "open").map(({ name }) => name));
  const read: Record<string, string> = {};
  for (const [name, value] of Object.entries(values).slice(0, 100)) {
    const pointer = pointerOf(name);
    if (!open.has(name)) problems.add(pointer, "is not open in this widget.");
    else if (typeof value === "number" && Number.isFinite(value)) read[name] = String(value);
    else if (typeof value !== "string") problems.add(pointer, "must be a text or a number.");
    else if (value.length > LONGEST_VALUE)
      problems.add(pointer, `is longer than ${LONGEST_VALUE} characters.`);
    else read[name] = value.trim();
  }
  return read;
}

/** Why the definition does not allow a value; undefined where it does, or where the engine will say what is wrong. */
export function refusalOf(
  value: string,
  rule: Pick<OpenRule, "min" | "max" | "choices">,
  input: InputFacts,
): string | undefined {
  if (rule.choices) {
    const allowed = rule.choices.some((choice) => sameText(choice.value, value));
    return allowed ? undefined : `must be one of ${rule.choices.map((choice) => choice.value).join(", ")}.`;
  }
  if (rule.min === undefined && rule.max === undefined) return undefined;
  const size = sizeOf(value, input);
  // What cannot be read has no size to compare, and the engine refuses it with the reason.
  if (size === undefined) return input.type === "quantity" ? undefined : "must be a whole number.";
  const min = rule.min === undefined ? undefined : sizeOf(rule.min, input);
  const max = rule.max === undefined ? undefined : sizeOf(rule.max, input);
  if ((min === undefined || size >= min) && (max === undefined || size <= max)) return undefined;
  if (rule.min === undefined) return `must be at most ${rule.max}.`;
  if (rule.max === undefined) return `must be at least ${rule.min}.`;
  return `must lie between ${rule.min} and ${rule.max}.`;
}

/** A value in the base unit of its kind; undefined where it cannot be read. */
export function sizeOf(text: string, input: InputFacts): number | undefined {
  if (input.type === "integer") return /^[+-]?\d{1,15}$/.test(text) ? Number(text) : undefined;
  if (input.kind === null) return undefined;
  const reading = readQuantity(text, input.kind, input.gauge ? { gauge: input.gauge } : {});
  return reading.ok ? reading.value : undefined;
}

function sameText(one: string, other: string): boolean {
  return one.replace(/\s+/g, "") === other.replace(/\s+/g, "");
}

function place(request: Record<string, unknown>, input: InputFacts, text: string): void {
  let target = request;
  for (const part of input.path.slice(0, -1)) {
    const next = target[part];
    target = isObject(next) ? next : (target[part] = {});
  }
  const [last] = input.path.slice(-1);
  if (input.type === "integer" && /^[+-]?\d{1,15}$/.test(text)) target[last] = Number(text);
  else target[last] = input.type === "flag" ? text === "true" : text;
}

/**
 * The engine's complaints as the widget's page can use them: those about an open input at that input, everything else
 * at the whole, without the values that the widget does not show.
 */
export function widgetComplaints(
  definition: EmbedDefinition,
  complaints: readonly Problem[],
): readonly Problem[] {
  const shape = findShape(definition.shape);
  const facts = shape ? inputsOf(shape) : new Map<string, InputFacts>();
  const hidden = definition.inputs.some(({ rule }) => rule.mode === "hidden");
  return complaints.map(({ pointer, detail }) => {
    const found = definition.inputs.find(
      ({ name }) => `#/${facts.get(name)?.path.map(escaped).join("/")}` === pointer,
    );
    if (found?.rule.mode === "open") return { pointer: pointerOf(found.name), detail };
    if (found?.rule.mode === "fixed" || !hidden) {
      return { pointer: "#", detail: found ? `${found.name} ${detail}` : detail };
    }
    return { pointer: "#", detail: "These values do not go together." };
  });
}

function pointerOf(name: string): string {
  return `#/values/${escaped(name)}`;
}

function escaped(name: string): string {
  return encodeURIComponent(name.slice(0, 80).replaceAll("~", "~0").replaceAll("/", "~1"));
}

function isObject(value: unknown): value is Record<string, unknown> {
  return typeof value === "object" && value !== null && !Array.isArray(value);
}
