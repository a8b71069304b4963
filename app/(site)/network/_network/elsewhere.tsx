"use client";

import { CodeBlock } from "../../../_ui/code-block";
import { Tabs } from "../../../_ui/tabs";
import { networkSnippets } from "../../_live/snippets";

/** The exact call of this page for other programs. */
export function Elsewhere({ origin, body }: { readonly origin: string; readonly body: object }) {
  return (
    <>
      <p className="mb-1 max-w-prose text-table text-ink-soft">
        Each of these asks for exactly this network. Set <code>RHOFORM_KEY</code> to a key of your team with
        the scope <code>compute</code>.
      </p>
      <Tabs
        label="Forms of the call"
        tabs={networkSnippets(origin, body).map(({ id, label, code }) => ({
          id,
          label,
          content: <CodeBlock code={code} label={label} />,
        }))}
      />
    </>
  );
}
