import type { Total } from "../usage/_parts/usage-answers";
import { countText, msText, shareText } from "./numbers";

/** The sums of a time as a row of figures. */
export function Figures({ total }: { readonly total: Total }) {
  const { requests, computations, refused, failed, p50Ms, p95Ms, p99Ms } = total;
  return (
    <dl className="grid grid-cols-2 gap-px rounded border border-rule bg-rule medium:grid-cols-4">
      <Figure title="Requests" value={countText(requests)} />
      <Figure title="Computations" value={countText(computations)} />
      <Figure
        title="Refused or failed"
        value={countText(refused)}
        more={
          requests > 0
            ? `${shareText(refused, requests)} of the requests; ${countText(failed)} failed`
            : undefined
        }
      />
      <Figure
        title="Latency, median"
        value={msText(p50Ms)}
        more={
          requests > 0
            ? `95\u00a0% under ${msText(p95Ms)}, 99\u00a0% under ${msText(p99Ms)}`
            : "no call to measure"
        }
      />
    </dl>
  );
}

interface FigureProps {
  readonly title: string;
  readonly value: string;
  readonly more?: string;
}

function Figure({ title, value, more }: FigureProps) {
  return (
    <div className="bg-sheet px-1.5 py-1">
      <dt className="text-small text-ink-soft">{title}</dt>
      <dd>
        <span className="font-mono text-h2">{value}</span>
        {more ? <span className="block text-small text-ink-soft">{more}</span> : null}
      </dd>
    </div>
  );
}
