"use client";

import { X } from "lucide-react";
import { CONTROL } from "../../../_ui/field";
import { DISTRIBUTIONS } from "../_model/tolerances";
import type { PlainForm } from "./form-context";

interface ToleranceProps {
  readonly form: PlainForm;
  /** The parameter that the tolerance belongs to. */
  readonly name: string;
  /** Its label, for readers. */
  readonly label: string;
}

/** Offers a tolerance at the end of a field's label; nothing once there is one. */
export function ToleranceButton({ form, name, label }: ToleranceProps) {
  const { parameters, change, tolerances } = form;
  if (!tolerances || `${name}.tolerance` in parameters) return null;
  return (
    <button
      type="button"
      aria-label={`Give ${label.toLowerCase()} a tolerance`}
      title="Give a tolerance"
      className="relative grid size-2.5 cursor-pointer place-items-center rounded border border-edge font-mono text-small leading-none text-ink-soft before:absolute before:-inset-1.5 before:content-[''] hover:border-ink hover:text-ink"
      onClick={() =>
        change({
          [`${name}.tolerance`]: "1 %",
          // A tolerance that nothing evaluates would say nothing.
          uncertainty: parameters.uncertainty ?? "propagation",
        })
      }
    >
      ±
    </button>
  );
}

/** The tolerance of a quantity: how far, and how it is spread. */
export function ToleranceRow({ form, name, label }: ToleranceProps) {
  const { parameters, change, errorAt } = form;
  const tolerance = parameters[`${name}.tolerance`];
  if (!form.tolerances || tolerance === undefined) return null;
  const error = errorAt(`${name}.tolerance`);
  const errorId = `${name}-tolerance-error`;
  return (
    <div className="mb-1.5 border-s-2 border-rule ps-1">
      <div className="grid grid-cols-[auto_minmax(4.5rem,1fr)_minmax(0,1.4fr)_auto] items-center gap-1">
        <span aria-hidden className="font-mono">
          ±
        </span>
        <input
          aria-label={`Tolerance of ${label.toLowerCase()}`}
          aria-invalid={error ? true : undefined}
          aria-describedby={error ? errorId : undefined}
          name={`${name}.tolerance`}
          value={tolerance}
          onChange={(event) => change({ [`${name}.tolerance`]: event.target.value })}
          type="text"
          autoComplete="off"
          autoCapitalize="off"
          spellCheck={false}
          className={CONTROL}
        />
        <select
          aria-label={`Distribution of ${label.toLowerCase()}`}
          value={parameters[`${name}.distribution`] ?? "uniform"}
          onChange={(event) =>
            change({
              [`${name}.distribution`]: event.target.value === "uniform" ? undefined : event.target.value,
            })
          }
          className={`${CONTROL} font-sans!`}
        >
          {DISTRIBUTIONS.map((option) => (
            <option key={option.value} value={option.value}>
              {option.label}
            </option>
          ))}
        </select>
        <button
          type="button"
          aria-label={`Take the tolerance of ${label.toLowerCase()} away`}
          className="grid size-4 cursor-pointer place-items-center rounded text-ink-soft hover:text-ink"
          onClick={() => change({ [`${name}.tolerance`]: undefined, [`${name}.distribution`]: undefined })}
        >
          <X aria-hidden size={15} />
        </button>
      </div>
      <p id={errorId} className="mt-0.5 text-small text-oxide">
        {error}
      </p>
    </div>
  );
}
