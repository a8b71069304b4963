"use client";

import type { ToleranceRule } from "@/lib/embeds/definition";
import { QuantitySymbol } from "../../../_ui/quantity-symbol";
import { Select } from "../../../_ui/select";
import { TextField } from "../../../_ui/text-field";
import { DISTRIBUTIONS } from "../../../(site)/calculate/_model/tolerances";

const WAYS = [
  { value: "none", label: "None" },
  { value: "fixed", label: "Fixed" },
  { value: "open", label: "Open to visitors" },
];

interface RuleProps {
  readonly label: string;
  readonly symbol: string;
  /** What a new tolerance starts as. */
  readonly first: string;
  /** Undefined where the input has no tolerance. */
  readonly rule: ToleranceRule | undefined;
  readonly errorAt: (place: "name" | "value" | "min" | "max") => string | undefined;
  readonly onChange: (rule: ToleranceRule | undefined) => void;
}

/** The tolerance of one input: none, one that counts for every visitor, or one that they may change within limits. */
export function ToleranceRuleFields({ label, symbol, first, rule, errorAt, onChange }: RuleProps) {
  return (
    <fieldset className="border-t border-rule pt-1">
      <legend className="sr-only">Tolerance of {label}</legend>
      <p aria-hidden className="text-table font-medium">
        {label} {symbol ? <QuantitySymbol text={symbol} /> : null}
      </p>
      <div className="grid gap-x-2 narrow:grid-cols-3">
        <Select
          label="Tolerance"
          value={rule?.mode ?? "none"}
          options={WAYS}
          error={errorAt("name")}
          onChange={(event) => onChange(changedWay(rule, event.target.value, first))}
        />
        {rule ? (
          <>
            <TextField
              label={rule.mode === "open" ? "± starts with" : "±"}
              prose={false}
              value={rule.value}
              error={errorAt("value")}
              onChange={(event) => onChange({ ...rule, value: event.target.value })}
            />
            <Select
              label="Spread"
              value={rule.distribution ?? "uniform"}
              options={DISTRIBUTIONS}
              onChange={(event) => {
                const found = DISTRIBUTIONS.find(({ value }) => value === event.target.value)?.value;
                onChange({ ...rule, distribution: found === "uniform" ? undefined : found });
              }}
            />
          </>
        ) : null}
      </div>
      {rule?.mode === "open" ? (
        <div className="grid grid-cols-2 gap-x-2">
          <TextField
            label="From"
            prose={false}
            placeholder="0"
            value={rule.min ?? ""}
            error={errorAt("min")}
            onChange={(event) => onChange({ ...rule, min: event.target.value || undefined })}
          />
          <TextField
            label="Up to"
            prose={false}
            placeholder="no limit"
            value={rule.max ?? ""}
            error={errorAt("max")}
            onChange={(event) => onChange({ ...rule, max: event.target.value || undefined })}
          />
        </div>
      ) : null}
    </fieldset>
  );
}

function changedWay(rule: ToleranceRule | undefined, way: string, first: string): ToleranceRule | undefined {
  if (way === "none") return undefined;
  const kept = { value: rule?.value ?? first, distribution: rule?.distribution };
  return way === "open" ? { mode: "open", ...kept } : { mode: "fixed", ...kept };
}
