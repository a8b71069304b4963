"use client";

import { useState } from "react";
import { Button } from "../../../_ui/button";
import { CONTROL, Field } from "../../../_ui/field";
import { FileButton } from "../../../_ui/file-button";
import { ProblemNotice } from "../../../_ui/problem-notice";
import { Segmented } from "../../../_ui/segmented";
import { TextField } from "../../../_ui/text-field";
import { callConsole, ConsoleProblem } from "../../_shell/call-console";
import type { useFormErrors } from "../../_shell/use-form-errors";
import type { Law, MaterialVersion } from "./material";

export interface LawDraft {
  readonly kind: "linear" | "constant" | "table" | "kept";
  readonly resistivity: string;
  readonly coefficient: string;
  readonly reference: string;
  /** A measured table that was read, or a law that stays as it is. */
  readonly law: Law | null;
  readonly from: string;
  readonly to: string;
}

export const NEW_LAW: LawDraft = {
  kind: "linear",
  resistivity: "",
  coefficient: "",
  reference: "20",
  law: null,
  from: "-40",
  to: "150",
};

/** The law of a version as the form begins with it. */
export function lawDraft({ resistivity: law, range }: MaterialVersion): LawDraft {
  const text = (name: string) => (name in law ? String(law[name]) : "");
  const kind =
    law.model === "linear" || law.model === "constant" ? law.model : law.model === "table" ? "table" : "kept";
  return {
    kind,
    resistivity: text("resistivity"),
    coefficient: text("coefficient"),
    reference: text("reference") || "20",
    law,
    from: String(range.from),
    to: String(range.to),
  };
}

/** What was typed as a number where it is one: what is none goes as it is, for the server to name. */
export function typedNumber(text: string): number | string {
  const trimmed = text.trim();
  return trimmed !== "" && Number.isFinite(Number(trimmed)) ? Number(trimmed) : trimmed;
}

/** The law and its range as the server takes them. */
export function lawBody(draft: LawDraft): Record<string, unknown> {
  const range = { from: typedNumber(draft.from), to: typedNumber(draft.to) };
  const resistivity = typedNumber(draft.resistivity);
  if (draft.kind === "constant") return { resistivity: { model: "constant", resistivity }, range };
  if (draft.kind === "linear") {
    const [coefficient, reference] = [typedNumber(draft.coefficient), typedNumber(draft.reference)];
    return { resistivity: { model: "linear", resistivity, coefficient, reference }, range };
  }
  return draft.law === null ? { range } : { resistivity: draft.law, range };
}

interface LawFieldsProps {
  readonly draft: LawDraft;
  readonly errors: Pick<ReturnType<typeof useFormErrors>, "of">;
  readonly onChange: (draft: LawDraft) => void;
}

const KINDS: readonly { readonly value: LawDraft["kind"]; readonly label: string }[] = [
  { value: "linear", label: "Linear" },
  { value: "constant", label: "Constant" },
  { value: "table", label: "Measured table" },
];

/** How the resistivity follows the temperature. */
export function LawFields({ draft, errors, onChange }: LawFieldsProps) {
  const change = (part: Partial<LawDraft>) => onChange({ ...draft, ...part });
  const options =
    draft.law && !["linear", "constant", "table"].includes(draft.law.model)
      ? [...KINDS, { value: "kept" as const, label: `${draft.law.model}, as it is` }]
      : KINDS;
  return (
    <>
      <Segmented
        label="Law of resistivity"
        value={draft.kind}
        options={options}
        onChange={(kind) => change({ kind })}
        className="mb-1.5"
      />
      {draft.kind === "table" ? (
        <TableFields draft={draft} error={errors.of("resistivity")} onChange={onChange} />
      ) : null}
      {draft.kind === "linear" || draft.kind === "constant" ? (
        <div className="grid gap-x-2 narrow:grid-cols-3">
          <TextField
            label="Resistivity / Ω·m"
            name="resistivity.resistivity"
            prose={false}
            placeholder="1.72e-8"
            value={draft.resistivity}
            error={errors.of("resistivity.resistivity") ?? errors.of("resistivity")}
            onChange={(event) => change({ resistivity: event.target.value })}
          />
          {draft.kind === "linear" ? (
            <>
              <TextField
                label="Coefficient / 1/K"
                name="resistivity.coefficient"
                prose={false}
                placeholder="0.0039"
                value={draft.coefficient}
                error={errors.of("resistivity.coefficient")}
                onChange={(event) => change({ coefficient: event.target.value })}
              />
              <TextField
                label="Reference / °C"
                name="resistivity.reference"
                prose={false}
                value={draft.reference}
                error={errors.of("resistivity.reference")}
                onChange={(event) => change({ reference: event.target.value })}
              />
            </>
          ) : null}
        </div>
      ) : null}
      <div className="grid grid-cols-2 gap-x-2">
        <TextField
          label="Holds from / °C"
          name="range.from"
          prose={false}
          value={draft.from}
          error={errors.of("range.from")}
          onChange={(event) => change({ from: event.target.value })}
        />
        <TextField
          label="to / °C"
          name="range.to"
          prose={false}
          value={draft.to}
          error={errors.of("range.to")}
          onChange={(event) => change({ to: event.target.value })}
        />
      </div>
    </>
  );
}

interface TableFieldsProps {
  readonly draft: LawDraft;
  readonly error: string | undefined;
  readonly onChange: (draft: LawDraft) => void;
}

interface ReadTable {
  readonly resistivity: Law & { readonly temperatures: readonly number[] };
  readonly range: { readonly from: number; readonly to: number };
}

function TableFields({ draft, error, onChange }: TableFieldsProps) {
  const [text, setText] = useState("");
  const [problem, setProblem] = useState<ConsoleProblem | null>(null);
  const temperatures = draft.law?.model === "table" ? draft.law.temperatures : undefined;
  const rows = Array.isArray(temperatures) ? temperatures.length : 0;

  async function read(table: string) {
    setText(table);
    setProblem(null);
    try {
      const { resistivity, range } = await callConsole<ReadTable>("POST", "materials/table", { text: table });
      onChange({ ...draft, law: resistivity, from: String(range.from), to: String(range.to) });
    } catch (failure) {
      if (!(failure instanceof ConsoleProblem)) throw failure;
      setProblem(failure);
    }
  }

  return (
    <div className="mb-1.5">
      <Field
        label="Measurements as CSV"
        help="A header such as temperature/degC,resistivity/uohm cm, then a row a measurement."
        error={error}
      >
        {(control) => (
          <textarea
            {...control}
            name="resistivity"
            rows={6}
            value={text}
            placeholder={"temperature/degC,resistivity/uohm cm\n-40,8.87\n20,9.50\n150,10.86"}
            onChange={(event) => setText(event.target.value)}
            className={CONTROL}
          />
        )}
      </Field>
      <div className="flex flex-wrap items-center gap-1">
        <FileButton
          label="Choose a file"
          accept=".csv,text/csv,text/plain"
          onText={(table) => void read(table)}
        />
        <Button onClick={() => void read(text)} disabled={text.trim() === ""}>
          Read the table
        </Button>
        <span role="status" className="text-table text-ink-soft">
          {rows > 0 ? `${rows} temperatures are read.` : "No table is read yet."}
        </span>
      </div>
      {problem ? <ProblemNotice problem={problem.problem} /> : null}
    </div>
  );
}
