"use client";

import dynamic from "next/dynamic";
import { Loading } from "../../../_ui/states";
import { Select } from "../../../_ui/select";
import { mediumKind, type MediumKind, mediumPrefixes } from "../_model/parameters";
import { useForm } from "./form-context";
import { MaterialPicker } from "./material-picker";
import { MediumQuantity, PlainMedium } from "./medium-quantity";
import { useMediumSwitch } from "./use-medium-switch";

const GradedEditor = dynamic(() => import("./graded/graded-editor").then((module) => module.GradedEditor), {
  loading: () => <Loading what="the profile editor" className="min-h-40" />,
});

const KIND_LABELS: Readonly<Record<MediumKind, string>> = {
  material: "A material",
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
  const form = useForm();
  const { entry, parameters, errorAt } = form;
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
      {kind === "material" ? <MaterialPicker name={`${prefix}material`} form={form} /> : null}
      {kind === "resistivity" || kind === "conductivity" ? (
        <PlainMedium prefix={prefix} kind={kind} form={form} />
      ) : null}
      {kind === "sheetResistance" ? (
        <MediumQuantity
          form={form}
          name={`${prefix}sheetResistance`}
          label="Sheet resistance"
          symbol="R□"
          kind="sheetResistance"
          bareUnit="ohm/sq"
        />
      ) : null}
      {sheet && kind && BULK.includes(kind) ? (
        <MediumQuantity
          form={form}
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
