"use client";

import type { ShapeEntry } from "@/lib/engine";
import { CodeBlock } from "../../../_ui/code-block";
import { Tabs } from "../../../_ui/tabs";
import { resistanceSnippets, sizingSnippets } from "../../_live/snippets";
import { addressCall } from "../_model/address-call";
import type { Parameters } from "../_model/parameters";
import { requestBody } from "../_model/request";
import { sizingBody } from "../_model/sizing";

interface ElsewhereProps {
  readonly entry: ShapeEntry;
  readonly parameters: Parameters;
  readonly origin: string;
}

/** The exact call of this page for other programs. */
export function Elsewhere({ entry, parameters, origin }: ElsewhereProps) {
  const call = addressCall(origin, entry, parameters);
  const snippets = resistanceSnippets(origin, requestBody(entry, parameters));
  const sizing = sizingBody(entry, parameters);
  return (
    <>
      <p className="mb-1 max-w-prose text-table text-ink-soft">
        Each of these asks for exactly this calculation. Set <code>RHOFORM_KEY</code> to a key of your team
        with the scope <code>compute</code>; the spreadsheet takes it from cell B1, and there the key must be
        allowed to travel in an address.
      </p>
      <Tabs
        label="Forms of the call"
        tabs={[
          ...snippets.map(({ id, label, code }) => ({
            id,
            label,
            content: <CodeBlock code={code} label={label} />,
          })),
          {
            id: "address",
            label: "Spreadsheet",
            content: call.ok ? (
              <div className="grid gap-2">
                <CodeBlock code={call.formula} label="formula for Excel and LibreOffice" />
                <CodeBlock code={call.address} label="address; the key goes at its end" />
              </div>
            ) : (
              <p className="rounded border border-dashed border-edge px-2 py-3 text-table">{call.reason}</p>
            ),
          },
        ]}
      />
      {sizing ? (
        <>
          <h3 className="mt-3 mb-1">The dimension for a resistance</h3>
          <Tabs
            label="Forms of the sizing"
            tabs={sizingSnippets(origin, sizing).map(({ id, label, code }) => ({
              id,
              label,
              content: <CodeBlock code={code} label={`${label}, sizing`} />,
            }))}
          />
        </>
      ) : null}
    </>
  );
}
