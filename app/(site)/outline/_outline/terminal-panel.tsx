"use client";

import { Plus, Trash2, X } from "lucide-react";
import { Button } from "../../../_ui/button";
import { CONTROL, ERROR_LINE } from "../../../_ui/field";
import { RowButton } from "../../calculate/_calculator/graded/row-button";
import { complaintAt, type Place } from "../_model/complaints";
import { coordinateText, type Part, ringTitle, type Terminal } from "../_model/sketch";
import {
  addPart,
  addTerminal,
  changePart,
  changeTerminal,
  removePart,
  removeSegment,
  removeTerminal,
} from "../_model/terminals";
import { NumberCell } from "./number-cell";
import { useOutline } from "./outline-context";

const MARKS = ["border-s-copper", "border-s-verdigris", "border-s-ink"] as const;

/** The terminals, each with the stretches of the boundary that belong to it. */
export function TerminalPanel() {
  const { sketch, edit, complaints, setTerminal } = useOutline();
  const complaint = complaintAt(
    complaints,
    (place) => place.kind === "setting" && place.name === "terminals",
  );
  return (
    <fieldset id="terminals">
      <legend className="mb-0.5 font-semibold">Terminals</legend>
      <p className="mb-1 text-small text-ink-soft">
        Choose one, then press edges on the board with the tool Terminals. With three or more the answer is a
        matrix.
      </p>
      <ul className="grid gap-1">
        {sketch.terminals.map((terminal, index) => (
          <TerminalItem key={index} terminal={terminal} index={index} />
        ))}
      </ul>
      <p className={ERROR_LINE}>{complaint}</p>
      <Button
        onClick={() => {
          edit(addTerminal);
          setTerminal(sketch.terminals.length);
        }}
      >
        <Plus aria-hidden size={15} /> Terminal
      </Button>
    </fieldset>
  );
}

function TerminalItem({ terminal, index }: { readonly terminal: Terminal; readonly index: number }) {
  const { sketch, edit, settle, terminal: current, setTerminal, complaints, selection } = useOutline();
  const { name, parts, segments } = terminal;
  const at = (test: (place: Extract<Place, { kind: "terminal" }>) => boolean) =>
    complaintAt(complaints, (place) => place.kind === "terminal" && place.terminal === index && test(place));
  const complaint = at(({ item }) => item === undefined);
  const edge = selection?.ring !== undefined && selection.ring >= 0 ? selection : { ring: 0, index: 0 };
  return (
    <li id={`terminal-${index}`} className={`border-s-4 ps-1 ${MARKS[Math.min(index, 2)]}`}>
      <div className="flex items-center gap-0.5">
        <label className="grid min-h-5.5 min-w-5.5 cursor-pointer place-items-center medium:min-h-4 medium:min-w-3">
          <input
            type="radio"
            name="terminal"
            aria-label={`Edges go to ${name}`}
            checked={index === current}
            onChange={() => setTerminal(index)}
            className="size-2.5 accent-copper"
          />
        </label>
        <input
          aria-label={`Name of terminal ${index + 1}`}
          aria-invalid={complaint ? true : undefined}
          value={name}
          maxLength={100}
          onChange={(event) =>
            edit((sketch) => changeTerminal(sketch, index, { name: event.target.value }), `name ${index}`)
          }
          onBlur={settle}
          className={`${CONTROL} font-sans!`}
        />
        <RowButton
          label={`Remove terminal ${name}`}
          disabled={false}
          onPress={() => {
            edit((sketch) => removeTerminal(sketch, index));
            setTerminal(Math.max(0, Math.min(current, sketch.terminals.length - 2)));
          }}
        >
          <Trash2 aria-hidden size={15} />
        </RowButton>
      </div>
      {complaint ? <p className="text-small text-oxide">{complaint}</p> : null}
      <ul className="mt-0.5 grid gap-0.25">
        {parts.map((part, place) => (
          <PartItem
            key={place}
            part={part}
            index={index}
            place={place}
            complaint={at(({ list, item }) => list === "parts" && item === place)}
          />
        ))}
        {segments.map(([a, b], place) => (
          <li key={`s${place}`} className="flex flex-wrap items-center gap-0.5 text-small">
            <span className="grow font-mono">
              {[a, b].map(([x, y]) => `(${coordinateText(x)}, ${coordinateText(y)})`).join(" … ")}
            </span>
            <RowButton
              label={`Take this stretch from ${name}`}
              disabled={false}
              onPress={() => edit((sketch) => removeSegment(sketch, index, place))}
            >
              <X aria-hidden size={14} />
            </RowButton>
            <Complaint text={at(({ list, item }) => list === "segments" && item === place)} />
          </li>
        ))}
      </ul>
      {parts.length + segments.length === 0 ? <p className="text-small text-ink-soft">No edge yet.</p> : null}
      <Button
        variant="quiet"
        className="-ms-2 min-h-5.5! py-0! medium:min-h-3.5!"
        disabled={(sketch.rings[0]?.length ?? 0) === 0}
        onClick={() =>
          edit((sketch) => addPart(sketch, index, { ring: edge.ring, edge: edge.index, from: 0, to: 1 }))
        }
      >
        <Plus aria-hidden size={14} /> Part of an edge
      </Button>
    </li>
  );
}

interface PartItemProps {
  readonly part: Part;
  readonly index: number;
  readonly place: number;
  readonly complaint: string | undefined;
}

function PartItem({ part, index, place, complaint }: PartItemProps) {
  const { sketch, edit } = useOutline();
  const { ring, edge, from, to } = part;
  const change = (next: Partial<Part>) => edit((sketch) => changePart(sketch, index, place, next));
  const what = `Terminal ${index + 1}, part ${place + 1}`;
  const share = (value: number) =>
    value >= 0 && value <= 1 ? null : "A share of the edge is between 0 and 1.";
  const whole = (value: number) =>
    Number.isInteger(value) && value >= 0 ? null : "An edge has a whole number from 0 on.";
  const pick = "min-h-5.5 rounded border border-edge bg-sheet text-small hover:border-ink medium:min-h-4";
  return (
    <li className="text-small">
      <div className="flex flex-wrap items-center gap-x-0.5 gap-y-0.25">
        {sketch.rings.length > 1 ? (
          <select
            aria-label={`${what}, ring`}
            value={ring}
            onChange={(event) => change({ ring: Number(event.target.value) })}
            className={pick}
          >
            {sketch.rings.map((_, k) => (
              <option key={k} value={k}>
                {ringTitle(k)}
              </option>
            ))}
          </select>
        ) : null}
        <span className="text-ink-soft">edge</span>
        <NumberCell
          label={`${what}, edge`}
          value={edge}
          refuse={whole}
          onCommit={(edge) => change({ edge })}
          invalid={complaint !== undefined}
          className="w-4.5"
        />
        <span className="text-ink-soft">from</span>
        <NumberCell
          label={`${what}, from`}
          value={from}
          refuse={share}
          onCommit={(from) => change({ from })}
          className="w-6"
        />
        <span className="text-ink-soft">to</span>
        <NumberCell
          label={`${what}, to`}
          value={to}
          refuse={share}
          onCommit={(to) => change({ to })}
          className="w-6"
        />
        <RowButton
          label={`Remove part ${place + 1} of terminal ${index + 1}`}
          disabled={false}
          onPress={() => edit((sketch) => removePart(sketch, index, place))}
        >
          <X aria-hidden size={14} />
        </RowButton>
      </div>
      <Complaint text={complaint} />
    </li>
  );
}

function Complaint({ text }: { readonly text: string | undefined }) {
  return text ? <p className="w-full text-small text-oxide">{text}</p> : null;
}
