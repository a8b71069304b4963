"use client";

import { Notice } from "../../../_ui/notice";
import { sentence } from "../../calculate/_model/complaints";
import { type PlacedComplaint, placeId, placeTitle } from "../_model/complaints";
import { ringOf } from "../_model/sketch";
import { useOutline } from "./outline-context";

/** Every complaint about this drawing, each with a way to its place; they also stand at their fields. */
export function Refusal() {
  const { sketch, complaints } = useOutline();
  return (
    <Notice tone="problem" title="This cannot be solved yet">
      <ul className="grid max-h-40 gap-0.5 overflow-y-auto">
        {complaints.map((complaint, k) => (
          <li key={k}>
            <PlaceButton complaint={complaint} title={placeTitle(complaint, sketch)} />
            <p>{sentence(complaint.detail)}</p>
          </li>
        ))}
      </ul>
    </Notice>
  );
}

function PlaceButton({ complaint, title }: { readonly complaint: PlacedComplaint; readonly title: string }) {
  const { sketch, select, setTerminal } = useOutline();
  const { place, at } = complaint;
  const drawn = place?.kind === "vertex" || place?.kind === "ring";
  if (place === null || (drawn && ringOf(sketch, place.ring).length === 0)) {
    return <strong className="font-semibold">{title}</strong>;
  }

  function show(shown: NonNullable<typeof place>) {
    if (shown.kind === "vertex" || shown.kind === "ring") {
      const index = shown.kind === "vertex" ? shown.index : 0;
      select({ kind: at ? "edge" : "vertex", ring: shown.ring, index });
      document.getElementById("board")?.scrollIntoView({ block: "nearest" });
      return;
    }
    if (shown.kind === "terminal") setTerminal(shown.terminal);
    focusField(placeId(shown), "name" in shown ? shown.name : "");
  }

  return (
    <button type="button" className="link min-h-3 cursor-pointer rounded" onClick={() => show(place)}>
      {title}
    </button>
  );
}

/** The field of that name in a part of the page, else its first one that is marked, else its first one. */
function focusField(id: string | null, name: string): void {
  const part = id === null ? null : document.getElementById(id);
  const choices = [`[name="${CSS.escape(name)}"]`, "[aria-invalid=true]", "input, select, button"];
  const field = choices.map((choice) => part?.querySelector<HTMLElement>(choice)).find(Boolean);
  field?.focus();
  field?.scrollIntoView({ block: "center" });
}
