"use client";

import { ArrowUp, X } from "lucide-react";
import type { InputRule } from "@/lib/embeds/definition";
import type { InputFacts } from "@/lib/embeds/inputs";
import { Button } from "../../../_ui/button";
import { QuantitySymbol } from "../../../_ui/quantity-symbol";
import { Select } from "../../../_ui/select";
import { TextField } from "../../../_ui/text-field";
import { ChoicesField, type Material } from "./choices-field";

type Way = "fixed" | "hidden" | "open" | "range" | "list";

const WAYS: readonly { readonly value: Way; readonly label: string }[] = [
  { value: "fixed", label: "Fixed, shown" },
  { value: "hidden", label: "Fixed, hidden" },
  { value: "open", label: "Open" },
  { value: "range", label: "Open within a range" },
  { value: "list", label: "Open, from a list" },
];

interface RuleProps {
  readonly name: string;
  readonly input: InputFacts | undefined;
  readonly rule: InputRule;
  readonly materials: readonly Material[];
  readonly errors: readonly { readonly place: string; readonly detail: string }[];
  readonly onChange: (rule: InputRule) => void;
  readonly onRemove: () => void;
  /** Undefined for the first. */
  readonly onUp?: () => void;
}

/** One input's rule. */
export function InputRuleFields(props: RuleProps) {
  const { name, input, rule, materials, errors, onChange, onRemove, onUp } = props;
  const label = input?.label ?? name;
  const way = wayOf(rule);
  const errorAt = (...places: readonly string[]) =>
    errors.find(({ place }) => places.includes(place))?.detail;
  const ways = WAYS.filter(({ value }) => allowed(value, input));
  const isMaterial = input?.type === "material";
  const choices = isMaterial
    ? materials.map(({ id, name: title }) => ({ value: id, label: title }))
    : (input?.choices ?? []);
  return (
    <fieldset className="border-t border-rule pt-1">
      <legend className="sr-only">{label}</legend>
      <div className="flex items-center gap-1">
        <p aria-hidden className="grow text-table font-medium">
          {label} {input?.symbol ? <QuantitySymbol text={input.symbol} /> : null}
        </p>
        {onUp ? (
          <Button variant="quiet" aria-label={`Move ${label} up`} onClick={onUp}>
            <ArrowUp aria-hidden size={16} />
          </Button>
        ) : null}
        <Button variant="quiet" aria-label={`Remove ${label}`} onClick={onRemove}>
          <X aria-hidden size={16} />
        </Button>
      </div>
      <div className="grid gap-x-2 narrow:grid-cols-2">
        <Select
          label="Visitors"
          value={way}
          options={ways}
          onChange={(event) => {
            const next = WAYS.find(({ value }) => value === event.target.value);
            if (next) onChange(changedWay(rule, next.value, choices));
          }}
        />
        {choices.length > 0 ? (
          <Select
            label={rule.mode === "open" ? "Starts with" : "Value"}
            value={rule.value}
            options={choices}
            error={errorAt("value", "")}
            onChange={(event) => onChange({ ...rule, value: event.target.value })}
          />
        ) : (
          <TextField
            label={rule.mode === "open" ? "Starts with" : "Value"}
            prose={false}
            value={rule.value}
            error={errorAt("value", "")}
            onChange={(event) => onChange({ ...rule, value: event.target.value })}
          />
        )}
        {way === "range" && rule.mode === "open" ? (
          <>
            <TextField
              label="From"
              prose={false}
              placeholder="no limit"
              value={rule.min ?? ""}
              error={errorAt("min")}
              onChange={(event) => onChange({ ...rule, min: event.target.value || undefined })}
            />
            <TextField
              label="To"
              prose={false}
              placeholder="no limit"
              value={rule.max ?? ""}
              error={errorAt("max")}
              onChange={(event) => onChange({ ...rule, max: event.target.value || undefined })}
            />
          </>
        ) : null}
        {rule.mode === "hidden" ? null : (
          <TextField
            label="Label"
            placeholder={label}
            value={rule.label ?? ""}
            maxLength={60}
            onChange={(event) => onChange({ ...rule, label: event.target.value || undefined })}
          />
        )}
        {rule.mode === "open" ? (
          <TextField
            label="Help"
            placeholder="none"
            value={rule.help ?? ""}
            maxLength={200}
            onChange={(event) => onChange({ ...rule, help: event.target.value || undefined })}
          />
        ) : null}
      </div>
      {way === "list" && rule.mode === "open" ? (
        <ChoicesField
          rule={rule}
          materials={isMaterial ? materials : null}
          error={errorAt("choices")}
          onChange={onChange}
        />
      ) : null}
    </fieldset>
  );
}

function wayOf(rule: InputRule): Way {
  if (rule.mode !== "open") return rule.mode;
  if (rule.choices) return "list";
  return rule.min !== undefined || rule.max !== undefined ? "range" : "open";
}

function allowed(way: Way, input: InputFacts | undefined): boolean {
  switch (input?.type) {
    case "material":
      return way !== "open" && way !== "range";
    case "flag":
      return way === "fixed" || way === "hidden";
    case "choice":
      return way !== "range";
    default:
      return true;
  }
}

function changedWay(
  rule: InputRule,
  way: Way,
  choices: readonly { readonly value: string; readonly label: string }[],
): InputRule {
  const { value } = rule;
  const label = rule.mode === "hidden" ? {} : { label: rule.label };
  const words = rule.mode === "open" ? { ...label, help: rule.help } : label;
  if (way === "hidden") return { mode: "hidden", value };
  if (way === "fixed") return { mode: "fixed", value, ...label };
  if (way === "range") return { mode: "open", value, ...words, min: value, max: value };
  if (way === "open") return { mode: "open", value, ...words };
  const known = choices.find((choice) => choice.value === value);
  return { mode: "open", value, ...words, choices: [known ? { value, label: known.label } : { value }] };
}
