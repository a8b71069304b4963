"use client";

import { memo } from "react";
import { UNITS } from "../../../../_ui/quantity/units";
import type { Column } from "../_model/table";
import { type ColumnChoice, GROUP_TITLES } from "../_model/vocabulary";

interface ColumnHeadProps {
  readonly column: Column;
  readonly place: number;
  readonly choices: readonly ColumnChoice[];
  /** Names that other columns have. */
  readonly taken: ReadonlySet<string>;
  /** What is wrong with it as a whole. */
  readonly complaint: string | undefined;
  readonly onChange: (place: number, change: Partial<Column>) => void;
  readonly onRemove: (place: number) => void;
}

/** In the menu of names: takes the column away. No name has a space. */
const REMOVE = "remove it";

const CONTROL =
  "min-h-5.5 w-full rounded border border-edge bg-sheet px-0.5 font-normal hover:border-ink medium:min-h-4";

/** What a column stands for and the unit of its bare numbers. Its long menu is not drawn again while cells are typed. */
export const ColumnHead = memo(function ColumnHead({
  column,
  place,
  choices,
  taken,
  complaint,
  onChange,
  onRemove,
}: ColumnHeadProps) {
  const choice = choices.find(({ name }) => name === column.name);
  const units = choice?.kind
    ? UNITS[choice.kind].filter(({ hidden, id }) => !hidden || id === column.unit)
    : [];
  const foreign = column.unit !== "" && !units.some(({ id }) => id === column.unit);
  const called = column.title || `column ${place + 1}`;
  return (
    <th scope="col" className="min-w-13 px-0.5 py-0.5 text-start align-top">
      <select
        aria-label={`What ${called} is`}
        value={column.name}
        onChange={(event) =>
          event.target.value === REMOVE
            ? onRemove(place)
            : onChange(place, { name: event.target.value, unit: "" })
        }
        aria-invalid={complaint === undefined ? undefined : true}
        aria-describedby={complaint === undefined ? undefined : `column-${place}-problem`}
        className={`${CONTROL} aria-invalid:border-2 aria-invalid:border-oxide ${column.name === "" ? "text-amber" : ""}`}
      >
        <option value="">left out</option>
        <option value={REMOVE}>remove the column</option>
        {Object.entries(GROUP_TITLES).map(([group, title]) => (
          <optgroup key={group} label={title}>
            {choices
              .filter((entry) => entry.group === group)
              .map(({ name }) => (
                <option key={name} value={name} disabled={name !== column.name && taken.has(name)}>
                  {name}
                </option>
              ))}
          </optgroup>
        ))}
      </select>
      {units.length > 0 || foreign ? (
        <select
          aria-label={`Unit of ${called}`}
          value={column.unit}
          onChange={(event) => onChange(place, { unit: event.target.value })}
          className={`${CONTROL} mt-0.5 text-ink-soft`}
        >
          <option value="">{choice?.kind === "temperature" ? "own, or °C" : "own, or SI"}</option>
          {foreign ? <option value={column.unit}>{column.unit}</option> : null}
          {units.map(({ id, label }) => (
            <option key={id} value={id}>
              {label}
            </option>
          ))}
        </select>
      ) : column.name === "" && column.title !== "" ? (
        <span className="mt-0.5 block text-small font-normal text-ink-soft">{column.title}</span>
      ) : null}
      {complaint === undefined ? null : (
        <span
          id={`column-${place}-problem`}
          className="mt-0.5 block max-w-24 text-small font-normal text-oxide"
        >
          {complaint}
        </span>
      )}
    </th>
  );
});
