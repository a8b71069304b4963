"use client";

import { useState } from "react";
import type { EmbedDetail } from "../../../api/console/embeds/_server/embed-detail";
import { Button } from "../../../_ui/button";
import { Notice } from "../../../_ui/notice";
import { ProblemNotice } from "../../../_ui/problem-notice";
import { callConsole } from "../../_shell/call-console";
import { AppearanceFields } from "./appearance-fields";
import { InputRules } from "./input-rules";
import { OutlineFields } from "./outline-fields";
import { Preview } from "./preview";
import { ToleranceFields } from "./tolerance-fields";
import { type Draft, useDraft } from "./use-draft";

interface BuilderProps {
  readonly detail: EmbedDetail;
  readonly onChanged: () => void;
  readonly act: (work: () => Promise<unknown>) => Promise<void>;
}

/** The builder: made anew whenever another version becomes the newest by other ways than typing here. */
export function Builder(props: BuilderProps) {
  const [newest] = props.detail.versions;
  const [own, setOwn] = useState({ number: newest.number, state: newest.state, round: 0 });
  const { number, state } = newest;
  // A draft that was started by typing here is not a reason to begin again.
  const started = number === own.number + 1 && state === "draft" && own.state !== "draft";
  if (number !== own.number || state !== own.state) {
    setOwn({ number, state, round: started ? own.round : own.round + 1 });
  }
  return <BuilderFields key={own.round} {...props} />;
}

function BuilderFields({ detail, onChanged, act }: BuilderProps) {
  const draft = useDraft(detail, onChanged);
  const { mayManage, embed, versions } = detail;
  const isDraft = versions[0].state === "draft";
  return (
    <div className="grid gap-3 pt-2 wide:grid-cols-[minmax(0,1fr)_minmax(0,1fr)]">
      <div className="min-w-0">
        <fieldset disabled={!mayManage} className="min-w-0">
          <legend className="sr-only">What the embed says</legend>
          <OutlineFields detail={detail} draft={draft} />
          <AppearanceFields detail={detail} draft={draft} />
          <InputRules detail={detail} draft={draft} />
          {draft.definition.outlineId === undefined ? (
            <ToleranceFields detail={detail} draft={draft} />
          ) : null}
        </fieldset>
      </div>
      <div className="min-w-0 wide:sticky wide:top-2 wide:self-start">
        {mayManage ? (
          <div className="mb-1.5 flex flex-wrap items-center gap-1">
            <Button
              variant="primary"
              disabled={!isDraft || draft.state !== "saved" || draft.problems.length > 0}
              onClick={() => void act(() => callConsole("POST", `embeds/${embed.id}/publish`))}
            >
              {isDraft
                ? `Publish version ${draft.shown.number}`
                : `Version ${draft.shown.number} is the newest`}
            </Button>
            {isDraft && draft.shown.number > 1 ? (
              <Button onClick={() => void act(() => callConsole("DELETE", `embeds/${embed.id}/draft`))}>
                Throw the draft away
              </Button>
            ) : null}
            <span className="text-small text-ink-soft" role="status">
              <SaveState draft={draft} isDraft={isDraft} />
            </span>
          </div>
        ) : null}
        {draft.failure ? <ProblemNotice problem={draft.failure.problem} /> : null}
        <ProblemList draft={draft} detail={detail} />
        <Preview embedId={embed.id} version={draft.shown.number} savedAt={draft.shown.savedAt} />
      </div>
    </div>
  );
}

function SaveState({ draft, isDraft }: { readonly draft: Draft; readonly isDraft: boolean }) {
  if (draft.state === "saving") return "Saving …";
  if (draft.state === "failed") return "Not saved";
  return isDraft ? "Draft saved; no page shows it yet." : "Change something to start the next draft.";
}

/** What stands in the way of publishing, each with the input it is about. */
function ProblemList({ draft, detail }: { readonly draft: Draft; readonly detail: EmbedDetail }) {
  if (draft.problems.length === 0) return null;
  return (
    <div className="mb-1.5">
      <Notice tone="problem" title="Before it can be published">
        <ul>
          {draft.problems.map(({ pointer, detail: text }) => (
            <li key={`${pointer} ${text}`}>
              {placeText(pointer, draft, detail)} {text}
            </li>
          ))}
        </ul>
      </Notice>
    </div>
  );
}

const PLACES: Readonly<Record<string, string>> = {
  title: "The title",
  intro: "The line below the title",
  accent: "The accent colour",
  requirement: "The requirement",
  graded: "The graded medium",
  inputs: "Inputs:",
  tolerances: "Tolerances:",
  shape: "The shape",
  outlineId: "The outline:",
  terminals: "The terminals:",
  accuracy: "The width of the bracket",
};

function placeText(pointer: string, { definition }: Draft, { inputs }: EmbedDetail): string {
  const [, place, ...rest] = pointer.split("/");
  const labelOf = (name: string) => inputs.find((input) => input.name === name)?.label ?? name;
  if (place === "inputs") {
    const name = definition.inputs[Number(rest[0])]?.name;
    if (name !== undefined) return `${labelOf(name)}:`;
  }
  if (place === "tolerances" && rest[0] === "inputs") {
    const name = definition.tolerances?.inputs[Number(rest[1])]?.name;
    if (name !== undefined) return `Tolerance of ${labelOf(name)}:`;
  }
  return PLACES[place ?? ""] ?? "";
}
