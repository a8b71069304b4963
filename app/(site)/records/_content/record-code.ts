import { createHash } from "node:crypto";

/** Digits and letters that nobody mistakes for each other (Crockford's base 32). */
const ALPHABET = "0123456789ABCDEFGHJKMNPQRSTVWXYZ";
const CODE = /^[0-9a-hjkmnp-tv-z]{4}-?[0-9a-hjkmnp-tv-z]{4}$/i;

/** Eight characters for a record, to be read from paper and typed into an address: "7K3M-9QXD". */
export function recordCode(id: string): string {
  const digest = createHash("sha256").update(id).digest();
  let code = "";
  let bits = 0;
  let held = 0;
  for (const byte of digest) {
    held = (held << 8) | byte;
    bits += 8;
    while (bits >= 5 && code.length < 8) {
      bits -= 5;
      code += ALPHABET[(held >> bits) & 31];
    }
    held &= 255;
    if (code.length === 8) break;
  }
  return `${code.slice(0, 4)}-${code.slice(4)}`;
}

/** The code that was typed, as it is printed; null where the text is none. */
export function readRecordCode(text: string): string | null {
  if (!CODE.test(text)) return null;
  const plain = text.replace("-", "").toUpperCase();
  return `${plain.slice(0, 4)}-${plain.slice(4)}`;
}
