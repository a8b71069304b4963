"use client";

import { type KeyboardEvent, type ReactNode, useEffect, useRef, useState } from "react";
import Link from "next/link";
import { Button } from "../../../_ui/button";
import { CONTROL, Field } from "../../../_ui/field";
import { EmptyState } from "../../../_ui/states";
import { replaceAddress } from "../replace-address";
import { matches } from "./search";

export interface CatalogueSection {
  readonly family: string;
  readonly title: string;
  readonly note: string;
  readonly shapes: readonly {
    readonly id: string;
    readonly title: string;
    readonly summary: string;
    readonly search: string;
    readonly picture: ReactNode;
  }[];
}

interface CatalogueSheetProps {
  readonly sections: readonly CatalogueSection[];
  readonly start: string;
}

const ADDRESS_MS = 250;

/** All shapes by family. "/" goes to the search, Enter opens its first find, arrow keys go from drawing to drawing. */
export function CatalogueSheet({ sections, start }: CatalogueSheetProps) {
  const [search, setSearch] = useState(start);
  const field = useRef<HTMLInputElement>(null);
  const sheet = useRef<HTMLDivElement>(null);

  useEffect(() => {
    const timer = setTimeout(() => {
      const query = search.trim() === "" ? "" : `?q=${encodeURIComponent(search.trim())}`;
      if (query !== window.location.search) {
        replaceAddress(`${window.location.pathname}${query}`);
      }
    }, ADDRESS_MS);
    return () => clearTimeout(timer);
  }, [search]);

  // After a step back in the history the page comes as it was first made; the address has what it became.
  useEffect(() => {
    const timer = setTimeout(() => setSearch(new URLSearchParams(window.location.search).get("q") ?? ""));
    return () => clearTimeout(timer);
  }, []);

  useEffect(() => {
    function toSearch(event: globalThis.KeyboardEvent) {
      const typing = event.target instanceof Element && event.target.matches("input, textarea, select");
      if (event.key !== "/" || typing || event.ctrlKey || event.metaKey || event.altKey) return;
      event.preventDefault();
      field.current?.focus();
    }
    window.addEventListener("keydown", toSearch);
    return () => window.removeEventListener("keydown", toSearch);
  }, []);

  const found = sections
    .map((section) => ({
      ...section,
      shapes: section.shapes.filter((shape) => matches(search, shape.search)),
    }))
    .filter(({ shapes }) => shapes.length > 0);
  const count = found.reduce((sum, { shapes }) => sum + shapes.length, 0);
  const cards = () => [...(sheet.current?.querySelectorAll<HTMLAnchorElement>("a[data-shape]") ?? [])];

  function fromSearch(event: KeyboardEvent) {
    if (event.key === "Enter") {
      event.preventDefault();
      cards()[0]?.click();
    } else if (event.key === "ArrowDown") {
      event.preventDefault();
      cards()[0]?.focus();
    } else if (event.key === "Escape") setSearch("");
  }

  function amongCards(event: KeyboardEvent) {
    const all = cards();
    const index = all.findIndex((card) => card === document.activeElement);
    if (index < 0) return;
    const next = nextCard(all, index, event.key);
    if (next === undefined) return;
    event.preventDefault();
    if (next === null) field.current?.focus();
    else all[next].focus();
  }

  return (
    <>
      <div className="flex flex-wrap items-end gap-x-3">
        <Field
          label="Search by word or symbol"
          help={`“/” goes here, Enter opens the first find. ${count === 1 ? "One shape" : `${count} shapes`} shown.`}
          className="w-full max-w-[26rem]"
        >
          {(control) => (
            <input
              {...control}
              ref={field}
              type="search"
              value={search}
              onChange={(event) => setSearch(event.target.value)}
              onKeyDown={fromSearch}
              autoComplete="off"
              spellCheck={false}
              className={`${CONTROL} font-sans!`}
            />
          )}
        </Field>
      </div>
      <div ref={sheet} onKeyDown={amongCards} className="grid gap-5">
        {found.map(({ family, title, note, shapes }) => (
          <section key={family} aria-labelledby={`family-${family}`}>
            <h2 id={`family-${family}`}>{title}</h2>
            <p className="mb-1.5 text-table text-ink-soft">{note}</p>
            <ul className="grid grid-cols-[repeat(auto-fill,minmax(min(100%,15.5rem),1fr))] pe-px pb-px">
              {shapes.map((shape) => (
                <li key={shape.id} className="-me-px -mb-px border border-rule bg-sheet">
                  <Link
                    href={`/calculate/${shape.id}`}
                    prefetch={false}
                    data-shape={shape.id}
                    className="group flex h-full flex-col gap-1 p-1.5 outline-offset-[-3px]! hover:bg-paper"
                  >
                    <span className="grid h-[180px] place-items-center">{shape.picture}</span>
                    <span className="text-table font-medium group-hover:underline">{shape.title}</span>
                  </Link>
                </li>
              ))}
            </ul>
          </section>
        ))}
        {count === 0 ? (
          <EmptyState
            title={`No shape has “${search.trim()}”`}
            action={<Button onClick={() => setSearch("")}>Show all shapes</Button>}
          >
            Try a plainer word, such as bar, tube or rod, or a symbol of the drawing.
          </EmptyState>
        ) : null}
      </div>
    </>
  );
}

/** Index of the card an arrow key goes to; null for the search above the first row, undefined for other keys. */
function nextCard(
  cards: readonly HTMLAnchorElement[],
  index: number,
  key: string,
): number | null | undefined {
  if (key === "ArrowRight") return Math.min(cards.length - 1, index + 1);
  if (key === "ArrowLeft") return Math.max(0, index - 1);
  if (key === "Home") return 0;
  if (key === "End") return cards.length - 1;
  if (key !== "ArrowDown" && key !== "ArrowUp") return undefined;
  const here = cards[index].getBoundingClientRect();
  const down = key === "ArrowDown";
  let best: number | null = null;
  let least = Infinity;
  cards.forEach((card, other) => {
    const box = card.getBoundingClientRect();
    const step = down ? box.top - here.top : here.top - box.top;
    if (step < 1) return;
    const cost = step * 1000 + Math.abs(box.left - here.left);
    if (cost < least) [best, least] = [other, cost];
  });
  return best ?? (down ? index : null);
}
