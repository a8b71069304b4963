/**
 * A sketch behind the "#" of the page's address: the API's own body as JSON, packed where it would be long. It never
 * reaches a server's log, and a link reproduces the page.
 */
import { fieldBody } from "./field-body";
import { readBodyText } from "./read-body";
import type { Sketch } from "./sketch";

/** The query of an address that asks for what this tab kept before it was left for signing in. */
export const KEPT_QUERY = "kept";

/** Plain JSON up to this length; packed beyond. */
const LONGEST_PLAIN = 1500;

export async function sketchToHash(sketch: Sketch): Promise<string> {
  const text = JSON.stringify(fieldBody(sketch));
  return plainHash(text) ?? packedHash(await pump(encoded(text), new CompressionStream("deflate-raw")));
}

/** The body's JSON as it is; null where it is too long for that. */
export function plainHash(text: string): string | null {
  return text.length <= LONGEST_PLAIN ? `body=${encodePlain(text)}` : null;
}

/** `packed` is the body's JSON in UTF-8, compressed as "deflate-raw". */
export function packedHash(packed: Uint8Array): string {
  return `packed=${toBase64(packed)}`;
}

function encoded(text: string): Uint8Array<ArrayBuffer> {
  return new TextEncoder().encode(text);
}

/** The sketch behind the "#", without it; null where there is none or it cannot be read. */
export async function sketchFromHash(hash: string, around: Sketch): Promise<Sketch | null> {
  const [name, value] = [hash.slice(0, hash.indexOf("=")), hash.slice(hash.indexOf("=") + 1)];
  try {
    if (name === "body") return taken(decodeURIComponent(value), around);
    if (name !== "packed") return null;
    const bytes = await pump(fromBase64(value), new DecompressionStream("deflate-raw"));
    return taken(new TextDecoder().decode(bytes), around);
  } catch {
    return null;
  }
}

function taken(text: string, around: Sketch): Sketch | null {
  const reading = readBodyText(text, around);
  return reading.ok ? reading.sketch : null;
}

/** Brackets, colons and commas stay as they are, so that the address can be read; quotes must not. */
function encodePlain(text: string): string {
  return encodeURIComponent(text).replace(/%(?:5B|5D|7B|7D|3A|2C|2F|2B|3D|40)/g, (code) =>
    decodeURIComponent(code),
  );
}

async function pump(bytes: Uint8Array<ArrayBuffer>, through: GenericTransformStream): Promise<Uint8Array> {
  const stream = new Blob([bytes])
    .stream()
    .pipeThrough(through as ReadableWritablePair<Uint8Array, BufferSource>);
  return new Uint8Array(await new Response(stream).arrayBuffer());
}

function toBase64(bytes: Uint8Array): string {
  let binary = "";
  for (const byte of bytes) binary += String.fromCharCode(byte);
  return btoa(binary).replaceAll("+", "-").replaceAll("/", "_").replace(/=+$/, "");
}

function fromBase64(text: string): Uint8Array<ArrayBuffer> {
  const binary = atob(text.replaceAll("-", "+").replaceAll("_", "/"));
  return Uint8Array.from(binary, (c) => c.charCodeAt(0));
}
