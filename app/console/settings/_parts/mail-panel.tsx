"use client";

import { useState } from "react";
import { Button } from "../../../_ui/button";
import { DataTable } from "../../../_ui/data-table";
import { Dialog } from "../../../_ui/dialog";
import { LocalTime } from "../../../_ui/local-time";
import { ProblemNotice } from "../../../_ui/problem-notice";
import { EmptyState, Loading } from "../../../_ui/states";
import { useToast } from "../../../_ui/toast";
import { StateWord } from "../../_parts/state-word";
import { callConsole } from "../../_shell/call-console";
import { useConsole } from "../../_shell/use-console";

type MailState = "queued" | "sent" | "captured" | "failed";

/** Where mails go, as the settings tell it. */
export interface MailStateShown {
  readonly kind: "kept" | "smtp";
  readonly server?: string;
  readonly from?: string;
  readonly counts: Readonly<Partial<Record<MailState, number>>>;
}

interface MailShown {
  readonly id: string;
  readonly kind: string;
  readonly recipient: string;
  readonly subject: string;
  readonly state: MailState;
  readonly error: string | null;
  readonly createdAt: string;
}

const TONES = { queued: "caution", sent: "good", captured: "plain", failed: "bad" } as const;
const WORDS = { queued: "waiting", sent: "sent", captured: "kept here", failed: "failed" } as const;

/** Where mails go, whether they go, and the latest of them. */
export function MailPanel({
  state,
  onSent,
}: {
  readonly state: MailStateShown;
  readonly onSent: () => void;
}) {
  const { data, error, mutate } = useConsole<{ rows: readonly MailShown[] }>("settings/mails");
  const [busy, setBusy] = useState(false);
  const [open, setOpen] = useState<MailShown | null>(null);
  const say = useToast();
  const { queued = 0, failed = 0 } = state.counts;

  async function test() {
    setBusy(true);
    try {
      const { recipient } = await callConsole<{ recipient: string }>("POST", "settings/test-mail");
      say(
        state.kind === "smtp"
          ? `A mail is on its way to ${recipient}.`
          : `A mail to ${recipient} is kept below.`,
      );
      await mutate();
      onSent();
    } finally {
      setBusy(false);
    }
  }

  return (
    <section className="mt-5">
      <div className="mb-1.5 flex flex-wrap items-end gap-1.5">
        <h2 className="grow">Mails</h2>
        <Button onClick={test} disabled={busy}>
          Send me a test mail
        </Button>
      </div>
      <p className="mb-2 max-w-prose text-table text-ink-soft">
        {state.kind === "smtp"
          ? `They go out by ${state.server ?? ""} from ${state.from ?? ""}.`
          : "No mail server is set (RHOFORM_SMTP_URL), so mails are kept here for administrators: pass their links on yourself."}
        {queued > 0 ? ` ${queued} waiting.` : ""}
        {failed > 0 ? ` ${failed} failed.` : ""}
      </p>
      {error ? <ProblemNotice problem={error.problem} /> : null}
      {data ? (
        data.rows.length === 0 ? (
          <EmptyState title="No mails yet">
            Invitations, new passwords and notices about keys are listed here.
          </EmptyState>
        ) : (
          <DataTable
            caption="Latest mails"
            maxHeight="32rem"
            rows={data.rows}
            rowKey={({ id }) => id}
            columns={[
              {
                key: "at",
                title: "When",
                minWidth: "9rem",
                cell: ({ createdAt }) => <LocalTime at={createdAt} />,
              },
              {
                key: "subject",
                title: "Subject",
                minWidth: "12rem",
                cell: (mail) =>
                  mail.state === "captured" ? (
                    <button
                      type="button"
                      onClick={() => setOpen(mail)}
                      className="link cursor-pointer rounded text-start"
                    >
                      {mail.subject}
                    </button>
                  ) : (
                    mail.subject
                  ),
              },
              { key: "to", title: "To", cell: ({ recipient }) => recipient },
              {
                key: "state",
                title: "State",
                cell: (mail) => (
                  <>
                    <StateWord tone={TONES[mail.state]}>{WORDS[mail.state]}</StateWord>
                    {mail.error ? <span className="block text-small text-ink-soft">{mail.error}</span> : null}
                  </>
                ),
              },
            ]}
          />
        )
      ) : error ? null : (
        <Loading what="the mails" className="h-20" />
      )}
      {open ? <MailDialog mail={open} onClose={() => setOpen(null)} /> : null}
    </section>
  );
}

function MailDialog({ mail, onClose }: { readonly mail: MailShown; readonly onClose: () => void }) {
  const { data, error } = useConsole<{ text: string }>(`settings/mails/${mail.id}`);
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={mail.subject}
      description={`To ${mail.recipient}`}
      actions={<Button onClick={onClose}>Close</Button>}
      wide
    >
      {error ? <ProblemNotice problem={error.problem} /> : null}
      {data ? (
        <pre className="text-table break-words whitespace-pre-wrap">{data.text}</pre>
      ) : error ? null : (
        <Loading what="the mail" className="h-20" />
      )}
    </Dialog>
  );
}
