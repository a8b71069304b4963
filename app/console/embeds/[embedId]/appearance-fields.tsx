"use client";

import type { EmbedDefinition } from "@/lib/embeds/definition";
import type { EmbedDetail } from "../../../api/console/embeds/_server/embed-detail";
import { Segmented } from "../../../_ui/segmented";
import { Select } from "../../../_ui/select";
import { TextField } from "../../../_ui/text-field";
import { Toggle } from "../../../_ui/toggle";
import type { Draft } from "./use-draft";

const LANGUAGES: readonly { readonly value: EmbedDefinition["language"]; readonly label: string }[] = [
  { value: "reader", label: "As the page around, else the reader’s" },
  { value: "en", label: "English" },
  { value: "de", label: "German" },
  { value: "fr", label: "French" },
  { value: "es", label: "Spanish" },
  { value: "sv", label: "Swedish" },
  { value: "ja", label: "Japanese" },
];

const THEMES: readonly { readonly value: EmbedDefinition["theme"]; readonly label: string }[] = [
  { value: "host", label: "As the page" },
  { value: "light", label: "Light" },
  { value: "dark", label: "Dark" },
];

const DENSITIES: readonly { readonly value: EmbedDefinition["density"]; readonly label: string }[] = [
  { value: "comfortable", label: "Roomy" },
  { value: "compact", label: "Compact" },
];

/** Copper, the accent where none was chosen, as the light theme has it. */
const USUAL_ACCENT = "#9c4a1f";

interface FieldsProps {
  readonly detail: EmbedDetail;
  readonly draft: Draft;
}

/** Wording, requirement, what is shown, and how it looks. */
export function AppearanceFields({ detail, draft }: FieldsProps) {
  const { definition, change, problems } = draft;
  const { show, requirement } = definition;
  const errorAt = (pointer: string) => problems.find((problem) => problem.pointer === pointer)?.detail;
  const limit = (end: "min" | "max", text: string) => {
    const next = { ...requirement, [end]: text.trim() === "" ? undefined : text };
    change({ requirement: next.min === undefined && next.max === undefined ? undefined : next });
  };
  return (
    <>
      <h2 className="text-h3! mb-1">Wording</h2>
      <TextField
        label="Title"
        value={definition.title}
        maxLength={100}
        error={errorAt("#/title")}
        onChange={(event) => change({ title: event.target.value })}
      />
      <TextField
        label="Line below it"
        value={definition.intro ?? ""}
        maxLength={300}
        error={errorAt("#/intro")}
        onChange={(event) => change({ intro: event.target.value || undefined })}
      />
      <div className="grid gap-x-2 narrow:grid-cols-2">
        <TextField
          label="Required: at least"
          prose={false}
          placeholder="no limit"
          value={requirement?.min ?? ""}
          error={errorAt("#/requirement/min")}
          onChange={(event) => limit("min", event.target.value)}
        />
        <TextField
          label="Required: at most"
          prose={false}
          placeholder="no limit"
          value={requirement?.max ?? ""}
          error={errorAt("#/requirement/max")}
          help="Such as 40 uohm; visitors see the verdict."
          onChange={(event) => limit("max", event.target.value)}
        />
      </div>
      <h2 className="text-h3! mt-1 mb-1">Look</h2>
      <div className="flex flex-wrap gap-x-3">
        <Toggle
          label="Drawing"
          checked={show.drawing}
          onChange={(drawing) => change({ show: { ...show, drawing } })}
        />
        <Toggle
          label="Bounds"
          checked={show.bounds}
          onChange={(bounds) => change({ show: { ...show, bounds } })}
        />
        <Toggle
          label={definition.outlineId === undefined ? "Plots along the flow" : "Picture of the field"}
          checked={show.plots}
          onChange={(plots) => change({ show: { ...show, plots } })}
        />
      </div>
      {detail.hasCautions ? <p className="text-small text-ink-soft">Its cautions always show.</p> : null}
      <div className="mt-1 flex flex-wrap gap-x-3 gap-y-1">
        <Segmented
          label="Theme"
          value={definition.theme}
          options={THEMES}
          onChange={(theme) => change({ theme })}
        />
        <Segmented
          label="Density"
          value={definition.density}
          options={DENSITIES}
          onChange={(density) => change({ density })}
        />
      </div>
      <div className="mt-1.5 grid gap-x-2 narrow:grid-cols-2">
        <Select
          label="Language"
          value={definition.language}
          options={LANGUAGES}
          onChange={(event) => {
            const found = LANGUAGES.find(({ value }) => value === event.target.value);
            if (found) change({ language: found.value });
          }}
        />
        <div className="flex items-start gap-1">
          <TextField
            label="Accent colour"
            type="color"
            value={definition.accent ?? USUAL_ACCENT}
            error={errorAt("#/accent")}
            className="grow"
            help={definition.accent ?? "copper, of the theme"}
            onChange={(event) => change({ accent: event.target.value.toLowerCase() })}
          />
          {definition.accent ? (
            <button
              type="button"
              className="link mt-3.5 min-h-5.5 cursor-pointer text-table"
              onClick={() => change({ accent: undefined })}
            >
              Copper
            </button>
          ) : null}
        </div>
      </div>
    </>
  );
}
