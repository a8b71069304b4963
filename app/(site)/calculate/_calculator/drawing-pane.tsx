"use client";

import { useRef } from "react";
import type { ShapeEntry } from "@/lib/engine";
import { Button } from "../../../_ui/button";
import { ShapeDrawing } from "../../../_ui/drawing/shape-drawing";
import type { Geometry } from "../_server/geometry";
import { OutdatedTag } from "./answer/outdated-tag";

interface DrawingPaneProps {
  readonly entry: ShapeEntry;
  readonly geometry: Geometry | null;
  readonly focused: string | undefined;
  /** Why what is drawn has no answer, or is not what the fields say; undefined where all is well. */
  readonly outdated: string | undefined;
  readonly className: string;
}

/** The drawing, in a place that keeps its height, with its files. */
export function DrawingPane({ entry, geometry, focused, outdated, className }: DrawingPaneProps) {
  const frame = useRef<HTMLDivElement>(null);

  /** The sheet that the container shows: the narrow or the wide one. */
  function picture(): SVGSVGElement | undefined {
    const sheets = frame.current?.querySelectorAll<SVGSVGElement>("svg[role=img]") ?? [];
    return [...sheets].find((sheet) => sheet.getBoundingClientRect().width > 0);
  }

  async function save(kind: "svg" | "png") {
    const svg = picture();
    if (!svg) return;
    const files = await import("../../../_ui/picture-file");
    if (kind === "svg") files.saveFile(`${entry.id}.svg`, files.svgFile(svg), "image/svg+xml");
    else files.saveFile(`${entry.id}.png`, await files.pngFile(svg), "image/png");
  }

  return (
    <div className={className}>
      <div
        ref={frame}
        className={`relative grid min-h-[17rem] place-items-center rounded border border-rule bg-sheet px-1 py-1.5 medium:min-h-[23rem] [&>figure]:w-full ${outdated ? "[&_svg[role=img]]:opacity-45" : ""}`}
      >
        {outdated && geometry ? (
          <OutdatedTag className="absolute start-1 top-1 z-1">{outdated}</OutdatedTag>
        ) : null}
        {geometry ? (
          <ShapeDrawing
            drawing={geometry.drawing}
            toScale={geometry.toScale}
            labels={geometry.labels}
            focused={focused}
            terminals={entry.terminals}
          />
        ) : (
          <p className="text-table text-ink-soft">The drawing comes with the dimensions.</p>
        )}
      </div>
      <div className="flex justify-end print:hidden">
        <Button variant="quiet" onClick={() => save("svg")} aria-label="Drawing as SVG">
          SVG
        </Button>
        <Button variant="quiet" onClick={() => save("png")} aria-label="Drawing as PNG">
          PNG
        </Button>
      </div>
    </div>
  );
}
