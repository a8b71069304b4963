/** What a record says, in the order in which it says it; the page and the printed sheet both show exactly this. */
import type { Drawing, PlotLook } from "@/lib/engine";

/** One line of a list of pairs. */
export interface Fact {
  readonly name: string;
  readonly value: string;
  /** Stands behind the value, smaller. */
  readonly note?: string;
}

export interface Column {
  readonly title: string;
  /** Set in the typeface of numbers. */
  readonly numeric?: boolean;
  /** Share of the width on paper; 1 if left out. */
  readonly weight?: number;
}

export interface RecordStep {
  readonly title: string;
  readonly tex: string;
  readonly value?: string;
}

export type Block =
  | { readonly kind: "facts"; readonly facts: readonly Fact[] }
  | {
      readonly kind: "table";
      readonly label: string;
      /** Shown below where rows were left out. */
      readonly remark?: string;
      readonly columns: readonly Column[];
      readonly rows: readonly (readonly string[])[];
    }
  | { readonly kind: "lines"; readonly lines: readonly string[] }
  | { readonly kind: "paragraph"; readonly text: string }
  | { readonly kind: "law"; readonly tex: string }
  | { readonly kind: "steps"; readonly steps: readonly RecordStep[] }
  | { readonly kind: "code"; readonly label: string; readonly text: string };

export interface Section {
  readonly id: string;
  readonly title: string;
  readonly blocks: readonly Block[];
}

/** The number that the record is about, and how sure it is. */
export interface Headline {
  readonly title: string;
  readonly text: string;
  /** Both bounds with their unit; null where there is no one bracket. */
  readonly bracket: string | null;
  readonly statements: readonly string[];
  readonly verdict: { readonly outcome: "met" | "not-met" | "undecided"; readonly sentence: string } | null;
}

/** Draws a picture as SVG in the size and the colours of where it stands; without rules of style. */
export type Draw = (look: PlotLook) => string;

export type Picture =
  | {
      readonly kind: "shape";
      readonly drawing: Drawing;
      readonly toScale: boolean;
      readonly labels: Readonly<Record<string, { readonly symbol: string; readonly value: string }>>;
      readonly terminals: { readonly high: string; readonly low: string };
    }
  | {
      readonly kind: "svg";
      readonly draw: Draw;
      readonly description: string;
    };

/** The page on which the same calculation can be opened again to go on with it. */
export interface OpenAgain {
  readonly page: "Calculate" | "Outline" | "Network";
  readonly href: string;
}

/** What an operation tells of its record. */
export interface Told {
  /** What was computed: a shape's title, "Outline", "Network". */
  readonly subject: string;
  readonly headline: Headline;
  readonly picture: Picture | null;
  readonly cautions: readonly string[];
  readonly sections: readonly Section[];
  readonly openAgain?: OpenAgain;
}

export interface RecordContent extends Told {
  readonly id: string;
  /** Short code that leads back. */
  readonly code: string;
  readonly address: string;
  readonly label: string;
  readonly operation: string;
  readonly team: string;
  /** ISO 8601, UTC. */
  readonly storedAt: string;
  readonly by: string;
  readonly engine: string;
  readonly catalogue: string;
}
