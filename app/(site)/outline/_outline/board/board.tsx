"use client";

import { type ReactNode, useRef, useState } from "react";
import { Maximize, Minus, Plus } from "lucide-react";
import { Button } from "../../../../_ui/button";
import { addRegion, addRing } from "../../_model/edit";
import { type Point, regionKey, type RingKey, ringTitle, type Sketch, withRing } from "../../_model/sketch";
import { zoomAt } from "../../_model/view";
import { useOutline } from "../outline-context";
import { ConductorLayer, TerminalLayer } from "./conductor-layer";
import { DraftLayer } from "./draft-layer";
import { GridLayer } from "./grid-layer";
import { HandleLayer } from "./handle-layer";
import type { HoverStore } from "./hover-store";
import type { Lens } from "./paths";
import { ReadingsLayer } from "./readings-layer";
import { ScaleBar } from "./scale-bar";
import type { DrawTarget, Readings, Tool } from "./tools";
import { useGestures, useWheel } from "./use-gestures";
import { useView } from "./use-view";

interface BoardProps {
  readonly tool: Tool;
  readonly drawTarget: DrawTarget;
  /** Called when a ring is drawn or given up. */
  readonly onDrawn: () => void;
  readonly generation: number;
  readonly readings: Readings;
  readonly setReadings: (readings: Readings) => void;
  readonly reading: HoverStore;
  /** The field, below the outline. */
  readonly picture?: (lens: Lens) => ReactNode;
  /** Whether the density is drawn, which takes the place of the hatch. */
  readonly bare: boolean;
}

/** The drawing board: the plane with grid, conductor, terminals and, once it is there, the field. */
export function Board(props: BoardProps) {
  const { tool, drawTarget, onDrawn, generation, readings, setReadings, reading, picture, bare } = props;
  const { sketch, edit, selection, select, complaints, grid } = useOutline();
  const frame = useRef<HTMLDivElement>(null);
  const [draft, setDraft] = useState<readonly Point[]>([]);
  const board = useView(frame, sketch, generation);
  const { view, size, setView } = board;
  const points = tool === "draw" ? draft : [];

  function finish(keep: boolean) {
    // A double press has left the same point twice.
    const ring = draft.filter((point, k) => k === 0 || String(point) !== String(draft[k - 1]));
    setDraft([]);
    if (keep && ring.length > 2) {
      edit((sketch) => withDrawn(sketch, drawTarget, ring));
      // Its first corner is marked, so that the table shows the coordinates of what was just drawn.
      select({ kind: "vertex", ring: keyOfDrawn(sketch, drawTarget), index: 0 });
      onDrawn();
    } else if (!keep) onDrawn();
  }

  const gestures = useGestures({
    ...board,
    tool,
    readings,
    setReadings,
    reading,
    draft: points,
    onDraw: (point) => setDraft([...points, point]),
    onDraftEnd: finish,
    onDraftBack: () => setDraft(points.slice(0, -1)),
  });
  useWheel(frame, (at, factor) => setView(zoomAt(view, size, at, factor)));
  const lens: Lens = { view, size };
  const middle: Point = [size.width / 2, size.height / 2];
  const shared = { sketch, view, size };

  return (
    <div className="relative">
      <div
        ref={frame}
        id="board"
        role="application"
        tabIndex={0}
        aria-label={`Drawing board. ${describe(sketch)}`}
        aria-describedby="board-keys"
        onKeyDown={gestures.onKeyDown}
        className="h-[62vw] max-h-[36rem] min-h-[19rem] overflow-hidden rounded border border-edge bg-sheet wide:h-[34rem]"
      >
        <svg
          viewBox={`0 0 ${size.width} ${size.height}`}
          width="100%"
          height="100%"
          data-testid="board"
          aria-hidden
          className={`block touch-none font-sans select-none ${CURSORS[tool]}`}
          {...gestures.handlers}
        >
          <rect width={size.width} height={size.height} className="fill-sheet" />
          <GridLayer view={view} size={size} step={grid.step} axis={sketch.symmetry === "axisymmetric"} />
          {picture?.(lens)}
          <ConductorLayer {...shared} bare={bare} />
          <TerminalLayer {...shared} />
          {picture ? <ReadingsLayer lens={lens} readings={readings} /> : null}
          {tool === "draw" ? (
            <DraftLayer lens={lens} points={points} cursor={gestures.cursor} />
          ) : (
            <HandleLayer
              sketch={sketch}
              lens={lens}
              selection={selection}
              hover={gestures.hover}
              complaints={complaints}
              vertices={tool === "shape"}
            />
          )}
          <ScaleBar view={view} size={size} unit={sketch.unit} />
        </svg>
      </div>
      <p id="board-keys" className="sr-only">
        Arrow keys move the view, or the marked vertex by a grid step. Plus and minus zoom, 0 shows all,
        Delete takes the marked vertex out. The table of coordinates below does everything by keyboard.
      </p>
      <div className="absolute end-1 top-1 flex gap-0.5 print:hidden">
        <Button
          aria-label="Zoom in"
          className={ZOOM}
          onClick={() => setView(zoomAt(view, size, middle, 1.4))}
        >
          <Plus aria-hidden size={16} />
        </Button>
        <Button
          aria-label="Zoom out"
          className={ZOOM}
          onClick={() => setView(zoomAt(view, size, middle, 1 / 1.4))}
        >
          <Minus aria-hidden size={16} />
        </Button>
        <Button aria-label="Show all" className={ZOOM} onClick={() => setView(null)}>
          <Maximize aria-hidden size={16} />
        </Button>
      </div>
      {tool === "draw" ? (
        <p className="pointer-events-none absolute start-1 top-1 max-w-[calc(100%-160px)] rounded bg-ink px-1 py-0.5 text-small text-paper">
          {points.length < 3
            ? `Press on the board, corner after corner. ${points.length === 0 ? "" : "Esc gives up."}`
            : "Press the first corner or Enter to close the ring. Backspace takes one back."}
        </p>
      ) : null}
    </div>
  );
}

const ZOOM = "px-0! w-5.5 medium:w-4.5 medium:min-h-4.5!";

const CURSORS: Readonly<Record<Tool, string>> = {
  shape: "cursor-default",
  draw: "cursor-crosshair",
  terminal: "cursor-pointer",
  read: "cursor-crosshair",
};

function withDrawn(sketch: Sketch, target: DrawTarget, points: readonly Point[]): Sketch {
  const ring = points.map(([x, y]) => ({ x, y }));
  if (target === "region") return addRegion(sketch, ring);
  if (target === "hole") return addRing(sketch, ring);
  // Another outer ring has other edges: no terminal can stay on it.
  return {
    ...withRing(sketch, 0, ring),
    terminals: sketch.terminals.map((terminal) => ({
      ...terminal,
      parts: terminal.parts.filter((part) => part.ring !== 0),
    })),
  };
}

/** Which ring that becomes. */
function keyOfDrawn(sketch: Sketch, target: DrawTarget): RingKey {
  if (target === "region") return regionKey(sketch.regions.length);
  return target === "hole" ? sketch.rings.length : 0;
}

/** The drawing in words. */
function describe(sketch: Sketch): string {
  const rings = sketch.rings.flatMap((ring, k) =>
    ring.length === 0 ? [] : [`${ringTitle(k)} with ${ring.length} vertices`],
  );
  const terminals = sketch.terminals.map(({ name }) => name);
  return `${rings.join(", ") || "Empty"}. ${
    terminals.length > 0 ? `Terminals ${terminals.join(", ")}.` : "No terminals."
  }`;
}
