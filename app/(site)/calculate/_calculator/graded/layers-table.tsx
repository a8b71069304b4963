"use client";

import { type ReactNode, useId, useState } from "react";
import { ArrowUp, Plus, X } from "lucide-react";
import { Button } from "../../../../_ui/button";
import { ERROR_LINE } from "../../../../_ui/field";
import { FileButton } from "../../../../_ui/file-button";
import { readRows, writeRows } from "../../_model/profile-forms";
import { focusSoon } from "../focus-soon";
import { useForm } from "../form-context";
import { spanText } from "../../_model/profile-starts";
import { baseValue } from "../../_model/value-texts";
import { CellInput } from "./cell-input";
import { type FieldSite, positionKind, VALUE_UNITS } from "./field-site";
import { RowButton } from "./row-button";
import { MOST_ROWS_SHOWN, ReadingNotes, RowsText } from "./rows-text";
import { useRowsReading } from "./use-rows-reading";

type Rows = readonly (readonly [string, string])[];

/** Allowed difference between the sum of the thicknesses and the range, relative: the API's. */
const TOLERANCE = 1e-9;

/** Layers from the coordinate's start to its end, one row each. */
export function LayersTable({ name, site }: { readonly name: string; readonly site: FieldSite }) {
  const { parameters, change, errorAt } = useForm();
  const id = useId();
  const [asText, setAsText] = useState(false);
  const rows = readRows(parameters[name] ?? "");
  const kind = positionKind(site.span);
  const base = site.span?.unit ?? "m";
  const set = (next: Rows) => change({ [name]: writeRows(next) });
  const { notes, revision, restart, read, take } = useRowsReading(set);
  const sizes = rows.map(([thickness]) => baseValue(thickness, kind, base));
  const sum = sizes.every((size) => size !== null)
    ? sizes.reduce((total, size) => total + (size ?? 0), 0)
    : null;
  const extent = site.span?.extent;
  const fits = sum !== null && extent !== undefined && Math.abs(sum / extent - 1) <= TOLERANCE;

  function moveUp(index: number) {
    const next = [...rows];
    [next[index - 1], next[index]] = [next[index], next[index - 1]];
    set(next);
  }

  function remove(index: number) {
    const last = rows.length - 2;
    set(rows.filter((_, i) => i !== index));
    focusSoon(last > 0 ? `${id}-remove-${Math.min(index, last)}` : `${id}-add`);
  }

  function scaleToFit() {
    if (sum === null || !site.span) return;
    const { span } = site;
    restart();
    set(rows.map(([, value], i) => [spanText(((sizes[i] ?? 0) * span.extent) / sum, span), value] as const));
    focusSoon(`${id}-sum`);
  }

  const below = { id: `${id}-sum`, sum, fits, site, complaint: errorAt(name), onFit: scaleToFit };
  const long = rows.length > MOST_ROWS_SHOWN;
  if (asText || long) {
    return (
      <div className="mb-1.5">
        <RowsText
          key={revision}
          label="Layers, one a line"
          columns="Thickness and value"
          rows={rows}
          onChange={(text) => {
            setAsText(true);
            void read(text);
          }}
        />
        <LayersSum {...below}>
          {long ? null : <Button onClick={() => setAsText(false)}>Edit as a table</Button>}
          <FileButton label="Read a CSV file" accept=".csv,.txt,.tsv,text/csv,text/plain" onFile={take} />
        </LayersSum>
        <ReadingNotes reading={notes} />
      </div>
    );
  }

  return (
    <div className="mb-1.5">
      <table className="w-full border-collapse text-table">
        <caption className="mb-0.5 text-start text-table">
          Layers, from the coordinate&rsquo;s start to its end
        </caption>
        <thead className="text-start text-small text-ink-soft">
          <tr>
            <th scope="col" className="w-2.5 text-start font-normal">
              <span className="sr-only">Number</span>
            </th>
            <th scope="col" className="text-start font-normal">
              Thickness
            </th>
            <th scope="col" className="text-start font-normal">
              Value
            </th>
            <th scope="col">
              <span className="sr-only">Change</span>
            </th>
          </tr>
        </thead>
        <tbody>
          {rows.map((row, index) => (
            <tr key={index} className="align-top">
              <th scope="row" className="pt-1 text-start text-small font-normal text-ink-soft">
                {index + 1}
              </th>
              {(["thickness", "value"] as const).map((column, place) => (
                <td key={column} className="pe-0.5 pb-0.5">
                  <CellInput
                    label={`Layer ${index + 1}, ${column}`}
                    kind={place === 0 ? kind : site.values}
                    bareUnit={place === 0 ? base : VALUE_UNITS[site.values]}
                    value={row[place]}
                    error={errorAt(`${name}/${index}/${column}`)}
                    onChange={(text) =>
                      set(
                        rows.map((own, i) =>
                          i !== index ? own : place === 0 ? [text, own[1]] : [own[0], text],
                        ),
                      )
                    }
                  />
                </td>
              ))}
              <td className="w-px pb-0.5 whitespace-nowrap">
                <RowButton
                  label={`Move layer ${index + 1} up`}
                  disabled={index === 0}
                  onPress={() => moveUp(index)}
                >
                  <ArrowUp aria-hidden size={15} />
                </RowButton>
                <RowButton
                  id={`${id}-remove-${index}`}
                  label={`Remove layer ${index + 1}`}
                  disabled={rows.length === 1}
                  onPress={() => remove(index)}
                >
                  <X aria-hidden size={15} />
                </RowButton>
              </td>
            </tr>
          ))}
        </tbody>
      </table>
      <LayersSum {...below}>
        <Button id={`${id}-add`} onClick={() => set([...rows, rows.at(-1) ?? ["", ""]])}>
          <Plus aria-hidden size={15} /> Layer
        </Button>
        <Button onClick={() => setAsText(true)}>Edit as text</Button>
        <FileButton label="Read a CSV file" accept=".csv,.txt,.tsv,text/csv,text/plain" onFile={take} />
      </LayersSum>
      <ReadingNotes reading={notes} />
    </div>
  );
}

interface LayersSumProps {
  /** Of the line that tells the sum: pressing "Scale to fit" disables it, and focus goes there. */
  readonly id: string;
  /** Of the thicknesses, in the coordinate's unit; null where one cannot be read. */
  readonly sum: number | null;
  readonly fits: boolean;
  readonly site: FieldSite;
  readonly complaint: string | undefined;
  readonly onFit: () => void;
  readonly children: ReactNode;
}

/** The buttons below the layers, and whether they fill the range. */
function LayersSum({ id, sum, fits, site, complaint, onFit, children }: LayersSumProps) {
  const { span } = site;
  const known = span !== undefined && sum !== null;
  return (
    <>
      <p className={ERROR_LINE}>{complaint}</p>
      <div className="flex flex-wrap items-center gap-1">
        {children}
        <Button onClick={onFit} disabled={!known || fits}>
          Scale to fit
        </Button>
        <p id={id} tabIndex={-1} className={`text-small ${fits ? "text-ink-soft" : "text-amber"}`}>
          {known
            ? `Together ${spanText(sum, span)} of ${spanText(span.extent, span)}`
            : "The sum is not known yet."}
        </p>
      </div>
    </>
  );
}
