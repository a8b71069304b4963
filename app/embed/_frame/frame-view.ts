import type { FieldResult } from "@/lib/engine/field/request/field-result-schema";
import type { ResistanceResult } from "@/lib/engine/resistance/result-schema";
import type { UnitKind } from "../../_ui/quantity/units";
import type { OutlinePlan } from "../../_ui/drawing/outline-plan";
import type { ShapeDrawing } from "../../_ui/drawing/shape-drawing";
import type { ComponentProps } from "react";
import type { CautionTexts } from "../_cautions/caution-in";
import type { Words } from "../_words/words";

/** An input that visitors may change. */
export interface OpenInput {
  readonly name: string;
  readonly label: string;
  readonly symbol: string;
  readonly help: string | null;
  readonly value: string;
  readonly type: "quantity" | "integer" | "choice";
  readonly kind: UnitKind;
  readonly bareUnit: string | null;
  readonly foil: boolean;
  /** Dimension line that shows it. */
  readonly line: string;
  /** "50 mm to 4 m", in the reader's locale; null where every value may be tried. */
  readonly range: string | null;
  readonly choices: readonly { readonly value: string; readonly label: string }[] | null;
  /** "± 0.1 mm", where the tolerance is fixed; empty otherwise. */
  readonly about: string;
}

/** The tolerance of one input that visitors may change. */
export interface OpenTolerance {
  /** Among the values: "width.tolerance". */
  readonly name: string;
  /** Input that it belongs to. */
  readonly input: string;
  readonly label: string;
  readonly value: string;
  /** What it is a tolerance of, where the input itself is fixed. */
  readonly about: string;
  readonly range: string | null;
}

export interface FrameTolerances {
  readonly open: readonly OpenTolerance[];
  readonly method: NonNullable<FrameResult["uncertainty"]>["method"];
  readonly budget: boolean;
  /** Names of the budget's entries by their place in the request; what is not there is not shown. */
  readonly labels: Readonly<Record<string, string>>;
}

export interface FixedInput {
  readonly name: string;
  readonly label: string;
  readonly symbol: string;
  readonly text: string;
}

export interface FrameDrawing {
  readonly drawing: ComponentProps<typeof ShapeDrawing>["drawing"];
  readonly toScale: boolean;
  readonly labels: ComponentProps<typeof ShapeDrawing>["labels"];
}

/** Everything that a frame shows and knows: nothing of what its version hides. */
export interface FrameView {
  readonly embed: string;
  readonly title: string;
  readonly intro: string | null;
  readonly open: readonly OpenInput[];
  readonly fixed: readonly FixedInput[];
  /** Null where the widget does not ask how far the resistance strays. */
  readonly tolerances: FrameTolerances | null;
  readonly requirement: string | null;
  readonly show: { readonly drawing: boolean; readonly bounds: boolean; readonly plots: boolean };
  readonly accent: string | null;
  readonly density: "comfortable" | "compact";
  readonly locale: string;
  readonly words: Words;
  /** "Busbar, Merrow Pike" */
  readonly owner: string;
  /** Address of the service's start page. */
  readonly service: string;
  /** Cautions of the shape, shown before there is an answer too. */
  readonly cautions: readonly string[];
  /** Cautions in the frame's language by the engine's English. */
  readonly cautionTexts: CautionTexts;
  /** Coordinate along the flow, for the plots. */
  readonly coordinateLabel: string;
  readonly preview: boolean;
  /** Origins whose pages may exchange messages with the frame. */
  readonly hosts: readonly string[];
  readonly token: { readonly token: string; readonly expiresAt: string };
  /** What it opens with: the defaults, or what the page around asked for. */
  readonly start: Readonly<Record<string, string>>;
  readonly drawing: FrameDrawing | null;
  /** Names of the drawing's views in the frame's language, by the engine's. */
  readonly viewTitles: Readonly<Record<string, string>>;
  /** What it is on, where that is an outline; null for a shape. */
  readonly outline: {
    /** Null where the widget shows no drawing. */
    readonly plan: OutlinePlan | null;
    /** Width of the bracket over its value that is wanted. */
    readonly accuracy: number;
  } | null;
}

/** What a frame reads of an answer: of a shape, or of a field solution on an outline. */
export type FrameResult = Pick<ResistanceResult, "verdict" | "cautions"> &
  Partial<Pick<ResistanceResult, "resistance" | "uncertainty" | "profile">> &
  Pick<FieldResult, "pairs" | "limit">;

/** The bracket of a field solution on its way, Ω. */
export interface FrameProgress {
  readonly lower: number;
  readonly upper: number;
}
