/** Longest that one computation may hold the process: others wait meanwhile. */
const LONGEST_COMPUTATION_MS = 4_000;

/** Asked by long work of the engine, which has no clock of its own: whether its time is up. */
export function overdueAfter(milliseconds = LONGEST_COMPUTATION_MS): () => boolean {
  const end = performance.now() + milliseconds;
  return () => performance.now() > end;
}
