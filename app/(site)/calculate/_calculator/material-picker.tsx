"use client";

import dynamic from "next/dynamic";
import { useState } from "react";
import { Button } from "../../../_ui/button";
import { CONTROL, Field } from "../../../_ui/field";
import { Toggle } from "../../../_ui/toggle";
import type { MaterialChoice } from "../_server/material-choices";
import type { MediumForm } from "./form-context";
import { spreadText } from "./material-words";

const MaterialBrowser = dynamic(() => import("./material-browser").then((module) => module.MaterialBrowser));

interface MaterialPickerProps {
  readonly name: string;
  readonly form: MediumForm;
}

/** A material of the library or the team, with what it stands for at the operating temperature. */
export function MaterialPicker({ name, form }: MaterialPickerProps) {
  const { parameters, change, errorAt, materials } = form;
  const [browsing, setBrowsing] = useState(false);
  const prefix = name.slice(0, -"material".length);
  const extrapolate = `${prefix}extrapolate`;
  const id = parameters[name] ?? "";
  const chosen = materials.find((material) => material.id === id);
  const allowed = parameters[extrapolate] === "true";
  const own = materials.filter(({ owner }) => owner !== LIBRARY);
  const groups = [...new Set([...own, ...materials].map(groupOf))];
  return (
    <>
      <Field
        label="Material"
        error={errorAt(name)}
        beside={
          <Button
            variant="quiet"
            className="relative -my-1 min-h-3! px-0.5! py-0! before:absolute before:inset-x-0 before:-inset-y-1.5 before:content-['']"
            onClick={() => setBrowsing(true)}
          >
            Compare all
          </Button>
        }
      >
        {(control) => (
          <select
            {...control}
            name={name}
            value={id}
            onChange={(event) => change({ [name]: event.target.value, [extrapolate]: undefined })}
            className={`${CONTROL} pe-3 font-sans!`}
          >
            {chosen ? null : <option value={id}>{id === "" ? "Choose …" : id}</option>}
            {groups.map((group) => (
              <optgroup key={group} label={group}>
                {materials
                  .filter((material) => groupOf(material) === group)
                  .map((material) => (
                    <option key={material.id} value={material.id}>
                      {material.name}
                    </option>
                  ))}
              </optgroup>
            ))}
          </select>
        )}
      </Field>
      {chosen ? <MaterialCard material={chosen} /> : null}
      {chosen && (!chosen.covered || allowed) ? (
        <Toggle
          label="Use it outside its range of temperature"
          checked={allowed}
          onChange={(on) => change({ [extrapolate]: on ? "true" : undefined })}
        />
      ) : null}
      {browsing ? (
        <MaterialBrowser
          materials={materials}
          chosen={id}
          onClose={() => setBrowsing(false)}
          onChoose={(next) => {
            change({ [name]: next, [extrapolate]: undefined });
            setBrowsing(false);
          }}
        />
      ) : null}
    </>
  );
}

const LIBRARY = "library";

/** A team's own stand together, those of the library by kind. */
function groupOf({ owner, kind }: MaterialChoice): string {
  return owner === LIBRARY ? kind : `Of the team ${owner}`;
}

function MaterialCard({ material }: { readonly material: MaterialChoice }) {
  const { resistivityText, range, version, provenance, source, uncertainty, note, covered } = material;
  return (
    <dl className="mb-2 grid grid-cols-[auto_1fr] gap-x-1.5 border-s-3 border-rule ps-1.5 text-small">
      <dt className="text-ink-soft">ρ here</dt>
      <dd className="font-mono">{resistivityText ?? "not defined at this temperature"}</dd>
      <dt className="text-ink-soft">Range</dt>
      <dd className={covered ? "" : "text-amber"}>
        {range.from} … {range.to} °C{covered ? "" : ", left by the operating temperature"}
      </dd>
      <dt className="text-ink-soft">Spread</dt>
      <dd title={uncertainty.note}>{spreadText(uncertainty)}</dd>
      <dt className="text-ink-soft">Source</dt>
      <dd>
        {source} ({provenance}, version {version})
      </dd>
      {note ? (
        <>
          <dt className="text-ink-soft">Note</dt>
          <dd>{note}</dd>
        </>
      ) : null}
    </dl>
  );
}
