import type { Client } from "./generated/client/index.js";
import { readResistance as read } from "./generated/sdk.gen.js";
import type { ReadResistanceData, ReadResistanceResponse } from "./generated/types.gen.js";
import type { DimensionsOf, RequestOf, ShapeId } from "./request-types.js";

type Written<Dimensions> = { [Name in keyof Dimensions]: string | number };

type MediumMember =
  "material" | "resistivity" | "conductivity" | "sheetResistance" | "thickness" | "extrapolate";

/** `core.material`, `cladding.resistivity`, …, for shapes of two media. */
type MediaMembers<Request> = Request extends { media: infer Media }
  ? { [Name in `${keyof Media & string}.${MediumMember}`]?: string | number }
  : unknown;

/** The query of one shape: its dimensions by name, the medium by its members, the operating point. */
export type ResistanceQuery<Shape extends ShapeId> = Written<DimensionsOf<Shape>> &
  MediaMembers<RequestOf<Shape>> &
  NonNullable<ReadResistanceData["query"]>;

export interface ReadResistanceOptions<Shape extends ShapeId> {
  readonly client: Client;
  readonly path: { readonly shape: Shape };
  readonly query: ResistanceQuery<Shape>;
  readonly signal?: AbortSignal;
}

/**
 * Computes one resistance by address: `GET /resistance/{shape}`, with the dimensions of that shape as its query.
 * With `format: "text"` the answer is the bare number as a text.
 */
export function readResistance<Shape extends ShapeId>(
  options: ReadResistanceOptions<Shape>,
): Promise<ReadResistanceResponse> {
  const { client, path, signal } = options;
  // What the generator knows of a query is its fixed part; the dimensions travel with it.
  const query: NonNullable<ReadResistanceData["query"]> = options.query;
  return read({ client, path, query, signal });
}
