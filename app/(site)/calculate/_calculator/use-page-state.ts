"use client";

import { useCallback, useEffect, useState } from "react";
import type { ShapeEntry } from "@/lib/engine";
import type { Parameters } from "../_model/parameters";
import { joinAddress, splitAddress } from "../_model/address";
import { replaceAddress } from "../replace-address";
import { toldAddress } from "./kept-address";
import { type PageState, readState, stateQuery, VARIANT_NAMES } from "../_model/variants";

/** What a change sets; undefined takes a parameter away. */
export type Patch = Readonly<Record<string, string | undefined>>;

export interface PageActions {
  readonly change: (patch: Patch) => void;
  readonly show: (index: number) => void;
  /** Adds a copy of the shown variant and shows it. */
  readonly add: () => void;
  readonly remove: (index: number) => void;
  readonly restart: () => void;
  /** Takes back a removal or a restart. */
  readonly restore: (state: PageState) => void;
}

const ADDRESS_MS = 250;

/** The state of a page, kept in its address as well, so that a link reproduces it. */
export function usePageState(
  start: PageState,
  entry: ShapeEntry,
  example: Parameters,
): readonly [PageState, PageActions] {
  const [state, setState] = useState(start);

  // Long tables travel behind the "#", which the server does not see; and after a step back in the history the page
  // comes as it was first made, while the address has what it became.
  useEffect(() => {
    function told() {
      const { search, hash } = toldAddress();
      const behind = hash.includes("=") ? hash.slice(1) : "";
      return readState(joinAddress(search, behind), entry, example);
    }
    function adopt(before: PageState): PageState {
      const next = told();
      return stateQuery(before, entry) === stateQuery(next, entry) ? before : next;
    }
    const readAddress = () => setState(adopt);
    // What the reader has changed by then outranks the address, which follows later.
    const timer = setTimeout(() => setState((before) => (before === start ? adopt(before) : before)));
    window.addEventListener("hashchange", readAddress);
    return () => {
      clearTimeout(timer);
      window.removeEventListener("hashchange", readAddress);
    };
  }, [start, entry, example]);

  useEffect(() => {
    const timer = setTimeout(() => {
      const { query, behind } = splitAddress(stateQuery(state, entry));
      const next = `${window.location.pathname}?${query}${behind === "" ? "" : `#${behind}`}`;
      const now = `${window.location.pathname}${window.location.search}${window.location.hash}`;
      if (next !== now && state !== start) replaceAddress(next);
    }, ADDRESS_MS);
    return () => clearTimeout(timer);
  }, [state, start, entry]);

  const change = useCallback((patch: Patch) => {
    setState((before) => ({
      ...before,
      variants: before.variants.map((variant, index) =>
        index === before.active ? patched(variant, patch) : variant,
      ),
    }));
  }, []);
  const show = useCallback((index: number) => setState((before) => ({ ...before, active: index })), []);
  const add = useCallback(
    () =>
      setState((before) =>
        before.variants.length >= VARIANT_NAMES.length
          ? before
          : {
              variants: [...before.variants, before.variants[before.active]],
              active: before.variants.length,
            },
      ),
    [],
  );
  const remove = useCallback(
    (index: number) =>
      setState((before) => {
        const variants = before.variants.filter((_, other) => other !== index);
        if (variants.length === 0) return before;
        const active =
          before.active > index ? before.active - 1 : Math.min(before.active, variants.length - 1);
        return { variants, active };
      }),
    [],
  );
  const restart = useCallback(() => setState({ variants: [example], active: 0 }), [example]);
  return [state, { change, show, add, remove, restart, restore: setState }];
}

function patched(variant: Parameters, patch: Patch): Parameters {
  const next: Record<string, string> = { ...variant };
  for (const [name, value] of Object.entries(patch)) {
    if (value === undefined) delete next[name];
    else next[name] = value;
  }
  return next;
}
