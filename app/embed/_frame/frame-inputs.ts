import "server-only";
import type { EmbedDefinition, InputRule, ToleranceRule } from "@/lib/embeds/definition";
import type { InputFacts } from "@/lib/embeds/inputs";
import type { Language } from "@/lib/embeds/language";
import { toleranceName } from "@/lib/embeds/tolerances";
import type { Shape } from "@/lib/engine";
import { usableMaterial } from "@/lib/materials/team-materials";
import type { Service } from "@/lib/service/service";
import type { UnitKind } from "../../_ui/quantity/units";
import { labelIn } from "../_labels/label-in";
import { filled, type Words } from "../_words/words";
import type { FixedInput, FrameTolerances, OpenInput } from "./frame-view";
import { shownQuantity } from "./local-number";

/** In whose words inputs are shown. */
export interface Naming {
  readonly service: Service;
  readonly teamId: string;
  /** Undefined for an outline. */
  readonly shape: Shape | undefined;
  readonly language: Language;
  readonly words: Words;
  readonly locale: string;
}

export interface ShownInputs {
  readonly open: readonly OpenInput[];
  readonly fixed: readonly FixedInput[];
  readonly tolerances: FrameTolerances | null;
}

/** The inputs that a version shows, with their tolerances; nothing of what it hides. */
export function shownInputs(
  definition: EmbedDefinition,
  facts: ReadonlyMap<string, InputFacts>,
  naming: Naming,
): ShownInputs {
  const { words, locale } = naming;
  const open: OpenInput[] = [];
  const fixed: FixedInput[] = [];
  const openTolerances: FrameTolerances["open"][number][] = [];
  const labels: Record<string, string> = {};
  for (const { name, rule } of definition.inputs) {
    const input = facts.get(name);
    if (!input || rule.mode === "hidden") continue;
    const label = rule.label ?? labelIn(naming.language, input.label);
    labels[input.path.join(".")] = input.type === "material" ? filled(words.stated, label) : label;
    const tolerance = definition.tolerances?.inputs.find((own) => own.name === name)?.rule;
    const about = tolerance?.mode === "fixed" ? ` ± ${shownQuantity(tolerance.value, locale)}` : "";
    if (rule.mode === "open") open.push({ ...openInput(input, rule, label, naming), about: about.trim() });
    else {
      const text = `${valueText(input, rule.value, naming)}${about}`;
      fixed.push({ name, label, symbol: input.symbol, text });
    }
    if (tolerance?.mode === "open") {
      openTolerances.push({
        name: toleranceName(name),
        input: name,
        label,
        value: tolerance.value,
        about: rule.value,
        range: rangeText(tolerance, naming),
      });
    }
  }
  const { tolerances } = definition;
  return {
    open,
    fixed,
    tolerances: tolerances
      ? { open: openTolerances, labels, budget: tolerances.budget, method: tolerances.uncertainty.method }
      : null,
  };
}

function openInput(
  input: InputFacts,
  rule: Extract<InputRule, { mode: "open" }>,
  label: string,
  naming: Naming,
): Omit<OpenInput, "about"> {
  const { name, type, kind, gauge, symbol } = input;
  const catalogued =
    type === "choice"
      ? input.choices.map((choice) => ({ ...choice, label: labelIn(naming.language, choice.label) }))
      : null;
  const listed = rule.choices?.map((choice) => ({
    value: choice.value,
    label: choice.label ?? valueText(input, choice.value, naming),
  }));
  const line = Object.entries(naming.shape?.dimensions ?? {}).find(
    ([, dimension]) =>
      dimension.type === "quantity" && (dimension.diameter === name || dimension.radius === name),
  );
  return {
    name,
    label,
    symbol,
    help: rule.help ?? null,
    value: rule.value,
    type: type === "material" || type === "flag" ? "choice" : type,
    kind: unitKind(kind),
    bareUnit: null,
    foil: gauge === "foil",
    line: line?.[0] ?? name,
    range: rangeText(rule, naming),
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

function valueText(input: InputFacts, value: string, naming: Naming): string {
  const { service, teamId, locale, language } = naming;
  if (input.type === "material") return usableMaterial(service.db, teamId, value)?.name ?? value;
  const choice = input.choices.find((entry) => entry.value === value);
  // A number and its unit stay on one line.
  return choice ? labelIn(language, choice.label) : shownQuantity(value, locale).replaceAll(" ", "\u00a0");
}

type Range = Pick<Extract<ToleranceRule, { mode: "open" }>, "min" | "max">;

/** "50 mm to 4 m"; null where there is no limit. */
export function rangeText(
  { min, max }: Range,
  { words, locale }: Pick<Naming, "words" | "locale">,
): string | null {
  const [low, high] = [min, max].map((text) => (text === undefined ? null : shownQuantity(text, locale)));
  if (low !== null && high !== null) return filled(words.between, low, high);
  if (low !== null) return filled(words.atLeast, low);
  return high === null ? null : filled(words.atMost, high);
}
