import "server-only";
import type { Content } from "@/api/operation";
import { refusalOf } from "@/api/refusal-of";
import { answerOf, type Answer, problemAnswer, respond } from "@/api/respond";
import type { BucketState } from "@/lib/limits/limiter";
import { newId } from "@/lib/service/identifier";
import { type Service, sharedService } from "@/lib/service/service";

/** A call of one of our own pages on its way: what is known before anything of it is read. */
export interface PageCall {
  readonly service: Service;
  readonly request: Request;
  readonly url: URL;
  readonly headers: Headers;
  /** Whom the caller's address belongs to, as far as trusted proxies tell. */
  readonly address: string;
  readonly requestId: string;
  /** Unix time, ms. */
  readonly now: number;
}

/** An answer with a status, headers or a form of its own; any other value is answered as JSON with 200. */
export class PageAnswer {
  constructor(
    readonly status: number,
    readonly content: Content,
    readonly headers: Readonly<Record<string, string>> = {},
    readonly setCookies: readonly string[] = [],
  ) {}
}

/** JSON with a status of its own, and perhaps cookies. */
export function json(value: unknown, status = 200, setCookies: readonly string[] = []): PageAnswer {
  return new PageAnswer(status, { kind: "json", value }, {}, setCookies);
}

/** A table as a file to keep. */
export function csv(text: string, fileName: string): PageAnswer {
  return new PageAnswer(
    200,
    { kind: "text", text, mediaType: "text/csv" },
    { "Content-Disposition": `attachment; filename="${fileName}"` },
  );
}

/** Nothing to say but that it was done; perhaps cookies. */
export function done(setCookies: readonly string[] = []): PageAnswer {
  return new PageAnswer(204, { kind: "none" }, {}, setCookies);
}

/**
 * Runs `work` for a call and answers with what it returns, or with the problem it throws. Never throws. A Response is a
 * document of its own, with its own headers, and goes out as it is.
 */
export async function answerPageCall(
  request: Request,
  work: (call: PageCall, limits: BucketState[]) => Promise<unknown>,
): Promise<Response> {
  const service = sharedService();
  const started = performance.now();
  const call: PageCall = {
    service,
    request,
    url: new URL(request.url),
    headers: request.headers,
    address: service.addresses.clientAddress(request.headers),
    requestId: newId("req"),
    now: service.now(),
  };
  const limits: BucketState[] = [];
  let answer: Answer;
  let setCookies: readonly string[] = [];
  let document: Response | undefined;
  try {
    const result = await work(call, limits);
    if (result instanceof Response) {
      document = result;
      answer = answerOf(result.status, { kind: "none" });
    } else if (result instanceof PageAnswer) {
      answer = answerOf(result.status, result.content, result.headers);
      setCookies = result.setCookies;
    } else {
      answer =
        result === undefined
          ? answerOf(204, { kind: "none" })
          : answerOf(200, { kind: "json", value: result });
    }
  } catch (error) {
    answer = problemAnswer(refusalOf(error, call), call.requestId, service.config.origin, "application/json");
  }
  service.log.info({
    requestId: call.requestId,
    method: request.method,
    path: call.url.pathname,
    status: answer.status,
    ms: Math.round((performance.now() - started) * 1000) / 1000,
    caller: "page",
    address: call.address,
  });
  if (document) return document;
  const response = respond(answer, {
    requestId: call.requestId,
    secure: service.config.origin.startsWith("https:"),
    limits,
    cors: [],
    bodyless: request.method === "HEAD",
  });
  for (const cookie of setCookies) response.headers.append("Set-Cookie", cookie);
  return response;
}
