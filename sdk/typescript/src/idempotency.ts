/**
 * Calls whose repeat would not be the same: issuing and rotating a key is answered a second time without the secret,
 * a replay may start another solution.
 */
const ONCE = /\/(keys|keys\/[^/]+\/rotate|records\/[^/]+\/replay)$/;

/** A call that may store something gets a key of its own, so that a broken connection can be tried again. */
export function withIdempotencyKey(request: Request): Request {
  const path = new URL(request.url).pathname;
  if (request.method === "POST" && !request.headers.has("Idempotency-Key") && !ONCE.test(path))
    request.headers.set("Idempotency-Key", freshKey());
  return request;
}

/** Different each time; no secret. Not from `crypto.randomUUID`, which pages served by plain HTTP do not have. */
function freshKey(): string {
  const part = () => Math.random().toString(36).slice(2);
  return `${Date.now().toString(36)}-${part()}${part()}`;
}
