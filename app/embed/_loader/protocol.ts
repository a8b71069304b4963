/** The loader's side of the messages between a page and the frame in it; what it does not know exactly it drops. */

export type FrameEvent =
  | { readonly type: "ready"; readonly data: object }
  | { readonly type: "size"; readonly height: number }
  | { readonly type: "values"; readonly values: Readonly<Record<string, string>> }
  | { readonly type: "result"; readonly data: object }
  | { readonly type: "error"; readonly data: { readonly code: string; readonly message: string } };

/** No frame is higher, px. */
const HIGHEST = 20_000;

/** Most values that a widget has, and the longest one, as the frame takes them. */
const MOST_VALUES = 80;
const LONGEST_VALUE = 120;

/** What a frame says; undefined for anything that is not exactly a message of the protocol about that widget. */
export function readFrameMessage(message: unknown, embed: string): FrameEvent | undefined {
  if (!isPlain(message) || message.source !== "rhoform" || message.version !== 1) return undefined;
  if (message.embed !== embed || !isPlain(message.data)) return undefined;
  const { type, data } = message;
  switch (type) {
    case "ready":
    case "result":
      return { type, data };
    case "size": {
      const { height } = data;
      const sound = typeof height === "number" && height >= 0 && height <= HIGHEST;
      return sound ? { type, height } : undefined;
    }
    case "values": {
      const values = textsOf(data.values);
      return values ? { type, values } : undefined;
    }
    case "error":
      return typeof data.code === "string" && typeof data.message === "string"
        ? { type, data: { ...data, code: data.code, message: data.message } }
        : undefined;
    default:
      return undefined;
  }
}

function textsOf(values: unknown): Readonly<Record<string, string>> | undefined {
  if (!isPlain(values)) return undefined;
  const entries = Object.entries(values);
  const sound = ([, text]: [string, unknown]): boolean =>
    typeof text === "string" && text.length <= LONGEST_VALUE;
  return entries.length <= MOST_VALUES && entries.every(sound)
    ? (values as Record<string, string>)
    : undefined;
}

export function hostMessage(type: "set" | "compute", embed: string, data: object): object {
  return { source: "rhoform", version: 1, type, embed, data };
}

function isPlain(value: unknown): value is Record<string, unknown> {
  return typeof value === "object" && value !== null && !Array.isArray(value);
}
