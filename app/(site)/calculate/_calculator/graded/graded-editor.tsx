"use client";

import { Segmented } from "../../../../_ui/segmented";
import { Select } from "../../../../_ui/select";
import { SELF_DESCRIBING } from "../../_model/profile-forms";
import { movedProfile, reciprocalProfile } from "../../_model/profile-starts";
import { useForm } from "../form-context";
import { ProfileFields } from "./profile-fields";
import { ProfilePlot } from "./profile-plot";
import { ownParameters, useProfileSwitch } from "./use-profile-switch";

/** A medium that varies along one coordinate: which one, what varies, by which law; the law is plotted as it stands. */
export function GradedEditor({ prefix }: { readonly prefix: string }) {
  const { entry, parameters, change, errorAt, profiles, ranges } = useForm();
  const name = `${prefix}profile`;
  const kind = parameters[name] ?? "constant";
  const coordinate = parameters[`${prefix}graded`];
  const quantity = parameters[`${prefix}quantity`] === "resistivity" ? "resistivity" : "conductivity";
  const facts = profiles.find((profile) => profile.kind === kind);
  const { switchKind, forget } = useProfileSwitch(name, prefix, quantity);
  const coordinates = entry.coordinates.filter(({ name: own }) => entry.media.gradable.includes(own));
  const chosen = coordinates.find((own) => own.name === coordinate);
  return (
    <div className="border-s-3 border-rule ps-1.5">
      <Select
        label="Varies along"
        value={coordinate}
        error={errorAt(`${prefix}graded`)}
        options={coordinates.map(({ name: own, role, label }) => ({
          value: own,
          label: `${label} (${role} the flow)`,
        }))}
        onChange={({ target: { value: next } }) => {
          forget();
          const own = ownParameters(name, parameters);
          change({ [`${prefix}graded`]: next, ...movedProfile(name, own, ranges[coordinate], ranges[next]) });
        }}
        help={
          chosen ? `${chosen.name} runs from ${spoken(chosen.start)} to ${spoken(chosen.end)}.` : undefined
        }
      />
      {SELF_DESCRIBING.has(kind) ? null : (
        <Segmented
          label="What varies"
          value={quantity}
          options={[
            { value: "conductivity" as const, label: "Conductivity σ" },
            { value: "resistivity" as const, label: "Resistivity ρ" },
          ]}
          onChange={(next) => {
            forget();
            const turned = reciprocalProfile(name, ownParameters(name, parameters), next);
            change({ [`${prefix}quantity`]: next, ...turned });
          }}
          className="mb-2"
        />
      )}
      <Select
        label="Law"
        value={kind}
        error={errorAt(name)}
        help={facts?.summary}
        options={profiles.map((profile) => ({ value: profile.kind, label: profile.title }))}
        onChange={(event) => switchKind(event.target.value)}
      />
      <ProfileFields name={name} site={{ values: quantity, span: ranges[coordinate], prefix }} />
      <ProfilePlot prefix={prefix} label={chosen?.label ?? coordinate} />
    </div>
  );
}

/** "innerRadius" as "inner radius". */
function spoken(name: string): string {
  return name.replace(/([A-Z\d])/g, " $1").toLowerCase();
}
