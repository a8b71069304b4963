import { useId } from "react";
import type { Drawing } from "@/lib/engine/shape/drawing";
import type { LabelText } from "./label";
import { layoutSheet } from "./sheet";
import { DrawingSheet } from "./drawing-sheet";

interface ShapeDrawingProps {
  readonly drawing: Drawing;
  /** Whether the drawing handed over has the true proportions; it may lose them here as well. */
  readonly toScale?: boolean;
  /** Symbol and value of each dimension by its name; a dimension without one is not drawn. */
  readonly labels: Readonly<Record<string, LabelText>>;
  /** Name of the dimension whose field has focus. */
  readonly focused?: string;
  /** The terminals in words, as the shape names them. */
  readonly terminals?: { readonly high: string; readonly low: string };
  /** The legend's words and those that are read out, where the page speaks another language than English. */
  readonly words?: DrawingWords;
}

export interface DrawingWords {
  readonly high: string;
  readonly low: string;
  readonly notToScale: string;
  readonly dimensions: string;
}

const WORDS: DrawingWords = {
  high: "high terminal",
  low: "low terminal",
  notToScale: "not to scale",
  dimensions: "Dimensions",
};

/** Widths for which the sheet is laid out; in between it scales. */
const NARROW = 320;
const WIDE = 560;

/**
 * The drawing of a shape: conductor, terminals, current, dimensions. Laid out twice, for narrow and for wide places,
 * and the container decides, so that it needs no script and prints as it stands.
 */
export function ShapeDrawing(props: ShapeDrawingProps) {
  const { drawing, toScale = true, labels, focused, terminals, words = WORDS } = props;
  const id = useId();
  const narrow = layoutSheet(drawing, labels, NARROW);
  const wide = layoutSheet(drawing, labels, WIDE);
  const proportional = toScale && !narrow.distorted && !wide.distorted;
  return (
    <figure className="@container">
      <DrawingSheet
        sheet={narrow}
        toScale={proportional}
        id={`${id}n`}
        focused={focused}
        description={drawing.description}
        words={words}
        className="mx-auto block w-full max-w-[420px] @min-[460px]:hidden"
      />
      <DrawingSheet
        sheet={wide}
        toScale={proportional}
        id={`${id}w`}
        focused={focused}
        description={drawing.description}
        words={words}
        className="mx-auto hidden w-full max-w-[720px] @min-[460px]:block"
      />
      <figcaption className="mt-1 flex flex-wrap gap-x-2 gap-y-0.5 text-small text-ink-soft">
        <span className="inline-flex items-center gap-1">
          <svg viewBox="0 0 20 8" aria-hidden className="h-1 w-2.5 shrink-0">
            <path d="M0 4h20" className="stroke-copper" strokeWidth="5" />
          </svg>
          {words.high}
          {terminals ? `: ${terminals.high}` : ""}
        </span>
        <span className="inline-flex items-center gap-1">
          <svg viewBox="0 0 20 8" aria-hidden className="h-1 w-2.5 shrink-0">
            <path d="M0 4h20" className="stroke-verdigris" strokeWidth="6" />
            <path d="M0 4h20" className="stroke-sheet" strokeWidth="1.6" />
          </svg>
          {words.low}
          {terminals ? `: ${terminals.low}` : ""}
        </span>
        {proportional ? null : <span>{words.notToScale}</span>}
      </figcaption>
    </figure>
  );
}
