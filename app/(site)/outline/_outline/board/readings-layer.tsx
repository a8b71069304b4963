import { toScreen } from "../../_model/view";
import { Cross } from "./draft-layer";
import type { Lens } from "./paths";
import type { Readings } from "./tools";

/** The probe and the line of the profile. */
export function ReadingsLayer({ lens, readings }: { readonly lens: Lens; readonly readings: Readings }) {
  const { probe, line } = readings;
  const [a, b] = line ? line.map((point) => toScreen(lens.view, lens.size, point)) : [];
  return (
    <g pointerEvents="none" data-cursor="">
      {line ? (
        <g className="fill-sheet stroke-ink" strokeWidth="1.5">
          <path d={`M${a[0]} ${a[1]}L${b[0]} ${b[1]}`} strokeDasharray="8 3" />
          <circle cx={a[0]} cy={a[1]} r="4" />
          <path d={`M${b[0] - 4} ${b[1] - 4}h8v8h-8z`} />
        </g>
      ) : null}
      {probe ? <Cross at={toScreen(lens.view, lens.size, probe)} /> : null}
    </g>
  );
}
