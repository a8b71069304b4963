"use client";

import { type FormEvent, useId, useState } from "react";
import { Button } from "../../../_ui/button";
import { Dialog } from "../../../_ui/dialog";
import { ProblemNotice } from "../../../_ui/problem-notice";
import { Select } from "../../../_ui/select";
import { TextField } from "../../../_ui/text-field";
import { callConsole } from "../../_shell/call-console";
import type { TeamChoice } from "../../_shell/team-choices";
import { useFormErrors } from "../../_shell/use-form-errors";
import { lawBody, type LawDraft, lawDraft, LawFields, NEW_LAW } from "./law-fields";
import { KINDS, type MaterialVersion, PROVENANCES } from "./material";

interface MaterialDialogProps {
  /** The material that gets a next version, with its newest one; neither: a new material. */
  readonly id?: string;
  readonly current?: MaterialVersion;
  readonly teams?: readonly TeamChoice[];
  readonly ownTeamId?: string;
  readonly onClose: () => void;
  readonly onSaved: () => void;
}

const choices = (names: readonly string[]) => names.map((name) => ({ value: name, label: name }));

/** Percent of a stated uncertainty: the wider of its two sides. */
function percentOf({ uncertainty }: MaterialVersion): string {
  const wider = Math.max(1 - uncertainty.lower, uncertainty.upper - 1);
  return String(Number((100 * wider).toPrecision(4)));
}

/** A material's facts, for a new one or the next version of one. */
export function MaterialDialog({
  id,
  current,
  teams = [],
  ownTeamId,
  onClose,
  onSaved,
}: MaterialDialogProps) {
  const [teamId, setTeamId] = useState(
    teams.some((team) => team.id === ownTeamId) ? (ownTeamId ?? "") : (teams[0]?.id ?? ""),
  );
  const [law, setLaw] = useState<LawDraft>(() => (current ? lawDraft(current) : NEW_LAW));
  const [facts, setFacts] = useState(() => ({
    name: current?.name ?? "",
    kind: current?.kind ?? "metal",
    percent: current ? percentOf(current) : "2",
    basis: current?.uncertainty.note ?? "",
    source: current?.source ?? "",
    provenance: current?.provenance ?? "measured",
    note: current?.note ?? "",
  }));
  const [busy, setBusy] = useState(false);
  const errors = useFormErrors();
  const form = useId();
  const change = (part: Partial<typeof facts>) => setFacts({ ...facts, ...part });

  function body(): Record<string, unknown> {
    const share = Number(facts.percent) / 100;
    const untouched =
      current && facts.percent === percentOf(current) && facts.basis === current.uncertainty.note;
    return {
      name: facts.name.trim(),
      kind: facts.kind,
      ...lawBody(law),
      uncertainty: untouched
        ? current.uncertainty
        : {
            // What is no share becomes a ratio that the server refuses and names.
            lower: share >= 0 && share < 1 ? 1 - share : 0,
            upper: 1 + share,
            note: facts.basis.trim() || `±${facts.percent} %`,
          },
      source: facts.source.trim(),
      provenance: facts.provenance,
      ...(facts.note.trim() === "" && !current?.note ? {} : { note: facts.note.trim() }),
    };
  }

  async function save(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    const element = event.currentTarget;
    setBusy(true);
    errors.clear();
    try {
      if (id && current) await callConsole("PATCH", `materials/${id}`, { from: current.version, ...body() });
      else await callConsole("POST", "materials", { teamId, ...body() });
      onSaved();
    } catch (failure) {
      errors.take(failure, element);
    } finally {
      setBusy(false);
    }
  }

  return (
    <Dialog
      open
      onOpenChange={onClose}
      title={current ? `Version ${current.version + 1} of ${current.name}` : "Add a material"}
      description={
        current
          ? "Requests use it from now on; records keep the version that they used."
          : "Requests of the team may name it as soon as it is stored."
      }
      actions={
        <>
          <Button onClick={onClose}>Cancel</Button>
          <Button variant="primary" type="submit" form={form} disabled={busy}>
            {busy ? "Storing …" : "Store"}
          </Button>
        </>
      }
    >
      <form id={form} onSubmit={save} noValidate>
        {errors.general ? <ProblemNotice problem={errors.general.problem} /> : null}
        {!current && teams.length > 1 ? (
          <Select
            label="Team"
            name="teamId"
            value={teamId}
            onChange={(event) => setTeamId(event.target.value)}
            options={teams.map((team) => ({ value: team.id, label: team.name }))}
          />
        ) : null}
        <TextField
          label="Name"
          name="name"
          maxLength={120}
          value={facts.name}
          error={errors.of("name")}
          onChange={(event) => change({ name: event.target.value })}
        />
        <Select
          label="Kind"
          name="kind"
          value={facts.kind}
          onChange={(event) => change({ kind: event.target.value })}
          options={choices(KINDS)}
        />
        <LawFields draft={law} errors={errors} onChange={setLaw} />
        <div className="grid gap-x-2 narrow:grid-cols-[1fr_2fr]">
          <TextField
            label="Uncertainty / ± %"
            name="uncertainty.lower"
            prose={false}
            value={facts.percent}
            error={errors.of("uncertainty.lower") ?? errors.of("uncertainty.upper")}
            onChange={(event) => change({ percent: event.target.value })}
          />
          <TextField
            label="What it stands for"
            name="uncertainty.note"
            maxLength={400}
            placeholder="Four-wire measurement, coverage factor 2"
            value={facts.basis}
            error={errors.of("uncertainty.note")}
            onChange={(event) => change({ basis: event.target.value })}
          />
        </div>
        <TextField
          label="Source"
          name="source"
          maxLength={400}
          help="Where the data come from: a report, a standard, a data sheet."
          value={facts.source}
          error={errors.of("source")}
          onChange={(event) => change({ source: event.target.value })}
        />
        <Select
          label="Provenance"
          name="provenance"
          value={facts.provenance}
          onChange={(event) => change({ provenance: event.target.value })}
          options={choices(PROVENANCES)}
        />
        <TextField
          label="Note"
          name="note"
          maxLength={600}
          help="What a user should know; may be empty."
          value={facts.note}
          error={errors.of("note")}
          onChange={(event) => change({ note: event.target.value })}
        />
      </form>
    </Dialog>
  );
}
