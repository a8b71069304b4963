"use client";

import { QuantityInput } from "../../../_ui/quantity-input";
import { Segmented } from "../../../_ui/segmented";
import { type Drive, DRIVES } from "../_model/parameters";
import type { PlainForm } from "./form-context";
import { ToleranceButton, ToleranceRow } from "./tolerance-field";

const LABELS: Readonly<Record<Drive, string>> = { voltage: "Voltage", current: "Current", power: "Power" };
const SYMBOLS: Readonly<Record<Drive, string>> = { voltage: "U", current: "I", power: "P" };

/** Temperature, and at most one of voltage, current and power. */
export function OperatingFields({ form }: { readonly form: PlainForm }) {
  const { parameters, change, errorAt } = form;
  const drive = DRIVES.find((name) => name in parameters);
  return (
    <fieldset>
      <legend className="mb-1 font-semibold">Operating point</legend>
      <div className="grid gap-x-2 narrow:max-wide:grid-cols-2">
        <div>
          <QuantityInput
            name="temperature"
            label="Temperature"
            symbol="ϑ"
            kind="temperature"
            bareUnit="degC"
            placeholder="20"
            help="Temperature of the material, at which its resistivity is taken. 20 °C where it is left empty."
            helpOnDemand
            value={parameters.temperature ?? ""}
            error={errorAt("temperature")}
            onChange={(text) => change({ temperature: text === "" ? undefined : text })}
            beside={
              parameters.temperature ? (
                <ToleranceButton form={form} name="temperature" label="Temperature" temperature />
              ) : null
            }
          />
          {parameters.temperature ? (
            <ToleranceRow form={form} name="temperature" label="Temperature" />
          ) : null}
        </div>
        <div>
          <Segmented
            label="Also given"
            value={drive ?? "none"}
            options={[
              { value: "none", label: "Nothing" },
              ...DRIVES.map((name) => ({ value: name, label: LABELS[name] })),
            ]}
            onChange={(next) => {
              const cleared = Object.fromEntries(DRIVES.map((name) => [name, undefined]));
              change(next === "none" ? cleared : { ...cleared, [next]: "" });
            }}
            className="mb-1.5"
          />
        </div>
      </div>
      {drive ? (
        <QuantityInput
          name={drive}
          label={LABELS[drive]}
          symbol={SYMBOLS[drive]}
          kind={drive}
          help="The answer then tells the other two, and field and current density at this point."
          helpOnDemand
          value={parameters[drive]}
          error={errorAt(drive)}
          onChange={(text) => change({ [drive]: text })}
        />
      ) : null}
    </fieldset>
  );
}
