import { randomBytes } from "node:crypto";

const ALPHABET = "0123456789ABCDEFGHIJKLMNOPQRSTUVWXYZabcdefghijklmnopqrstuvwxyz";

/** Random bytes are drawn many at a time: a draw costs more than what is drawn. */
let pool = Buffer.alloc(0);
let drawn = 0;

function randomByte(): number {
  if (drawn === pool.length) {
    pool = randomBytes(4096);
    drawn = 0;
  }
  return pool[drawn++];
}

/** Random letters and digits, without bias. */
export function randomText(length: number): string {
  let text = "";
  while (text.length < length) {
    const byte = randomByte();
    // 248 = 4·62: bytes above it would favour the first letters.
    if (byte < 248) text += ALPHABET[byte % 62];
  }
  return text;
}

/** 32 bytes as 43 letters and digits (62^43 > 2^256). */
export function bytesToText(bytes: Uint8Array): string {
  let value = BigInt(`0x${Buffer.from(bytes).toString("hex")}`);
  let text = "";
  for (let i = 0; i < 43; i++) {
    text = ALPHABET[Number(value % 62n)] + text;
    value /= 62n;
  }
  return text;
}

/** An id that cannot be guessed: `rec_` and 95 random bits. */
export function newId(
  prefix:
    "act" | "emb" | "fld" | "lnk" | "mail" | "mat" | "out" | "per" | "rec" | "req" | "sec" | "ses" | "team",
): string {
  return `${prefix}_${randomText(16)}`;
}

/** A key's id: letters and digits only, since `_` separates the parts of a key. */
export function newKeyId(): string {
  return `k${randomText(15)}`;
}
