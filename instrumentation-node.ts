import type { Instrumentation } from "next";
import { prepareIncomingRequests } from "@/lib/http/incoming-requests";
import { startRounds } from "@/lib/mail/rounds";
import { closeSharedService, sharedService } from "@/lib/service/service";

/** What the start script emits on the first signal. */
const STOP_EVENT = "rhoform:stop";

/** Opens and migrates the database, warms the threads, begins the rounds, and sees to it that all of it is closed at the end. */
export async function openForRequests(): Promise<void> {
  prepareIncomingRequests();
  process.once("exit", closeSharedService);
  // Event streams and jobs end as soon as the server is told to stop, so that it can.
  const stopRounds = startRounds(sharedService());
  process.once(STOP_EVENT, () => {
    stopRounds();
    sharedService().fields.close();
  });
  await sharedService().fields.open();
}

/** Writes a failed page to the structured log; the path without its query, which may carry a key. */
export function logPageFailure(
  ...[error, request, context]: Parameters<Instrumentation.onRequestError>
): void {
  sharedService().log.error({
    event: "page-failed",
    path: request.path.split("?")[0],
    method: request.method,
    route: context.routePath,
    digest:
      typeof error === "object" && error !== null && "digest" in error ? String(error.digest) : undefined,
    error: error instanceof Error ? (error.stack ?? error.message) : String(error),
  });
}
