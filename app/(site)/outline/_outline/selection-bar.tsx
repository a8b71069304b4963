"use client";

import { Button } from "../../../_ui/button";
import { edgeLength, edgeOf } from "../_model/edges";
import { bowEdge, insertVertex, moveVertex, QUARTER_BOW, removeVertex, setArc } from "../_model/edit";
import { coordinateText, ringOf, ringTitle } from "../_model/sketch";
import { terminalOn, toggleEdge } from "../_model/terminals";
import { NumberCell } from "./number-cell";
import { useOutline } from "./outline-context";

/** What is marked, with its numbers and what can be done to it. */
export function SelectionBar() {
  const { sketch, edit, selection, select, terminal } = useOutline();
  const ring = selection ? ringOf(sketch, selection.ring) : [];
  if (!selection || selection.index >= ring.length) {
    return (
      <p className="flex min-h-5.5 items-center text-small text-ink-soft">
        Drag a corner to move it, with Shift its whole ring; press an edge to mark it, twice for a new corner.
        Empty ground pans; the wheel zooms once the board has focus.
      </p>
    );
  }
  const { ring: key, index } = selection;
  const title = ringTitle(key);
  const quiet = "min-h-5.5! py-0! medium:min-h-4!";
  if (selection.kind === "vertex") {
    const { x, y } = ring[index];
    return (
      <div className="flex min-h-5.5 flex-wrap items-center gap-1 text-table" data-testid="selection">
        <span>
          {title}, vertex {index}
        </span>
        <span className="flex items-center gap-0.5">
          x
          <NumberCell
            label="x of the marked vertex"
            value={x}
            unit={sketch.unit}
            onCommit={(x) => edit((sketch) => moveVertex(sketch, key, index, x, y))}
            className="w-9"
          />
        </span>
        <span className="flex items-center gap-0.5">
          y
          <NumberCell
            label="y of the marked vertex"
            value={y}
            unit={sketch.unit}
            onCommit={(y) => edit((sketch) => moveVertex(sketch, key, index, x, y))}
            className="w-9"
          />
        </span>
        <Button
          className={quiet}
          onClick={() => {
            edit((sketch) => removeVertex(sketch, key, index));
            select(null);
          }}
        >
          Remove
        </Button>
      </div>
    );
  }
  const edge = edgeOf(ring, index);
  const arc = edge.arc !== null;
  const target = sketch.terminals[terminal];
  const has = key >= 0 && target !== undefined && terminalOn(sketch, key, index) === terminal;
  return (
    <div className="flex min-h-5.5 flex-wrap items-center gap-1 text-table" data-testid="selection">
      <span>
        {title}, edge {index},{" "}
        <span className="font-mono">
          {coordinateText(Number(edgeLength(edge).toPrecision(6)))}{" "}
          {sketch.unit === "um" ? "µm" : sketch.unit}
        </span>
      </span>
      <Button
        className={quiet}
        onClick={() => {
          edit((sketch) => insertVertex(sketch, key, index));
          select({ kind: "vertex", ring: key, index: index + 1 });
        }}
      >
        Add a corner
      </Button>
      {key >= 0 ? (
        <>
          <Button
            className={quiet}
            onClick={() =>
              edit((sketch) =>
                arc ? setArc(sketch, key, index, null) : bowEdge(sketch, key, index, QUARTER_BOW),
              )
            }
          >
            {arc ? "Make straight" : "Make an arc"}
          </Button>
          {target ? (
            <Button
              className={quiet}
              onClick={() => edit((sketch) => toggleEdge(sketch, terminal, key, index))}
            >
              {has ? `Take from ${target.name}` : `Terminal ${target.name}`}
            </Button>
          ) : null}
        </>
      ) : null}
    </div>
  );
}
