import type { RefusalCode } from "@/lib/service/refusal";
import type { OperationFacts, Operation } from "./operation";

/** Codes that follow from what an operation is: what it asks for, whether it has input, computes or stores. */
function impliedCodes(operation: Operation): RefusalCode[] {
  const { request, scope, method, path } = operation;
  const codes: RefusalCode[] = ["not-acceptable", "too-many-requests", "internal", "busy", "invalid-input"];
  // A key may be sent everywhere; one that does not count is refused everywhere.
  codes.push("ambiguous-credentials", "invalid-key", "expired-key", "revoked-key", "key-not-allowed-in-url");
  codes.push("invalid-token", "origin-not-allowed");
  if (operation.widgets) codes.push("embed-withdrawn");
  if (scope !== "none") codes.push("missing-credentials");
  if (scope !== "none" && scope !== "any") codes.push("insufficient-scope");
  if (request.body) codes.push("malformed-json", "body-too-large", "unsupported-media-type");
  if (operation.computes) codes.push("quota-exhausted");
  if (operation.mayStore) codes.push("invalid-header", "idempotency-key-reused", "request-in-progress");
  if (method === "GET" && path.includes("{")) codes.push("not-found");
  return codes;
}

/** Every problem that an operation may answer with. */
export function problemCodes(operation: Operation): readonly RefusalCode[] {
  const declared: OperationFacts["errors"] = operation.errors;
  return [...new Set([...declared, ...impliedCodes(operation)])].sort();
}
