import { Notice } from "./notice";

/** The members of a problem document that a page shows. */
export interface ProblemShown {
  readonly title: string;
  readonly detail?: string;
  /** Page that explains the problem. */
  readonly type?: string;
  /** Request id, to quote to an administrator. */
  readonly instance?: string;
  readonly errors?: readonly {
    readonly pointer?: string;
    readonly parameter?: string;
    readonly detail: string;
  }[];
}

/** A problem of the API as a person reads it; complaints about fields that the page shows elsewhere are left out. */
export function ProblemNotice({
  problem,
  tone = "problem",
}: {
  readonly problem: ProblemShown;
  readonly tone?: "problem" | "caution";
}) {
  const { title, detail, type, instance, errors = [] } = problem;
  return (
    <Notice tone={tone} title={title}>
      {detail ? <p>{detail}</p> : null}
      {errors.length > 0 ? (
        <ul className="mt-0.5">
          {errors.map((error, index) => (
            <li key={index}>
              <code>{error.pointer ?? error.parameter}</code> {error.detail}
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
