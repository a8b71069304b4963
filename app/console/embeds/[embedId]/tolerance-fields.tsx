"use client";

import type { EmbedDefinition, ToleranceRule, Tolerances } from "@/lib/embeds/definition";
import { takesTolerance } from "@/lib/embeds/takes-tolerance";
import type { EmbedDetail } from "../../../api/console/embeds/_server/embed-detail";
import { Select } from "../../../_ui/select";
import { TextField } from "../../../_ui/text-field";
import { Toggle } from "../../../_ui/toggle";
import { ToleranceRuleFields } from "./tolerance-rule-fields";
import type { Draft } from "./use-draft";

interface FieldsProps {
  readonly detail: EmbedDetail;
  readonly draft: Draft;
}

type Uncertainty = Tolerances["uncertainty"];

const METHODS: readonly { readonly value: Uncertainty["method"]; readonly label: string }[] = [
  { value: "propagation", label: "First-order propagation (GUM)" },
  { value: "worst-case", label: "Worst case" },
  { value: "monte-carlo", label: "Monte Carlo (GUM Supplement 1)" },
];

/** What a widget starts with when its tolerances are switched on. */
const FIRST: Tolerances = { uncertainty: { method: "propagation" }, budget: true, inputs: [] };

/** How far the resistance strays: by which method, with a budget or without, and the tolerance of each input. */
export function ToleranceFields({ detail, draft }: FieldsProps) {
  const { definition, change } = draft;
  const { tolerances } = definition;
  // The engine evaluates tolerances on shapes.
  if (definition.outlineId !== undefined) return null;
  const put = (part: Partial<Tolerances>) => tolerances && change({ tolerances: { ...tolerances, ...part } });
  return (
    <section aria-label="Tolerances">
      <h2 className="text-h3! mt-2 mb-0.5">Tolerances</h2>
      <Toggle
        label="Evaluate tolerances"
        checked={tolerances !== undefined}
        onChange={(on) => change({ tolerances: on ? FIRST : undefined })}
      />
      {tolerances ? (
        <>
          <p className="mb-1 max-w-prose text-small text-ink-soft">
            Visitors see the range beside the bounds, and a verdict that counts it in. ± a quantity such as
            0.1 mm or 5 K, or a share such as 1 %. A material brings its own stated uncertainty.
          </p>
          <MethodFields draft={draft} uncertainty={tolerances.uncertainty} put={put} />
          <Toggle
            label="Show the tolerance budget"
            checked={tolerances.budget}
            onChange={(budget) => put({ budget })}
          />
          {tolerable(detail, definition).map(({ name, label, symbol, first }) => (
            <ToleranceRuleFields
              key={name}
              label={label}
              symbol={symbol}
              first={first}
              rule={tolerances.inputs.find((own) => own.name === name)?.rule}
              errorAt={(place) => errorAt(draft, name, place)}
              onChange={(rule) => put({ inputs: withRule(tolerances.inputs, name, rule) })}
            />
          ))}
        </>
      ) : null}
    </section>
  );
}

interface MethodProps {
  readonly draft: Draft;
  readonly uncertainty: Uncertainty;
  readonly put: (part: Partial<Tolerances>) => void;
}

function MethodFields({ draft, uncertainty, put }: MethodProps) {
  const problemAt = (member: string) =>
    draft.problems.find(({ pointer }) => pointer === `#/tolerances/uncertainty/${member}`)?.detail;
  const set = (next: Uncertainty) => put({ uncertainty: next });
  return (
    <div className="grid gap-x-2 narrow:grid-cols-2">
      <Select
        label="Evaluated by"
        value={uncertainty.method}
        options={METHODS}
        onChange={(event) => {
          const found = METHODS.find(({ value }) => value === event.target.value);
          if (found) set({ method: found.value });
        }}
      />
      {uncertainty.method === "monte-carlo" ? (
        <div className="grid grid-cols-2 gap-x-1">
          {(["trials", "seed"] as const).map((member) => (
            <TextField
              key={member}
              label={member === "trials" ? "Trials" : "Seed"}
              prose={false}
              inputMode="numeric"
              placeholder={member === "trials" ? "100000" : "1"}
              value={uncertainty[member] ?? ""}
              error={problemAt(member)}
              onChange={(event) => {
                const digits = event.target.value.replace(/\D/g, "").slice(0, 15);
                set({ ...uncertainty, [member]: digits === "" ? undefined : Number(digits) });
              }}
            />
          ))}
        </div>
      ) : null}
    </div>
  );
}

interface Tolerable {
  readonly name: string;
  readonly label: string;
  readonly symbol: string;
  /** What its tolerance starts as: a temperature's is a difference, every other quantity can stray by a share of itself. */
  readonly first: string;
}

/** The widget's inputs that may have a tolerance, in its order and in its words. */
function tolerable(detail: EmbedDetail, { inputs }: EmbedDefinition): readonly Tolerable[] {
  return inputs.flatMap(({ name, rule }) => {
    const input = detail.inputs.find((known) => known.name === name);
    if (!input || !takesTolerance(input)) return [];
    const own = rule.mode === "hidden" ? undefined : rule.label;
    return [
      {
        name,
        label: own ?? input.label,
        symbol: input.symbol,
        first: input.kind === "temperature" ? "5 K" : "1 %",
      },
    ];
  });
}

function withRule(
  inputs: Tolerances["inputs"],
  name: string,
  rule: ToleranceRule | undefined,
): Tolerances["inputs"] {
  const index = inputs.findIndex((own) => own.name === name);
  if (!rule) return inputs.filter((own) => own.name !== name);
  return index < 0 ? [...inputs, { name, rule }] : inputs.with(index, { name, rule });
}

function errorAt({ definition, problems }: Draft, name: string, place: string): string | undefined {
  const index = definition.tolerances?.inputs.findIndex((own) => own.name === name) ?? -1;
  // A text of a wrong form is refused with the whole definition, and so by its own path.
  const own = [`#/tolerances/inputs/${index}/${place}`, `#/tolerances/inputs/${index}/rule/${place}`];
  return problems.find(({ pointer }) => own.includes(pointer))?.detail;
}
