import { hkdfSync, randomBytes } from "node:crypto";
import { mkdirSync, readFileSync, writeFileSync } from "node:fs";
import { join } from "node:path";

/**
 * The secret kept in the data folder, readable by the owner only; made on first use. Two processes that start at once
 * agree: the file is created exclusively, and the loser reads what the winner wrote.
 */
export function keptSecret(dataFolder: string): string {
  const path = join(dataFolder, "secret");
  mkdirSync(dataFolder, { recursive: true, mode: 0o700 });
  try {
    writeFileSync(path, `${randomBytes(32).toString("base64url")}\n`, { flag: "wx", mode: 0o600 });
  } catch (error) {
    if (!(error instanceof Error && "code" in error && error.code === "EEXIST")) throw error;
  }
  const secret = readFileSync(path, "utf8").trim();
  if (secret.length < 16)
    throw new Error("The secret kept in the data folder is damaged: remove the file to make a new one.");
  return secret;
}

/** 32 bytes for one purpose, so that no two uses of the secret share a key. */
export function deriveKey(secret: string, purpose: string): Uint8Array {
  return new Uint8Array(hkdfSync("sha256", secret, "rhoform", purpose, 32));
}
