import { Refusal } from "@/lib/service/refusal";

/** The version that `If-Match` names: `"3"`, or `*` for whichever is current. Undefined where the header is missing. */
export function ifMatchVersion(headers: Headers): number | "any" | undefined {
  const header = headers.get("if-match")?.trim();
  if (header === undefined) return undefined;
  if (header === "*") return "any";
  const version = /^"?(\d{1,9})"?$/.exec(header)?.[1];
  if (version === undefined) {
    throw new Refusal("invalid-header", 'If-Match must carry the version as the ETag gave it, such as "3".');
  }
  return Number(version);
}

/** The same where the header must be there. */
export function requiredVersion(headers: Headers): number | "any" {
  const version = ifMatchVersion(headers);
  if (version !== undefined) return version;
  throw new Refusal("precondition-required", "Send If-Match with the version that the change was made from.");
}

export function versionTag(version: number): string {
  return `"${version}"`;
}
