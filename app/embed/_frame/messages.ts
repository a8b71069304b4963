/** The messages between a frame and the page around it; both sides check every one. */

export type FrameMessage = "ready" | "size" | "values" | "result" | "error";
export type HostMessage = "set" | "compute";

interface Envelope<Type extends string> {
  readonly source: "rhoform";
  readonly version: 1;
  readonly type: Type;
  readonly embed: string;
  readonly data: unknown;
}

/** Longest text and largest number of values, tolerances among them, that a page around may set. */
const LONGEST_VALUE = 120;
const MOST_VALUES = 80;

export function frameMessage(type: FrameMessage, embed: string, data: unknown): Envelope<FrameMessage> {
  return { source: "rhoform", version: 1, type, embed, data };
}

/** What the page around asks for; undefined for anything that is not exactly such a message. */
export function readHostMessage(
  message: unknown,
  embed: string,
):
  | { readonly type: "set"; readonly values: Readonly<Record<string, string>> }
  | { readonly type: "compute" }
  | undefined {
  if (!isPlain(message)) return undefined;
  const { source, version, type, data } = message;
  if (source !== "rhoform" || version !== 1 || message.embed !== embed) return undefined;
  if (type === "compute") return { type };
  if (type !== "set" || !isPlain(data) || !isPlain(data.values)) return undefined;
  const entries = Object.entries(data.values);
  if (entries.length > MOST_VALUES) return undefined;
  const values: Record<string, string> = {};
  for (const [name, value] of entries) {
    if (typeof value === "number" && Number.isFinite(value)) values[name] = String(value);
    else if (typeof value === "string" && value.length <= LONGEST_VALUE) values[name] = value;
    else return undefined;
  }
  return { type, values };
}

function isPlain(value: unknown): value is Record<string, unknown> {
  return typeof value === "object" && value !== null && !Array.isArray(value);
}
