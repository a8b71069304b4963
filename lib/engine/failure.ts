/**
 * How the engine refuses: a caller's mistake is an InputError with every complaint found, a defect of the engine itself
 * is a CheckFailure. Nothing else is thrown on purpose.
 */

/** One complaint about the input: where (a JSON pointer as a URI fragment) and what, in one sentence. */
export interface Problem {
  readonly pointer: string;
  readonly detail: string;
  /** Where on an outline, in its unit, if the place is no vertex: two edges that cross between their ends. */
  readonly at?: readonly [number, number];
}

/** The request cannot be answered as it stands; `errors` holds every complaint found. */
export class InputError extends Error {
  readonly errors: readonly Problem[];

  constructor(errors: readonly Problem[]) {
    super(errors.map(({ pointer, detail }) => `${pointer}: ${detail}`).join("\n"));
    this.name = "InputError";
    this.errors = errors;
  }
}

/** One of the engine's own checks on a finished answer failed: a defect, never the caller's fault. */
export class CheckFailure extends Error {
  readonly check: string;
  readonly deviation: number;
  readonly tolerance: number;

  constructor(check: string, deviation: number, tolerance: number) {
    super(`The check ${check} failed: deviation ${deviation}, tolerance ${tolerance}.`);
    this.name = "CheckFailure";
    this.check = check;
    this.deviation = deviation;
    this.tolerance = tolerance;
  }
}

/** A JSON pointer (RFC 6901) in URI fragment form, such as `#/dimensions/width`. */
export function pointerTo(base: string, ...path: readonly (string | number | symbol)[]): string {
  let pointer = base;
  for (const part of path) {
    const escaped = String(part).replaceAll("~", "~0").replaceAll("/", "~1");
    pointer += `/${encodeURIComponent(escaped)}`;
  }
  return pointer;
}

/** Collects complaints, so that a caller learns of all of them at once. */
export class Problems {
  private readonly found: Problem[] = [];

  add(pointer: string, detail: string): void {
    this.found.push({ pointer, detail });
  }

  /** Takes over what another check has found. */
  addAll(problems: readonly Problem[]): void {
    this.found.push(...problems);
  }

  get list(): readonly Problem[] {
    return this.found;
  }

  get any(): boolean {
    return this.found.length > 0;
  }

  /** @throws InputError if anything was collected. */
  throwIfAny(): void {
    if (this.found.length > 0) throw new InputError(this.found);
  }
}
