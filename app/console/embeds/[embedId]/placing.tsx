"use client";

import Link from "next/link";
import { type FormEvent, useState } from "react";
import type { EmbedDetail } from "../../../api/console/embeds/_server/embed-detail";
import { Button } from "../../../_ui/button";
import { CodeBlock } from "../../../_ui/code-block";
import { CONTROL, Field } from "../../../_ui/field";
import { Notice } from "../../../_ui/notice";
import { ProblemNotice } from "../../../_ui/problem-notice";
import { TextField } from "../../../_ui/text-field";
import { callConsole, ConsoleProblem } from "../../_shell/call-console";

interface PlacingProps {
  readonly detail: EmbedDetail;
  readonly origin: string;
  readonly onChanged: () => void;
}

/** Where it may stand, and what to copy there. */
export function Placing({ detail, origin, onChanged }: PlacingProps) {
  const { embed } = detail;
  return (
    <div className="grid gap-3 pt-2 wide:grid-cols-2">
      <section className="min-w-0">
        <h2 className="text-h3! mb-1">Pages that may show it</h2>
        <SettingsForm detail={detail} onChanged={onChanged} />
        <p className="max-w-prose text-table text-ink-soft">
          An origin is the beginning of a page’s address: scheme, host and port, without what follows. For{" "}
          <code>https://wiki.example/space/busbars</code> it is <code>https://wiki.example</code>. A browser
          shows the frame on pages of these origins only; files opened from a disk have none. The service’s
          own pages always may.
        </p>
        <p className="mt-1 max-w-prose text-table text-ink-soft">
          On any other page the browser refuses the frame. The loader then says so in its place and names the
          origin: add it above, and the page works when it is loaded again.
        </p>
      </section>
      <section className="grid min-w-0 grid-cols-[minmax(0,1fr)] content-start gap-1.5">
        <h2 className="text-h3!">Snippets</h2>
        {embed.state === "published" ? null : (
          <Notice tone="caution" title="Not published">
            <p>Pages with the snippet say that there is no such calculator until a version is published.</p>
          </Notice>
        )}
        <CodeBlock
          label="with the loader: grows with its content, fires events"
          code={loaderSnippet(origin, embed.id)}
        />
        <CodeBlock
          label="plain iframe, where scripts are not allowed"
          code={frameSnippet(origin, embed.id, embed.name)}
        />
        <CodeBlock label="directives for a page with a strict policy" code={policySnippet(origin)} />
        <p className="text-table text-ink-soft">
          Events, values and themes are told in{" "}
          <Link className="link" href="/docs/embedding">
            Embedding
          </Link>
          .
        </p>
      </section>
    </div>
  );
}

function SettingsForm({
  detail,
  onChanged,
}: {
  readonly detail: EmbedDetail;
  readonly onChanged: () => void;
}) {
  const { embed, mayManage } = detail;
  const [problem, setProblem] = useState<ConsoleProblem | null>(null);
  const [saved, setSaved] = useState(false);

  async function save(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    const data = new FormData(event.currentTarget);
    const text = (name: string) => String(data.get(name) ?? "");
    setProblem(null);
    setSaved(false);
    try {
      await callConsole("PATCH", `embeds/${embed.id}`, {
        name: text("name"),
        // What people paste is an address; its origin is what counts.
        origins: text("origins").split(/\s+/).filter(Boolean).map(originOf),
        monthQuota: Number(text("monthQuota")),
      });
      setSaved(true);
      onChanged();
    } catch (error) {
      if (!(error instanceof ConsoleProblem)) throw error;
      setProblem(error);
    }
  }

  const errors = problem?.fieldErrors();
  const originErrors = [...(errors ?? [])].filter(([name]) => name.startsWith("origins"));
  return (
    <form onSubmit={(event) => void save(event)}>
      <fieldset disabled={!mayManage}>
        <Field
          label="Origins, one a line"
          error={
            originErrors
              .map(([name, text]) => `Origin ${Number(name.split(".")[1] ?? 0) + 1}: ${text}`)
              .join(" ") || undefined
          }
        >
          {(control) => (
            <textarea
              {...control}
              name="origins"
              rows={4}
              defaultValue={embed.origins.join("\n")}
              placeholder="https://intranet.example"
              spellCheck={false}
              className={CONTROL}
            />
          )}
        </Field>
        <div className="grid gap-x-2 narrow:grid-cols-2">
          <TextField
            label="Name"
            name="name"
            defaultValue={embed.name}
            maxLength={100}
            error={errors?.get("name")}
          />
          <TextField
            label="Computations a month"
            name="monthQuota"
            type="number"
            min={0}
            step={1}
            required
            prose={false}
            defaultValue={embed.monthQuota}
            error={errors?.get("monthQuota")}
            help={`${detail.month.remaining.toLocaleString("en")} left`}
          />
        </div>
        {mayManage ? (
          <div className="mb-1.5 flex items-center gap-1">
            <Button variant="primary" type="submit">
              Save
            </Button>
            <span role="status" className="text-small text-ink-soft">
              {saved ? "Saved; it counts at once, whatever version is shown." : ""}
            </span>
          </div>
        ) : null}
      </fieldset>
      {problem && originErrors.length === 0 && !errors?.has("name") && !errors?.has("monthQuota") ? (
        <ProblemNotice problem={problem.problem} />
      ) : null}
    </form>
  );
}

function originOf(text: string): string {
  try {
    const { origin } = new URL(text);
    return origin === "null" ? text : origin;
  } catch {
    return text;
  }
}

function loaderSnippet(origin: string, id: string): string {
  return `<script src="${origin}/embed/v1.js" async></script>\n<rhoform-embed embed="${id}"></rhoform-embed>`;
}

function frameSnippet(origin: string, id: string, name: string): string {
  const title = name.replace(/[&<>"]/g, (sign) => `&#${sign.charCodeAt(0)};`);
  return [
    `<iframe src="${origin}/embed/${id}"`,
    `  title="${title}" width="480" height="720"`,
    `  style="border: 0; max-width: 100%"></iframe>`,
  ].join("\n");
}

function policySnippet(origin: string): string {
  return `script-src ${origin}/embed/v1.js;\nframe-src ${origin};\nconnect-src ${origin}`;
}
