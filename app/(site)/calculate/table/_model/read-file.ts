/** The text of an uploaded file, or why it is no table: what is damaged by a guess is never taken in silence. */

/** Largest file, bytes: as large as the API takes a batch. */
export const MOST_BYTES = 20_000_000;

export type FileReading =
  | { readonly ok: true; readonly text: string; /** What to look at. */ readonly note: string | null }
  | { readonly ok: false; readonly reason: string };

const WORKBOOK = "a workbook; save its sheet as “CSV UTF-8” first";

/** First bytes of files that are often taken for a table. */
const KNOWN: readonly (readonly [readonly number[], string])[] = [
  [[0x89, 0x50, 0x4e, 0x47], "a PNG picture"],
  [[0xff, 0xd8, 0xff], "a JPEG picture"],
  [[0x47, 0x49, 0x46, 0x38], "a GIF picture"],
  [[0x25, 0x50, 0x44, 0x46], "a PDF"],
  [[0x50, 0x4b, 0x03, 0x04], WORKBOOK],
  [[0xd0, 0xcf, 0x11, 0xe0], WORKBOOK],
  [[0x1f, 0x8b], "a packed file; unpack it first"],
];

export async function readFile(file: File): Promise<FileReading> {
  if (file.size > MOST_BYTES) {
    const size = (file.size / 1e6).toLocaleString("en", { maximumFractionDigits: 1 });
    return { ok: false, reason: `“${file.name}” has ${size} MB; a table may have at most 20 MB. Split it.` };
  }
  return readBytes(new Uint8Array(await file.arrayBuffer()), file.name);
}

export function readBytes(bytes: Uint8Array, name: string): FileReading {
  const refuse = (what: string): FileReading => ({
    ok: false,
    reason: `“${name}” is ${what}. A table is text: CSV with commas, semicolons or tabs.`,
  });
  const known = KNOWN.find(([start]) => start.every((byte, k) => bytes[k] === byte));
  if (known) return refuse(known[1]);
  const wide = wideEncoding(bytes);
  const text = wide ? new TextDecoder(wide).decode(bytes) : decoded(bytes, "utf-8");
  if (text !== null && !BINARY.test(text)) return readText(text, null, refuse);
  // Every byte but five is a character there, so only a text without control characters is believed.
  const western = decoded(bytes, "windows-1252");
  if (western === null || BINARY.test(western)) return refuse("no text");
  const note = `“${name}” is not in UTF-8. It was read as Windows-1252 (Western European): look at letters with accents and at µ before you compute, or save it as “CSV UTF-8” and upload it again.`;
  return readText(western, note, refuse);
}

/** Control characters that no text has. */
const BINARY = /[\u0000-\u0008\u000b\u000e-\u001f\u0081\u008d\u008f\u0090\u009d\ufffd]/;

function readText(text: string, note: string | null, refuse: (what: string) => FileReading): FileReading {
  if (isJson(text)) return refuse("JSON, which POST /resistance/batch takes");
  if (/^\s*<[!?a-z]/i.test(text)) return refuse("a page or a drawing in markup");
  return { ok: true, text, note };
}

function isJson(text: string): boolean {
  if (!/^\s*[[{]/.test(text)) return false;
  try {
    JSON.parse(text);
    return true;
  } catch {
    return false;
  }
}

/** Spreadsheets save “Unicode text” so. */
function wideEncoding(bytes: Uint8Array): "utf-16le" | "utf-16be" | null {
  if (bytes[0] === 0xff && bytes[1] === 0xfe) return "utf-16le";
  return bytes[0] === 0xfe && bytes[1] === 0xff ? "utf-16be" : null;
}

function decoded(bytes: Uint8Array, encoding: string): string | null {
  try {
    return new TextDecoder(encoding, { fatal: true }).decode(bytes);
  } catch {
    return null;
  }
}
