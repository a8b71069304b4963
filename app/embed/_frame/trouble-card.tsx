"use client";

import { Button } from "../../_ui/button";
import { Notice } from "../../_ui/notice";
import { filled } from "../_words/words";
import type { Trouble, Values } from "./frame-api";
import type { FrameView } from "./frame-view";

interface TroubleProps {
  readonly view: FrameView;
  readonly trouble: Trouble;
  readonly values: Values;
  readonly onAgain: () => void;
}

/** Why there is no new answer, calmly: what was typed stays, and what helps stands beside it. */
export function TroubleCard({ view, trouble, values, onAgain }: TroubleProps) {
  const { words, locale } = view;
  switch (trouble.kind) {
    case "fields":
      return (
        <Notice tone="problem" title={words.seeFields}>
          {trouble.whole.length > 0 ? (
            <ul lang="en">
              {trouble.whole.map((detail) => (
                <li key={detail}>{detail}</li>
              ))}
            </ul>
          ) : null}
        </Notice>
      );
    case "failed":
      return (
        <Notice tone="problem" title={words.noSolution}>
          {trouble.detail ? <p lang="en">{trouble.detail}</p> : null}
        </Notice>
      );
    case "quota": {
      const day = new Intl.DateTimeFormat(locale, { dateStyle: "long" }).format(trouble.until);
      return (
        <Notice tone="caution" title={words.quotaTitle}>
          <p>{filled(words.quotaText, day)}</p>
        </Notice>
      );
    }
    case "pause":
      return (
        <Notice tone="plain" title={words.pauseTitle}>
          <p>{words.pauseText}</p>
        </Notice>
      );
    case "away":
      return (
        <Notice tone="caution" title={words.awayTitle}>
          <p>{words.awayText}</p>
          <Button className="mt-0.5 print:hidden" onClick={onAgain}>
            {words.again}
          </Button>
        </Notice>
      );
    case "gone":
      return (
        <Notice tone="caution" title={words.goneTitle}>
          <p>{words.goneText}</p>
        </Notice>
      );
    case "stale":
      return (
        <Notice tone="caution" title={words.staleTitle}>
          <p>{words.staleText}</p>
          <Button className="mt-0.5 print:hidden" onClick={() => reload(values)}>
            {words.again}
          </Button>
        </Notice>
      );
  }
}

/** Loads the present version with what was typed. */
function reload(values: Values): void {
  const address = new URL(window.location.href);
  for (const [name, value] of Object.entries(values)) address.searchParams.set(name, value);
  window.location.replace(address);
}
