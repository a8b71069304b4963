import type { Metadata } from "next";
import { Breadcrumb } from "../../../_ui/breadcrumb";
import { Button, ButtonLink } from "../../../_ui/button";
import { CodeBlock } from "../../../_ui/code-block";
import { Notice } from "../../../_ui/notice";
import { ProblemNotice } from "../../../_ui/problem-notice";
import { EmptyState, Loading } from "../../../_ui/states";
import { Tex } from "../../../_ui/tex";
import { Exhibit } from "./_parts/exhibit";
import { FieldExhibits } from "./_parts/field-exhibits";
import { OverlayExhibits } from "./_parts/overlay-exhibits";
import { DataExhibits } from "./_parts/data-exhibits";

export const metadata: Metadata = {
  title: "Controls",
  description: "Every control of the pages in every state, for those who build pages.",
};

const TOKENS = [
  ["paper", "bg-paper", "page"],
  ["sheet", "bg-sheet", "panels, inputs"],
  ["ink", "bg-ink", "text"],
  ["ink-soft", "bg-ink-soft", "secondary text"],
  ["rule", "bg-rule", "hairlines"],
  ["edge", "bg-edge", "borders of controls"],
  ["copper", "bg-copper", "conductor, primary action, high terminal"],
  ["verdigris", "bg-verdigris", "low terminal, success, links"],
  ["amber", "bg-amber", "cautions"],
  ["oxide", "bg-oxide", "errors, destructive action"],
] as const;

/** The design system on one page: what a page is made of, in every state. */
export default function DesignPage() {
  return (
    <>
      <Breadcrumb trail={[{ href: "/docs", label: "Docs" }]} />
      <h1>Controls</h1>
      <p className="mt-1 mb-3 max-w-prose text-ink-soft">
        For those who build pages of this service: every control of <code>app/_ui</code> in every state. Look
        at it in both themes, at phone width, and with the keyboard alone.
      </p>
      <div className="grid grid-cols-1 gap-5">
        <Exhibit title="Colours" note="Each follows the theme; contrast is checked by a test.">
          <ul className="grid grid-cols-[repeat(auto-fill,minmax(14rem,1fr))] gap-1">
            {TOKENS.map(([name, background, use]) => (
              <li key={name} className="flex items-center gap-1 text-table">
                <span className={`size-4 shrink-0 rounded border border-edge ${background}`} />
                <span>
                  <code>{name}</code> <span className="text-ink-soft">{use}</span>
                </span>
              </li>
            ))}
          </ul>
        </Exhibit>
        <Exhibit title="Type" note="Spline Sans for text, Spline Sans Mono for numbers, units and code.">
          <p className="text-h1 font-semibold">Heading of a page</p>
          <p className="text-h2 font-semibold">Heading of a section</p>
          <p className="text-h3 font-semibold">Heading of a part</p>
          <p className="text-lead">Lead: a sentence that carries a page.</p>
          <p>Body: one column of prose at 68 characters.</p>
          <p className="text-table">Table: dense text and forms.</p>
          <p className="text-small text-ink-soft">Small: help and captions.</p>
          <p className="font-mono text-figure">1.2345{"\u2009"}mΩ</p>
          <Tex tex="R = \frac{\rho}{\varphi L}\,\ln\frac{b}{a}" display />
        </Exhibit>
        <Exhibit title="Buttons" note="One primary action a view; a destructive one asks first.">
          <div className="flex flex-wrap gap-1">
            <Button variant="primary">Primary</Button>
            <Button>Plain</Button>
            <Button variant="quiet">Quiet</Button>
            <Button variant="danger">Destructive</Button>
            <Button variant="primary" disabled>
              Primary, off
            </Button>
            <Button disabled>Plain, off</Button>
            <ButtonLink href="/calculate">A link that looks like a button</ButtonLink>
          </div>
        </Exhibit>
        <FieldExhibits />
        <OverlayExhibits />
        <DataExhibits />
        <Exhibit title="Notices" note="Their kind is said in words, not by colour alone.">
          <div className="grid gap-2">
            <Notice>Something to know.</Notice>
            <Notice tone="caution" title="A short pause">
              Something to be careful about.
            </Notice>
            <Notice tone="problem" title="The input cannot be used">
              Something that went wrong, and what to do.
            </Notice>
            <ProblemNotice
              problem={{
                title: "The input cannot be used",
                detail: "One place needs another value.",
                type: "/docs/problems/invalid-input",
                instance: "req-example",
                errors: [{ pointer: "#/dimensions/width", detail: "must be greater than 0." }],
              }}
            />
          </div>
        </Exhibit>
        <Exhibit title="Loading and empty" note="A place keeps its height while its content is on its way.">
          <div className="grid gap-2 medium:grid-cols-2">
            <Loading what="the plots" className="min-h-15" />
            <EmptyState
              title="No records yet"
              action={<ButtonLink href="/calculate">Start a calculation</ButtonLink>}
            >
              A record keeps a calculation with its versions, so that it can be replayed.
            </EmptyState>
          </div>
        </Exhibit>
        <Exhibit title="Code" note="Scrolls inside its block; copies as it stands.">
          <CodeBlock
            label="curl"
            code={'curl -s https://rhoform.example/api/v1/health \\\n  -H "Accept: application/json"'}
          />
        </Exhibit>
      </div>
    </>
  );
}
