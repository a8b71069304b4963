"use client";

import { type FormEvent, useState } from "react";
import { Button } from "../../../_ui/button";
import { DataTable } from "../../../_ui/data-table";
import { Dialog } from "../../../_ui/dialog";
import { ProblemNotice } from "../../../_ui/problem-notice";
import { EmptyState } from "../../../_ui/states";
import { TextField } from "../../../_ui/text-field";
import { useToast } from "../../../_ui/toast";
import { callConsole } from "../../_shell/call-console";
import { useConsole } from "../../_shell/use-console";
import { useFormErrors } from "../../_shell/use-form-errors";
import type { TeamShown } from "./person";

/** The teams: whoever owns keys, embeds, materials and records. */
export function TeamPanel({ manages }: { readonly manages: boolean }) {
  const { data, error, mutate } = useConsole<{ rows: readonly TeamShown[] }>("teams");
  const [open, setOpen] = useState<TeamShown | "new" | null>(null);
  const say = useToast();

  return (
    <section className="mt-5">
      <div className="mb-1.5 flex flex-wrap items-end gap-1.5">
        <h2 className="grow">Teams</h2>
        {manages ? <Button onClick={() => setOpen("new")}>New team</Button> : null}
      </div>
      {error ? <ProblemNotice problem={error.problem} /> : null}
      {data && data.rows.length === 0 ? (
        <EmptyState title="No teams yet">
          Keys, embeds, materials and records belong to a team.
          {manages ? " Make the first one, then invite people into it." : null}
        </EmptyState>
      ) : null}
      {data && data.rows.length > 0 ? (
        <DataTable
          caption="Teams"
          rows={data.rows}
          rowKey={({ id }) => id}
          columns={[
            {
              key: "name",
              title: "Name",
              sortBy: ({ name }) => name,
              cell: (team) =>
                manages ? (
                  <button
                    type="button"
                    onClick={() => setOpen(team)}
                    className="link cursor-pointer rounded text-start"
                  >
                    {team.name}
                  </button>
                ) : (
                  team.name
                ),
            },
            {
              key: "slug",
              title: "Short name",
              cell: ({ slug }) => <code className="whitespace-nowrap">{slug}</code>,
            },
            {
              key: "people",
              title: "People",
              align: "end",
              sortBy: ({ people }) => people,
              cell: ({ people }) => people,
            },
            {
              key: "keys",
              title: "Keys in use",
              align: "end",
              sortBy: ({ keys }) => keys,
              cell: ({ keys }) => keys,
            },
          ]}
        />
      ) : null}
      {open ? (
        <TeamDialog
          team={open === "new" ? null : open}
          onClose={() => setOpen(null)}
          onSaved={(what) => {
            setOpen(null);
            say(what);
            void mutate();
          }}
        />
      ) : null}
    </section>
  );
}

interface TeamDialogProps {
  /** None makes a new one. */
  readonly team: TeamShown | null;
  readonly onClose: () => void;
  readonly onSaved: (what: string) => void;
}

function TeamDialog({ team, onClose, onSaved }: TeamDialogProps) {
  const [busy, setBusy] = useState(false);
  const errors = useFormErrors();

  async function submit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    const form = event.currentTarget;
    const given = new FormData(form);
    const name = given.get("name");
    setBusy(true);
    errors.clear();
    try {
      if (team) await callConsole("PATCH", `teams/${team.id}`, { name });
      else await callConsole("POST", "teams", { name, slug: given.get("slug") });
      onSaved(team ? "The team is renamed." : `The team ${String(name)} is there.`);
    } catch (error) {
      errors.take(error, form);
      setBusy(false);
    }
  }

  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={team ? `Rename ${team.name}` : "New team"}
      actions={
        <>
          <Button onClick={onClose}>Cancel</Button>
          <Button variant="primary" type="submit" form="team" disabled={busy}>
            {team ? "Rename" : "Make the team"}
          </Button>
        </>
      }
    >
      <form id="team" method="post" onSubmit={submit} noValidate>
        <TextField
          label="Name"
          name="name"
          defaultValue={team?.name}
          required
          maxLength={100}
          error={errors.of("name")}
        />
        {team ? null : (
          <TextField
            label="Short name"
            name="slug"
            required
            prose={false}
            autoCapitalize="none"
            spellCheck={false}
            help="In answers and on the shell: lower-case letters, digits and hyphens. It cannot be changed later."
            error={errors.of("slug")}
          />
        )}
        <div role="alert">{errors.general ? <ProblemNotice problem={errors.general.problem} /> : null}</div>
      </form>
    </Dialog>
  );
}
