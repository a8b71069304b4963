import { createHash, createHmac, randomBytes, timingSafeEqual } from "node:crypto";
import { bytesToText } from "../service/identifier";

/** The parts of `rho_<id>_<secret>`. */
export interface KeyText {
  readonly id: string;
  readonly secret: string;
}

/** Reads a key; undefined if it does not look like one. */
export function parseKey(text: string): KeyText | undefined {
  const match = /^rho_([0-9A-Za-z]{4,40})_([0-9A-Za-z]{43})$/.exec(text);
  return match ? { id: match[1], secret: match[2] } : undefined;
}

export function formatKey({ id, secret }: KeyText): string {
  return `rho_${id}_${secret}`;
}

/** A new secret of 256 random bits. */
export function newSecret(): string {
  return bytesToText(randomBytes(32));
}

/** The secret of a demo key: derived, so that it can be printed again and is different in every installation. */
export function demoSecret(serviceSecret: string, keyId: string): string {
  return bytesToText(createHmac("sha256", serviceSecret).update(`rhoform demo key ${keyId}`).digest());
}

/** The password of the demo's administrator: derived in the same way. 95 bits in four groups. */
export function demoPassword(serviceSecret: string): string {
  const digest = createHmac("sha256", serviceSecret).update("rhoform demo password").digest();
  return (bytesToText(digest).slice(-16).match(/.{4}/g) ?? []).join("-");
}

/** What is stored of a secret. */
export function hashSecret(secret: string): string {
  return createHash("sha256").update(secret).digest("hex");
}

/** Compares a secret with a stored hash in constant time. */
export function secretMatches(secret: string, hash: string): boolean {
  const given = createHash("sha256").update(secret).digest();
  const stored = Buffer.from(hash, "hex");
  return stored.length === given.length && timingSafeEqual(given, stored);
}
