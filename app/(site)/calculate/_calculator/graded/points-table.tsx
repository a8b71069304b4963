"use client";

import { useId, useState } from "react";
import { Plus, X } from "lucide-react";
import { Button } from "../../../../_ui/button";
import { CONTROL, Field } from "../../../../_ui/field";
import { readRows, writeRows } from "../../_model/profile-forms";
import { useForm } from "../form-context";
import { CellInput } from "./cell-input";
import { type FieldSite, positionKind, VALUE_UNITS } from "./field-site";
import { RowButton } from "./row-button";
import { readPoints, type PointsReading } from "./read-points";

type Rows = readonly (readonly [string, string])[];

/** Longer tables are edited as text. */
const MOST_ROWS = 40;

/** Measured points: typed row by row, pasted as text, or read from a CSV file. */
export function PointsTable({ name, site }: { readonly name: string; readonly site: FieldSite }) {
  const { parameters, change, errorAt } = useForm();
  const [asText, setAsText] = useState(false);
  const [notes, setNotes] = useState<PointsReading | null>(null);
  const fileId = useId();
  const rows = readRows(parameters[name] ?? "");
  const long = rows.length > MOST_ROWS;
  const set = (next: Rows) => change({ [name]: writeRows(next) });

  async function read(text: string) {
    const reading = await readPoints(text);
    setNotes(reading);
    if (reading.rows.length > 0) set(reading.rows);
  }

  return (
    <div className="mb-1.5">
      {asText || long ? (
        <PointsText key={`${name}${asText}`} rows={rows} onRead={read} />
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
                    label={`Remove point ${index + 1}`}
                    disabled={rows.length <= 2}
                    onPress={() => set(rows.filter((_, i) => i !== index))}
                  >
                    <X aria-hidden size={15} />
                  </RowButton>
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      )}
      <p className="min-h-2.5 text-small text-oxide">
        {errorAt(name) ?? firstInside(name, errorAt, rows.length, long)}
      </p>
      <div className="flex flex-wrap items-center gap-1">
        {long ? null : (
          <>
            <Button onClick={() => set([...rows, rows.at(-1) ?? ["", ""]])} disabled={asText}>
              <Plus aria-hidden size={15} /> Point
            </Button>
            <Button aria-pressed={asText} onClick={() => setAsText(!asText)}>
              {asText ? "Edit as a table" : "Edit as text"}
            </Button>
          </>
        )}
        <label
          htmlFor={fileId}
          className="inline-flex min-h-5.5 cursor-pointer items-center rounded border border-edge bg-sheet px-2 text-table font-medium hover:border-ink has-focus-visible:outline-2 has-focus-visible:outline-offset-2 has-focus-visible:outline-verdigris medium:min-h-5"
        >
          Read a CSV file
          <input
            id={fileId}
            type="file"
            accept=".csv,.txt,.tsv,text/csv,text/plain"
            className="sr-only"
            onChange={async (event) => {
              const file = event.target.files?.[0];
              event.target.value = "";
              if (file) await read(await file.text());
            }}
          />
        </label>
        <p className="text-small text-ink-soft">{rows.length} points</p>
      </div>
      <div aria-live="polite" className="text-small">
        {notes?.problems.slice(0, 5).map((problem) => (
          <p key={problem} className="text-oxide">
            {problem}
          </p>
        ))}
        {notes?.note ? <p className="text-ink-soft">{notes.note}</p> : null}
      </div>
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

interface PointsTextProps {
  readonly rows: Rows;
  readonly onRead: (text: string) => void;
}

function PointsText({ rows, onRead }: PointsTextProps) {
  const [text, setText] = useState(() => rows.map((row) => row.join("; ")).join("\n"));
  return (
    <Field
      label="Points, one a line"
      help="Position and value, with a tab, a semicolon or a comma between them; a first line may carry names and units, such as radius/mm; conductivity/(S/m)."
    >
      {(control) => (
        <textarea
          {...control}
          rows={8}
          value={text}
          spellCheck={false}
          onChange={(event) => {
            setText(event.target.value);
            onRead(event.target.value);
          }}
          className={`${CONTROL} resize-y`}
        />
      )}
    </Field>
  );
}
