"use client";

import { useState } from "react";
import type { ShapeEntry } from "@/lib/engine";
import { bracketText } from "../../../../_ui/bracket";
import { QuantitySymbol } from "../../../../_ui/quantity-symbol";
import { Toggle } from "../../../../_ui/toggle";
import { orderedPairs, type Parameters } from "../../_model/parameters";
import { differingNames, VARIANT_NAMES } from "../../_model/variants";
import type { FormDimension } from "../../_server/form-facts";
import type { MaterialChoice } from "../../_server/material-choices";
import type { Answer } from "../use-answer";
import { parameterLabel, parameterText } from "./parameter-words";
import { VERDICTS } from "../answer/words";

interface CompareTableProps {
  readonly entry: ShapeEntry;
  readonly dimensions: readonly FormDimension[];
  readonly variants: readonly Parameters[];
  readonly answers: readonly Answer[];
  readonly active: number;
  readonly materials: readonly MaterialChoice[];
}

/** Two to four variants side by side: inputs, with those that differ marked, and answers against the first. */
export function CompareTable({ entry, dimensions, variants, answers, active, materials }: CompareTableProps) {
  const [onlyDifferent, setOnlyDifferent] = useState(true);
  const differing = new Set(differingNames(variants, entry));
  const all = orderedPairs(Object.assign({}, ...variants) as Parameters, entry).map(([name]) => name);
  const shown = onlyDifferent ? all.filter((name) => differing.has(name)) : all;
  const names = VARIANT_NAMES.slice(0, variants.length);
  return (
    <>
      <div
        className="relative overflow-x-auto rounded border border-rule bg-sheet"
        tabIndex={0}
        role="group"
        aria-label="Comparison"
      >
        <table className="w-full border-collapse text-table" data-testid="comparison">
          <caption className="sr-only">Variants side by side; a dot marks inputs that differ</caption>
          <thead>
            <tr>
              <td className="w-[12rem] px-1.5 py-0.5" />
              {names.map((name, index) => (
                <th
                  key={name}
                  scope="col"
                  className={`min-w-[9rem] px-1.5 py-0.5 text-start font-semibold ${index === active ? "border-b-3 border-copper" : "border-b-3 border-transparent"}`}
                >
                  {name}
                  {index === active ? <span className="sr-only"> (shown above)</span> : null}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            <AnswerRow title="Resistance" answers={answers} cell={resistanceCell} strong />
            <AnswerRow title="Bounds" answers={answers} cell={boundsCell} />
            <AnswerRow
              title="Against A"
              answers={answers}
              cell={(answer) => againstCell(answer, answers[0])}
            />
            <AnswerRow
              title="Conductance"
              answers={answers}
              cell={({ result }) => result?.conductance.text ?? "–"}
            />
            {answers.some(({ result }) => result?.verdict) ? (
              <AnswerRow
                title="Requirement"
                answers={answers}
                cell={({ result }) => (result?.verdict ? VERDICTS[result.verdict].word : "–")}
              />
            ) : null}
            {shown.map((name) => (
              <InputRow
                key={name}
                name={name}
                entry={entry}
                dimensions={dimensions}
                materials={materials}
                variants={variants}
                differs={differing.has(name)}
              />
            ))}
            {shown.length === 0 ? (
              <tr className="border-t border-rule">
                <td colSpan={names.length + 1} className="px-1.5 py-1 text-ink-soft">
                  The inputs are the same so far. Change a field: it changes the variant that is shown.
                </td>
              </tr>
            ) : null}
          </tbody>
        </table>
      </div>
      <Toggle label="Only inputs that differ" checked={onlyDifferent} onChange={setOnlyDifferent} />
    </>
  );
}

interface AnswerRowProps {
  readonly title: string;
  readonly answers: readonly Answer[];
  readonly cell: (answer: Answer) => string;
  readonly strong?: boolean;
}

function AnswerRow({ title, answers, cell, strong = false }: AnswerRowProps) {
  return (
    <tr className="border-t border-rule align-top">
      <th scope="row" className="px-1.5 py-0.5 text-start font-normal text-ink-soft">
        {title}
      </th>
      {answers.map((answer, index) => (
        <td
          key={index}
          className={`px-1.5 py-0.5 font-mono ${strong ? "font-medium" : ""} ${answer.stale && answer.trouble ? "text-ink-soft" : ""}`}
        >
          {answer.trouble && title === "Resistance" ? "no answer" : cell(answer)}
        </td>
      ))}
    </tr>
  );
}

function resistanceCell({ result }: Answer): string {
  return result?.resistance.text ?? "–";
}

function boundsCell({ result }: Answer): string {
  if (!result) return "–";
  const { value, lower, upper } = result.resistance;
  const bracket = bracketText(value, lower, upper, "Ω");
  return `[${bracket.lower} … ${bracket.upper}] ${bracket.unit}`;
}

function againstCell({ result }: Answer, first: Answer): string {
  if (!result || !first.result) return "–";
  const ratio = result.resistance.value / first.result.resistance.value;
  if (result === first.result || ratio === 1) return "the same";
  if (ratio > 3 || ratio < 1 / 3) return `× ${Number(ratio.toPrecision(4))}`;
  const percent = (ratio - 1) * 100;
  return `${percent > 0 ? "+" : "−"}${Number(Math.abs(percent).toPrecision(4))} %`;
}

interface InputRowProps {
  readonly name: string;
  readonly entry: ShapeEntry;
  readonly dimensions: readonly FormDimension[];
  readonly materials: readonly MaterialChoice[];
  readonly variants: readonly Parameters[];
  readonly differs: boolean;
}

function InputRow({ name, entry, dimensions, materials, variants, differs }: InputRowProps) {
  const { label, symbol } = parameterLabel(name, entry, dimensions);
  return (
    <tr className="border-t border-rule align-top">
      <th scope="row" className="px-1.5 py-0.5 text-start font-normal">
        {differs ? (
          <span className="text-copper">
            <span aria-hidden>● </span>
            <span className="sr-only">differs: </span>
          </span>
        ) : null}
        {label} {symbol ? <QuantitySymbol text={symbol} /> : null}
      </th>
      {variants.map((variant, index) => (
        <td
          key={index}
          className={`max-w-[16rem] truncate px-1.5 py-0.5 font-mono ${variant[name] !== variants[0][name] ? "bg-copper/10" : ""}`}
          title={variant[name]}
        >
          {name in variant ? (
            parameterText(name, variant[name], entry, materials)
          ) : (
            <span className="text-ink-soft">–</span>
          )}
        </td>
      ))}
    </tr>
  );
}
