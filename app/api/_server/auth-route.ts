import "server-only";
import type { z } from "zod";
import { parseBody, receiveBody } from "@/api/body";
import { requireSamePage } from "@/lib/http/same-page";
import { answerPageCall, type PageCall } from "./page-call";

/** Largest body of a sign-in form, bytes. */
const MAX_BYTES = 10_000;

/** A POST of the sign-in pages: from a page of our own only, its body checked. */
export function authRoute<Body extends z.ZodType>(
  schema: Body,
  handle: (body: z.infer<Body>, call: PageCall) => unknown,
): (request: Request) => Promise<Response> {
  const readers = { description: "The form.", schema, maxBytes: MAX_BYTES };
  return (request) =>
    answerPageCall(request, async (call) => {
      requireSamePage(call.headers, call.service.config.origin);
      const body = parseBody(readers, await receiveBody(request, readers), call.url.searchParams);
      return await handle(body, call);
    });
}
