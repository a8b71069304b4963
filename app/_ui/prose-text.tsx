import { Fragment } from "react";

/** Running text in which `backticks` mark code. */
export function ProseText({ text }: { readonly text: string }) {
  return text
    .split("`")
    .map((part, index) =>
      index % 2 === 1 ? <code key={index}>{part}</code> : <Fragment key={index}>{part}</Fragment>,
    );
}
