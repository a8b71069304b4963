import { hash, hashSync, verify, verifySync } from "@node-rs/argon2";

/** Argon2id with 19 MiB and two passes (OWASP's first choice of 2023 for one thread). 2 stands for argon2id. */
const PARAMETERS = { algorithm: 2, memoryCost: 19_456, timeCost: 2, parallelism: 1 } as const;

export const SHORTEST_PASSWORD = 12;
export const LONGEST_PASSWORD = 200;

/** The hash of a random text nobody knows: checked where there is no account, so that the answer takes as long. */
const NOBODY =
  "$argon2id$v=19$m=19456,t=2,p=1$7rDb0XxX6Nou4ypdVAKKTw$ew4WuJJLI5lDVcL9JgbwiXOjhEsZRJoIDbbgFNhhFj0";

export function hashPassword(password: string): Promise<string> {
  return hash(password.normalize("NFC"), PARAMETERS);
}

/** For the seed, which is one transaction and so cannot wait. */
export function hashPasswordNow(password: string): string {
  return hashSync(password.normalize("NFC"), PARAMETERS);
}

/** Whether a password is the one of that hash. Without a hash the answer is no, after the same time. */
export async function passwordMatches(password: string, stored: string | null | undefined): Promise<boolean> {
  const matches = await verify(stored ?? NOBODY, password.normalize("NFC"));
  return matches && stored != null;
}

export function passwordMatchesNow(password: string, stored: string | null): boolean {
  return stored !== null && verifySync(stored, password.normalize("NFC"));
}

/**
 * What is wrong with a password that somebody chooses, as a clause that begins at its verb; undefined if nothing.
 * Length is what counts; no rules about kinds of characters.
 */
export function passwordComplaint(password: string, email: string): string | undefined {
  const length = [...password].length;
  if (length < SHORTEST_PASSWORD) return `must have at least ${SHORTEST_PASSWORD} characters.`;
  if (length > LONGEST_PASSWORD) return `must have at most ${LONGEST_PASSWORD} characters.`;
  const plain = password.toLowerCase();
  if (new Set(plain).size < 5) return "must have at least five different characters.";
  const [name] = email.toLowerCase().split("@");
  const bare = plain
    .replace(name, "")
    .replace(email.toLowerCase(), "")
    .replace(/rhoform|password/g, "");
  if (bare.length < SHORTEST_PASSWORD / 2) return "must not be made of your address or the word itself.";
  return undefined;
}
