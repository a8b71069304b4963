/** Raised when the caller wants to stop. */
export class InterruptedError extends Error {
  override readonly name = "InterruptedError";
}

/** Asks the caller now and then whether to go on, without asking at every step. */
export class Interruption {
  private work = 0;

  /** `every` is the amount of work between two questions. */
  constructor(
    private readonly shouldStop: () => boolean,
    private readonly every: number,
  ) {}

  /** Counts work done; throws `InterruptedError` if it is time to ask and the answer is to stop. */
  spend(amount: number): void {
    this.work += amount;
    if (this.work < this.every) return;
    this.work = 0;
    if (this.shouldStop()) throw new InterruptedError("stopped");
  }
}
