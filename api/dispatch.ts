import { countEmbedCall } from "@/db/queries/embeds";
import { insertUsage } from "@/db/queries/usage";
import { requireAccess } from "@/lib/auth/access";
import { SIGNED_OUT_ID } from "@/lib/auth/principal";
import { abandon, finish, fingerprintOf, readIdempotencyKey, startOrRepeat } from "@/lib/idempotency/repeat";
import { Refusal } from "@/lib/service/refusal";
import type { Service } from "@/lib/service/service";
import { clientKind } from "@/lib/usage/client-kind";
import { discardBody, receiveBody } from "./body";
import { Call } from "./call";
import { corsHeaders, isPreflight, preflightHeaders, requireOrigin } from "./cors";
import { BASE_PATH } from "./base-path";
import { negotiate } from "./negotiate";
import type { Handled, Operation, Outcome, Prepared } from "./operation";
import { refusalOf } from "./refusal-of";
import type { Match, RouteTable } from "./route-table";
import { answerOf, type Answer, problemAnswer, respond } from "./respond";

/** What is known of a call once it is over, for the usage and the log. */
interface Report {
  operation: Operation | undefined;
  accepts: string;
  shape: string | null;
  computations: number;
  /** Reserved computations that a job goes on holding. */
  held: number;
  /** The call was counted in the transaction that made its change. */
  counted: boolean;
}

/**
 * Answers one call: request id, authentication, limits, input, work, metering, answer. Pure of any framework: whoever
 * has a Request and a service can serve the registry. Never throws; a defect is a 500 without particulars.
 */
export async function dispatch(request: Request, service: Service, registry: RouteTable): Promise<Response> {
  const call = new Call(request, service);
  const match = registry.match(request.method, call.url.pathname.slice(BASE_PATH.length));
  if (request.method === "OPTIONS" && match) return options(call, match);

  const report: Report = {
    operation: match?.operation,
    accepts: "application/json",
    shape: null,
    computations: 0,
    held: 0,
    counted: false,
  };
  let answer: Answer;
  try {
    answer = await work(call, registry, match, report);
  } catch (error) {
    const refusal = refusalOf(error, call);
    answer = problemAnswer(refusal, call.requestId, service.config.origin, report.accepts);
  }
  try {
    await discardBody(request);
    await call.settle(report.computations + report.held);
    await countOnce(call, report, answer.status);
    log(call, report, answer.status);
    return await finished(call, notModified(call, answer), request.method === "HEAD");
  } catch (error) {
    // Not even metering went through, for instance because another process holds the database.
    const refusal = refusalOf(error, call);
    answer = problemAnswer(refusal, call.requestId, service.config.origin, report.accepts);
    return respond(answer, {
      requestId: call.requestId,
      secure: service.config.origin.startsWith("https:"),
      limits: [],
      cors: [],
      bodyless: request.method === "HEAD",
    });
  }
}

async function work(
  call: Call,
  registry: RouteTable,
  match: Match | undefined,
  report: Report,
): Promise<Answer> {
  const { request, service, url, headers } = call;
  const operation = match?.operation;
  const negotiated = operation && negotiation(operation, call);
  if (typeof negotiated === "string") report.accepts = negotiated;

  const principal = await call.admit();
  if (!match) throw new Refusal("unknown-path", `There is nothing at ${url.pathname.slice(0, 200)}.`);
  if (!operation) {
    throw new Refusal("method-not-allowed", `This path takes ${match.allow.join(", ")}.`, {
      headers: { Allow: match.allow.join(", ") },
    });
  }
  requireOrigin(principal, headers, service.config.origin);
  requireAccess(principal, operation.scope);
  if (principal.kind === "embed" && !operation.widgets && operation.scope !== "none") {
    throw new Refusal("insufficient-scope", "A widget's frame computes; this call is not for it.");
  }
  if (negotiated instanceof Refusal) throw negotiated;

  const body = operation.request.body && (await receiveBody(request, operation.request.body));
  const prepared = operation.prepare({ path: match.path, query: url.searchParams, body });
  const idempotencyKey =
    prepared.stores && principal.kind === "key"
      ? readIdempotencyKey(headers.get("idempotency-key"))
      : undefined;
  if (idempotencyKey === undefined) return await perform(call, registry, prepared, report);

  const key = { owner: principal.kind === "key" ? principal.id : "", key: idempotencyKey };
  const fingerprint = fingerprintOf(request.method, url.pathname + url.search, body?.bytes);
  const repeated = startOrRepeat(service.db, key, fingerprint, call.now);
  if (repeated) return repeated;
  try {
    return await perform(call, registry, prepared, report, (answer, outcome) => {
      const body = outcome.repeat === undefined ? String(answer.body ?? "") : JSON.stringify(outcome.repeat);
      finish(service.db, key, { status: answer.status, headers: answer.headers, body }, call.now);
    });
  } catch (error) {
    abandon(service.db, key);
    throw error;
  }
}

/** Runs the handler; a change, the answer kept for repeats and the count are one transaction. */
async function perform(
  call: Call,
  registry: RouteTable,
  prepared: Prepared,
  report: Report,
  keep?: (answer: Answer, outcome: Outcome) => void,
): Promise<Answer> {
  const { service, principal } = call;
  if (!principal) throw new Error("A call is performed before its caller is known.");
  await call.reserve(prepared.reserve);
  const handled: Handled = await prepared.handle({
    service,
    principal,
    requestId: call.requestId,
    now: call.now,
    url: call.url,
    headers: call.headers,
    accepts: report.accepts,
    registry,
    reserve: (computations) => call.reserve(computations),
  });
  const done = await service.commits.run(() => {
    const outcome = "commit" in handled ? handled.commit() : handled;
    const answer = answerOf(outcome.status, outcome.content, outcome.headers);
    keep?.(answer, outcome);
    const facts = {
      shape: outcome.shape ?? null,
      computations: outcome.computations ?? 0,
      held: outcome.held ?? 0,
    };
    count(call, { ...report, ...facts }, answer.status);
    return { answer, facts };
  });
  // Only now, when nothing can be rolled back any more.
  Object.assign(report, done.facts, { counted: true });
  return done.answer;
}

/** Agreed before the caller is known, so that a refusal to a spreadsheet is text as well; told after. */
function negotiation(operation: Operation, call: Call): string | Refusal {
  try {
    return negotiate(operation.produces, call.headers, call.url.searchParams);
  } catch (error) {
    if (error instanceof Refusal) return error;
    throw error;
  }
}

/** Counts a call that ended without a change of its own. */
async function countOnce(call: Call, report: Report, status: number): Promise<void> {
  const { principal, service } = call;
  if (report.counted || !principal || principal.kind === "anonymous") return;
  await service.commits.run(() => count(call, report, status));
}

function count(call: Call, report: Report, status: number): void {
  const { principal } = call;
  if (!principal || principal.kind === "anonymous") return;
  insertUsage(call.service.db, {
    at: call.now,
    requestId: call.requestId,
    keyId: principal.kind === "signed-out" ? SIGNED_OUT_ID : principal.id,
    teamId: principal.kind === "signed-out" ? "" : principal.teamId,
    operation: report.operation?.id ?? "none",
    shape: report.shape,
    status,
    latencyUs: Math.round((performance.now() - call.started) * 1000),
    computations: report.computations,
    client: clientKind(call.headers.get("user-agent")),
  });
  if (principal.kind === "embed") {
    const { id: embedId, host } = principal;
    countEmbedCall(call.service.db, {
      embedId,
      host,
      at: call.now,
      status,
      computations: report.computations,
    });
  }
}

function log(call: Call, report: Report, status: number): void {
  const { principal, service } = call;
  service.log.info({
    requestId: call.requestId,
    method: call.request.method,
    path: call.url.pathname,
    operation: report.operation?.id,
    status,
    ms: Math.round((performance.now() - call.started) * 1000) / 1000,
    computations: report.computations,
    caller:
      principal?.kind === "key" || principal?.kind === "embed"
        ? principal.id
        : (principal?.kind ?? "refused"),
    client: clientKind(call.headers.get("user-agent")),
    address: call.address,
  });
}

/** RFC 9110, 13.1.2: what the client has already is not sent again. */
function notModified(call: Call, answer: Answer): Answer {
  const etag = answer.headers.ETag;
  const wanted = call.headers.get("if-none-match");
  const reads = call.request.method === "GET" || call.request.method === "HEAD";
  if (!reads || answer.status !== 200 || etag === undefined || wanted === null) return answer;
  const weak = (tag: string) => tag.trim().replace(/^W\//, "");
  if (wanted.trim() !== "*" && !wanted.split(",").some((tag) => weak(tag) === weak(etag))) return answer;
  const { "Content-Type": _type, ...headers } = answer.headers;
  return { status: 304, headers, body: null };
}

async function finished(call: Call, answer: Answer, bodyless: boolean): Promise<Response> {
  const { config } = call.service;
  return respond(answer, {
    requestId: call.requestId,
    secure: config.origin.startsWith("https:"),
    limits: await call.limits(),
    cors: corsHeaders(call.principal, call.headers, config.origin),
    bodyless,
  });
}

/** OPTIONS spends nothing and needs no key: a browser's preflight cannot carry one. */
async function options(call: Call, match: Match): Promise<Response> {
  const { config } = call.service;
  const origin = call.headers.get("origin");
  const preflight = isPreflight(call.request) && origin !== null;
  return respond(
    { status: 204, headers: { Allow: match.allow.join(", ") }, body: null },
    {
      requestId: call.requestId,
      secure: config.origin.startsWith("https:"),
      limits: await call.limits(),
      cors: preflight ? preflightHeaders(origin, match.allow) : [],
      bodyless: true,
    },
  );
}
