"use client";

import { X } from "lucide-react";
import { CONTROL } from "../../../_ui/field";
import { focusSoon } from "./focus-soon";
import { DISTRIBUTIONS, hasTolerance, noTolerance } from "../_model/tolerances";
import type { PlainForm } from "./form-context";

interface ToleranceProps {
  readonly form: PlainForm;
  /** The parameter that the tolerance belongs to. */
  readonly name: string;
  /** Its label, for readers. */
  readonly label: string;
}

interface Temperature {
  readonly temperature?: boolean;
}

interface Compact {
  /** One line for a table's cell. */
  readonly compact?: boolean;
}

/** The button and the field take each other's place, and focus goes from one to the other. */
const buttonId = (name: string) => `${name}-give-tolerance`;
const fieldId = (name: string) => `${name}-tolerance`;

/** Offers a tolerance at the end of a field's label; nothing once there is one. */
export function ToleranceButton({ form, name, label, temperature = false }: ToleranceProps & Temperature) {
  const { parameters, change, tolerances } = form;
  if (!tolerances || hasTolerance(parameters, name)) return null;
  // A share of a temperature would depend on where its zero lies.
  const start = temperature ? "1 K" : "1 %";
  return (
    <button
      type="button"
      id={buttonId(name)}
      aria-label={`Give ${label.toLowerCase()} a tolerance`}
      title="Give a tolerance"
      className="relative grid size-2.5 cursor-pointer place-items-center rounded border border-edge font-mono text-small leading-none text-ink-soft before:absolute before:-inset-[13px] before:content-[''] hover:border-ink hover:text-ink"
      onClick={() => {
        change({
          [`${name}.tolerance`]: start,
          // A tolerance that nothing evaluates would say nothing.
          uncertainty: parameters.uncertainty ?? "propagation",
        });
        focusSoon(fieldId(name));
      }}
    >
      ±
    </button>
  );
}

const SIDES = {
  tolerance: { sign: "±", said: "Tolerance" },
  plus: { sign: "+", said: "Upper tolerance" },
  minus: { sign: "−", said: "Lower tolerance" },
} as const;

const EVENLY = "the same to both sides";
const APART = "plus and minus apart";

const IN_FORM = {
  row: "-mt-1 mb-3 border-s-2 border-rule ps-1",
  sides: "grid grid-cols-[minmax(0,1fr)_minmax(0,1fr)_auto] items-center gap-1",
  side: "min-w-0",
  away: "size-4",
  spread: "mt-0.5 flex flex-wrap items-center gap-1",
  distribution: "w-auto! max-w-full min-w-0",
};
const IN_CELL: typeof IN_FORM = {
  row: "flex flex-wrap items-center gap-x-0.5",
  sides: "flex items-center gap-0.5",
  side: "w-9! px-0.5! medium:min-h-4!",
  away: "size-5.5 medium:size-3",
  spread: "flex items-center gap-0.5",
  distribution: "w-16! px-0.5! medium:min-h-4!",
};

/** The tolerance of a quantity: how far, to both sides alike or to each, and how it is spread. */
export function ToleranceRow({ form, name, label, compact = false }: ToleranceProps & Compact) {
  const { parameters, change, errorAt } = form;
  if (!form.tolerances || !hasTolerance(parameters, name)) return null;
  const said = label.toLowerCase();
  const uneven = `${name}.plus` in parameters || `${name}.minus` in parameters;
  const members = uneven ? (["plus", "minus"] as const) : (["tolerance"] as const);
  const errors = [...new Set(["tolerance", "plus", "minus"].flatMap((m) => errorAt(`${name}.${m}`) ?? []))];
  const errorId = `${name}-tolerance-error`;
  const text = (member: string) => parameters[`${name}.${member}`] ?? "";
  const part = () =>
    change({
      [`${name}.tolerance`]: undefined,
      [`${name}.plus`]: text("tolerance"),
      [`${name}.minus`]: text("tolerance"),
    });
  const join = () =>
    change({
      [`${name}.plus`]: undefined,
      [`${name}.minus`]: undefined,
      [`${name}.tolerance`]: text("plus") || text("minus"),
    });
  const look = compact ? IN_CELL : IN_FORM;
  return (
    <div className={look.row}>
      <div className={look.sides}>
        {members.map((member, index) => (
          <label key={member} className="flex items-center gap-0.5">
            <span aria-hidden className="w-1.5 shrink-0 font-mono">
              {SIDES[member].sign}
            </span>
            <input
              id={index === 0 ? fieldId(name) : undefined}
              aria-label={`${SIDES[member].said} of ${said}`}
              aria-invalid={errorAt(`${name}.${member}`) ? true : undefined}
              aria-describedby={errors.length > 0 ? errorId : undefined}
              name={`${name}.${member}`}
              value={text(member)}
              placeholder={uneven ? "0" : undefined}
              onChange={(event) => change({ [`${name}.${member}`]: event.target.value })}
              type="text"
              autoComplete="off"
              autoCapitalize="off"
              spellCheck={false}
              className={`${CONTROL} ${look.side}`}
            />
          </label>
        ))}
        {uneven || compact ? null : <span />}
        <button
          type="button"
          aria-label={`Take the tolerance of ${said} away`}
          className={`grid ${look.away} cursor-pointer place-items-center rounded text-ink-soft hover:text-ink`}
          onClick={() => {
            change(noTolerance(name));
            focusSoon(buttonId(name));
          }}
        >
          <X aria-hidden size={15} />
        </button>
      </div>
      <div className={look.spread}>
        <select
          aria-label={`Distribution of ${said}`}
          value={parameters[`${name}.distribution`] ?? "uniform"}
          onChange={(event) =>
            change({
              [`${name}.distribution`]: event.target.value === "uniform" ? undefined : event.target.value,
            })
          }
          className={`${CONTROL} ${look.distribution} font-sans!`}
        >
          {DISTRIBUTIONS.map((option) => (
            <option key={option.value} value={option.value}>
              {option.label}
            </option>
          ))}
        </select>
        <button
          type="button"
          className="min-h-4 cursor-pointer rounded px-0.5 text-small whitespace-nowrap link"
          onClick={uneven ? join : part}
        >
          {compact ? (
            <>
              <span aria-hidden title={uneven ? EVENLY : APART} className="font-mono">
                {uneven ? "±" : "+ −"}
              </span>
              <span className="sr-only">{uneven ? EVENLY : APART}</span>
            </>
          ) : uneven ? (
            EVENLY
          ) : (
            APART
          )}
          <span className="sr-only"> for {said}</span>
        </button>
      </div>
      <p id={errorId} className="mt-0.5 text-small text-oxide empty:hidden">
        {errors.join(" ")}
      </p>
    </div>
  );
}
