import { Refusal } from "@/lib/service/refusal";

/** The text of a body, its byte order mark included. @throws Refusal of 400 that names the first byte which is not UTF-8. */
export function decodeText(bytes: Uint8Array): string {
  // In UTF-16 every other byte of plain text is 0, which is valid UTF-8 and no character of any body.
  const wide = (bytes[0] === 0xff && bytes[1] === 0xfe) || (bytes[0] === 0xfe && bytes[1] === 0xff);
  if (wide || bytes[0] === 0 || (bytes.length > 1 && bytes[1] === 0)) {
    throw unreadable("it looks like UTF-16");
  }
  try {
    return new TextDecoder("utf-8", { fatal: true, ignoreBOM: true }).decode(bytes);
  } catch {
    const { place, line } = firstBadByte(bytes);
    const byte = bytes[place].toString(16).toUpperCase().padStart(2, "0");
    throw unreadable(`byte ${place + 1} (0x${byte}, in line ${line}) is part of no character`);
  }
}

function unreadable(why: string): Refusal {
  return new Refusal("malformed-json", `The body is not UTF-8: ${why}. Save or send it as UTF-8.`);
}

const REPLACEMENT = "\uFFFD";

/** Where decoding stops, counted from 0, and the line there, counted from 1. */
function firstBadByte(bytes: Uint8Array): { readonly place: number; readonly line: number } {
  const text = new TextDecoder("utf-8", { ignoreBOM: true }).decode(bytes);
  let place = 0;
  let from = 0;
  for (;;) {
    const at = text.indexOf(REPLACEMENT, from);
    place += Buffer.byteLength(text.slice(from, at < 0 ? undefined : at));
    const written = bytes[place] === 0xef && bytes[place + 1] === 0xbf && bytes[place + 2] === 0xbd;
    if (at < 0 || !written) return { place, line: text.slice(0, Math.max(at, 0)).split("\n").length };
    // The character itself was sent.
    place += 3;
    from = at + 1;
  }
}
