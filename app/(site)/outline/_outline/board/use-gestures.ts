"use client";

import { type KeyboardEvent, type PointerEvent, useEffect, useRef, useState } from "react";
import { bowThrough, edgeOf, pointAt } from "../../_model/edges";
import { bowEdge, insertVertex, moveVertex, removeVertex, setArc, shiftRing } from "../../_model/edit";
import { type Hit, hitEdge, hitTest } from "../../_model/hit";
import { type Point, ringOf } from "../../_model/sketch";
import { addTerminal, terminalOn, toggleEdge } from "../../_model/terminals";
import { panBy, snapTo, toPlane, toScreen, zoomAt } from "../../_model/view";
import { useOutline } from "../outline-context";
import type { HoverStore } from "./hover-store";
import type { Readings, Tool } from "./tools";
import type { BoardView } from "./use-view";

const REACH_PX = 11;
const TOUCH_REACH_PX = 20;
/** A press that moves less than this is a click, px. */
const STILL_PX = 4;

interface GestureOptions extends BoardView {
  readonly tool: Tool;
  readonly readings: Readings;
  readonly setReadings: (readings: Readings) => void;
  /** A press in the draw tool, and how a draft goes on. */
  readonly onDraw: (point: Point) => void;
  readonly draft: readonly Point[];
  readonly onDraftEnd: (keep: boolean) => void;
  readonly onDraftBack: () => void;
  readonly reading: HoverStore;
}

type Drag =
  | { readonly kind: "pan"; readonly moved: boolean }
  | { readonly kind: "pinch" }
  | { readonly kind: "vertex"; readonly hit: Hit }
  | { readonly kind: "bow"; readonly ring: number; readonly edge: number }
  | { readonly kind: "line"; readonly from: Point };

/** What pointer and keys do on the board, tool by tool. */
export function useGestures(options: GestureOptions) {
  const { tool, view, size, setView, readings, setReadings, draft, onDraw, onDraftEnd, onDraftBack } =
    options;
  const { sketch, edit, settle, selection, select, terminal, setTerminal, grid } = useOutline();
  const [hover, setHover] = useState<Hit | null>(null);
  const [cursor, setCursor] = useState<Point | null>(null);
  const drag = useRef<Drag | null>(null);
  const pointers = useRef(new Map<number, Point>());
  const start = useRef<Point>([0, 0]);

  const onScreen = (event: { clientX: number; clientY: number; currentTarget: Element }): Point => {
    const box = event.currentTarget.getBoundingClientRect();
    return [event.clientX - box.left, event.clientY - box.top];
  };
  const inPlane = (at: Point, free: boolean): Point => {
    const point = toPlane(view, size, at);
    return grid.snap && !free ? snapTo(grid.step, point) : [round(point[0]), round(point[1])];
  };
  /** Digits below a hundredth of a pixel mean nothing. */
  const round = (value: number): number => {
    const power = 10 ** Math.ceil(Math.log10(view.scale) + 2);
    const rounded = Math.round(value * power) / power;
    return Number.isFinite(rounded) ? rounded + 0 : value;
  };

  function onPointerDown(event: PointerEvent<SVGSVGElement>) {
    const at = onScreen(event);
    pointers.current.set(event.pointerId, at);
    event.currentTarget.setPointerCapture(event.pointerId);
    if (pointers.current.size === 2) {
      drag.current = { kind: "pinch" };
      return;
    }
    start.current = at;
    const reach = event.pointerType === "mouse" ? REACH_PX : TOUCH_REACH_PX;
    // The middle button pans, whatever the tool.
    drag.current = event.button === 1 ? { kind: "pan", moved: false } : begin(at, reach, event.altKey);
    if (drag.current?.kind === "vertex" || drag.current?.kind === "bow") setView(view);
  }

  function begin(at: Point, reach: number, free: boolean): Drag {
    if (tool === "read") return { kind: "line", from: inPlane(at, free) };
    if (tool !== "shape") return { kind: "pan", moved: false };
    if (selection?.kind === "edge" && selection.ring >= 0) {
      const { ring, index } = selection;
      const [x, y] = toScreen(view, size, pointAt(edgeOf(ringOf(sketch, ring), index), 0.5));
      if (Math.hypot(x - at[0], y - at[1]) < reach) return { kind: "bow", ring, edge: index };
    }
    const hit = hitTest(sketch, view, size, at, reach);
    if (hit) select({ kind: hit.kind, ring: hit.ring, index: hit.index });
    return hit?.kind === "vertex" ? { kind: "vertex", hit } : { kind: "pan", moved: false };
  }

  function onPointerMove(event: PointerEvent<SVGSVGElement>) {
    const at = onScreen(event);
    const before = pointers.current.get(event.pointerId);
    if (!before) return look(at, event);
    if (drag.current?.kind === "pinch") pinch(event.pointerId, at);
    pointers.current.set(event.pointerId, at);
    const far = Math.hypot(at[0] - start.current[0], at[1] - start.current[1]) > STILL_PX;
    switch (drag.current?.kind) {
      case "pan":
        if (!drag.current.moved && !far) return;
        drag.current = { kind: "pan", moved: true };
        return setView(panBy(view, at[0] - before[0], at[1] - before[1]));
      case "vertex": {
        if (!far) return;
        const { ring, index } = drag.current.hit;
        const [x, y] = inPlane(at, event.altKey);
        if (event.shiftKey) {
          return edit((sketch) => {
            const { x: fromX, y: fromY } = ringOf(sketch, ring)[index];
            return shiftRing(sketch, ring, x - fromX, y - fromY);
          }, `shift ${ring}`);
        }
        return edit((sketch) => moveVertex(sketch, ring, index, x, y), `drag ${ring} ${index}`);
      }
      case "bow":
        if (!far) return;
        return bow(drag.current.ring, drag.current.edge, inPlane(at, event.altKey));
      case "line":
        if (far) setReadings({ ...readings, line: [drag.current.from, inPlane(at, event.altKey)] });
    }
  }

  function bow(ring: number, edge: number, through: Point) {
    const { from, to } = edgeOf(ringOf(sketch, ring), edge);
    const size = bowThrough([from.x, from.y], [to.x, to.y], through);
    edit(
      (sketch) => (size === null ? setArc(sketch, ring, edge, null) : bowEdge(sketch, ring, edge, size)),
      `bow ${ring} ${edge}`,
    );
  }

  function pinch(id: number, at: Point) {
    const other = [...pointers.current].find(([pointer]) => pointer !== id)?.[1];
    const before = pointers.current.get(id);
    if (!other || !before) return;
    const span = (p: Point) => Math.hypot(p[0] - other[0], p[1] - other[1]);
    const middle: Point = [(at[0] + other[0]) / 2, (at[1] + other[1]) / 2];
    const moved = panBy(view, (at[0] - before[0]) / 2, (at[1] - before[1]) / 2);
    setView(zoomAt(moved, size, middle, span(before) > 0 ? span(at) / span(before) : 1));
  }

  /** What lies under a pointer that is not pressed. */
  function look(at: Point, event: PointerEvent) {
    const free = event.altKey;
    setCursor(tool === "draw" ? inPlane(at, free) : null);
    options.reading.set(tool === "read" ? inPlane(at, true) : null);
    const outlines = sketch.rings.map((_, ring) => ring);
    if (tool === "shape") setHover(hitTest(sketch, view, size, at, REACH_PX));
    else setHover(tool === "terminal" ? hitEdge(sketch, view, size, at, REACH_PX, outlines) : null);
  }

  function onPointerUp(event: PointerEvent<SVGSVGElement>) {
    const at = onScreen(event);
    const was = drag.current;
    pointers.current.delete(event.pointerId);
    drag.current = null;
    settle();
    const still = Math.hypot(at[0] - start.current[0], at[1] - start.current[1]) <= STILL_PX;
    if (!was || was.kind === "pinch" || !still || event.button === 1) return;
    const reach = event.pointerType === "mouse" ? REACH_PX : TOUCH_REACH_PX;
    if (tool === "draw") press(at, reach, event.altKey);
    else if (tool === "terminal") pressEdge(at, reach);
    else if (tool === "read") setReadings({ ...readings, probe: inPlane(at, true) });
    else if (!hitTest(sketch, view, size, at, reach) && was.kind === "pan") select(null);
  }

  function press(at: Point, reach: number, free: boolean) {
    if (draft.length > 2) {
      const [x, y] = toScreen(view, size, draft[0]);
      if (Math.hypot(x - at[0], y - at[1]) < reach) return onDraftEnd(true);
    }
    setView(view);
    onDraw(inPlane(at, free));
  }

  function pressEdge(at: Point, reach: number) {
    const outlines = sketch.rings.map((_, ring) => ring);
    const hit = hitEdge(sketch, view, size, at, reach, outlines);
    if (!hit) return;
    select({ kind: "edge", ring: hit.ring, index: hit.index });
    const target = sketch.terminals[terminal] ? terminal : 0;
    const before = terminalOn(sketch, hit.ring, hit.index);
    edit((sketch) => {
      const some = sketch.terminals.length > 0 ? sketch : addTerminal(sketch);
      return toggleEdge(some, target, hit.ring, hit.index);
    });
    if (before !== target) setTerminal(target);
  }

  function onDoubleClick(event: { clientX: number; clientY: number; currentTarget: Element }) {
    const at = onScreen(event);
    if (tool === "draw") return onDraftEnd(true);
    if (tool !== "shape") return;
    const hit = hitTest(sketch, view, size, at, REACH_PX);
    if (hit?.kind !== "edge") return;
    const straight = edgeOf(ringOf(sketch, hit.ring), hit.index).arc === null;
    const snapped = straight && grid.snap ? snapTo(grid.step, toPlane(view, size, at)) : undefined;
    edit((sketch) => insertVertex(sketch, hit.ring, hit.index, hit.t, snapped));
    select({ kind: "vertex", ring: hit.ring, index: hit.index + 1 });
  }

  function onKeyDown(event: KeyboardEvent<HTMLElement>) {
    if (event.ctrlKey || event.metaKey) return;
    const arrow = ARROWS[event.key];
    const middle: Point = [size.width / 2, size.height / 2];
    if (arrow) moveByKey(arrow, event.shiftKey ? 10 : 1);
    else if (event.key === "+" || event.key === "=") setView(zoomAt(view, size, middle, 1.25));
    else if (event.key === "-") setView(zoomAt(view, size, middle, 0.8));
    else if (event.key === "0") setView(null);
    else if (event.key === "Escape") {
      if (draft.length > 0) onDraftEnd(false);
      else select(null);
    } else if (event.key === "Enter" && draft.length > 0) onDraftEnd(true);
    else if (event.key === "Backspace" && draft.length > 0) onDraftBack();
    else if ((event.key === "Delete" || event.key === "Backspace") && selection?.kind === "vertex") {
      edit((sketch) => removeVertex(sketch, selection.ring, selection.index));
      select(null);
    } else return;
    event.preventDefault();
  }

  function moveByKey([dx, dy]: Point, times: number) {
    const step = grid.step * times;
    if (tool === "shape" && selection?.kind === "vertex") {
      const { ring, index } = selection;
      edit((sketch) => {
        const { x, y } = ringOf(sketch, ring)[index];
        const next: Point = [x + dx * step, y + dy * step];
        const [nx, ny] = grid.snap ? snapTo(grid.step, next) : next;
        return moveVertex(sketch, ring, index, nx, ny);
      }, `nudge ${ring} ${index}`);
    } else if (tool === "read" && readings.probe) {
      const [x, y] = readings.probe;
      // A pointer that rests on the board would hide what the keys read.
      options.reading.set(null);
      setReadings({ ...readings, probe: [x + dx * step, y + dy * step] });
    } else setView(panBy(view, -40 * dx, 40 * dy));
  }

  return {
    hover,
    cursor,
    onKeyDown,
    handlers: {
      onPointerDown,
      onPointerMove,
      onPointerUp,
      onPointerCancel: onPointerUp,
      onPointerLeave: () => {
        setHover(null);
        setCursor(null);
        options.reading.set(null);
      },
      onDoubleClick,
    },
  };
}

const ARROWS: Readonly<Record<string, Point | undefined>> = {
  ArrowLeft: [-1, 0],
  ArrowRight: [1, 0],
  ArrowUp: [0, 1],
  ArrowDown: [0, -1],
};

/** The wheel zooms while the board has focus or Ctrl is held; otherwise the page scrolls. */
export function useWheel(
  board: { readonly current: HTMLElement | null },
  zoom: (at: Point, factor: number) => void,
): void {
  const latest = useRef(zoom);
  useEffect(() => {
    latest.current = zoom;
  });
  useEffect(() => {
    const element = board.current;
    if (!element) return;
    const onWheel = (event: WheelEvent) => {
      if (!event.ctrlKey && !element.contains(document.activeElement)) return;
      event.preventDefault();
      const box = element.getBoundingClientRect();
      latest.current([event.clientX - box.left, event.clientY - box.top], Math.exp(-event.deltaY * 0.0015));
    };
    element.addEventListener("wheel", onWheel, { passive: false });
    return () => element.removeEventListener("wheel", onWheel);
  }, [board]);
}
