"use client";

import { useCallback, useEffect, useRef, useState } from "react";
import { type FrameApi, FrameTrouble, type Trouble, type Values } from "./frame-api";
import type { FrameDrawing, FrameResult } from "./frame-view";

/** How long typing may pause before a call is made, ms. */
const PAUSE_MS = 250;

export interface FrameAnswer {
  /** The answer to what was typed last, or the one before while that is on its way or refused. */
  readonly result: FrameResult | null;
  readonly trouble: Trouble | null;
  readonly pending: boolean;
  /** Asks at once, also for what was asked before. */
  readonly ask: () => void;
}

/** The answer to the open values: asked for when they rest, and again by itself while the service is away. */
export function useAnswer(api: FrameApi, values: Values): FrameAnswer {
  const [result, setResult] = useState<FrameResult | null>(null);
  const [trouble, setTrouble] = useState<Trouble | null>(null);
  const [pending, setPending] = useState(true);
  const [turn, setTurn] = useState(0);
  const asked = useRef(false);
  const text = JSON.stringify(values);

  useEffect(() => {
    const abort = new AbortController();
    const compute = async () => {
      setPending(true);
      try {
        const answer = await api.post<FrameResult>("/api/v1/resistance", JSON.parse(text), abort.signal);
        if (abort.signal.aborted) return;
        setResult(answer);
        setTrouble(null);
      } catch (error) {
        if (abort.signal.aborted || !(error instanceof FrameTrouble)) return;
        setTrouble(error.trouble);
      }
      setPending(false);
    };
    // What the frame opens with, and what was asked for, is not waited for.
    const timer = setTimeout(() => void compute(), asked.current ? PAUSE_MS : 0);
    asked.current = true;
    return () => {
      clearTimeout(timer);
      abort.abort();
    };
  }, [api, text, turn]);

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

  return { result, trouble, pending, ask };
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
