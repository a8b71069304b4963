import type { z } from "zod";
import { pointerTo } from "@/lib/engine";
import { type Complaint, Refusal } from "@/lib/service/refusal";
import { decodeText } from "./decode-text";
import { bodyComplaints } from "./issues";

/** Largest body where an operation names no other limit, bytes. */
export const DEFAULT_MAX_BYTES = 1_000_000;

/** How much of an unwanted body is read and thrown away before the answer, bytes; beyond it the connection is cut. */
const LARGEST_DRAIN = 64_000_000;

/** How the body of an operation is read. */
export interface BodyReaders<Schema extends z.ZodType = z.ZodType> {
  readonly description: string;
  readonly schema: Schema;
  /** What the document shows where it says more than the schema that checks. */
  readonly documented?: () => z.ZodType;
  readonly maxBytes?: number;
  /** Whether it may be left out; then it counts as an empty object. */
  readonly optional?: boolean;
  /** Other media types, turned into what the schema checks. */
  readonly others?: Readonly<
    Record<
      string,
      {
        readonly description: string;
        readonly documented: z.ZodType;
        /** `text` keeps its byte order mark, if it has one. */
        readonly read: (text: string, query: URLSearchParams) => unknown;
      }
    >
  >;
}

export interface ReceivedBody {
  /** Lower case, without parameters; JSON is given as its text was parsed. */
  readonly mediaType: string;
  readonly bytes: Uint8Array;
}

/** Reads the body of a call up to its limit. Throws a Refusal of 413, 415 or 400. */
export async function receiveBody(request: Request, readers: BodyReaders): Promise<ReceivedBody | undefined> {
  const limit = readers.maxBytes ?? DEFAULT_MAX_BYTES;
  const mediaType = checkMediaType(request.headers, readers);
  const declared = Number(request.headers.get("content-length") ?? "0");
  if (!request.body) return empty(readers, mediaType);
  if (declared > limit) throw tooLarge(limit);
  const reader = request.body.getReader();
  const chunks: Uint8Array[] = [];
  let size = 0;
  for (;;) {
    const { done, value } = await reader.read();
    if (done) break;
    size += value.byteLength;
    if (size > limit) {
      await drain(reader, size);
      throw tooLarge(limit);
    }
    chunks.push(value);
  }
  if (size === 0) return empty(readers, mediaType);
  if (mediaType === undefined) throw unsupported(readers);
  return { mediaType, bytes: chunks.length === 1 ? chunks[0] : Buffer.concat(chunks, size) };
}

function tooLarge(limit: number): Refusal {
  return new Refusal("body-too-large", `The body may have at most ${limit.toLocaleString("en")} bytes.`);
}

/** An empty body. What is not JSON is for its own reader to refuse. */
function empty(readers: BodyReaders, mediaType: string | undefined): ReceivedBody | undefined {
  if (readers.optional) return undefined;
  if (mediaType !== undefined && mediaType !== "application/json")
    return { mediaType, bytes: new Uint8Array() };
  throw new Refusal("malformed-json", "The body is empty.");
}

/**
 * Throws away a body that nobody has read, because the call was refused before: the client gets to see the answer, and
 * the connection can be used again.
 */
export async function discardBody(request: Request): Promise<void> {
  if (request.body && !request.bodyUsed && !request.body.locked) await drain(request.body.getReader(), 0);
}

/** Reads on without keeping anything, so that the client gets to see the answer instead of a broken connection. */
async function drain(reader: ReadableStreamDefaultReader<Uint8Array>, from: number): Promise<void> {
  let size = from;
  for (;;) {
    const { done, value } = await reader.read();
    if (done) return;
    size += value.byteLength;
    if (size > LARGEST_DRAIN) {
      await reader.cancel();
      return;
    }
  }
}

function unsupported(readers: BodyReaders): Refusal {
  const types = ["application/json", ...Object.keys(readers.others ?? {})].join(" or ");
  return new Refusal(
    "unsupported-media-type",
    `This call reads ${types} in UTF-8, without content encoding.`,
    {
      headers: { "Accept-Post": ["application/json", ...Object.keys(readers.others ?? {})].join(", ") },
    },
  );
}

/** The media type, or undefined where none is named, which only an empty body may do. */
function checkMediaType(headers: Headers, readers: BodyReaders): string | undefined {
  const encoding = headers.get("content-encoding");
  if (encoding !== null && encoding.toLowerCase() !== "identity") throw unsupported(readers);
  const header = headers.get("content-type");
  if (header === null) return undefined;
  const [type, ...parameters] = header.split(";").map((part) => part.trim().toLowerCase());
  if (type !== "application/json" && !Object.hasOwn(readers.others ?? {}, type)) throw unsupported(readers);
  const charset = parameters
    .find((parameter) => parameter.startsWith("charset="))
    ?.slice(8)
    .replaceAll('"', "");
  if (charset !== undefined && charset !== "utf-8" && charset !== "utf8") throw unsupported(readers);
  return type;
}

/** The value that a body stands for, checked by the operation's schema. */
export function parseBody<Schema extends z.ZodType>(
  readers: BodyReaders<Schema>,
  body: ReceivedBody | undefined,
  query: URLSearchParams,
): z.infer<Schema> {
  const value = body === undefined ? {} : read(readers, body, query);
  const parsed = readers.schema.safeParse(value, { reportInput: true });
  if (parsed.success) return parsed.data;
  throw bodyRefusal(bodyComplaints(readers.schema, parsed.error.issues));
}

/** A 422 with its complaints; the first one is the detail. */
export function bodyRefusal(errors: readonly Complaint[]): Refusal {
  const [first] = errors;
  const more = errors.length > 1 ? ` (and ${errors.length - 1} more)` : "";
  const place = "pointer" in first ? first.pointer : first.parameter;
  return new Refusal("invalid-input", `${place === "#" ? "The body" : place} ${first.detail}${more}`, {
    errors,
  });
}

function read(readers: BodyReaders, body: ReceivedBody, query: URLSearchParams): unknown {
  const text = decodeText(body.bytes);
  const other = readers.others?.[body.mediaType];
  if (other) return other.read(text, query);
  let value: unknown;
  try {
    value = JSON.parse(text.startsWith("\uFEFF") ? text.slice(1) : text);
  } catch (error) {
    const place = /position \d+(?: \(line \d+ column \d+\))?/.exec(
      error instanceof Error ? error.message : "",
    );
    throw new Refusal(
      "malformed-json",
      `The body is not JSON${place ? `: reading stopped at ${place[0]}` : ""}.`,
    );
  }
  if (MAY_NAME_PROTOTYPE.test(text)) refusePrototypes(value);
  return value;
}

/** The name itself, or a letter of it written as an escape. */
const MAY_NAME_PROTOTYPE = /__proto__|\\u00/i;

/**
 * Refuses members called `__proto__`. Schemas and copies of objects pass over just this name, so it would be neither
 * used nor told, and a record would keep it.
 */
function refusePrototypes(body: unknown): void {
  const errors: Complaint[] = [];
  // Not by recursion: a body may be nested deeper than the stack.
  const open: (readonly [unknown, string])[] = [[body, "#"]];
  for (let next = open.pop(); next; next = open.pop()) {
    const [value, pointer] = next;
    if (typeof value !== "object" || value === null) continue;
    for (const [name, member] of Object.entries(value)) {
      if (name === "__proto__") {
        errors.push({ pointer: pointerTo(pointer, name), detail: "is not known here." });
      } else if (typeof member === "object") open.push([member, pointerTo(pointer, name)]);
    }
  }
  if (errors.length > 0) throw bodyRefusal(errors.slice(0, 50));
}
