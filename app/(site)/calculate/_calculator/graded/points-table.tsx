"use client";

import { useId, useState } from "react";
import { Plus, X } from "lucide-react";
import { Button } from "../../../../_ui/button";
import { ERROR_LINE } from "../../../../_ui/field";
import { FileButton } from "../../../../_ui/file-button";
import { readRows, writeRows } from "../../_model/profile-forms";
import { focusSoon } from "../focus-soon";
import { useForm } from "../form-context";
import { CellInput } from "./cell-input";
import { type FieldSite, positionKind, VALUE_UNITS } from "./field-site";
import { RowButton } from "./row-button";
import { MOST_ROWS_SHOWN, ReadingNotes, RowsText } from "./rows-text";
import { useRowsReading } from "./use-rows-reading";

type Rows = readonly (readonly [string, string])[];

/** Measured points: typed row by row, pasted as text, or read from a CSV file. */
export function PointsTable({ name, site }: { readonly name: string; readonly site: FieldSite }) {
  const { parameters, change, errorAt } = useForm();
  const id = useId();
  const [asText, setAsText] = useState(false);
  const rows = readRows(parameters[name] ?? "");
  const long = rows.length > MOST_ROWS_SHOWN;
  const set = (next: Rows) => change({ [name]: writeRows(next) });
  const { notes, revision, read, take } = useRowsReading(set);

  function remove(index: number) {
    const last = rows.length - 2;
    set(rows.filter((_, i) => i !== index));
    focusSoon(last > 1 ? `${id}-remove-${Math.min(index, last)}` : `${id}-add`);
  }

  return (
    <div className="mb-1.5">
      {asText || long ? (
        <RowsText
          key={revision}
          label="Points, one a line"
          columns="Position and value"
          rows={rows}
          onChange={(text) => {
            setAsText(true);
            void read(text);
          }}
        />
      ) : (
        <table className="w-full border-collapse text-table">
          <caption className="mb-0.5 text-start text-table">Points, by increasing position</caption>
          <thead className="text-small text-ink-soft">
            <tr>
              <th scope="col" className="text-start font-normal">
                Position
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
                {(["position", "value"] as const).map((column, place) => (
                  <td key={column} className="pe-0.5 pb-0.5">
                    <CellInput
                      label={`Point ${index + 1}, ${column}`}
                      kind={place === 0 ? positionKind(site.span) : site.values}
                      bareUnit={place === 0 ? (site.span?.unit ?? "m") : VALUE_UNITS[site.values]}
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
                <td className="w-px pb-0.5">
                  <RowButton
                    id={`${id}-remove-${index}`}
                    label={`Remove point ${index + 1}`}
                    disabled={rows.length <= 2}
                    onPress={() => remove(index)}
                  >
                    <X aria-hidden size={15} />
                  </RowButton>
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      )}
      <p className={ERROR_LINE}>{errorAt(name) ?? firstInside(name, errorAt, rows.length, long)}</p>
      <div className="flex flex-wrap items-center gap-1">
        {long ? null : (
          <>
            {asText ? null : (
              <Button id={`${id}-add`} onClick={() => set([...rows, rows.at(-1) ?? ["", ""]])}>
                <Plus aria-hidden size={15} /> Point
              </Button>
            )}
            <Button aria-pressed={asText} onClick={() => setAsText(!asText)}>
              {asText ? "Edit as a table" : "Edit as text"}
            </Button>
          </>
        )}
        <FileButton label="Read a CSV file" accept=".csv,.txt,.tsv,text/csv,text/plain" onFile={take} />
        <p className="text-small text-ink-soft">{rows.length} points</p>
      </div>
      <ReadingNotes reading={notes} />
    </div>
  );
}

/** In a long table no row is in sight, so its first complaint is told here. */
function firstInside(
  name: string,
  errorAt: (name: string) => string | undefined,
  count: number,
  long: boolean,
): string | undefined {
  if (!long) return undefined;
  for (let i = 0; i < count; i++) {
    const found = errorAt(`${name}/${i}/position`) ?? errorAt(`${name}/${i}/value`);
    if (found) return `Point ${i + 1}: ${found}`;
  }
  return undefined;
}
