"use client";

import { QuantityInput } from "../../../_ui/quantity-input";
import type { PlainForm } from "./form-context";

/** Limits that the answer is held against. */
export function RequirementFields({ form }: { readonly form: PlainForm }) {
  const { parameters, change, errorAt } = form;
  const field = (name: "min" | "max", label: string) => (
    <QuantityInput
      name={name}
      label={label}
      kind="resistance"
      placeholder="none"
      value={parameters[name] ?? ""}
      error={errorAt(name)}
      onChange={(text) => change({ [name]: text === "" ? undefined : text })}
    />
  );
  return (
    <fieldset>
      <legend className="mb-1 font-semibold">Requirement</legend>
      <div className="grid grid-cols-2 gap-x-2">
        {field("min", "At least")}
        {field("max", "At most")}
      </div>
    </fieldset>
  );
}
