/** What a key may do, with the sentence that the console and the document show. */
export const SCOPES = {
  compute: "compute resistances; store, relabel, replay and delete records",
  field: "store outlines and solve fields on them",
  "materials:read": "read the library's and the team's materials",
  "materials:write": "create, change and retire the team's materials",
  "records:read": "read the team's records",
  "keys:manage": "issue, rotate and revoke keys of the team",
} as const;

export type Scope = keyof typeof SCOPES;

export const SCOPE_NAMES: readonly Scope[] = Object.keys(SCOPES).filter(isScope);

export function isScope(name: string): name is Scope {
  return Object.hasOwn(SCOPES, name);
}
