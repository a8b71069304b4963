import { countText, shareText } from "./numbers";

interface MeterProps {
  readonly used: number;
  readonly quota: number;
  /** What is counted: "computations". */
  readonly what: string;
}

/** How much of a quota is spent, as numbers and as a bar. */
export function Meter({ used, quota, what }: MeterProps) {
  const share = quota === 0 ? 1 : Math.min(1, used / quota);
  const fill = share >= 1 ? "bg-oxide" : share >= 0.8 ? "bg-amber" : "bg-verdigris";
  return (
    <div className="min-w-14">
      <div className="flex justify-between gap-1 font-mono text-small whitespace-nowrap">
        <span>
          {countText(used)} / {countText(quota)}
        </span>
        <span>{shareText(used, quota)}</span>
      </div>
      <div
        role="meter"
        aria-label={`${what} used`}
        aria-valuemin={0}
        aria-valuemax={quota}
        aria-valuenow={Math.min(used, quota)}
        className="mt-px h-[6px] rounded border border-edge"
      >
        <div className={`h-full ${fill}`} style={{ width: `${100 * share}%` }} />
      </div>
    </div>
  );
}
