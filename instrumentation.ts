import type { Instrumentation } from "next";

/** Runs once before the first request. */
export async function register(): Promise<void> {
  // Written this way round, bundles for other runtimes leave the import out.
  if (process.env.NEXT_RUNTIME === "nodejs") {
    const { openForRequests } = await import("./instrumentation-node");
    await openForRequests();
  }
}

/** What went wrong while a page was rendered goes to the log; the reader gets only the digest. */
export const onRequestError: Instrumentation.onRequestError = async (error, request, context) => {
  if (process.env.NEXT_RUNTIME === "nodejs") {
    const { logPageFailure } = await import("./instrumentation-node");
    logPageFailure(error, request, context);
  }
};
