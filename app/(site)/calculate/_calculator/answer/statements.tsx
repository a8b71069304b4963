import type { ReactNode } from "react";
import type { ShapeEntry } from "@/lib/engine";
import type { ResistanceResult } from "@/lib/engine/resistance/result-schema";
import { Notice } from "../../../../_ui/notice";
import { ProseText } from "../../../../_ui/prose-text";
import { CHECK_TITLES, PROVENANCE } from "./words";

/** Cautions of the shape and of this very answer; they stand close to the number. */
export function Cautions({ cautions }: { readonly cautions: readonly string[] }) {
  if (cautions.length === 0) return null;
  return (
    <Notice tone="caution" title={cautions.length > 1 ? "Cautions" : "Caution"}>
      <ul className={cautions.length > 1 ? "list-disc ps-2" : ""}>
        {cautions.map((caution) => (
          <li key={caution}>{caution}</li>
        ))}
      </ul>
    </Notice>
  );
}

/** The engine's checks on this answer. */
export function Checks({ checks }: { readonly checks: NonNullable<ResistanceResult["checks"]> }) {
  return (
    <div className="relative overflow-x-auto" tabIndex={0} role="group" aria-label="Checks">
      <table className="w-full border-collapse text-table">
        <thead className="text-small text-ink-soft">
          <tr>
            <th scope="col" className="pe-2 text-start font-normal">
              Check
            </th>
            <th scope="col" className="pe-2 text-start font-normal">
              Outcome
            </th>
            <th scope="col" className="text-start font-normal">
              Deviation
            </th>
          </tr>
        </thead>
        <tbody>
          {checks.map((check) => (
            <tr key={check.name} className="border-t border-rule align-top">
              <th scope="row" className="py-0.5 pe-2 text-start font-normal">
                {CHECK_TITLES[check.name] ?? check.name}
              </th>
              <td
                className={`py-0.5 pe-2 ${check.applies ? (check.passed ? "text-verdigris" : "text-oxide") : "text-ink-soft"}`}
              >
                {check.applies ? (check.passed ? "✓ passed" : "✗ failed") : "does not apply"}
              </td>
              <td className="py-0.5">
                {check.applies ? (
                  <span className="font-mono">
                    {small(check.deviation)} of {small(check.tolerance)} allowed
                  </span>
                ) : (
                  <span className="text-ink-soft">{check.reason}</span>
                )}
              </td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}

function small(value: number | undefined): string {
  if (value === undefined) return "–";
  return value === 0 ? "0" : value.toExponential(1);
}

interface GroundsProps {
  readonly entry: ShapeEntry;
  readonly result: ResistanceResult | undefined;
}

/** What the answer assumes, where its law holds, and where it comes from. */
export function Grounds({ entry, result }: GroundsProps) {
  const assumptions = result?.assumptions ?? entry.assumptions;
  const sources = result?.sources ?? entry.sources;
  return (
    <div className="grid gap-x-4 gap-y-3 medium:grid-cols-2">
      <Lines title="Assumptions" lines={assumptions} />
      <Lines title="Where the law holds" lines={entry.validity} />
      <section>
        <h3 className="mb-0.5">Sources</h3>
        <ul className="grid gap-0.5 text-table">
          {sources.map(({ title, detail, provenance }) => (
            <li key={`${title}${detail ?? ""}`}>
              <ProseText text={title} />
              {detail ? <>: {detail}</> : null}{" "}
              <span className="text-small text-ink-soft">({PROVENANCE[provenance] ?? provenance})</span>
            </li>
          ))}
        </ul>
      </section>
      {result ? (
        <section>
          <h3 className="mb-0.5">Versions</h3>
          <p className="text-table">
            Engine {result.engine}, catalogue {result.catalogue}
          </p>
        </section>
      ) : null}
    </div>
  );
}

function Lines({ title, lines }: { readonly title: string; readonly lines: readonly string[] }): ReactNode {
  if (lines.length === 0) return null;
  return (
    <section>
      <h3 className="mb-0.5">{title}</h3>
      <ul className="grid list-disc gap-0.5 ps-2 text-table">
        {lines.map((line) => (
          <li key={line}>{line}</li>
        ))}
      </ul>
    </section>
  );
}
