import type { ResistanceRequest } from "./generated/types.gen.js";

/** Id of a shape of the catalogue. */
export type ShapeId = ResistanceRequest["shape"];

/** The request of one shape: `RequestOf<"bar">`. */
export type RequestOf<Shape extends ShapeId> = Extract<ResistanceRequest, { shape: Shape }>;

/** The dimensions of one shape: `DimensionsOf<"bar">` knows `length`, `width`, `thickness` and no other. */
export type DimensionsOf<Shape extends ShapeId> = RequestOf<Shape>["dimensions"];
