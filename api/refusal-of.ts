import { CheckFailure, InputError } from "@/lib/engine";
import { Refusal } from "@/lib/service/refusal";
import type { Service } from "@/lib/service/service";
import { bodyRefusal } from "./body";

interface FailedCall {
  readonly service: Service;
  readonly requestId: string;
  readonly url: URL;
}

/** What the caller may know of an error; a defect is logged with its stack and told without. */
export function refusalOf(error: unknown, call: FailedCall): Refusal {
  if (error instanceof Refusal) return error;
  if (error instanceof InputError) return bodyRefusal(error.errors);
  call.service.log.error({
    requestId: call.requestId,
    path: call.url.pathname,
    error:
      error instanceof Error
        ? { name: error.name, message: error.message, stack: error.stack }
        : String(error),
  });
  if (error instanceof Error && "code" in error && error.code === "SQLITE_BUSY") {
    return new Refusal("busy", "The database is busy.", { headers: { "Retry-After": "1" } });
  }
  const what =
    error instanceof CheckFailure ? "One of the engine's own checks on the answer failed" : "The call failed";
  return new Refusal("internal", `${what}. Please report the request id.`);
}
