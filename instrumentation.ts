import type { Instrumentation } from "next";

/** Runs once before the first request: opens and migrates the database, and sees to it that it is closed at the end. */
export async function register(): Promise<void> {
  if (process.env.NEXT_RUNTIME !== "nodejs") return;
  const { closeSharedService, sharedService } = await import("@/lib/service/service");
  sharedService();
  process.once("exit", closeSharedService);
}

/** What went wrong while rendering a page goes to the structured log; the reader gets only the digest. */
export const onRequestError: Instrumentation.onRequestError = async (error, request, context) => {
  if (process.env.NEXT_RUNTIME !== "nodejs") return;
  const { sharedService } = await import("@/lib/service/service");
  sharedService().log.error({
    event: "page-failed",
    // Without the query: it may carry a key.
    path: request.path.split("?")[0],
    method: request.method,
    route: context.routePath,
    digest:
      typeof error === "object" && error !== null && "digest" in error ? String(error.digest) : undefined,
    error: error instanceof Error ? (error.stack ?? error.message) : String(error),
  });
};
