"use client";

import { QuantityInput } from "../../../_ui/quantity-input";
import type { UnitKind } from "../../../_ui/quantity/units";
import type { MediumForm, PlainForm } from "./form-context";
import { ToleranceButton, ToleranceRow } from "./tolerance-field";

interface PlainMediumProps {
  readonly form: MediumForm;
  readonly prefix: string;
  readonly kind: "resistivity" | "conductivity";
}

/** A resistivity or conductivity and how it changes with temperature. */
export function PlainMedium({ form, prefix, kind }: PlainMediumProps) {
  return (
    <>
      <MediumQuantity
        form={form}
        name={`${prefix}${kind}`}
        label={kind === "resistivity" ? "Resistivity" : "Conductivity"}
        symbol={kind === "resistivity" ? "ρ" : "σ"}
        kind={kind}
        bareUnit={kind === "resistivity" ? "ohm m" : "S/m"}
      />
      <div className="grid grid-cols-2 gap-x-2">
        <MediumQuantity
          form={form}
          name={`${prefix}temperatureCoefficient`}
          label="Coefficient"
          symbol="α"
          kind="temperatureCoefficient"
          bareUnit="1/K"
          placeholder="0"
          optional
          help="Change of the resistivity with temperature, relative to its value at the reference temperature."
        />
        <MediumQuantity
          form={form}
          name={`${prefix}referenceTemperature`}
          label="at"
          symbol="ϑ₀"
          kind="temperature"
          bareUnit="degC"
          placeholder="20"
          optional
          help="Reference temperature: the one at which the value is given. 20 °C where it is left empty."
        />
      </div>
    </>
  );
}

interface MediumQuantityProps {
  readonly form: PlainForm;
  readonly name: string;
  readonly label: string;
  readonly symbol?: string;
  readonly kind: UnitKind;
  readonly bareUnit?: string;
  readonly foil?: boolean;
  readonly placeholder?: string;
  readonly optional?: boolean;
  readonly help?: string;
}

/** One quantity of a medium, with its tolerance unless it is a plain number. */
export function MediumQuantity({ form, name, optional = false, ...field }: MediumQuantityProps) {
  const { parameters, change, errorAt } = form;
  const toleranced = field.kind !== "number" && (parameters[name] ?? "") !== "";
  return (
    <div>
      <QuantityInput
        {...field}
        name={name}
        helpOnDemand
        value={parameters[name] ?? ""}
        error={errorAt(name)}
        onChange={(text) => change({ [name]: text === "" && optional ? undefined : text })}
        beside={
          toleranced ? (
            <ToleranceButton
              form={form}
              name={name}
              label={field.label}
              temperature={field.kind === "temperature"}
            />
          ) : null
        }
      />
      {toleranced ? <ToleranceRow form={form} name={name} label={field.label} /> : null}
    </div>
  );
}
