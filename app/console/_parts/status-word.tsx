import { StateWord } from "./state-word";

/** A status of HTTP with what it means for the caller. */
export function StatusWord({ status }: { readonly status: number }) {
  const tone = status >= 500 ? "bad" : status >= 400 ? "caution" : "good";
  const word = status >= 500 ? "failed" : status >= 400 ? "refused" : "answered";
  return <StateWord tone={tone}>{`${status} ${word}`}</StateWord>;
}
