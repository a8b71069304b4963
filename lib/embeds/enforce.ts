import { InputError, type Problem, Problems } from "@/lib/engine";
import type { EmbedDefinition, InputRule, ToleranceRule } from "./definition";
import { definitionInputs, type InputFacts, sizeOf } from "./inputs";
import { openTolerances, toleranceName, toleranceRefusal } from "./tolerances";

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
  const facts = definitionInputs(definition);
  if (!facts)
    throw new InputError([{ pointer: "#", detail: "The shape of this widget is not in the catalogue." }]);
  const { shape, outlineId, terminals, accuracy } = definition;
  // Members left undefined are none.
  const request: Record<string, unknown> =
    outlineId === undefined ? { shape, dimensions: {} } : { outlineId, terminals, accuracy, medium: {} };
  for (const { input, value, tolerance } of readInputs(definition, facts, body)) {
    place(request, input, value, tolerance);
  }
  if (definition.graded) request.medium = { graded: definition.graded };
  if (definition.requirement) request.requirement = definition.requirement;
  if (definition.tolerances) request.uncertainty = definition.tolerances.uncertainty;
  if (outlineId !== undefined) return request;
  request.include = definition.show.plots ? ["checks", "profile"] : ["checks"];
  return request;
}

/** The dimensions alone, without their tolerances: for the drawing. */
export function widgetDimensions(definition: EmbedDefinition, body: unknown): Record<string, unknown> {
  const facts = definitionInputs(definition);
  const inputs = facts ? readInputs(definition, facts, body) : [];
  const request: Record<string, unknown> = {};
  for (const { input, value } of inputs) {
    if (input.place === "dimension") place(request, input, value);
  }
  return isObject(request.dimensions) ? request.dimensions : {};
}

interface GivenInput {
  readonly input: InputFacts;
  readonly value: string;
  readonly tolerance?: Pick<ToleranceRule, "value" | "distribution">;
}

/** Every input with what counts for it: the page's value where it is open, and the definition's where it is not. */
function readInputs(
  definition: EmbedDefinition,
  facts: ReadonlyMap<string, InputFacts>,
  body: unknown,
): readonly GivenInput[] {
  const problems = new Problems();
  const values = readValues(body, definition, problems);
  const inputs = definition.inputs.flatMap(({ name, rule }): GivenInput[] => {
    const input = facts.get(name);
    if (!input) return [];
    const given = rule.mode === "open" ? values[name] : undefined;
    if (given !== undefined && rule.mode === "open") {
      const complaint = refusalOf(given, rule, input);
      if (complaint !== undefined) problems.add(pointerOf(name), complaint);
    }
    const value = given ?? rule.value;
    const own = definition.tolerances?.inputs.find((tolerance) => tolerance.name === name)?.rule;
    if (!own) return [{ input, value }];
    const set = own.mode === "open" ? values[toleranceName(name)] : undefined;
    const complaint = set === undefined ? undefined : toleranceRefusal(set, value, own, input);
    if (complaint !== undefined) problems.add(pointerOf(toleranceName(name)), complaint);
    return [{ input, value, tolerance: { value: set ?? own.value, distribution: own.distribution } }];
  });
  problems.throwIfAny();
  return inputs;
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
  const open = new Set([
    ...definition.inputs.filter(({ rule }) => rule.mode === "open").map(({ name }) => name),
    ...openTolerances(definition).map(({ name }) => toleranceName(name)),
  ]);
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

function sameText(one: string, other: string): boolean {
  return one.replace(/\s+/g, "") === other.replace(/\s+/g, "");
}

function place(
  request: Record<string, unknown>,
  input: InputFacts,
  text: string,
  tolerance?: GivenInput["tolerance"],
): void {
  let target = request;
  for (const part of input.path.slice(0, -1)) {
    const next = target[part];
    target = isObject(next) ? next : (target[part] = {});
  }
  const [last] = input.path.slice(-1);
  if (tolerance) {
    const { value, distribution } = tolerance;
    target[last] = { value: text, tolerance: value, ...(distribution ? { distribution } : {}) };
  } else if (input.type === "integer" && /^[+-]?\d{1,15}$/.test(text)) target[last] = Number(text);
  else target[last] = input.type === "flag" ? text === "true" : text;
}

/**
 * The engine's complaints as the widget's page can use them: those about an open input or its tolerance at that input,
 * everything else at the whole, without the values that the widget does not show.
 */
export function widgetComplaints(
  definition: EmbedDefinition,
  complaints: readonly Problem[],
): readonly Problem[] {
  const facts = definitionInputs(definition) ?? new Map<string, InputFacts>();
  const hidden = definition.inputs.some(({ rule }) => rule.mode === "hidden");
  const tolerances = new Map(definition.tolerances?.inputs.map(({ name, rule }) => [name, rule]));
  return complaints.map(({ pointer, detail }) => {
    const [found, member] = inputAt(pointer, definition, facts);
    const tolerance = found && tolerances.get(found.name);
    // What a tolerance reaches is told with the values of the other inputs.
    const text = hidden && (tolerance || pointer.startsWith("#/uncertainty")) ? REACHES : detail;
    if (tolerance?.mode === "open" && (member === "tolerance" || found?.rule.mode !== "open")) {
      return { pointer: pointerOf(toleranceName(found?.name ?? "")), detail: text };
    }
    if (found?.rule.mode === "open") {
      const own = member === "tolerance" ? `has a tolerance of ±${tolerance?.value}, which ${text}` : text;
      return { pointer: pointerOf(found.name), detail: own };
    }
    if (found?.rule.mode === "fixed" || !hidden) {
      return { pointer: "#", detail: found ? `${found.name} ${text}` : detail };
    }
    return {
      pointer: "#",
      detail: text === REACHES ? `A tolerance ${text}` : "These values do not go together.",
    };
  });
}

const REACHES = "reaches values for which there is no answer; make it smaller.";

/** The input that a pointer of the engine is about, and the member of it: "tolerance" or nothing. */
function inputAt(
  pointer: string,
  { inputs }: EmbedDefinition,
  facts: ReadonlyMap<string, InputFacts>,
): readonly [found: EmbedDefinition["inputs"][number] | undefined, member: string | undefined] {
  for (const input of inputs) {
    const place = `#/${facts.get(input.name)?.path.map(escaped).join("/")}`;
    if (pointer === place || pointer === `${place}/value`) return [input, undefined];
    if (pointer.startsWith(`${place}/`)) return [input, "tolerance"];
  }
  return [undefined, undefined];
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
