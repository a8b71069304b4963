"use client";

import { createContext, useContext } from "react";
import type { MaterialChoice } from "../../calculate/_server/material-choices";
import type { PlacedComplaint } from "../_model/complaints";
import type { RingKey, Sketch } from "../_model/sketch";

/** What is marked on the board and in the table. */
export type Selection =
  | { readonly kind: "vertex"; readonly ring: RingKey; readonly index: number }
  | { readonly kind: "edge"; readonly ring: RingKey; readonly index: number };

export interface Grid {
  /** In the outline's unit. */
  readonly step: number;
  readonly snap: boolean;
}

/** What the parts of the page share. */
export interface OutlineState {
  readonly sketch: Sketch;
  /** Changes with one tag one after another are one step of undo. */
  readonly edit: (change: (sketch: Sketch) => Sketch, tag?: string) => void;
  /** Ends a run of changes with one tag. */
  readonly settle: () => void;
  readonly selection: Selection | null;
  readonly select: (selection: Selection | null) => void;
  /** The terminal that a press on an edge goes to. */
  readonly terminal: number;
  readonly setTerminal: (index: number) => void;
  readonly grid: Grid;
  readonly setGrid: (grid: Grid) => void;
  /** What the API said about this very sketch. */
  readonly complaints: readonly PlacedComplaint[];
  readonly materials: readonly MaterialChoice[];
}

const Context = createContext<OutlineState | null>(null);

export const OutlineProvider = Context.Provider;

export function useOutline(): OutlineState {
  const state = useContext(Context);
  if (!state) throw new Error("A part of the outline page stands outside of it.");
  return state;
}
