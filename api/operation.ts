import type { z } from "zod";
import type { Access } from "@/lib/auth/access";
import type { Principal } from "@/lib/auth/principal";
import type { RefusalCode } from "@/lib/service/refusal";
import type { Service } from "@/lib/service/service";
import { type BodyReaders, parseBody, type ReceivedBody } from "./body";
import type { Example, ResponseSpec } from "./documentation";
import type { RouteTable } from "./route-table";
import { parseParameters, parsePathParameters } from "./parameters";

export type Method = "GET" | "POST" | "PATCH" | "DELETE";

/** What a handler knows beside its input. */
export interface CallContext {
  readonly service: Service;
  readonly principal: Principal;
  readonly requestId: string;
  /** Unix time of the call, ms. */
  readonly now: number;
  readonly url: URL;
  readonly headers: Headers;
  /** Media type agreed on for the answer. */
  readonly accepts: string;
  /** Everything that is served here, for what describes it. */
  readonly registry: RouteTable;
  /** Reserves more computations of the month, where only the stored thing tells what the call needs. */
  readonly reserve: (computations: number) => Promise<void>;
}

export type Content =
  | { readonly kind: "json"; readonly value: unknown }
  /** Ready text: a number for a spreadsheet, or JSON that was written before. */
  | { readonly kind: "text"; readonly text: string; readonly mediaType: string }
  | { readonly kind: "stream"; readonly stream: ReadableStream<Uint8Array>; readonly mediaType: string }
  | { readonly kind: "none" };

/** What a call is answered with. */
export interface Outcome {
  readonly status: number;
  readonly content: Content;
  readonly headers?: Readonly<Record<string, string>>;
  /** Shape computed, for the usage. */
  readonly shape?: string;
  /** Computations that count against the month; what was reserved beyond them is given back. */
  readonly computations?: number;
  /** Reserved computations that a job holds on to; it settles them at its end. */
  readonly held?: number;
  /** What is kept for a repeat with the same Idempotency-Key where it differs from the answer: no secrets. */
  readonly repeat?: unknown;
}

/**
 * What a call that changes something is answered with: `commit` makes the change and says the outcome. It runs once,
 * in the transaction that also keeps the answer for repeats and counts the call: all of it happens or nothing.
 * It is synchronous and may throw a Refusal.
 */
export interface Deferred {
  readonly commit: () => Outcome;
}

export type Handled = Outcome | Deferred;

/** A call whose input has been read and found in order. */
export interface Prepared {
  /** Computations reserved before the work. */
  readonly reserve: number;
  /** Whether it stores something, so that an Idempotency-Key counts. */
  readonly stores: boolean;
  readonly handle: (context: CallContext) => Handled | Promise<Handled>;
}

/** What arrived, before any schema looked at it. */
export interface RawInput {
  readonly path: Readonly<Record<string, string>>;
  readonly query: URLSearchParams;
  readonly body: ReceivedBody | undefined;
}

/** What an operation says about itself. */
export interface OperationFacts {
  readonly id: string;
  readonly method: Method;
  /** `/records/{id}`, below `/api/v1`. */
  readonly path: string;
  /** Group in the reference. */
  readonly tag: string;
  readonly summary: string;
  readonly description: string;
  readonly scope: Access;
  /** Whether a widget's frame may call it; its body then holds the values of open inputs only. */
  readonly widgets?: boolean;
  /** Media types it can answer with, the preferred one first; `format=` picks one by its last part. */
  readonly produces: readonly string[];
  /** By status; the problems of `errors` come on top. */
  readonly responses: Readonly<Record<number, ResponseSpec>>;
  readonly errors: readonly RefusalCode[];
  readonly examples: readonly Example[];
  /** Sent with answers of 200, for what rarely changes; others are never stored by caches. */
  readonly cacheControl?: string;
}

/** An operation as the registry keeps it: its input's types are known inside `prepare` only. */
export interface Operation extends OperationFacts {
  readonly request: {
    readonly path?: z.ZodObject;
    readonly query?: z.ZodObject;
    readonly body?: BodyReaders;
  };
  /** Whether it can cost computations of the month. */
  readonly computes: boolean;
  /** Whether it can store something, so that an Idempotency-Key counts. */
  readonly mayStore: boolean;
  readonly prepare: (input: RawInput) => Prepared;
}

interface Definition<
  Path extends z.ZodObject,
  Query extends z.ZodObject,
  Body extends z.ZodType,
> extends Omit<OperationFacts, "produces"> {
  readonly produces?: readonly string[];
  readonly request: {
    readonly path?: Path;
    readonly query?: Query;
    readonly body?: BodyReaders<Body>;
  };
  /** Computations to reserve; 0 where left out. */
  readonly reserve?: (input: Input<Path, Query, Body>) => number;
  readonly stores?: (input: Input<Path, Query, Body>) => boolean;
  readonly handler: (input: Input<Path, Query, Body>, context: CallContext) => Handled | Promise<Handled>;
}

export interface Input<Path extends z.ZodObject, Query extends z.ZodObject, Body extends z.ZodType> {
  readonly path: z.infer<Path>;
  readonly query: z.infer<Query>;
  readonly body: z.infer<Body>;
  /** The query as it came, for operations whose parameters depend on the path. */
  readonly rawQuery: URLSearchParams;
}

/** Declares an operation; the types of its schemas flow into its handler. */
export function defineOperation<
  Path extends z.ZodObject = z.ZodObject<Record<never, never>>,
  Query extends z.ZodObject = z.ZodObject<Record<never, never>>,
  Body extends z.ZodType = z.ZodUndefined,
>(definition: Definition<Path, Query, Body>): Operation {
  const { request, reserve, stores, handler, produces = ["application/json"], ...facts } = definition;
  return {
    ...facts,
    produces,
    request,
    computes: reserve !== undefined,
    mayStore: stores !== undefined,
    prepare: (raw) => {
      // Parsed by the very schemas whose inferred types are named here; one that is left out admits nothing.
      const input = {
        path: parsePathParameters(request.path, raw.path),
        query: parseParameters(request.query, raw.query),
        body: request.body ? parseBody(request.body, raw.body, raw.query) : undefined,
        rawQuery: raw.query,
      } as Input<Path, Query, Body>;
      return {
        reserve: reserve?.(input) ?? 0,
        stores: stores?.(input) ?? false,
        handle: (context) => handler(input, context),
      };
    },
  };
}

/** A JSON answer. */
export function json(
  status: number,
  value: unknown,
  more: Omit<Outcome, "status" | "content"> = {},
): Outcome {
  return { status, content: { kind: "json", value }, ...more };
}
