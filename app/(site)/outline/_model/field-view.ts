import type { FieldResult } from "@/lib/engine/field/request/field-result-schema";

/** A field solution as the API answers it. */
export interface FieldView {
  readonly id: string;
  readonly status: "queued" | "running" | "done" | "limited" | "failed" | "cancelled";
  readonly progress: FieldProgress | null;
  readonly result: FieldResult | null;
  readonly failure?: string;
  readonly record?: { readonly id: string; readonly url: string };
}

export interface FieldProgress {
  readonly lower: number;
  readonly upper: number;
  readonly unknowns: number;
  readonly refinements: number;
}

/** The members of a map that the page draws. */
export interface FieldMapView {
  readonly unit: string;
  readonly between: readonly [string, string];
  readonly equipotentials: readonly {
    readonly potential: number;
    readonly lines: readonly (readonly number[])[];
  }[];
  readonly streamlines: readonly (readonly number[])[];
  readonly currentBetweenStreamlines: number;
  readonly raster: RasterView;
  readonly edges: readonly {
    readonly from: readonly [number, number];
    readonly to: readonly [number, number];
    readonly ring: number;
    readonly terminal: string;
    readonly current: number;
  }[];
}

export interface RasterView {
  readonly origin: readonly [number, number];
  readonly cell: number;
  readonly columns: number;
  readonly rows: number;
  readonly density: readonly (number | null)[];
}

/** Samples along a straight line; null outside the conductor. */
export interface FieldLineView {
  readonly distance: readonly number[];
  readonly points: readonly (readonly [number, number])[];
  readonly potential: readonly (number | null)[];
  readonly density: readonly (number | null)[];
  readonly densityAlong: readonly (number | null)[];
}

export function isOver({ status }: FieldView): boolean {
  return status !== "queued" && status !== "running";
}
