/** How long the event loop is kept at a stretch, ms. */
const SLICE_MS = 20;

/** Does work that comes in stretches, and lets other calls have their turn between them. */
export async function workInTurns<Result>(work: Iterator<void, Result>): Promise<Result> {
  for (;;) {
    const end = performance.now() + SLICE_MS;
    do {
      const { done, value } = work.next();
      if (done) return value;
    } while (performance.now() < end);
    await new Promise((resolve) => setImmediate(resolve));
  }
}
