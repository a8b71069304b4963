import Link from "next/link";
import { StateWord } from "../../_parts/state-word";
import type { Replay } from "./use-replays";

interface DriftWordProps {
  readonly replay: Replay | undefined;
  readonly operation: string;
  readonly id: string;
}

/** What a replay found, in a word. */
export function DriftWord({ replay, operation, id }: DriftWordProps) {
  if (replay === undefined) {
    return operation === "resistance" ? (
      <span className="text-ink-soft">–</span>
    ) : (
      <Link className="link text-small" href={`/records/${id}`}>
        on its page
      </Link>
    );
  }
  if (replay === "running") return <span className="text-ink-soft">computing …</span>;
  if ("problem" in replay) return <StateWord tone="bad">refused today</StateWord>;
  if (replay.identical) return <StateWord tone="good">identical</StateWord>;
  return (
    <>
      <StateWord tone="caution">{`drift ${replay.drift.toExponential(1).replace("-", "−")}`}</StateWord>
      <span className="block font-mono text-small">now {replay.now}</span>
    </>
  );
}
