"use client";

import type { PlainForm } from "../../calculate/_calculator/form-context";
import { ToleranceButton, ToleranceRow } from "../../calculate/_calculator/tolerance-field";
import type { Complaints } from "../_model/complaints";
import { type Element, methodOf, type Network } from "../_model/network";
import { bringsTolerance, changedTolerance, toleranceParameters } from "../_model/tolerance";

interface ToleranceCellProps {
  readonly element: Element;
  readonly number: number;
  readonly uncertainty: Network["uncertainty"];
  readonly wrong: Complaints | undefined;
  readonly onChange: (id: number, change: Partial<Element>, whole?: Partial<Network>) => void;
}

/** How far an element may be off: fields for a plain resistance; a calculation brings its tolerances along. */
export function ToleranceCell({ element, number, uncertainty, wrong, onChange }: ToleranceCellProps) {
  const { id, value } = element;
  if (value.kind !== "resistance") {
    return <span className="text-ink-soft">{bringsTolerance(value) ? "in its link" : "–"}</span>;
  }
  const name = `element-${id}`;
  const label = `element ${number}`;
  const parameters = toleranceParameters(name, value.tolerance);
  const form: PlainForm = {
    parameters: uncertainty === "" ? parameters : { ...parameters, uncertainty },
    tolerances: true,
    errorAt: (place) => wrong?.tolerance?.[place.slice(name.length + 1)],
    change: (patch) => {
      const { tolerance, ...kept } = value;
      const next = changedTolerance(name, tolerance, patch);
      onChange(
        id,
        { value: next ? { ...kept, tolerance: next } : kept },
        "uncertainty" in patch ? { uncertainty: methodOf(patch.uncertainty) } : undefined,
      );
    },
  };
  return (
    <>
      <ToleranceButton form={form} name={name} label={label} />
      <ToleranceRow form={form} name={name} label={label} compact />
    </>
  );
}
