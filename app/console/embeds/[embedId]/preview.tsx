"use client";

import { useEffect, useRef, useState, useSyncExternalStore } from "react";
import { Segmented } from "../../../_ui/segmented";

interface PreviewProps {
  readonly embedId: string;
  readonly version: number;
  readonly savedAt: number;
}

const WIDTHS = [
  { value: "320", label: "320" },
  { value: "480", label: "480" },
  { value: "720", label: "720" },
] as const;
type Width = (typeof WIDTHS)[number]["value"];

const THEMES = [
  { value: "light", label: "Light" },
  { value: "dark", label: "Dark" },
] as const;
type Theme = (typeof THEMES)[number]["value"];

function followWindow(onChange: () => void): () => void {
  window.addEventListener("resize", onChange);
  return () => window.removeEventListener("resize", onChange);
}

/** The saved version in a real frame, as pages show it; anew with every save. */
export function Preview({ embedId, version, savedAt }: PreviewProps) {
  const [chosen, setChosen] = useState<Width>();
  const roomy = useSyncExternalStore(
    followWindow,
    () => window.innerWidth >= 560,
    () => true,
  );
  const width = chosen ?? (roomy ? "480" : "320");
  const [theme, setTheme] = useState<Theme>("light");
  const [height, setHeight] = useState(420);
  const frame = useRef<HTMLIFrameElement>(null);

  useEffect(() => {
    const listen = (event: MessageEvent<{ type?: string; data?: { height?: number } }>) => {
      if (event.source !== frame.current?.contentWindow || event.origin !== window.location.origin) return;
      const told = event.data.data?.height;
      if (event.data.type === "size" && typeof told === "number") setHeight(told);
    };
    window.addEventListener("message", listen);
    return () => window.removeEventListener("message", listen);
  }, []);

  const query = new URLSearchParams({ preview: "1", version: String(version), theme, at: String(savedAt) });
  return (
    <section aria-label="Preview">
      <div className="mb-1 flex flex-wrap items-end gap-2">
        <Segmented label="Width, px" value={width} options={WIDTHS} onChange={setChosen} />
        <Segmented label="Page around" value={theme} options={THEMES} onChange={setTheme} />
      </div>
      <div
        // Reachable by keyboard, since it scrolls where the screen is narrower.
        tabIndex={0}
        role="group"
        aria-label={`Frame of ${width} px`}
        className="overflow-x-auto rounded border border-rule p-1"
      >
        <iframe
          ref={frame}
          title="Preview of the embed"
          src={`/embed/${embedId}?${query}`}
          width={width}
          height={height}
          className="mx-auto block border-0"
        />
      </div>
    </section>
  );
}
