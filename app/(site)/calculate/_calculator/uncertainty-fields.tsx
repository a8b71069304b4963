"use client";

import { CONTROL, Field } from "../../../_ui/field";
import { Select } from "../../../_ui/select";
import { UNCERTAINTY_METHODS, type UncertaintyMethod } from "../_model/tolerances";
import type { PlainForm } from "./form-context";

const METHODS: readonly { readonly value: UncertaintyMethod | ""; readonly label: string }[] = [
  { value: "", label: "Not evaluated" },
  { value: "propagation", label: "First-order propagation (GUM)" },
  { value: "worst-case", label: "Worst case" },
  { value: "monte-carlo", label: "Monte Carlo (GUM Supplement 1)" },
];

interface UncertaintyProps {
  readonly form: PlainForm;
  /** Methods that are offered; all of them if left out. */
  readonly methods?: readonly UncertaintyMethod[];
}

/** How tolerances are evaluated; for Monte Carlo how often, and from which seed. */
export function UncertaintyFields({ form, methods = UNCERTAINTY_METHODS }: UncertaintyProps) {
  const { parameters, change, errorAt } = form;
  const method = parameters.uncertainty ?? "";
  return (
    <fieldset>
      <legend className="mb-1 font-semibold">Tolerances</legend>
      <Select
        label="Evaluated by"
        value={method}
        options={METHODS.filter(({ value }) => value === "" || methods.includes(value))}
        error={errorAt("uncertainty")}
        help={
          method === ""
            ? "Press ± at a quantity to give it a tolerance. A material brings its own."
            : undefined
        }
        onChange={(event) => {
          const next = event.target.value;
          change({
            uncertainty: next === "" ? undefined : next,
            ...(next === "monte-carlo" ? {} : { trials: undefined, seed: undefined }),
          });
        }}
      />
      {method === "monte-carlo" ? (
        <div className="grid grid-cols-2 gap-x-2">
          <WholeNumber form={form} name="trials" label="Trials" placeholder="100000" />
          <WholeNumber form={form} name="seed" label="Seed" placeholder="1" />
        </div>
      ) : null}
    </fieldset>
  );
}

interface WholeNumberProps {
  readonly form: PlainForm;
  readonly name: "trials" | "seed";
  readonly label: string;
  readonly placeholder: string;
}

function WholeNumber({ form, name, label, placeholder }: WholeNumberProps) {
  const { parameters, change, errorAt } = form;
  return (
    <Field label={label} error={errorAt(name)}>
      {(control) => (
        <input
          {...control}
          name={name}
          value={parameters[name] ?? ""}
          placeholder={placeholder}
          onChange={(event) => change({ [name]: event.target.value === "" ? undefined : event.target.value })}
          type="text"
          inputMode="numeric"
          autoComplete="off"
          className={CONTROL}
        />
      )}
    </Field>
  );
}
