import { z } from "zod";
import type { Problem } from "../../failure";
import { LENGTH_UNITS_M, type LengthUnit } from "./length-units";

const unitNames = Object.keys(LENGTH_UNITS_M) as [LengthUnit, ...LengthUnit[]];

/** A point of the plane, [x, y] in the outline's unit. */
export const pointSchema = z.tuple([z.number(), z.number()]);

/** An arc in place of a vertex: from the vertex before to `arcTo` around `center`. */
export const arcSchema = z.strictObject({
  arcTo: pointSchema,
  center: pointSchema,
  clockwise: z.boolean().default(false),
});

/** An open list of vertices and arcs; the last is joined to the first. Orientation does not matter. */
export const ringSchema = z.array(z.union([pointSchema, arcSchema]));

export const outlineSchema = z.strictObject({
  unit: z.enum(unitNames).default("m"),
  outer: ringSchema,
  holes: z.array(ringSchema).default([]),
  symmetry: z.enum(["plan", "axisymmetric"]).default("plan"),
});

/** A stretch of one edge; ring 0 is the outer one, 1… the holes; edge i runs from vertex i to vertex i + 1. */
export const partSchema = z.strictObject({
  ring: z.number().int().min(0),
  edge: z.number().int().min(0),
  from: z.number().min(0).max(1).default(0),
  to: z.number().min(0).max(1).default(1),
});

export const terminalSchema = z.strictObject({
  name: z.string().trim().min(1).max(100),
  segments: z.array(z.tuple([pointSchema, pointSchema])).optional(),
  parts: z.array(partSchema).optional(),
});

/** Border of a region of another medium: a polygon in the outline's unit. */
export const regionRingSchema = z.array(pointSchema);

export type Point = z.output<typeof pointSchema>;
export type RingElement = Point | z.output<typeof arcSchema>;
export type OutlineInput = z.output<typeof outlineSchema>;
export type TerminalInput = z.output<typeof terminalSchema>;

/** What `checkOutline` takes; the rings of the medium's regions in the order of `medium.regions`. */
export interface OutlineRequest {
  readonly outline: OutlineInput;
  readonly terminals: readonly TerminalInput[];
  readonly regions?: ReadonlyArray<readonly Point[]>;
}

/** A complaint about one member of the request body, its pointer such as `#/outline/outer/3`. */
export type OutlineError = Problem;
