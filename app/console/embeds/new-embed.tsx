"use client";

import { useRouter } from "next/navigation";
import { type FormEvent, useId, useState } from "react";
import type { EmbedView } from "@/lib/embeds/embed-view";
import { Button } from "../../_ui/button";
import { Dialog } from "../../_ui/dialog";
import { ProblemNotice } from "../../_ui/problem-notice";
import { Segmented } from "../../_ui/segmented";
import { Select } from "../../_ui/select";
import { TextField } from "../../_ui/text-field";
import { callConsole } from "../_shell/call-console";
import { useFormErrors } from "../_shell/use-form-errors";
import type { ShapeChoice } from "./embed-list";
import { OutlinePicker } from "./outline-picker";

interface NewEmbedProps {
  readonly teams: readonly { readonly id: string; readonly name: string }[];
  readonly ownTeam: string;
  readonly shapes: readonly ShapeChoice[];
  /** Shape and values of the calculation page that led here. */
  readonly shape: string | undefined;
  readonly values: Readonly<Record<string, string>>;
  /** Id of the stored outline that the outline page led here with. */
  readonly outlineId: string | undefined;
  readonly onClose: () => void;
}

type Subject = "shape" | "outline";

const SUBJECTS: readonly { readonly value: Subject; readonly label: string }[] = [
  { value: "shape", label: "A shape of the catalogue" },
  { value: "outline", label: "A saved outline" },
];

/** Asks for what a new widget needs; everything else is the builder's. */
export function NewEmbed({ teams, ownTeam, shapes, shape, values, outlineId, onClose }: NewEmbedProps) {
  const router = useRouter();
  const form = useId();
  const errors = useFormErrors();
  const [busy, setBusy] = useState(false);
  const [subject, setSubject] = useState<Subject>(outlineId === undefined ? "shape" : "outline");
  const [teamId, setTeamId] = useState(ownTeam);
  const [outline, setOutline] = useState(outlineId ?? "");

  async function make(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    const element = event.currentTarget;
    const data = new FormData(element);
    errors.clear();
    setBusy(true);
    try {
      const embed = await callConsole<EmbedView>("POST", "embeds", {
        name: String(data.get("name") ?? ""),
        teamId,
        ...(subject === "outline" ? { outlineId: outline } : { shape: String(data.get("shape") ?? "") }),
        // Of another shape than the page's the values would mean nothing.
        ...(subject === "shape" && data.get("shape") === shape ? { values: short(values) } : {}),
      });
      router.push(`/console/embeds/${embed.id}`);
    } catch (error) {
      errors.take(error, element);
      setBusy(false);
    }
  }

  return (
    <Dialog
      open
      onOpenChange={onClose}
      title="New embed"
      description="It starts as a draft that no page shows."
      actions={
        <Button
          variant="primary"
          type="submit"
          form={form}
          disabled={busy || (subject === "outline" && outline === "")}
        >
          Make the draft
        </Button>
      }
    >
      <form id={form} onSubmit={(event) => void make(event)}>
        <TextField
          label="Name"
          name="name"
          required
          maxLength={100}
          error={errors.of("name")}
          help="For your team; visitors see the title, which comes later."
        />
        <Select
          label="Team"
          name="teamId"
          value={teamId}
          error={errors.of("teamId")}
          options={teams.map(({ id, name }) => ({ value: id, label: name }))}
          onChange={(event) => {
            setTeamId(event.target.value);
            setOutline("");
          }}
        />
        <Segmented
          label="What it computes"
          value={subject}
          options={SUBJECTS}
          onChange={setSubject}
          className="mb-1"
        />
        {subject === "outline" ? (
          <OutlinePicker teamId={teamId} value={outline} onChange={setOutline} />
        ) : (
          <Select
            label="Shape"
            name="shape"
            defaultValue={shape}
            help={shape === undefined ? undefined : "With the values of the calculation you came from."}
            error={errors.of("shape")}
            options={shapes.map(({ id, title }) => ({ value: id, label: title }))}
          />
        )}
        {errors.general ? <ProblemNotice problem={errors.general.problem} /> : null}
      </form>
    </Dialog>
  );
}

/** Long profiles and lists are for the builder. */
function short(values: Readonly<Record<string, string>>): Record<string, string> {
  return Object.fromEntries(Object.entries(values).filter(([, value]) => value.length <= 120));
}
