"use client";

import { useCallback, useEffect, useRef, useState } from "react";
import { type FrameApi, FrameTrouble, type Trouble, type Values } from "./frame-api";
import type { FrameDrawing, FrameProgress, FrameResult } from "./frame-view";

/** How long typing may pause before a call is made, ms. */
const PAUSE_MS = 250;
/** Before a field solution is begun, which costs more than a formula. */
const SOLVE_PAUSE_MS = 700;

/** Where not even the way of asking could be loaded, ms. */
const AGAIN_MS = 10_000;

export interface FrameAnswer {
  /** The answer to what was typed last, or the one before while that is on its way or refused. */
  readonly result: FrameResult | null;
  readonly trouble: Trouble | null;
  readonly pending: boolean;
  /** The bracket of a field solution on its way, and the first one; null where there is none. */
  readonly closing: { readonly now: FrameProgress; readonly first: FrameProgress } | null;
  /** Path of the field solution that answered; null for a shape. */
  readonly path: string | null;
  /** Asks at once, also for what was asked before. */
  readonly ask: () => void;
}

/** The answer to the open values: asked for when they rest, and again by itself while the service is away. */
export function useAnswer(api: FrameApi, values: Values, onOutline: boolean): FrameAnswer {
  const [path, setPath] = useState<string | null>(null);
  const [closing, setClosing] = useState<FrameAnswer["closing"]>(null);
  const [result, setResult] = useState<FrameResult | null>(null);
  const [trouble, setTrouble] = useState<Trouble | null>(null);
  const [pending, setPending] = useState(true);
  const [turn, setTurn] = useState(0);
  const asked = useRef(false);
  const text = JSON.stringify(values);

  useEffect(() => {
    const abort = new AbortController();
    const pause = onOutline ? SOLVE_PAUSE_MS : PAUSE_MS;
    const compute = async () => {
      setPending(true);
      try {
        const given: Values = JSON.parse(text);
        const tell = (now: FrameProgress) => setClosing((before) => ({ now, first: before?.first ?? now }));
        const solved = onOutline
          ? await (await import("./solve-outline")).solveOutline(api, given, abort.signal, tell)
          : { result: await api.post<FrameResult>("/api/v1/resistance", given, abort.signal), path: null };
        if (abort.signal.aborted) return;
        setResult(solved.result);
        setPath(solved.path);
        setTrouble(null);
      } catch (error) {
        if (abort.signal.aborted) return;
        // What cannot be loaded, as the way of solving an outline, is away with the service.
        setTrouble(error instanceof FrameTrouble ? error.trouble : { kind: "away", waitMs: AGAIN_MS });
      }
      setPending(false);
      setClosing(null);
    };
    // What the frame opens with, and what was asked for, is not waited for.
    const timer = setTimeout(() => void compute(), asked.current ? pause : 0);
    asked.current = true;
    return () => {
      clearTimeout(timer);
      abort.abort();
      setClosing(null);
    };
  }, [api, text, turn, onOutline]);

  const ask = useCallback(() => {
    asked.current = false;
    setTurn((before) => before + 1);
  }, []);

  const waitMs = trouble?.kind === "away" || trouble?.kind === "pause" ? trouble.waitMs : null;
  useEffect(() => {
    if (waitMs === null) return undefined;
    const timer = setTimeout(ask, waitMs);
    return () => clearTimeout(timer);
  }, [trouble, waitMs, ask]);

  return { result, trouble, pending, closing, path, ask };
}

/** The drawing of the open values, and of the last ones that could be drawn. */
export function useDrawing(api: FrameApi, values: Values, first: FrameDrawing | null): FrameDrawing | null {
  const [drawing, setDrawing] = useState(first);
  const text = JSON.stringify(values);
  const last = useRef(text);
  useEffect(() => {
    if (!first || last.current === text) return undefined;
    const abort = new AbortController();
    const draw = async () => {
      last.current = text;
      try {
        setDrawing(await api.post<FrameDrawing>("/api/embed/drawing", JSON.parse(text), abort.signal));
      } catch {
        // The last drawing stands; what is wrong is told beside the answer.
      }
    };
    const timer = setTimeout(() => void draw(), PAUSE_MS);
    return () => {
      clearTimeout(timer);
      abort.abort();
    };
  }, [api, text, first]);
  return drawing;
}
