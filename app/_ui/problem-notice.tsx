import { Notice } from "./notice";

/** The members of a problem document that a page shows. */
export interface ProblemShown {
  readonly title: string;
  readonly detail?: string;
  /** Page that explains the problem. */
  readonly type?: string;
  /** Request id, to quote to an administrator. */
  readonly instance?: string;
  readonly errors?: readonly ErrorShown[];
}

export interface ErrorShown {
  readonly pointer?: string;
  readonly parameter?: string;
  readonly detail: string;
}

/** A problem of the API as a person reads it; complaints about fields that the page shows elsewhere are left out. */
export function ProblemNotice({
  problem,
  tone = "problem",
  placeOf,
}: {
  readonly problem: ProblemShown;
  readonly tone?: "problem" | "caution";
  /** How the page calls the place of an error; without it the error's pointer stands there. */
  readonly placeOf?: (error: ErrorShown) => string | undefined;
}) {
  const { title, type, instance, errors = [] } = problem;
  // A document's detail repeats its first error, so that it can be read alone.
  const detail = errors.some((error) => problem.detail?.includes(error.detail)) ? undefined : problem.detail;
  return (
    <Notice tone={tone} title={title}>
      {detail ? <p>{detail}</p> : null}
      {errors.length > 0 ? (
        <ul className="mt-0.5">
          {errors.map((error, index) => (
            <li key={index}>
              <Place error={error} placeOf={placeOf} /> {error.detail}
            </li>
          ))}
        </ul>
      ) : null}
      {type || instance ? (
        <p className="mt-0.5 text-small text-ink-soft">
          {type ? (
            <a className="link" href={type}>
              What this means
            </a>
          ) : null}
          {type && instance ? " · " : null}
          {instance ? <>request {instance}</> : null}
        </p>
      ) : null}
    </Notice>
  );
}

function Place({
  error,
  placeOf,
}: {
  readonly error: ErrorShown;
  readonly placeOf: ((error: ErrorShown) => string | undefined) | undefined;
}) {
  if (!placeOf) return <code>{error.pointer ?? error.parameter}</code>;
  const title = placeOf(error);
  return title === undefined ? null : <strong className="font-semibold">{title}:</strong>;
}
