"use client";

import { useRef } from "react";
import { Field, CONTROL } from "../../../_ui/field";
import { Select } from "../../../_ui/select";
import type { MediumForm } from "../../calculate/_calculator/form-context";
import { MaterialPicker } from "../../calculate/_calculator/material-picker";
import { MediumQuantity, PlainMedium } from "../../calculate/_calculator/medium-quantity";
import { complaintAt, type Place } from "../_model/complaints";
import { MEDIUM_KINDS, mediumKindOf, type OutlineMediumKind, switchMedium } from "../_model/medium";
import type { Parameters, Sketch } from "../_model/sketch";
import { useOutline } from "./outline-context";

const LABELS: Readonly<Record<OutlineMediumKind, string>> = {
  sheetResistance: "A sheet resistance",
  material: "A material",
  resistivity: "A resistivity",
  conductivity: "A conductivity",
  expression: "An expression in x and y",
};

/** What fills the outline, and the regions of another medium. */
export function MediumPanel() {
  const { sketch, edit } = useOutline();
  return (
    <>
      <OneMedium
        id="medium"
        legend={sketch.regions.length > 0 ? "Medium outside the regions" : "Medium"}
        medium={sketch.medium}
        kinds={MEDIUM_KINDS}
        set={(medium, tag) => edit((sketch) => ({ ...sketch, medium }), tag && `medium ${tag}`)}
        isHere={(place, name) => place.kind === "medium" && place.name === name}
      />
      {sketch.regions.map((region, k) => (
        <OneMedium
          key={k}
          id={`region-${k}`}
          legend={`Region ${k}`}
          medium={region.medium}
          kinds={MEDIUM_KINDS.filter((kind) => kind !== "expression")}
          set={(medium, tag) =>
            edit((sketch) => withRegionMedium(sketch, k, medium), tag && `region ${k} ${tag}`)
          }
          isHere={(place, name) => place.kind === "region" && place.region === k && place.name === name}
        />
      ))}
    </>
  );
}

function withRegionMedium(sketch: Sketch, index: number, medium: Parameters): Sketch {
  return {
    ...sketch,
    regions: sketch.regions.map((region, k) => (k === index ? { ...region, medium } : region)),
  };
}

interface OneMediumProps {
  /** As `placeId` names it. */
  readonly id: string;
  readonly legend: string;
  readonly medium: Parameters;
  readonly kinds: readonly OutlineMediumKind[];
  /** With a tag, typing in one field is one step of undo. */
  readonly set: (medium: Parameters, tag?: string) => void;
  readonly isHere: (place: Place, name: string) => boolean;
}

function OneMedium({ id, legend, medium, kinds, set, isHere }: OneMediumProps) {
  const { sketch, complaints, materials } = useOutline();
  const remembered = useRef(new Map<OutlineMediumKind, Parameters>());
  const axisymmetric = sketch.symmetry === "axisymmetric";
  const kind = mediumKindOf(medium);
  const errorAt = (name: string) => complaintAt(complaints, (place) => isHere(place, name));
  const form: MediumForm = {
    parameters: medium,
    materials,
    errorAt,
    change: (patch) => set(patched(medium, patch), Object.keys(patch).join(" ")),
  };
  const offered = kinds.filter((value) => !axisymmetric || value !== "sheetResistance" || value === kind);

  function switchTo(next: OutlineMediumKind) {
    if (kind) remembered.current.set(kind, medium);
    set(switchMedium(medium, next, remembered.current.get(next), axisymmetric));
  }

  return (
    <fieldset id={id}>
      <legend className="mb-0.5 font-semibold">{legend}</legend>
      <Select
        label="Given as"
        value={kind ?? ""}
        error={errorAt("medium")}
        options={[
          ...(kind ? [] : [{ value: "", label: "Choose …" }]),
          ...offered.map((value) => ({
            value,
            label:
              axisymmetric || value === "sheetResistance"
                ? LABELS[value]
                : `${LABELS[value]} and a thickness`,
          })),
        ]}
        onChange={(event) => switchTo(event.target.value as OutlineMediumKind)}
      />
      {kind === "sheetResistance" ? (
        <MediumQuantity
          form={form}
          name="sheetResistance"
          label="Sheet resistance"
          symbol="R□"
          kind="sheetResistance"
          bareUnit="ohm/sq"
        />
      ) : null}
      {kind === "material" ? <MaterialPicker name="material" form={form} /> : null}
      {kind === "resistivity" || kind === "conductivity" ? (
        <PlainMedium form={form} prefix="" kind={kind} />
      ) : null}
      {kind === "expression" ? <Expression form={form} /> : null}
      {kind && kind !== "sheetResistance" && !axisymmetric ? (
        <MediumQuantity
          form={form}
          name="thickness"
          label="Thickness"
          symbol="t"
          kind="length"
          bareUnit="m"
          foil
        />
      ) : null}
    </fieldset>
  );
}

function Expression({ form }: { readonly form: MediumForm }) {
  const { parameters, change, errorAt } = form;
  return (
    <>
      <Select
        label="Its values are a"
        value={parameters.quantity ?? "conductivity"}
        error={errorAt("quantity")}
        options={[
          { value: "conductivity", label: "conductivity in S/m" },
          { value: "resistivity", label: "resistivity in Ω·m" },
        ]}
        onChange={(event) => change({ quantity: event.target.value })}
      />
      <Field
        label="Expression"
        help="x and y are the position in metres; the usual functions, and if(c, a, b)."
        error={errorAt("expression")}
      >
        {(control) => (
          <input
            {...control}
            name="expression"
            value={parameters.expression ?? ""}
            maxLength={1000}
            spellCheck={false}
            autoCapitalize="off"
            onChange={(event) => change({ expression: event.target.value })}
            className={CONTROL}
          />
        )}
      </Field>
    </>
  );
}

function patched(medium: Parameters, patch: Readonly<Record<string, string | undefined>>): Parameters {
  return Object.fromEntries(
    Object.entries({ ...medium, ...patch }).filter(
      (entry): entry is [string, string] => entry[1] !== undefined,
    ),
  );
}
