import { z } from "zod";
import type { FieldRow } from "@/db/queries/fields";
import {
  boundaryFlux,
  densityRaster,
  type FieldMap,
  fieldLines,
  type FieldRequest,
  type FieldResult,
  formatQuantity,
  type PlotText,
  plotSvg,
  sampleLine,
} from "@/lib/engine";
import { isFinished } from "@/lib/jobs/field-jobs";
import { Refusal } from "@/lib/service/refusal";
import { type CallContext, defineOperation, json } from "../operation";
import { fieldLineSchema, fieldMapSchema } from "../schemas/field";
import { callersField, viewOf } from "./field-start";
import { fieldId } from "./fields";

interface Solved {
  readonly map: FieldMap;
  readonly request: FieldRequest;
  readonly result: FieldResult;
  readonly names: readonly string[];
}

/** A finished solution with its map. Refuses one that has none (yet). */
async function solved(context: CallContext, id: string): Promise<Solved> {
  const row = callersField(context, id);
  if (row.result === null) {
    const detail = isFinished(row)
      ? `The field solution has the status ${row.status} and no picture.`
      : "The field solution is not finished yet.";
    throw new Refusal("not-ready", detail, isFinished(row) ? {} : { headers: { "Retry-After": "1" } });
  }
  const map = await context.service.fields.files.read(id);
  if (!map) throw new Refusal("not-found", "The map of this field solution is no longer kept.");
  // Both were written by this application from what its schemas had checked.
  const request = JSON.parse(row.request) as FieldRequest;
  const result = JSON.parse(row.result) as FieldResult;
  return { map, request, result, names: (request.terminals ?? []).map(({ name }) => name) };
}

const notReady = [
  { name: "unknown", summary: "Unknown, or of another team", status: 404, path: { id: "fld_0" } },
] as const;

export const readFieldMap = defineOperation({
  id: "readFieldMap",
  method: "GET",
  path: "/fields/{id}/map.json",
  tag: "Fields",
  summary: "Read a field solution's map",
  description:
    "Equipotentials, stream lines with equal shares of the current, a raster of the current density and the flux through each piece of the terminals, all for one volt between the first two terminals.",
  scope: "field",
  request: {
    path: fieldId,
    query: z.strictObject({
      lines: z.coerce
        .number({ error: "must be a whole number." })
        .int({ error: "must be a whole number." })
        .min(2)
        .max(100)
        .default(20)
        .meta({ description: "Shares of voltage and of current between lines, 2 to 100." }),
      resolution: z.coerce
        .number({ error: "must be a whole number." })
        .int({ error: "must be a whole number." })
        .min(8)
        .max(512)
        .default(160)
        .meta({ description: "Cells along the raster's longer side, 8 to 512." }),
    }),
  },
  responses: { 200: { description: "The map.", content: { "application/json": fieldMapSchema } } },
  errors: ["not-found", "not-ready"],
  examples: [
    {
      name: "map",
      summary: "A coarse map",
      status: 200,
      path: { id: "$field" },
      query: { lines: "4", resolution: "8" },
    },
    ...notReady,
  ],
  handler: async ({ path, query }, context) => {
    const { map, request, names } = await solved(context, path.id);
    const lines = fieldLines(map, query.lines, query.lines);
    return json(200, {
      unit: request.outline?.unit,
      per: "volt",
      between: map.between.map((k) => names[k]),
      equipotentials: lines.equipotentials,
      streamlines: lines.streamlines,
      currentBetweenStreamlines: lines.currentBetweenLines,
      raster: densityRaster(map, query.resolution),
      // The engine counts what leaves the conductor; here, as in `conductance`, what a terminal feeds is positive.
      edges: boundaryFlux(map).map(({ terminal, current, ...edge }) => ({
        ...edge,
        terminal: names[terminal],
        current: 0 - current,
      })),
    });
  },
});

/** The bracket with as many digits as tell its ends apart, rounded outward. */
function bracketText({ lower, upper }: { lower: number; upper: number | null }): string {
  if (upper === null) return `above ${formatQuantity(lower, "ohm")}`;
  const digits = Math.min(15, Math.max(3, Math.ceil(-Math.log10((upper - lower) / upper)) + 2));
  const step = 10 ** (Math.floor(Math.log10(upper)) + 1 - digits);
  const [low, high] = [Math.floor(lower / step) * step, Math.ceil(upper / step) * step];
  return `${formatQuantity(low, "ohm", { digits })} … ${formatQuantity(high, "ohm", { digits })}`;
}

/** What the picture says: resistance and bounds, or for three terminals and more those of the pair that it shows. */
export function plotTextOf(
  { resistance, squares, pairs }: FieldResult,
  { between }: FieldMap,
  names: readonly string[],
  unit: string,
): PlotText {
  const [from, to] = between.map((k) => names[k]);
  const pair = pairs?.find(({ between: [a, b] }) => a === from && b === to)?.floating;
  const shown = resistance ?? pair;
  const title = shown ? `R = ${shown.text}${squares ? ` = ${squares.text}` : ""}` : `From ${from} to ${to}`;
  const bracket = shown ? `${bracketText(shown)}, ${shown.proved ? "proved" : "estimated"}.` : "";
  const short = (name: string) => (name.length > 24 ? `${name.slice(0, 23)}…` : name);
  const subtitle = resistance
    ? bracket
    : `From ${short(from)} to ${short(to)}, the others open. ${bracket}`.trim();
  return { title, subtitle, terminalNames: names, unit };
}

export const readFieldPlot = defineOperation({
  id: "readFieldPlot",
  method: "GET",
  path: "/fields/{id}/plot.svg",
  tag: "Fields",
  summary: "Read a field solution's picture",
  description:
    "The finished picture: outline, terminals, current density, equipotentials and stream lines, with scale bar and legend.",
  scope: "field",
  widgets: true,
  produces: ["image/svg+xml"],
  request: { path: fieldId },
  responses: {
    200: {
      description: "The picture.",
      content: { "image/svg+xml": z.string().meta({ description: "SVG." }) },
    },
  },
  errors: ["not-found", "not-ready"],
  examples: [...notReady],
  handler: async ({ path }, context) => {
    const { principal } = context;
    if (principal.kind === "embed" && !principal.definition.show.plots) {
      throw new Refusal("insufficient-scope", "This widget shows no picture of the field.");
    }
    const { map, request, result, names } = await solved(context, path.id);
    const text = plotSvg(map, plotTextOf(result, map, names, request.outline?.unit ?? "m"));
    return { status: 200, content: { kind: "text", text, mediaType: "image/svg+xml" } };
  },
});

const place = (what: string) =>
  z
    .string()
    .regex(/^\s*[-+\d.eE]+\s*,\s*[-+\d.eE]+\s*$/, { error: "must be two numbers with a comma: x,y." })
    .transform((text) => text.split(",").map(Number) as [number, number])
    .refine(([x, y]) => Number.isFinite(x) && Number.isFinite(y), { error: "must be two numbers: x,y." })
    .meta({ description: `${what} of the line, x,y in the outline's unit.`, example: "5,5" });

export const readFieldLine = defineOperation({
  id: "readFieldLine",
  method: "GET",
  path: "/fields/{id}/line",
  tag: "Fields",
  summary: "Read a field solution along a line",
  description:
    "Potential and current density along a straight line, for one volt between the first two terminals.",
  scope: "field",
  request: {
    path: fieldId,
    query: z.strictObject({
      from: place("Start"),
      to: place("End"),
      samples: z.coerce
        .number({ error: "must be a whole number." })
        .int({ error: "must be a whole number." })
        .min(2)
        .max(10_000)
        .default(201)
        .meta({ description: "Samples at equal steps, 2 to 10000." }),
    }),
  },
  responses: { 200: { description: "The samples.", content: { "application/json": fieldLineSchema } } },
  errors: ["not-found", "not-ready"],
  examples: [
    {
      name: "acrossTheTrack",
      summary: "Across the track",
      status: 200,
      path: { id: "$field" },
      query: { from: "25,0", to: "25,10", samples: "5" },
    },
    {
      name: "noNumbers",
      summary: "A place that is none",
      status: 422,
      path: { id: "$field" },
      query: { from: "here", to: "25,10" },
    },
  ],
  handler: async ({ path, query }, context) => {
    const { map, request } = await solved(context, path.id);
    const { distanceM, ...samples } = sampleLine(map, query.from, query.to, query.samples);
    return json(200, { unit: request.outline?.unit, per: "volt", distance: distanceM, ...samples });
  },
});

const encoder = new TextEncoder();

/** One server-sent event. */
function event(row: FieldRow): Uint8Array {
  return encoder.encode(
    `event: ${isFinished(row) ? "end" : "progress"}\ndata: ${JSON.stringify(viewOf(row))}\n\n`,
  );
}

/** Comment lines keep proxies from closing a quiet stream, ms. */
const HEARTBEAT = 15_000;

export const readFieldEvents = defineOperation({
  id: "readFieldEvents",
  method: "GET",
  path: "/fields/{id}/events",
  tag: "Fields",
  summary: "Follow a field solution",
  description:
    "Server-sent events: `progress` with the solution as `GET /fields/{id}` answers it, each time the bracket narrows, and `end` with the finished one; then the stream closes.",
  scope: "field",
  produces: ["text/event-stream"],
  request: { path: fieldId },
  responses: {
    200: {
      description: "The events.",
      content: { "text/event-stream": z.string().meta({ description: "Server-sent events." }) },
    },
  },
  errors: ["not-found"],
  examples: [
    { name: "finished", summary: "One that is finished", status: 200, path: { id: "$field" } },
    ...notReady,
  ],
  handler: ({ path }, context) => {
    const first = callersField(context, path.id);
    const { fields } = context.service;
    let stop = () => {};
    const stream = new ReadableStream<Uint8Array>({
      start: (controller) => {
        controller.enqueue(event(first));
        if (isFinished(first)) return controller.close();
        const beat = setInterval(() => controller.enqueue(encoder.encode(": waiting\n\n")), HEARTBEAT);
        const unwatch = fields.watch(path.id, (row) => {
          controller.enqueue(event(row));
          if (isFinished(row)) end();
        });
        const unend = fields.onClose(() => end());
        stop = () => {
          clearInterval(beat);
          unwatch();
          unend();
        };
        const end = () => {
          stop();
          controller.close();
        };
        // It may have ended between the look above and the watch.
        const now = callersField(context, path.id);
        if (isFinished(now)) {
          controller.enqueue(event(now));
          end();
        }
      },
      cancel: () => stop(),
    });
    return {
      status: 200,
      content: { kind: "stream", stream, mediaType: "text/event-stream" },
      headers: { "Cache-Control": "no-cache, no-transform", "X-Accel-Buffering": "no" },
    };
  },
});
