"use client";

import { useCallback, useEffect, useState } from "react";
import { replaceAddress } from "../../calculate/replace-address";
import { KEPT_QUERY, sketchFromHash, sketchToHash } from "../_model/address";
import { commit, type History, redo, settle, startHistory, undo } from "../_model/history";
import type { Sketch } from "../_model/sketch";

const ADDRESS_MS = 300;
const KEPT = "rhoform-outline";

export interface SketchState {
  readonly sketch: Sketch;
  readonly edit: (change: (sketch: Sketch) => Sketch, tag?: string) => void;
  readonly settle: () => void;
  readonly undo: () => void;
  readonly redo: () => void;
  readonly canUndo: boolean;
  readonly canRedo: boolean;
  /** Told apart from a change: another drawing is there, and the view should show it. */
  readonly generation: number;
  readonly replace: (sketch: Sketch) => void;
}

/** The sketch with its history, kept behind the "#" of the address, so that a link reproduces it. */
export function useSketch(start: Sketch): SketchState {
  const [history, setHistory] = useState<History<Sketch>>(() => startHistory(start));
  const [generation, setGeneration] = useState(0);
  const sketch = history.present;

  useEffect(() => {
    let current = true;
    async function readAddress() {
      const found = (await sketchFromHash(window.location.hash.slice(1), start)) ?? (await readKept(start));
      if (!found || !current) return;
      // What the reader has changed by then outranks the address.
      setHistory((before) => (before.past.length === 0 ? startHistory(found) : before));
      setGeneration((before) => before + 1);
    }
    async function follow() {
      const found = await sketchFromHash(window.location.hash.slice(1), start);
      if (!found || !current) return;
      setHistory((before) =>
        JSON.stringify(found) === JSON.stringify(before.present) ? before : commit(before, found),
      );
      setGeneration((before) => before + 1);
    }
    const onChange = () => void follow();
    void readAddress();
    window.addEventListener("hashchange", onChange);
    return () => {
      current = false;
      window.removeEventListener("hashchange", onChange);
    };
  }, [start]);

  useEffect(() => {
    if (sketch === start) return;
    let current = true;
    const timer = setTimeout(() => {
      void sketchToHash(sketch).then((hash) => {
        if (!current) return;
        keep(hash);
        const next = `${window.location.pathname}#${hash}`;
        const now = `${window.location.pathname}${window.location.search}${window.location.hash}`;
        if (next !== now) replaceAddress(next);
      });
    }, ADDRESS_MS);
    return () => {
      current = false;
      clearTimeout(timer);
    };
  }, [sketch, start]);

  const edit = useCallback((change: (sketch: Sketch) => Sketch, tag?: string) => {
    setHistory((before) => commit(before, change(before.present), tag));
  }, []);
  const replace = useCallback((next: Sketch) => {
    setHistory((before) => commit(before, next));
    setGeneration((before) => before + 1);
  }, []);
  return {
    sketch,
    edit,
    replace,
    generation,
    settle: useCallback(() => setHistory(settle), []),
    undo: useCallback(() => setHistory(undo), []),
    redo: useCallback(() => setHistory(redo), []),
    canUndo: history.past.length > 0,
    canRedo: history.future.length > 0,
  };
}

/** A tab's own memory, for the way back from signing in; a browser without it loses nothing else. */
function keep(hash: string): void {
  try {
    sessionStorage.setItem(KEPT, hash);
  } catch {
    // Full or switched off.
  }
}

async function readKept(around: Sketch): Promise<Sketch | null> {
  if (!new URLSearchParams(window.location.search).has(KEPT_QUERY)) return null;
  try {
    const hash = sessionStorage.getItem(KEPT);
    return hash === null ? null : await sketchFromHash(hash, around);
  } catch {
    return null;
  }
}
