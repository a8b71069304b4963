"use client";

import { CONTROL, Field } from "../../../../_ui/field";
import { Segmented } from "../../../../_ui/segmented";
import { Select } from "../../../../_ui/select";
import { Toggle } from "../../../../_ui/toggle";
import { PROFILE_FORMS, type ProfileField } from "../../_model/profile-forms";
import { useForm } from "../form-context";
import { MaterialPicker } from "../material-picker";
import { MediumQuantity } from "../medium-quantity";
import { type FieldSite, positionKind, VALUE_UNITS } from "./field-site";
import { LayersTable } from "./layers-table";
import { PointsTable } from "./points-table";
import { useProfileSwitch } from "./use-profile-switch";

/** The fields of the profile whose parameters begin with `name`. */
export function ProfileFields({ name, site }: { readonly name: string; readonly site: FieldSite }) {
  const { parameters } = useForm();
  const fields = PROFILE_FORMS[parameters[name] ?? "constant"] ?? [];
  return fields.map((field) => (
    <OneField key={field.name} field={field} name={`${name}.${field.name}`} site={site} />
  ));
}

interface OneFieldProps {
  readonly field: ProfileField;
  readonly name: string;
  readonly site: FieldSite;
}

function OneField({ field, name, site }: OneFieldProps) {
  const form = useForm();
  const { parameters, change, errorAt } = form;
  const value = parameters[name] ?? "";
  const error = errorAt(name);
  const set = (text: string) => change({ [name]: text });
  switch (field.type) {
    case "layers":
      return <LayersTable name={name} site={site} />;
    case "table":
      return <PointsTable name={name} site={site} />;
    case "profile":
      return <InnerProfile name={name} site={{ ...site, values: "density" }} />;
    case "material":
      return <MaterialPicker name={name} form={form} />;
    case "flag":
      return (
        <Toggle
          label={field.label}
          checked={value === "true"}
          onChange={(on) => change({ [name]: on ? "true" : undefined })}
        />
      );
    case "choice": {
      const shared = { label: field.label, value: value || field.choices[0].value };
      return field.choices.length > 2 ? (
        <Select
          {...shared}
          error={error}
          options={field.choices}
          onChange={(event) => set(event.target.value)}
        />
      ) : (
        <Segmented {...shared} options={field.choices} onChange={set} className="mb-2" />
      );
    }
    case "expression":
      return (
        <Field label={field.label} help={field.help} error={error}>
          {(control) => (
            <textarea
              {...control}
              name={name}
              value={value}
              rows={3}
              spellCheck={false}
              autoCapitalize="off"
              onChange={(event) => set(event.target.value)}
              className={`${CONTROL} resize-y`}
            />
          )}
        </Field>
      );
    default: {
      const kinds = {
        value: site.values,
        position: positionKind(site.span),
        number: "number",
        temperature: "temperature",
        density: "density",
      } as const;
      const units = {
        value: VALUE_UNITS[site.values],
        position: site.span?.unit ?? "m",
        number: undefined,
        temperature: "degC",
        density: "1/cm^3",
      };
      return (
        <MediumQuantity
          form={form}
          name={name}
          label={field.label}
          help={field.help}
          kind={kinds[field.type]}
          bareUnit={units[field.type]}
          placeholder={field.optional ? "0" : undefined}
          optional={field.optional}
        />
      );
    }
  }
}

/** A profile inside a profile: the dopant density. */
function InnerProfile({ name, site }: { readonly name: string; readonly site: FieldSite }) {
  const { parameters, errorAt, profiles } = useForm();
  const { switchKind } = useProfileSwitch(name, site.prefix, "density");
  const kind = parameters[name] ?? "constant";
  const inner = profiles.filter((profile) => !["temperature", "dopant"].includes(profile.kind));
  return (
    <>
      <Select
        label="Law of the density"
        value={kind}
        error={errorAt(name)}
        help={inner.find((profile) => profile.kind === kind)?.summary}
        options={inner.map((profile) => ({ value: profile.kind, label: profile.title }))}
        onChange={(event) => switchKind(event.target.value)}
      />
      <ProfileFields name={name} site={site} />
    </>
  );
}
