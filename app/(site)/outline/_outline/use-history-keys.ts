"use client";

import { useEffect, useRef } from "react";

/** Ctrl+Z and Ctrl+Shift+Z (or Ctrl+Y), but for fields in which something is typed: there they are the browser's. */
export function useHistoryKeys(undo: () => void, redo: () => void): void {
  const latest = useRef({ undo, redo });
  useEffect(() => {
    latest.current = { undo, redo };
  });
  useEffect(() => {
    function onKeyDown(event: KeyboardEvent) {
      if (!(event.ctrlKey || event.metaKey) || event.altKey || ownsUndo(event.target)) return;
      const key = event.key.toLowerCase();
      if (key === "z" && !event.shiftKey) latest.current.undo();
      else if (key === "y" || (key === "z" && event.shiftKey)) latest.current.redo();
      else return;
      event.preventDefault();
    }
    window.addEventListener("keydown", onKeyDown);
    return () => window.removeEventListener("keydown", onKeyDown);
  }, []);
}

function ownsUndo(target: EventTarget | null): boolean {
  if (target instanceof HTMLTextAreaElement) return true;
  if (!(target instanceof HTMLInputElement)) return false;
  const text = ["text", "search", ""].includes(target.getAttribute("type") ?? "");
  return text && target.dataset.cell !== "settled";
}
