"use client";

import type { EmbedDetail } from "../../../api/console/embeds/_server/embed-detail";
import { OutlineDrawing } from "../../../_ui/drawing/outline-drawing";
import { Select } from "../../../_ui/select";
import { outlineFacts, outlineName } from "../outline-picker";
import { JsonField } from "./json-field";
import type { Draft } from "./use-draft";

/** Width of the bracket over its value, as the API takes it. */
const ACCURACIES = [
  { value: "0.01", label: "1 %" },
  { value: "0.001", label: "0.1 %" },
  { value: "0.0001", label: "0.01 %" },
  { value: "0.00001", label: "0.001 %" },
  { value: "0.000001", label: "0.0001 %" },
];

const USUAL = 1e-4;

/** What a widget on an outline has in place of a shape: the drawing, its terminals, how narrow the bracket shall be. */
export function OutlineFields({ detail, draft }: { readonly detail: EmbedDetail; readonly draft: Draft }) {
  const { definition, change, problems } = draft;
  const { outline } = detail;
  if (definition.outlineId === undefined) return null;
  const errorAt = (member: string) =>
    problems.find(({ pointer }) => pointer === `#/${member}` || pointer.startsWith(`#/${member}/`))?.detail;
  const accuracy = definition.accuracy ?? USUAL;
  const known = ACCURACIES.some(({ value }) => Number(value) === accuracy);
  return (
    <>
      <h2 className="text-h3! mb-1">Outline</h2>
      {outline ? (
        <div className="mb-1 flex flex-wrap items-center gap-2">
          <OutlineDrawing plan={outline.plan} label={outlineFacts(outline)} className="max-h-20 w-[14rem]" />
          <p className="min-w-0 grow basis-[12rem] text-table text-ink-soft">
            <span className="font-medium text-ink">{outlineName(outline)}</span>
            <br />
            {outlineFacts(outline)}. A stored outline never changes, so what is published stays as it is; for
            another drawing make another embed.
          </p>
        </div>
      ) : (
        <p className="mb-1 text-table text-oxide">{errorAt("outlineId") ?? "There is no such outline."}</p>
      )}
      <Select
        label="Width of the bracket"
        help="Narrower ones take longer and cost more computations."
        error={errorAt("accuracy")}
        value={String(known ? ACCURACIES.find(({ value }) => Number(value) === accuracy)?.value : accuracy)}
        options={
          known ? ACCURACIES : [{ value: String(accuracy), label: `${100 * accuracy} %` }, ...ACCURACIES]
        }
        onChange={(event) => change({ accuracy: Number(event.target.value) })}
      />
      {/* Other terminals than those that the outline was stored with; they are needed where it has none. */}
      <JsonField
        label="Terminals"
        help="As the member terminals of the API, in JSON; empty for those that the outline was stored with."
        offer="Give other terminals"
        placeholder={PLACEHOLDER}
        value={definition.terminals}
        error={errorAt("terminals")}
        onChange={(terminals) => change({ terminals: terminals as typeof definition.terminals })}
      />
    </>
  );
}

const PLACEHOLDER = `[
  { "name": "in", "segments": [[[40, 0], [40, 10]]] },
  { "name": "out", "segments": [[[10, 40], [0, 40]]] }
]`;
