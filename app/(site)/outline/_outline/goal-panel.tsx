"use client";

import { superscript } from "../../../_ui/plot/axis";
import { Select } from "../../../_ui/select";
import type { PlainForm } from "../../calculate/_calculator/form-context";
import { OperatingFields } from "../../calculate/_calculator/operating-fields";
import { RequirementFields } from "../../calculate/_calculator/requirement-fields";
import { complaintAt } from "../_model/complaints";
import { useOutline } from "./outline-context";

const ACCURACIES = [1e-2, 1e-3, 1e-4, 1e-5, 1e-6, 1e-7, 1e-8];

/** How narrow the bracket shall be, the operating point, and the limits that the answer is held against. */
export function GoalPanel() {
  const { sketch, edit, complaints } = useOutline();
  const errorAt = (name: string) =>
    complaintAt(complaints, (place) => place.kind === "setting" && place.name === name);
  const form: PlainForm = {
    parameters: sketch.settings,
    errorAt,
    change: (patch) =>
      edit(
        (sketch) => ({
          ...sketch,
          settings: Object.fromEntries(
            Object.entries({ ...sketch.settings, ...patch }).filter(
              (entry): entry is [string, string] => entry[1] !== undefined,
            ),
          ),
        }),
        `setting ${Object.keys(patch).join(" ")}`,
      ),
  };
  const options = [...new Set([...ACCURACIES, sketch.accuracy])].sort((a, b) => b - a);
  return (
    <div id="goal" className="grid grid-cols-1 gap-3">
      <Select
        name="accuracy"
        label="Width of the bracket, relative"
        value={String(sketch.accuracy)}
        error={errorAt("accuracy")}
        options={options.map((value) => ({ value: String(value), label: accuracyText(value) }))}
        onChange={(event) => {
          const accuracy = Number(event.target.value);
          edit((sketch) => ({ ...sketch, accuracy }));
        }}
      />
      <OperatingFields form={form} />
      <RequirementFields form={form} />
    </div>
  );
}

function accuracyText(value: number): string {
  if (value >= 1e-6) return `${Number((value * 100).toPrecision(6))} %`;
  const exponent = Math.floor(Math.log10(value) + 1e-9);
  const mantissa = Number((value / 10 ** exponent).toPrecision(6));
  return `${mantissa === 1 ? "" : `${mantissa}·`}10${superscript(exponent)}`;
}
