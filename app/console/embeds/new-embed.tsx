"use client";

import { useRouter } from "next/navigation";
import { type FormEvent, useId, useState } from "react";
import type { EmbedView } from "@/lib/embeds/embed-view";
import { Button } from "../../_ui/button";
import { Dialog } from "../../_ui/dialog";
import { ProblemNotice } from "../../_ui/problem-notice";
import { Select } from "../../_ui/select";
import { TextField } from "../../_ui/text-field";
import { callConsole } from "../_shell/call-console";
import { useFormErrors } from "../_shell/use-form-errors";
import type { ShapeChoice } from "./embed-list";

interface NewEmbedProps {
  readonly teams: readonly { readonly id: string; readonly name: string }[];
  readonly ownTeam: string;
  readonly shapes: readonly ShapeChoice[];
  /** Shape and values of the calculation page that led here. */
  readonly shape: string | undefined;
  readonly values: Readonly<Record<string, string>>;
  readonly onClose: () => void;
}

/** Asks for what a new widget needs; everything else is the builder's. */
export function NewEmbed({ teams, ownTeam, shapes, shape, values, onClose }: NewEmbedProps) {
  const router = useRouter();
  const form = useId();
  const errors = useFormErrors();
  const [busy, setBusy] = useState(false);

  async function make(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    const element = event.currentTarget;
    const data = new FormData(element);
    errors.clear();
    setBusy(true);
    try {
      const embed = await callConsole<EmbedView>("POST", "embeds", {
        name: String(data.get("name") ?? ""),
        shape: String(data.get("shape") ?? ""),
        teamId: String(data.get("teamId") ?? ""),
        // Of another shape than the page's the values would mean nothing.
        ...(data.get("shape") === shape ? { values: short(values) } : {}),
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
        <Button variant="primary" type="submit" form={form} disabled={busy}>
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
          label="Shape"
          name="shape"
          defaultValue={shape}
          help={shape === undefined ? undefined : "With the values of the calculation you came from."}
          error={errors.of("shape")}
          options={shapes.map(({ id, title }) => ({ value: id, label: title }))}
        />
        <Select
          label="Team"
          name="teamId"
          defaultValue={ownTeam}
          error={errors.of("teamId")}
          options={teams.map(({ id, name }) => ({ value: id, label: name }))}
        />
        {errors.general ? <ProblemNotice problem={errors.general.problem} /> : null}
      </form>
    </Dialog>
  );
}

/** Long profiles and lists are for the builder. */
function short(values: Readonly<Record<string, string>>): Record<string, string> {
  return Object.fromEntries(Object.entries(values).filter(([, value]) => value.length <= 120));
}
