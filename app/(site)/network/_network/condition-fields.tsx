"use client";

import { CONTROL, Field } from "../../../_ui/field";
import { QuantityInput } from "../../../_ui/quantity-input";
import { Select } from "../../../_ui/select";
import { RequirementFields } from "../../calculate/_calculator/requirement-fields";
import { UncertaintyFields } from "../../calculate/_calculator/uncertainty-fields";
import { type DriveKind, methodOf, type Network, UNCERTAINTY_METHODS } from "../_model/network";

interface ConditionFieldsProps {
  readonly network: Network;
  /** Nodes that there are. */
  readonly names: readonly string[];
  readonly complaints: readonly string[];
  readonly uncertaintyComplaint: string | undefined;
  readonly requirementComplaints: ReadonlyMap<string, string>;
  readonly onChange: (change: (network: Network) => Network) => void;
}

const DRIVES: readonly { readonly value: DriveKind; readonly label: string }[] = [
  { value: "none", label: "One volt" },
  { value: "current", label: "Current" },
  { value: "voltage", label: "Voltage" },
  { value: "power", label: "Power" },
];
const START_TEXT = { none: "", current: "1 A", voltage: "1 V", power: "1 W" } as const;

/** Between which nodes, under what, and how warm. */
export function ConditionFields(props: ConditionFieldsProps) {
  const { network, names, complaints, uncertaintyComplaint, requirementComplaints, onChange } = props;
  const { ports, drive, temperature, requirement, uncertainty } = network;
  const port = (place: 0 | 1, label: string) => (
    <Field label={label} error={place === 0 ? undefined : complaints.join(" ") || undefined}>
      {(control) => (
        <input
          {...control}
          value={ports[place]}
          list="nodes"
          autoComplete="off"
          spellCheck={false}
          onChange={(event) => {
            const name = event.target.value;
            onChange((now) => ({ ...now, ports: place === 0 ? [name, now.ports[1]] : [now.ports[0], name] }));
          }}
          className={CONTROL}
        />
      )}
    </Field>
  );
  return (
    <form
      aria-label="Ports and operating point"
      className="grid grid-cols-2 gap-x-2"
      onSubmit={(event) => event.preventDefault()}
    >
      {port(0, "From node")}
      {port(1, "To node")}
      <Select
        label="Driven by"
        value={drive.kind}
        options={DRIVES}
        onChange={(event) => {
          const kind = DRIVES.find(({ value }) => value === event.target.value)?.value ?? "none";
          onChange((now) => ({ ...now, drive: { kind, text: START_TEXT[kind] } }));
        }}
      />
      {drive.kind === "none" ? (
        <span />
      ) : (
        <QuantityInput
          label={DRIVES.find(({ value }) => value === drive.kind)?.label ?? ""}
          kind={drive.kind}
          value={drive.text}
          onChange={(text) => onChange((now) => ({ ...now, drive: { ...now.drive, text } }))}
        />
      )}
      <QuantityInput
        label="Temperature of shapes"
        kind="temperature"
        value={temperature}
        placeholder="20"
        bareUnit="degC"
        onChange={(text) => onChange((now) => ({ ...now, temperature: text }))}
      />
      <p className="self-center text-small text-ink-soft">
        {names.length} nodes, {network.elements.length} elements
      </p>
      <div className="col-span-2 grid gap-1">
        <RequirementFields
          form={{
            parameters: requirement,
            change: (patch) =>
              onChange((now) => {
                const { min, max } = { ...now.requirement, ...patch };
                return { ...now, requirement: { min: min ?? "", max: max ?? "" } };
              }),
            errorAt: (name) => requirementComplaints.get(name),
          }}
        />
        <UncertaintyFields
          methods={UNCERTAINTY_METHODS}
          form={{
            parameters: uncertainty === "" ? {} : { uncertainty },
            change: (patch) => onChange((now) => ({ ...now, uncertainty: methodOf(patch.uncertainty) })),
            errorAt: () => uncertaintyComplaint,
          }}
        />
      </div>
    </form>
  );
}
