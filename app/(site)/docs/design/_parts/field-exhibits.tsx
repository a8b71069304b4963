"use client";

import { useState } from "react";
import { FileButton } from "../../../../_ui/file-button";
import { LocalTime } from "../../../../_ui/local-time";
import { QuantityInput } from "../../../../_ui/quantity-input";
import { Segmented } from "../../../../_ui/segmented";
import { Select } from "../../../../_ui/select";
import { TextField } from "../../../../_ui/text-field";
import { Toggle } from "../../../../_ui/toggle";
import { Exhibit } from "./exhibit";

const CHOICES = [
  { value: "edge", label: "Edge" },
  { value: "centre", label: "Centre" },
] as const;

/** Fields: quantities with their units, texts, files, choices, switches. */
export function FieldExhibits() {
  const [length, setLength] = useState("12.5 mm");
  const [foil, setFoil] = useState("1 oz/ft^2");
  const [temperature, setTemperature] = useState("");
  const [wrong, setWrong] = useState("5 kg");
  const [resistivity, setResistivity] = useState("1.72e-8 ohm m");
  const [choice, setChoice] = useState<"edge" | "centre">("edge");
  const [on, setOn] = useState(true);
  const [read, setRead] = useState<string | null>(null);
  return (
    <>
      <Exhibit
        title="Quantities"
        note="The menu converts and never reinterprets; “12,5 mm”, “1/2 in” and “AWG 24” are understood when typed or pasted."
      >
        <div className="grid gap-x-3 medium:grid-cols-2 wide:grid-cols-3">
          <QuantityInput
            label="Length"
            symbol="L"
            kind="length"
            value={length}
            onChange={setLength}
            help="Distance between the two end faces."
            helpOnDemand
          />
          <QuantityInput
            label="Thickness of a foil"
            symbol="t"
            kind="length"
            foil
            value={foil}
            onChange={setFoil}
            help="May be given by weight."
          />
          <QuantityInput
            label="Temperature"
            symbol="ϑ"
            kind="temperature"
            placeholder="20"
            value={temperature}
            onChange={setTemperature}
          />
          <QuantityInput
            label="Resistivity"
            symbol="ρ"
            kind="resistivity"
            value={resistivity}
            onChange={setResistivity}
          />
          <QuantityInput
            label="With a complaint"
            symbol="w"
            kind="length"
            value={wrong}
            onChange={setWrong}
            error='Must be a length, but "kg" measures a mass.'
          />
          <QuantityInput label="One text, no menu" value={length} onChange={setLength} />
        </div>
        <p className="text-small text-ink-soft">
          Texts for the API: <code>{[length, foil, temperature, resistivity, wrong].join(" · ")}</code>
        </p>
      </Exhibit>
      <Exhibit title="Texts and files" note="A moment is shown in the reader’s own time, its zone on hover.">
        <div className="grid items-start gap-x-3 gap-y-2 medium:grid-cols-2 wide:grid-cols-3">
          <TextField label="Name of the record" defaultValue="Main bar, panel 2" />
          <TextField
            label="With a complaint"
            defaultValue="ines.hartwell"
            help="An e-mail address."
            error="Must be an e-mail address, such as ines.hartwell@merrow-pike.example."
          />
          <TextField label="Not available" defaultValue="Busbar" disabled />
          <div>
            <p className="mb-0.5 text-table font-medium">A file</p>
            <FileButton label="Read a CSV file" accept=".csv,text/csv" onText={setRead} />
            <p className="mt-0.5 text-small text-ink-soft">
              {read === null ? "Nothing is read yet." : `${read.length} characters are read.`}
            </p>
          </div>
          <p className="text-table">
            Stored <LocalTime at="2026-03-04T05:06:07.000Z" />
          </p>
        </div>
      </Exhibit>
      <Exhibit title="Choices" note="Few short ones stand in sight; more go into a list.">
        <div className="grid gap-x-3 gap-y-2 medium:grid-cols-2 wide:grid-cols-3">
          <Segmented label="Position" value={choice} options={CHOICES} onChange={setChoice} />
          <Select
            label="Arrangement"
            options={[
              { value: "line", label: "In a line" },
              { value: "ring", label: "In a ring" },
              { value: "square", label: "In a square" },
            ]}
            help="How the rods stand."
          />
          <Select
            label="With a complaint"
            options={[{ value: "", label: "Choose …" }]}
            error="Must be one of line, ring or square."
          />
          <Toggle
            label="Only inputs that differ"
            checked={on}
            onChange={setOn}
            help="Takes effect at once."
          />
          <Toggle label="Off and not available" checked={false} disabled onChange={() => undefined} />
        </div>
      </Exhibit>
    </>
  );
}
