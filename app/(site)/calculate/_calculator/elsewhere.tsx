"use client";

import type { ShapeEntry } from "@/lib/engine";
import { CodeBlock } from "../../../_ui/code-block";
import { SiteLink } from "../../../_ui/site/site-link";
import { Tabs } from "../../../_ui/tabs";
import { resistanceClientSnippets } from "../../_live/client-snippets";
import { resistanceSnippets, sizingSnippets } from "../../_live/snippets";
import { addressCall } from "../_model/address-call";
import {
  compactValue,
  mediumPrefixes,
  ofMedium,
  orderedPairs,
  type Parameters,
  queryText,
} from "../_model/parameters";
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
  const body = requestBody(entry, parameters);
  const snippets = [...resistanceSnippets(origin, body), ...resistanceClientSnippets(origin, body)];
  const sizing = sizingBody(entry, parameters);
  return (
    <>
      <p className="mb-1 max-w-prose text-table text-ink-soft">
        Each of these asks for exactly this calculation. Set <code>RHOFORM_KEY</code> to a key of your team
        with the scope <code>compute</code>; the spreadsheet takes it from cell B1, and there the key must be
        allowed to travel in an address. The clients are under{" "}
        <SiteLink href="/docs/clients" className="link">
          Clients
        </SiteLink>
        .
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
          {
            id: "page",
            label: "iframe",
            content: <FrameSnippet entry={entry} parameters={parameters} origin={origin} />,
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

/** A frame for pages of others: it shows a widget, which the team makes once. */
function FrameSnippet({ entry, parameters, origin }: ElsewhereProps) {
  const inputs = orderedPairs(parameters, entry).filter(([name]) => widgetInput(name, entry));
  const query = queryText(inputs.map(([name, value]) => [name, compactValue(name, value)] as const));
  const code = `<iframe src="${origin}/embed/emb_…?${query.replaceAll("&", "&amp;")}"\n  title="${entry.title}" width="480" height="720"\n  style="border: 0; max-width: 100%"></iframe>`;
  const start = queryText([["shape", entry.id], ...orderedPairs(parameters, entry)]);
  return (
    <div className="grid gap-1">
      <CodeBlock code={code} label="HTML for an intranet page or a wiki" />
      <p className="max-w-prose text-table text-ink-soft">
        The frame shows a widget of your team, without a key in the page:{" "}
        <a href={`/console/embeds?${start}`} className="link">
          make one from this calculation
        </a>
        , publish it, and put its id in place of <code>emb_…</code>.
      </p>
    </div>
  );
}

/** What a widget may leave open: dimensions, plain media, the temperature. What it fixes it keeps, whatever the address says. */
function widgetInput(name: string, entry: ShapeEntry): boolean {
  if (name === "temperature" || entry.dimensions.some((dimension) => dimension.name === name)) return true;
  const graded = /^(?:\w+\.)?(?:graded|quantity|profile)\b/.test(name);
  return !graded && mediumPrefixes(entry).some((prefix) => ofMedium(name, prefix, entry));
}
