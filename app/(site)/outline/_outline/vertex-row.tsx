"use client";

import { Plus, X } from "lucide-react";
import { complaintsAt } from "../_model/complaints";
import { centreOfRadius, edgeOf } from "../_model/edges";
import { bowEdge, insertVertex, moveVertex, QUARTER_BOW, removeVertex, setArc } from "../_model/edit";
import { type RingKey, ringOf } from "../_model/sketch";
import { changeTerminal, terminalOn, toggleEdge } from "../_model/terminals";
import { RowButton } from "../../calculate/_calculator/graded/row-button";
import { NumberCell } from "./number-cell";
import { useOutline } from "./outline-context";

const SELECT =
  "min-h-5.5 rounded border border-edge bg-sheet ps-0.5 text-table hover:border-ink medium:min-h-4";

/** One vertex with the edge that runs from it to the next one. */
export function VertexRow({ ring, index }: { readonly ring: RingKey; readonly index: number }) {
  const { sketch, edit, selection, select, complaints } = useOutline();
  const vertices = ringOf(sketch, ring);
  const vertex = vertices[index];
  const edge = edgeOf(vertices, index);
  const { arc } = edge.to;
  const marked = selection?.ring === ring && selection.index === index;
  const here = complaintsAt(
    complaints,
    (place) => place.kind === "vertex" && place.ring === ring && place.index === index,
  );
  const owner = terminalOn(sketch, ring, index);
  const shape = !arc ? "straight" : arc.clockwise ? "clockwise" : "counterclockwise";

  function reshape(next: string) {
    edit((sketch) => {
      if (next === "straight") return setArc(sketch, ring, index, null);
      const clockwise = next === "clockwise";
      if (arc) return setArc(sketch, ring, index, { ...arc, clockwise });
      return bowEdge(sketch, ring, index, clockwise ? -QUARTER_BOW : QUARTER_BOW);
    });
  }

  function own(next: number) {
    edit((sketch) => {
      if (next >= 0) return toggleEdge(sketch, next, ring, index);
      const { parts } = sketch.terminals[owner];
      return changeTerminal(sketch, owner, {
        parts: parts.filter((part) => part.ring !== ring || part.edge !== index),
      });
    });
  }

  const cell = "px-0.5 py-0.25 align-top";
  return (
    <>
      <tr
        data-vertex={index}
        className={`border-t border-rule ${marked ? "bg-paper" : ""}`}
        onFocus={() => {
          if (!marked) select({ kind: "vertex", ring, index });
        }}
      >
        <th scope="row" className={`px-0.5 text-start font-mono font-normal ${marked ? "text-copper" : ""}`}>
          {marked ? "▸" : ""}
          {index}
        </th>
        <td className={cell}>
          <NumberCell
            label={`Vertex ${index}, x`}
            value={vertex.x}
            unit={sketch.unit}
            invalid={here.length > 0}
            onCommit={(x) => edit((sketch) => moveVertex(sketch, ring, index, x, vertex.y))}
            className="w-full min-w-8"
          />
        </td>
        <td className={cell}>
          <NumberCell
            label={`Vertex ${index}, y`}
            value={vertex.y}
            unit={sketch.unit}
            invalid={here.length > 0}
            onCommit={(y) => edit((sketch) => moveVertex(sketch, ring, index, vertex.x, y))}
            className="w-full min-w-8"
          />
        </td>
        <td className={cell}>
          {ring < 0 ? (
            <span className="text-ink-soft">straight</span>
          ) : (
            <select
              aria-label={`Edge ${index}`}
              value={shape}
              onChange={(event) => reshape(event.target.value)}
              className={SELECT}
            >
              <option value="straight">straight</option>
              <option value="counterclockwise">arc ↺</option>
              <option value="clockwise">arc ↻</option>
            </select>
          )}
        </td>
        {ring >= 0 ? (
          <td className={cell}>
            <select
              aria-label={`Terminal on edge ${index}`}
              value={owner}
              onChange={(event) => own(Number(event.target.value))}
              className={`max-w-16 ${SELECT}`}
            >
              <option value={-1}>–</option>
              {sketch.terminals.map(({ name }, k) => (
                <option key={k} value={k}>
                  {name}
                </option>
              ))}
            </select>
          </td>
        ) : null}
        <td className="w-px whitespace-nowrap">
          <RowButton
            label={`Add a vertex after ${index}`}
            disabled={false}
            onPress={() => {
              edit((sketch) => insertVertex(sketch, ring, index));
              select({ kind: "vertex", ring, index: index + 1 });
            }}
          >
            <Plus aria-hidden size={15} />
          </RowButton>
          <RowButton
            label={`Remove vertex ${index}`}
            disabled={false}
            onPress={() => {
              edit((sketch) => removeVertex(sketch, ring, index));
              select(null);
            }}
          >
            <X aria-hidden size={15} />
          </RowButton>
        </td>
      </tr>
      {arc && edge.arc ? (
        <tr className={marked ? "bg-paper" : ""}>
          <td />
          <td colSpan={5} className="px-0.5 pb-0.5">
            <div className="flex flex-wrap items-center gap-0.5 text-small text-ink-soft">
              centre
              <NumberCell
                label={`Edge ${index}, centre x`}
                value={arc.x}
                unit={sketch.unit}
                onCommit={(x) => edit((sketch) => setArc(sketch, ring, index, { ...arc, x }))}
                className="w-9"
              />
              <NumberCell
                label={`Edge ${index}, centre y`}
                value={arc.y}
                unit={sketch.unit}
                onCommit={(y) => edit((sketch) => setArc(sketch, ring, index, { ...arc, y }))}
                className="w-9"
              />
              radius
              <NumberCell
                label={`Edge ${index}, radius`}
                value={edge.arc.radius}
                unit={sketch.unit}
                refuse={(radius) =>
                  centreOfRadius(edge, radius)
                    ? null
                    : "The radius is at least half the distance of the ends."
                }
                onCommit={(radius) => {
                  const centre = centreOfRadius(edge, radius);
                  if (centre) edit((sketch) => setArc(sketch, ring, index, centre));
                }}
                className="w-9"
              />
            </div>
          </td>
        </tr>
      ) : null}
      {here.length > 0 ? (
        <tr className={marked ? "bg-paper" : ""}>
          <td />
          <td colSpan={5} className="px-0.5 pb-0.5 text-small text-oxide">
            <ul className="grid gap-0.25">
              {here.map((complaint) => (
                <li key={complaint}>{complaint}</li>
              ))}
            </ul>
          </td>
        </tr>
      ) : null}
    </>
  );
}
