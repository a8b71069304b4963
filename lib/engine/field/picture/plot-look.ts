/** How large the picture of a field solution is, and in which colours what is not the conductor's own is drawn. */

/** Anything that SVG takes for a paint. */
export interface PlotColours {
  /** What the picture stands on. */
  readonly sheet: string;
  readonly ink: string;
  readonly soft: string;
  readonly edge: string;
  /** Terminals: the first of the pair that is shown, the second, and those without current. */
  readonly high: string;
  readonly low: string;
  readonly open: string;
}

export interface PlotLook {
  /** Width of the picture, px; its texts are 14 px high. At least 320. */
  readonly width: number;
  /** Largest height of the conductor, px. */
  readonly tallest: number;
  /** Whether result and bounds stand above it. */
  readonly titled: boolean;
  /** Whether the picture brings its own sheet along. */
  readonly ground: boolean;
  readonly colours: PlotColours;
  /** Begins the ids inside, which are then unique in a document that holds several pictures. */
  readonly id: string;
}

export const PAPER_COLOURS: PlotColours = {
  sheet: "#ffffff",
  ink: "#1b2226",
  soft: "#566067",
  edge: "#857f73",
  high: "#9c4a1f",
  low: "#1f6f62",
  open: "#566067",
};

/** The picture as a file of its own. */
export const FILE_LOOK: PlotLook = {
  width: 960,
  tallest: 848,
  titled: true,
  ground: true,
  colours: { ...PAPER_COLOURS, sheet: "#faf8f3" },
  id: "plot",
};

export const MARGIN = 24;
export const FONT = 14;
/** Below this width the legend stands under the scale, not beside it, px. */
export const NARROW = 640;
