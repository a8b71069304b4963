"use client";

import { useEffect, useState } from "react";
import { Button } from "../../../../_ui/button";
import { Notice } from "../../../../_ui/notice";
import { ProblemNotice } from "../../../../_ui/problem-notice";
import type { Complaint } from "../../_model/complaints";
import { sentence } from "../../_model/complaints";
import type { Trouble } from "../use-answer";

/** Longer waits are told with their end, by the API. */
const LONGEST_COUNTDOWN_S = 120;

interface TroubleNoticeProps {
  readonly trouble: Trouble;
  /** Complaints for which the page has no field. */
  readonly elsewhere: readonly Complaint[];
  /** Whether an earlier answer still stands above. */
  readonly answered: boolean;
  /** Whether signing in would allow more calculations. */
  readonly signedOut: boolean;
  readonly retry: () => void;
}

/** Why there is no new answer, calmly, and what happens next. */
export function TroubleNotice({ trouble, elsewhere, answered, signedOut, retry }: TroubleNoticeProps) {
  const stands = answered ? " What stands above is the answer to the input before." : "";
  switch (trouble.kind) {
    case "input":
      return (
        <Notice title="No answer to this input">
          <p>
            {elsewhere.length < trouble.complaints.length ? "The marked fields say why." : ""}
            {stands}
          </p>
          {elsewhere.length > 0 ? (
            <ul className="list-disc ps-2">
              {elsewhere.map(({ detail }) => (
                <li key={detail}>{sentence(detail)}</li>
              ))}
            </ul>
          ) : null}
        </Notice>
      );
    case "limit":
      return (
        <Notice tone="caution" title="A short pause">
          <p>
            {trouble.seconds !== null && trouble.seconds <= LONGEST_COUNTDOWN_S ? (
              <>
                The calculations of this minute are used up.{" "}
                <Countdown key={trouble.seconds} seconds={trouble.seconds} />
              </>
            ) : (
              `${trouble.detail || "The calculations of this month are used up."}${signedOut ? " Signing in allows more." : ""}`
            )}
            {stands}
          </p>
        </Notice>
      );
    case "offline":
      return (
        <Notice tone="caution" title="No connection">
          <p>The service cannot be reached; the page keeps trying.{stands}</p>
          <Button onClick={retry} className="mt-0.5">
            Try now
          </Button>
        </Notice>
      );
    case "service":
      return <ProblemNotice problem={trouble.problem.problem} />;
  }
}

function Countdown({ seconds }: { readonly seconds: number }) {
  const [left, setLeft] = useState(seconds);
  useEffect(() => {
    const timer = setInterval(() => setLeft((before) => Math.max(0, before - 1)), 1000);
    return () => clearInterval(timer);
  }, []);
  return left > 0 ? `The page asks again in ${left} s.` : "The page asks again now.";
}
