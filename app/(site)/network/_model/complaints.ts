/** Where a complaint of the API belongs on the page. */
import type { ProblemShown } from "../../../_ui/problem-notice";
import { sentence } from "../../calculate/_model/complaints";

/** About one element, by what they concern. */
export interface Complaints {
  readonly name?: string;
  readonly between?: string;
  readonly value?: string;
  /** By the member of the tolerance. */
  readonly tolerance?: Readonly<Record<string, string>>;
}

export interface SortedComplaints {
  /** By the element's id. */
  readonly complaints: ReadonlyMap<number, Complaints>;
  readonly ports: readonly string[];
  readonly uncertainty: string | undefined;
  /** By the limit's name. */
  readonly requirement: ReadonlyMap<string, string>;
  /** What no field stands for. */
  readonly rest: ProblemShown | null;
}

const ELEMENT = /^#\/elements\/(\d+)(?:\/(name|between|resistance|request))?(.*)$/;
const TOLERANCE = /^\/(tolerance|plus|minus|distribution)$/;

/** Complaints that have a place on the page go there; what is left is told as a whole. `ids` are those of the elements asked. */
export function sortComplaints(problem: ProblemShown | null, ids: readonly number[]): SortedComplaints {
  const complaints = new Map<number, Complaints>();
  const ports: string[] = [];
  const uncertainty: string[] = [];
  const requirement = new Map<string, string>();
  const rest: { pointer?: string; detail: string }[] = [];
  for (const { pointer = "#", detail } of problem?.errors ?? []) {
    const [, index, member, path = ""] = ELEMENT.exec(pointer) ?? [];
    if (index === undefined) {
      if (pointer.startsWith("#/ports")) ports.push(detail);
      else if (pointer.startsWith("#/uncertainty")) uncertainty.push(sentence(detail));
      else if (pointer.startsWith("#/requirement")) {
        // What concerns both limits stands at the second.
        requirement.set(pointer.split("/")[2] ?? "max", sentence(detail));
      } else rest.push({ pointer, detail });
      continue;
    }
    const id = ids[Number(index)];
    const known = complaints.get(id) ?? {};
    const [, side] = (member === "resistance" && TOLERANCE.exec(path)) || [];
    if (side !== undefined) {
      // The choice of the distribution has no mark of its own.
      const field = side === "distribution" ? "tolerance" : side;
      const tolerance = { [field]: sentence(detail), ...known.tolerance };
      complaints.set(id, { ...known, tolerance });
      continue;
    }
    const place = member === "name" || member === "between" ? member : "value";
    // A request has many members, a resistance one.
    const within = member === "request" ? (path.split("/").pop() ?? "") : "";
    const said = within === "" ? sentence(detail) : `${within} ${detail}`;
    if (known[place] === undefined) complaints.set(id, { ...known, [place]: said });
  }
  const [first] = uncertainty;
  return {
    complaints,
    ports,
    uncertainty: first,
    requirement,
    rest: restOf(problem, rest),
  };
}

/** How the page calls the place of a complaint, where it lies in an element; `names` are those of the elements asked. */
export function elementAt(pointer: string, names: readonly string[]): string | undefined {
  const [, index] = ELEMENT.exec(pointer) ?? [];
  const name = index === undefined ? undefined : names[Number(index)];
  return name === undefined ? undefined : `Element ${name}`;
}

function restOf(
  problem: ProblemShown | null,
  rest: NonNullable<ProblemShown["errors"]>,
): ProblemShown | null {
  if (!problem || !problem.errors || problem.errors.length === 0) return problem;
  return rest.length > 0 ? { ...problem, detail: undefined, errors: rest } : null;
}
