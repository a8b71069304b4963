import "server-only";
import { readSetting } from "@/db/queries/settings";
import { frameDrawing } from "@/app/api/embed/_server/frame-drawing";
import { readGeometry } from "@/app/(site)/calculate/_server/geometry";
import type { EmbedDefinition, InputRule } from "@/lib/embeds/definition";
import { widgetRequest } from "@/lib/embeds/enforce";
import { type InputFacts, inputsOf } from "@/lib/embeds/inputs";
import { speechOf } from "@/lib/embeds/language";
import type { ShownEmbed } from "@/lib/embeds/show-embed";
import { issueEmbedToken } from "@/lib/embeds/token";
import { findShape, InputError, type Shape } from "@/lib/engine";
import { usableMaterial } from "@/lib/materials/team-materials";
import type { Service } from "@/lib/service/service";
import type { UnitKind } from "../../_ui/quantity/units";
import { wordsOf } from "../_words/choose";
import { filled, type Words } from "../_words/words";
import type { FrameView, OpenInput } from "./frame-view";
import { shownQuantity } from "./local-number";

interface Asked {
  /** Language that the page around asks for. */
  readonly language: string | undefined;
  readonly acceptLanguage: string | null;
  /** Origin of the page around; empty where it is not known or not one of the widget's. */
  readonly host: string;
  readonly preview: boolean;
  /** Values in the frame's address, by name. */
  readonly values: Readonly<Record<string, string>>;
  /** Own origins: the configured one and the one that was called. */
  readonly own: readonly string[];
}

/** What a frame shows of a version, with the token it computes with. */
export async function frameViewOf(
  service: Service,
  shown: ShownEmbed,
  asked: Asked,
): Promise<FrameView | null> {
  const { embed, version, definition } = shown;
  const shape = findShape(definition.shape);
  if (!shape) return null;
  const { language, locale } = speechOf(definition.language, asked.language, asked.acceptLanguage);
  const words = wordsOf(language);
  const facts = inputsOf(shape);
  const context: Naming = { service, teamId: embed.teamId, shape, words, locale };
  const open: OpenInput[] = [];
  const fixed: FrameView["fixed"][number][] = [];
  for (const { name, rule } of definition.inputs) {
    const input = facts.get(name);
    if (!input || rule.mode === "hidden") continue;
    if (rule.mode === "open") open.push(openInput(input, rule, context));
    else {
      const label = rule.label ?? named(input, words);
      fixed.push({ name, label, symbol: input.symbol, text: valueText(input, rule.value, context) });
    }
  }
  const start = Object.fromEntries(open.map(({ name, value }) => [name, asked.values[name] ?? value]));
  const binding = { embedId: embed.id, version, host: asked.host, preview: asked.preview };
  return {
    embed: embed.id,
    title: definition.title,
    intro: definition.intro ?? null,
    open,
    fixed,
    requirement: requirementText(definition, words, locale),
    show: definition.show,
    accent: definition.accent ?? null,
    density: definition.density,
    locale,
    words,
    owner: ownerText(service, embed.teamName),
    service: service.config.origin,
    cautions: shape.cautions,
    coordinateLabel: shape.coordinates.find(({ role }) => role === "along")?.label ?? "",
    preview: asked.preview,
    hosts: [...new Set([...asked.own, ...embed.origins])],
    token: await issueEmbedToken(service.config.secret, binding, service.now()),
    start,
    drawing: definition.show.drawing ? firstDrawing(definition, shape, start) : null,
  };
}

interface Naming {
  readonly service: Service;
  readonly teamId: string;
  readonly shape: Shape;
  readonly words: Words;
  readonly locale: string;
}

function openInput(
  input: InputFacts,
  rule: Extract<InputRule, { mode: "open" }>,
  context: Naming,
): OpenInput {
  const { words, locale, shape } = context;
  const { name, type, kind, gauge } = input;
  const catalogued = type === "choice" ? input.choices : null;
  const listed = rule.choices?.map((choice) => ({
    value: choice.value,
    label: choice.label ?? valueText(input, choice.value, context),
  }));
  const fields = shape.dimensions;
  const line = Object.entries(fields).find(
    ([, dimension]) =>
      dimension.type === "quantity" && (dimension.diameter === name || dimension.radius === name),
  );
  return {
    name,
    label: rule.label ?? named(input, words),
    symbol: input.symbol,
    help: rule.help ?? null,
    value: rule.value,
    type: type === "material" || type === "flag" ? "choice" : type,
    kind: unitKind(kind),
    bareUnit: null,
    foil: gauge === "foil",
    line: line?.[0] ?? name,
    range: rangeText(rule, words, locale),
    choices: listed ?? catalogued,
  };
}

const UNIT_KINDS: readonly UnitKind[] = [
  "length",
  "area",
  "angle",
  "temperature",
  "temperatureCoefficient",
  "resistivity",
  "conductivity",
  "sheetResistance",
  "resistance",
  "voltage",
  "current",
  "power",
  "density",
];

function unitKind(kind: string | null): UnitKind {
  return UNIT_KINDS.find((known) => known === kind) ?? "number";
}

/** The catalogue's name of an input, in the frame's language where it is a common one. */
function named({ label }: InputFacts, words: Words): string {
  return words.names[label] ?? label;
}

function valueText(input: InputFacts, value: string, { service, teamId, locale }: Naming): string {
  if (input.type === "material") return usableMaterial(service.db, teamId, value)?.name ?? value;
  const choice = input.choices.find((entry) => entry.value === value);
  return choice ? choice.label : shownQuantity(value, locale);
}

function rangeText(
  { min, max }: { readonly min?: string; readonly max?: string },
  words: Words,
  locale: string,
): string | null {
  const [low, high] = [min, max].map((text) => (text === undefined ? null : shownQuantity(text, locale)));
  if (low !== null && high !== null) return filled(words.between, low, high);
  if (low !== null) return filled(words.atLeast, low);
  return high === null ? null : filled(words.atMost, high);
}

function requirementText({ requirement }: EmbedDefinition, words: Words, locale: string): string | null {
  return requirement ? rangeText(requirement, words, locale) : null;
}

function ownerText({ db }: Service, teamName: string): string {
  const organisation = readSetting(db, "organisation");
  const name =
    typeof organisation === "object" && organisation !== null && "name" in organisation
      ? String(organisation.name)
      : "";
  return name === "" ? teamName : `${teamName}, ${name}`;
}

function firstDrawing(
  definition: EmbedDefinition,
  shape: Shape,
  values: Readonly<Record<string, string>>,
): FrameView["drawing"] {
  for (const given of [values, {}]) {
    try {
      const { dimensions } = widgetRequest(definition, { values: given });
      const reading = readGeometry(shape, Object(dimensions) as Record<string, unknown>);
      if (reading.ok) return frameDrawing(definition, reading.geometry);
    } catch (error) {
      if (!(error instanceof InputError)) throw error;
    }
  }
  return null;
}
