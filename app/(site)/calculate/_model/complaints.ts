/** Which parameter of the page a complaint of the API is about. */
export interface Complaint {
  readonly pointer?: string;
  readonly detail: string;
}

/** `#/medium/graded/profile/layers/2/value` is `profile.layers/2/value`, `#/media/core/material` is `core.material`. */
export function parameterAt(pointer: string): string | undefined {
  const [place, ...path] = pointer
    .replace(/^#\/?/, "")
    .split("/")
    .map((part) => decodeURIComponent(part).replaceAll("~1", "/").replaceAll("~0", "~"));
  switch (place) {
    case "dimensions":
    case "operating":
    case "requirement":
      return withTolerance(path[0], path[1]);
    case "uncertainty":
      return path[0] === "trials" || path[0] === "seed" ? path[0] : "uncertainty";
    case "solveFor":
    case "target":
      return place;
    case "within":
      return path[0] === "1" ? "to" : "from";
    case "medium":
      return mediumParameter(path, "");
    case "media":
      return path.length === 0 ? undefined : mediumParameter(path.slice(1), `${path[0]}.`);
    default:
      return undefined;
  }
}

/** What is wrong with a tolerance stands at the tolerance's own field. */
function withTolerance(name: string | undefined, part: string | undefined): string | undefined {
  if (part === "plus" || part === "minus") return `${name}.${part}`;
  return part === "tolerance" || part === "distribution" ? `${name}.tolerance` : name;
}

function mediumParameter(path: readonly string[], prefix: string): string | undefined {
  const [member, part, ...rest] = path;
  if (member === undefined) return `${prefix}medium`;
  if (member !== "graded") return withTolerance(`${prefix}${member}`, part);
  if (part === undefined) return `${prefix}graded`;
  if (part === "coordinate") return `${prefix}graded`;
  return part === "profile" ? profileParameter(rest, `${prefix}profile`) : `${prefix}${part}`;
}

function profileParameter(path: readonly string[], name: string): string {
  const [field, ...rest] = path;
  if (field === undefined || field === "kind") return name;
  if (field === "profile") return profileParameter(rest, `${name}.profile`);
  if (field === "layers") return [`${name}.layers`, ...rest].join("/");
  if (field === "positions")
    return [`${name}.table`, ...rest, ...(rest.length > 0 ? ["position"] : [])].join("/");
  if (field === "values") return [`${name}.table`, ...rest, ...(rest.length > 0 ? ["value"] : [])].join("/");
  return withTolerance(`${name}.${field}`, rest[0]) ?? name;
}

/** The first complaint about each parameter, and those that no field of the page stands for. */
export function sortComplaints(complaints: readonly Complaint[]): {
  readonly atField: ReadonlyMap<string, string>;
  readonly elsewhere: readonly Complaint[];
} {
  const atField = new Map<string, string>();
  const elsewhere: Complaint[] = [];
  for (const complaint of complaints) {
    const name = complaint.pointer === undefined ? undefined : parameterAt(complaint.pointer);
    if (name === undefined) elsewhere.push(complaint);
    else if (!atField.has(name)) atField.set(name, sentence(complaint.detail));
  }
  return { atField, elsewhere };
}

/** The API's details go on after the field's name; alone they begin with a capital. */
export function sentence(detail: string): string {
  return detail.charAt(0).toUpperCase() + detail.slice(1);
}
