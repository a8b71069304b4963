"use client";

import { type ClipboardEvent, useEffect, useRef, useState } from "react";
import { Plus, Trash2 } from "lucide-react";
import { Button } from "../../../_ui/button";
import { CONTROL } from "../../../_ui/field";
import { complaintsAt, type PlacedComplaint } from "../_model/complaints";
import { addRegion, addRing, placeVertices, removeRing } from "../_model/edit";
import { isTable, readPastedPoints } from "../_model/pasted-points";
import { roomiest } from "../_model/room";
import { type Ring, type RingKey, regionKey, ringOf, ringTitle, type Sketch, tidy } from "../_model/sketch";
import { roundLength } from "../_model/view";
import { useOutline } from "./outline-context";
import { VertexRow } from "./vertex-row";

/** Rows that are shown at a time. */
const PAGE = 60;

/** Exact coordinates, ring by ring: everything that the board does, by keyboard. */
export function VertexTable() {
  const { sketch, edit, selection, select, complaints } = useOutline();
  const [chosen, setChosen] = useState<RingKey>(0);
  const [page, setPage] = useState(0);
  const [unread, setUnread] = useState<string | null>(null);
  const [followed, setFollowed] = useState(selection);
  // The table follows what is marked on the board.
  if (selection !== followed) {
    setFollowed(selection);
    if (selection) {
      setChosen(selection.ring);
      setPage(Math.floor(selection.index / PAGE));
    }
  }
  const keys = [...sketch.rings.map((_, k) => k), ...sketch.regions.map((_, k) => regionKey(k))];
  const key = keys.includes(chosen) ? chosen : 0;
  const ring = ringOf(sketch, key);
  const pages = Math.max(1, Math.ceil(ring.length / PAGE));
  const first = Math.min(page, pages - 1) * PAGE;
  const here = complaintsAt(complaints, (place) => place.kind === "ring" && place.ring === key);
  const frame = useRef<HTMLDivElement>(null);
  const marked = selection?.ring === key ? selection.index : null;
  useEffect(() => {
    if (marked !== null) bringIntoView(frame.current, marked);
  }, [marked]);

  /** Rows of x and y pasted into a cell go from its vertex on; a single number is the cell's own affair. */
  async function paste(event: ClipboardEvent) {
    const text = event.clipboardData.getData("text");
    const row = event.target instanceof Element ? event.target.closest("[data-vertex]") : null;
    setUnread(null);
    if (!row || !isTable(text)) return;
    event.preventDefault();
    const index = Number(row.getAttribute("data-vertex"));
    const pasted = await readPastedPoints(text, sketch.unit);
    if (pasted.ok) edit((sketch) => placeVertices(sketch, key, index, pasted.points));
    else setUnread(pasted.problem);
  }

  function show(next: RingKey) {
    setChosen(next);
    setUnread(null);
    setPage(0);
    select(null);
  }

  function add(kind: "hole" | "round" | "region") {
    const square = kind === "round" ? circleIn(sketch) : squareIn(sketch);
    if (kind === "region") {
      edit((sketch) => addRegion(sketch, square));
      show(regionKey(sketch.regions.length));
    } else {
      edit((sketch) => addRing(sketch, square));
      show(sketch.rings[0].length === 0 ? 0 : sketch.rings.length);
    }
  }

  return (
    <section aria-labelledby="coordinates">
      <div className="mb-1 flex flex-wrap items-center gap-1">
        <h2 id="coordinates" className="grow text-h3">
          Coordinates / {sketch.unit === "um" ? "µm" : sketch.unit}
        </h2>
        <select
          aria-label="Ring"
          value={key}
          onChange={(event) => show(Number(event.target.value))}
          className={`${CONTROL} w-auto! font-sans!`}
        >
          {keys.map((value) => (
            <option key={value} value={value}>
              {ringTitle(value)}
              {complaintCount(complaints, value)}
            </option>
          ))}
        </select>
        <Button onClick={() => add("hole")}>
          <Plus aria-hidden size={15} /> {sketch.rings[0].length === 0 ? "Square" : "Hole"}
        </Button>
        <Button onClick={() => add("round")}>
          <Plus aria-hidden size={15} /> {sketch.rings[0].length === 0 ? "Disc" : "Round hole"}
        </Button>
        {sketch.rings[0].length === 0 ? null : (
          <Button onClick={() => add("region")}>
            <Plus aria-hidden size={15} /> Region
          </Button>
        )}
        {ring.length > 0 ? (
          <Button
            variant="quiet"
            aria-label={`Remove ${ringTitle(key).toLowerCase()}`}
            onClick={() => {
              edit((sketch) => removeRing(sketch, key));
              show(0);
            }}
          >
            <Trash2 aria-hidden size={15} />
          </Button>
        ) : null}
      </div>
      {here.map((complaint) => (
        <p key={complaint} className="mb-0.5 text-small text-oxide">
          {complaint}
        </p>
      ))}
      {ring.length === 0 ? (
        <p className="rounded border border-dashed border-edge px-2 py-3 text-table text-ink-soft">
          There is no outer ring yet. Draw one on the board, add a square to start from, or open JSON.
        </p>
      ) : (
        <div
          ref={frame}
          tabIndex={0}
          role="group"
          onPaste={(event) => void paste(event)}
          aria-label={`${ringTitle(key)}: coordinates`}
          className="relative max-h-[26rem] overflow-auto rounded border border-rule bg-sheet"
        >
          <table className="w-full border-collapse text-table">
            <thead className="sticky top-0 z-1 bg-sheet text-small text-ink-soft">
              <tr>
                {["Vertex", "x", "y", "Edge from here", ...(key >= 0 ? ["Terminal"] : [])].map((title) => (
                  <th key={title} scope="col" className="px-0.5 py-0.5 text-start font-normal">
                    {title}
                  </th>
                ))}
                <th scope="col">
                  <span className="sr-only">Change</span>
                </th>
              </tr>
            </thead>
            <tbody>
              {ring.slice(first, first + PAGE).map((_, k) => (
                <VertexRow key={first + k} ring={key} index={first + k} />
              ))}
            </tbody>
          </table>
        </div>
      )}
      {ring.length > 0 ? (
        <p className="mt-0.5 text-small text-ink-soft">
          Rows of x and y from a spreadsheet can be pasted into a cell: they go from its vertex on.
        </p>
      ) : null}
      {unread ? (
        <p role="alert" className="mt-0.5 text-small text-oxide">
          Nothing was pasted. {unread}
        </p>
      ) : null}
      {pages > 1 ? (
        <div className="mt-0.5 flex items-center gap-1 text-table">
          <Button disabled={first === 0} onClick={() => setPage(first / PAGE - 1)}>
            Earlier
          </Button>
          <span>
            {first} … {Math.min(ring.length, first + PAGE) - 1} of {ring.length}
          </span>
          <Button disabled={first + PAGE >= ring.length} onClick={() => setPage(first / PAGE + 1)}>
            Later
          </Button>
        </div>
      ) : null}
    </section>
  );
}

/** Scrolls the table, and not the page, to a row that is out of sight. */
function bringIntoView(frame: HTMLElement | null, index: number): void {
  const row = frame?.querySelector<HTMLElement>(`[data-vertex="${index}"]`);
  if (!frame || !row) return;
  const head = frame.querySelector("thead")?.offsetHeight ?? 0;
  const [top, bottom] = [row.offsetTop - head, row.offsetTop + row.offsetHeight];
  if (top < frame.scrollTop || bottom > frame.scrollTop + frame.clientHeight) frame.scrollTop = top;
}

/** How many complaints a ring has, for its name in the menu. */
function complaintCount(complaints: readonly PlacedComplaint[], ring: RingKey): string {
  const count = complaints.filter(({ place }) => place && "ring" in place && place.ring === ring).length;
  return count === 0 ? "" : ` (${count} ${count === 1 ? "complaint" : "complaints"})`;
}

/** Middle and half width of a ring to start from: where the conductor has most room, or one of its own. */
function placeIn(sketch: Sketch): readonly [number, number, number] {
  const room = roomiest([...sketch.rings, ...sketch.regions.map(({ ring }) => ring)]);
  // Half of the room is left around a square's corners, on a grid that reads well.
  return room ? [room.x, room.y, roundLength(1, 0.35 * room.distance)] : [20, 20, 20];
}

function squareIn(sketch: Sketch): Ring {
  const [x, y, half] = placeIn(sketch);
  return [
    [-1, -1],
    [1, -1],
    [1, 1],
    [-1, 1],
  ].map(([dx, dy]) => ({ x: tidy(x + dx * half), y: tidy(y + dy * half) }));
}

/** Two half circles. */
function circleIn(sketch: Sketch): Ring {
  const [x, y, half] = placeIn(sketch).map(tidy);
  return [-1, 1].map((side) => ({
    x: tidy(x + side * half),
    y,
    arc: { x, y, clockwise: false },
  }));
}
