import type { z } from "zod";

/** What a response of an operation carries, for the OpenAPI document. */
export interface ResponseSpec {
  readonly description: string;
  /** By media type; none for an empty answer. */
  readonly content?: Readonly<Record<string, z.ZodType>>;
  /** Response headers beyond those that every answer has. */
  readonly headers?: Readonly<Record<string, string>>;
}

/**
 * A call that means something and is really made: the document carries its answer, computed by the handler itself
 * when the document is built, and a test makes every one of them over HTTP.
 */
export interface Example {
  /** `camelCase`, unique within the operation. */
  readonly name: string;
  readonly summary: string;
  /** The status it is answered with. */
  readonly status: number;
  readonly path?: Readonly<Record<string, string>>;
  readonly query?: Readonly<Record<string, string>>;
  readonly headers?: Readonly<Record<string, string>>;
  readonly body?: unknown;
  /** Media type of the body where it is not JSON; then `body` is its text. */
  readonly mediaType?: string;
  /** Media type asked for, where it is not the preferred one. */
  readonly accept?: string;
}
