/** Arranges the views of a drawing on one sheet: side by side where there is room, else one below the other. */
import type { Drawing } from "@/lib/engine/shape/drawing";
import type { LabelText } from "./label";
import { type ViewLayout, layoutView } from "./view-layout";

export interface PlacedView {
  readonly view: ViewLayout;
  readonly x: number;
  readonly y: number;
  /** Place of the view's title; empty where the drawing has only one view. */
  readonly title: string;
  readonly titleY: number;
}

export interface Sheet {
  readonly width: number;
  readonly height: number;
  readonly views: readonly PlacedView[];
  readonly distorted: boolean;
}

type Labels = Readonly<Record<string, LabelText>>;

const GUTTER = 24;
const TITLE = 26;
/** Below this width a view does not get a column of its own. */
const COLUMN = 200;
const COLUMN_HEIGHT = 260;
const STACKED_HEIGHT = 220;
/** Ways to divide the sheet between two views; an uneven one has to be clearly better. */
const SHARES = [0.5, 0.6, 0.4] as const;

export function layoutSheet(drawing: Drawing, labels: Labels, width: number): Sheet {
  const sideBySide = drawing.views.length === 2 && (width - GUTTER) / 2 >= COLUMN;
  return sideBySide ? columns(drawing, labels, width) : stack(drawing, labels, width);
}

function columns({ views }: Drawing, labels: Labels, width: number): Sheet {
  let best: readonly ViewLayout[] = [];
  let bestSize = 0;
  for (const share of SHARES) {
    const paper = width - GUTTER;
    const layouts = [
      layoutView(views[0], labels, paper * share, COLUMN_HEIGHT),
      layoutView(views[1], labels, paper * (1 - share), COLUMN_HEIGHT),
    ];
    const size = Math.min(layouts[0].bodySize, layouts[1].bodySize);
    if (size > 1.15 * bestSize) {
      best = layouts;
      bestSize = size;
    }
  }
  const tallest = Math.max(...best.map((view) => view.height));
  return {
    width,
    height: tallest + TITLE,
    views: best.map((view, index) => ({
      view,
      x: index * (best[0].width + GUTTER),
      y: (tallest - view.height) / 2,
      title: view.title,
      titleY: tallest + 14,
    })),
    distorted: best.some((view) => view.distorted),
  };
}

function stack({ views }: Drawing, labels: Labels, width: number): Sheet {
  const titled = views.length > 1;
  const maxHeight = titled ? STACKED_HEIGHT : COLUMN_HEIGHT;
  let below = 0;
  const placed = views.map((source): PlacedView => {
    const view = layoutView(source, labels, width, maxHeight);
    const y = below;
    below += view.height + (titled ? TITLE + GUTTER : 0);
    return { view, x: 0, y, title: titled ? view.title : "", titleY: y + view.height + 14 };
  });
  return {
    width,
    height: titled ? below - GUTTER : below,
    views: placed,
    distorted: placed.some(({ view }) => view.distorted),
  };
}
