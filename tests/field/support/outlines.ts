import type { z } from "zod";
import { buildDomain, type Role } from "@/lib/engine/field/outline/build-domain";
import {
  checkOutline,
  type CheckedOutline,
  type OutlineCheck,
} from "@/lib/engine/field/outline/check-outline";
import { meshDomain, type MeshedDomain, type MeshOptions } from "@/lib/engine/field/mesh/mesh-domain";
import {
  outlineSchema,
  regionRingSchema,
  terminalSchema,
  type OutlineError,
} from "@/lib/engine/field/outline/schema";

type OutlineJson = z.input<typeof outlineSchema>;
type TerminalJson = z.input<typeof terminalSchema>;

/** Parses the JSON as the API does, then checks it. */
export function check(
  outline: OutlineJson,
  terminals: TerminalJson[],
  regions?: Array<z.input<typeof regionRingSchema>>,
): OutlineCheck {
  return checkOutline({
    outline: outlineSchema.parse(outline),
    terminals: terminals.map((terminal) => terminalSchema.parse(terminal)),
    regions: regions?.map((ring) => regionRingSchema.parse(ring)),
  });
}

export function accept(...request: Parameters<typeof check>): CheckedOutline {
  const result = check(...request);
  if (!result.ok) throw new Error(result.errors.map((e) => `${e.pointer}: ${e.detail}`).join("\n"));
  return result.outline;
}

/** The complaints, as "pointer: detail"; an empty list when the outline is accepted. */
export function refusals(...request: Parameters<typeof check>): string[] {
  const result = check(...request);
  return result.ok ? [] : result.errors.map((e: OutlineError) => `${e.pointer}: ${e.detail}`);
}

export function meshOf(
  outline: CheckedOutline,
  role: Role = "nominal",
  chordTolerance?: number,
  options?: MeshOptions,
): MeshedDomain {
  return meshDomain(buildDomain(outline, role, chordTolerance), options);
}

export const BEND: OutlineJson = {
  unit: "mm",
  outer: [
    [0, 0],
    [40, 0],
    [40, 10],
    [10, 10],
    [10, 40],
    [0, 40],
  ],
};

export const BEND_TERMINALS: TerminalJson[] = [
  {
    name: "in",
    segments: [
      [
        [40, 0],
        [40, 10],
      ],
    ],
  },
  {
    name: "out",
    segments: [
      [
        [10, 40],
        [0, 40],
      ],
    ],
  },
];

export function rectangle(x0: number, y0: number, x1: number, y1: number): Array<[number, number]> {
  return [
    [x0, y0],
    [x1, y0],
    [x1, y1],
    [x0, y1],
  ];
}

/** A regular polygon, counter-clockwise. */
export function gon(cx: number, cy: number, radius: number, corners: number): Array<[number, number]> {
  return Array.from({ length: corners }, (_, i): [number, number] => {
    const angle = (2 * Math.PI * i) / corners;
    return [cx + radius * Math.cos(angle), cy + radius * Math.sin(angle)];
  });
}

/** Terminals on the short ends of an outline whose edges 3 and 1 are the left and right end of a rectangle. */
export const ENDS: TerminalJson[] = [
  { name: "left", parts: [{ ring: 0, edge: 3 }] },
  { name: "right", parts: [{ ring: 0, edge: 1 }] },
];
