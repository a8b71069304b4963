/** An outline to keep for later: checked, cleaned, its terminals named by what is left of its edges. */
import { z } from "zod";
import { InputError, Problems } from "../../failure";
import { addSchemaComplaints } from "../../schema-complaints";
import { type CheckedOutline, checkOutline } from "../outline/check-outline";
import {
  outlineSchema,
  type Point,
  type RingElement,
  type TerminalInput,
  terminalSchema,
} from "../outline/schema";
import type { StoredOutline } from "./prepare-field";

const LONGEST_NAME = 100;

export const outlineRequestSchema = z
  .strictObject({
    name: z
      .string()
      .trim()
      .max(LONGEST_NAME)
      // A pattern would stand in the OpenAPI document with its flag, which JSON Schema does not know.
      .refine((name) => !/\p{Cc}/u.test(name), "must be one line.")
      .default("")
      .meta({ description: "What the team calls it; shown where one is chosen.", example: "Track, rev B" }),
    outline: outlineSchema,
    terminals: z
      .array(terminalSchema)
      .max(64)
      .default([])
      .meta({ description: "Terminals to keep with the outline; a field solution may bring its own." }),
  })
  .meta({ description: "An outline to store." });

export interface CleanedOutline extends StoredOutline {
  /** Empty where it was stored without one. */
  readonly name: string;
  /** What was put right, as sentences. */
  readonly repairs: readonly string[];
}

/**
 * Checks and cleans an outline.
 * @param body `{ name?, outline, terminals? }` as it arrived, or the members of `outline` themselves.
 * @throws InputError with every complaint found.
 */
export function cleanOutline(body: unknown): CleanedOutline {
  if (typeof body !== "object" || body === null || !("outer" in body) || "outline" in body)
    return clean(body);
  const { terminals, name, ...outline } = body as { terminals?: unknown; name?: unknown };
  try {
    return clean({
      outline,
      ...(terminals === undefined ? {} : { terminals }),
      ...(name === undefined ? {} : { name }),
    });
  } catch (error) {
    if (!(error instanceof InputError)) throw error;
    const bare = (pointer: string): string => pointer.replace(/^#\/outline(?=\/|$)/, "#");
    throw new InputError(error.errors.map(({ pointer, detail }) => ({ pointer: bare(pointer), detail })));
  }
}

function clean(body: unknown): CleanedOutline {
  const problems = new Problems();
  const parsed = outlineRequestSchema.safeParse(body, { reportInput: true });
  if (!parsed.success) {
    addSchemaComplaints(outlineRequestSchema, parsed.error.issues, "#", problems);
    throw new InputError(problems.list);
  }
  const { name, outline, terminals } = parsed.data;
  const check = checkOutline({ outline, terminals }, { leastTerminals: 0 });
  if (!check.ok) throw new InputError(check.errors);
  const submitted = [outline.outer, ...outline.holes];
  const [outer, ...holes] = submitted.map((ring, r) => cleanRing(ring, check.outline, r));
  return {
    name,
    outline: { ...outline, outer, holes },
    terminals: terminals.map((terminal) => onCleanedEdges(terminal, submitted, check.outline)),
    repairs: check.outline.repairs,
  };
}

function cleanRing(ring: readonly RingElement[], { rings }: CheckedOutline, r: number): RingElement[] {
  return [...rings[r].source].sort((a, b) => a - b).map((i) => ring[i]);
}

/** Parts on straight edges become segments, which no cleaning moves; parts on arcs get the arc's new number. */
function onCleanedEdges(
  terminal: TerminalInput,
  submitted: readonly (readonly RingElement[])[],
  { rings }: CheckedOutline,
): TerminalInput {
  const segments = [...(terminal.segments ?? [])];
  const parts: NonNullable<TerminalInput["parts"]> = [];
  for (const part of terminal.parts ?? []) {
    const ring = submitted[part.ring];
    const next = ring[(part.edge + 1) % ring.length];
    if (Array.isArray(next)) {
      const a = endOf(ring[part.edge]);
      const at = (t: number): Point => [a[0] + t * (next[0] - a[0]), a[1] + t * (next[1] - a[1])];
      segments.push([part.from === 0 ? a : at(part.from), part.to === 1 ? next : at(part.to)]);
    } else {
      parts.push({ ...part, edge: arcEdge(rings[part.ring], part.edge) });
    }
  }
  return {
    name: terminal.name,
    ...(segments.length > 0 ? { segments } : {}),
    ...(parts.length > 0 ? { parts } : {}),
  };
}

function endOf(element: RingElement): Point {
  return Array.isArray(element) ? element : element.arcTo;
}

/** Number of a submitted arc edge among the vertices that are left, in the order in which they were submitted. */
function arcEdge(ring: CheckedOutline["rings"][number], edge: number): number {
  const order = [...ring.source].sort((a, b) => a - b);
  const from = ring.source[ring.edgeOfSubmitted[edge]];
  return order.indexOf(from);
}
