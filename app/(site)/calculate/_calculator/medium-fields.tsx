"use client";

import dynamic from "next/dynamic";
import { Loading } from "../../../_ui/states";
import { QuantityInput } from "../../../_ui/quantity-input";
import { Select } from "../../../_ui/select";
import type { UnitKind } from "../../../_ui/quantity/units";
import { mediumKind, type MediumKind, mediumPrefixes } from "../_model/parameters";
import { useForm } from "./form-context";
import { MaterialPicker } from "./material-picker";
import { useMediumSwitch } from "./use-medium-switch";

const GradedEditor = dynamic(() => import("./graded/graded-editor").then((module) => module.GradedEditor), {
  loading: () => <Loading what="the profile editor" className="min-h-40" />,
});

const KIND_LABELS: Readonly<Record<MediumKind, string>> = {
  material: "A material of the library",
  resistivity: "A resistivity",
  conductivity: "A conductivity",
  sheetResistance: "A sheet resistance",
  graded: "Graded: it varies in the shape",
};

const BULK: readonly MediumKind[] = ["material", "resistivity", "conductivity"];

/** What fills the shape: one medium, or each of two. */
export function MediumFields() {
  const { entry } = useForm();
  return mediumPrefixes(entry).map((prefix, index) => (
    <fieldset key={prefix}>
      <legend className="mb-1 font-semibold">
        {entry.media.kind === "two" ? `Medium: ${entry.media.names[index].label}` : "Medium"}
      </legend>
      <OneMedium prefix={prefix} />
    </fieldset>
  ));
}

function OneMedium({ prefix }: { readonly prefix: string }) {
  const { entry, parameters, errorAt } = useForm();
  const switchTo = useMediumSwitch(prefix);
  const sheet = entry.media.kind === "sheet";
  const kinds: readonly MediumKind[] = [
    ...(sheet ? (["sheetResistance"] as const) : []),
    ...BULK,
    ...(entry.media.gradable.length > 0 && !sheet ? (["graded"] as const) : []),
  ];
  const kind = mediumKind(parameters, prefix);
  return (
    <>
      <Select
        label="Given as"
        value={kind ?? ""}
        error={errorAt(`${prefix}medium`)}
        options={[
          ...(kind ? [] : [{ value: "", label: "Choose …" }]),
          ...kinds.map((value) => ({
            value,
            label:
              sheet && BULK.includes(value) ? `${KIND_LABELS[value]} and a thickness` : KIND_LABELS[value],
          })),
        ]}
        onChange={(event) => switchTo(event.target.value as MediumKind)}
      />
      {kind === "material" ? <MaterialPicker name={`${prefix}material`} /> : null}
      {kind === "resistivity" || kind === "conductivity" ? <PlainMedium prefix={prefix} kind={kind} /> : null}
      {kind === "sheetResistance" ? (
        <MediumQuantity
          name={`${prefix}sheetResistance`}
          label="Sheet resistance"
          symbol="R□"
          kind="sheetResistance"
          bareUnit="ohm/sq"
        />
      ) : null}
      {sheet && kind && BULK.includes(kind) ? (
        <MediumQuantity
          name={`${prefix}thickness`}
          label="Thickness"
          symbol="t"
          kind="length"
          bareUnit="m"
          foil
        />
      ) : null}
      {kind === "graded" ? <GradedEditor prefix={prefix} /> : null}
    </>
  );
}

function PlainMedium({
  prefix,
  kind,
}: {
  readonly prefix: string;
  readonly kind: "resistivity" | "conductivity";
}) {
  return (
    <>
      <MediumQuantity
        name={`${prefix}${kind}`}
        label={kind === "resistivity" ? "Resistivity" : "Conductivity"}
        symbol={kind === "resistivity" ? "ρ" : "σ"}
        kind={kind}
        bareUnit={kind === "resistivity" ? "ohm m" : "S/m"}
      />
      <div className="grid grid-cols-2 gap-x-2">
        <MediumQuantity
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
  readonly name: string;
  readonly label: string;
  readonly symbol: string;
  readonly kind: UnitKind;
  readonly bareUnit: string;
  readonly foil?: boolean;
  readonly placeholder?: string;
  readonly optional?: boolean;
  readonly help?: string;
}

function MediumQuantity({ name, optional = false, ...field }: MediumQuantityProps) {
  const { parameters, change, errorAt } = useForm();
  return (
    <QuantityInput
      {...field}
      name={name}
      helpOnDemand
      value={parameters[name] ?? ""}
      error={errorAt(name)}
      onChange={(text) => change({ [name]: text === "" && optional ? undefined : text })}
    />
  );
}
