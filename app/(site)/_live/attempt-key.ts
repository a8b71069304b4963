/** A name for one act of storing: its repeats carry the same one, so that it is done once. */
export function newAttemptKey(): string {
  return [...crypto.getRandomValues(new Uint8Array(16))]
    .map((byte) => byte.toString(16).padStart(2, "0"))
    .join("");
}
