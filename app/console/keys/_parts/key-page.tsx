"use client";

import Link from "next/link";
import { useState } from "react";
import { Button } from "../../../_ui/button";
import { LocalTime } from "../../../_ui/local-time";
import { Notice } from "../../../_ui/notice";
import { ProblemNotice } from "../../../_ui/problem-notice";
import { Loading } from "../../../_ui/states";
import { useToast } from "../../../_ui/toast";
import { Meter } from "../../_parts/meter";
import { countText } from "../../_parts/numbers";
import { PageHead } from "../../_parts/page-head";
import { useConsole } from "../../_shell/use-console";
import { ClientTable } from "./client-table";
import { EditDialog } from "./edit-dialog";
import type { KeyDetail } from "./key";
import { KeyState } from "./key-state";
import { RevokeDialog } from "./revoke-dialog";
import { RotateDialog } from "./rotate-dialog";

/** One key: what it may do, who calls with it, and what can be done to it. */
export function KeyPage({ id, name }: { readonly id: string; readonly name: string }) {
  const { data: key, error, mutate } = useConsole<KeyDetail>(`keys/${id}`, { refreshInterval: 30_000 });
  const [open, setOpen] = useState<"edit" | "rotate" | "revoke" | null>(null);
  const toast = useToast();
  const close = () => setOpen(null);

  function changed(message: string) {
    close();
    void mutate();
    toast(message);
  }

  const manages = key?.mayManage === true && key.state !== "revoked";
  return (
    <>
      <PageHead
        title={key?.name ?? name}
        actions={
          manages ? (
            <>
              <Button onClick={() => setOpen("edit")}>Change</Button>
              {key.state === "active" ? <Button onClick={() => setOpen("rotate")}>Rotate</Button> : null}
              <Button variant="danger" onClick={() => setOpen("revoke")}>
                Revoke
              </Button>
            </>
          ) : null
        }
      >
        <span className="font-mono">{id}</span>
      </PageHead>
      {error ? <ProblemNotice problem={error.problem} /> : null}
      {key ? <Facts keyShown={key} /> : <Loading what="the key" className="h-40" />}
      {key && open === "edit" ? (
        <EditDialog keyShown={key} onClose={close} onChanged={() => changed("The key is changed.")} />
      ) : null}
      {key && open === "rotate" ? (
        <RotateDialog keyShown={key} onClose={close} onRotated={() => void mutate()} />
      ) : null}
      {key && open === "revoke" ? (
        <RevokeDialog keyShown={key} onClose={close} onRevoked={() => changed("The key is revoked.")} />
      ) : null}
    </>
  );
}

function Facts({ keyShown: key }: { readonly keyShown: KeyDetail }) {
  return (
    <>
      {key.state === "expired" ? (
        <div className="mb-2">
          <Notice tone="caution" title="This key has expired">
            Calls with it are refused and told so. Change its last day to use it again.
          </Notice>
        </div>
      ) : null}
      {key.previousUntil ? (
        <div className="mb-2">
          <Notice title="Rotation under way">
            The secret before counts until <LocalTime at={key.previousUntil} />.
          </Notice>
        </div>
      ) : null}
      <dl className="grid gap-x-3 text-table max-medium:[&_dt:not(:first-child)]:mt-1 medium:grid-cols-[auto_1fr] medium:gap-y-1 [&_dt]:text-ink-soft">
        <dt>State</dt>
        <dd>
          <KeyState state={key.state} expiresAt={key.expiresAt} />
        </dd>
        <dt>Team</dt>
        <dd>{key.teamName}</dd>
        <dt>Scopes</dt>
        <dd className="font-mono">{key.scopes.join("  ")}</dd>
        <dt>Computations this month</dt>
        <dd className="max-w-32">
          <Meter used={key.monthUsed} quota={key.quotas.month} what="computations" />
        </dd>
        <dt>Requests a minute</dt>
        <dd>at most {countText(key.quotas.minute)}</dd>
        <dt>Origins of browser pages</dt>
        <dd className="font-mono break-all">{key.origins.length > 0 ? key.origins.join("  ") : "none"}</dd>
        <dt>In a URL</dt>
        <dd>{key.allowedInUrl ? "may travel as ?key=" : "not accepted"}</dd>
        <dt>Expires</dt>
        <dd>{key.expiresAt ? <LocalTime at={key.expiresAt} /> : "never"}</dd>
        <dt>Issued</dt>
        <dd>
          <LocalTime at={key.createdAt} /> by {key.createdBy}
        </dd>
        {key.revokedAt ? (
          <>
            <dt>Revoked</dt>
            <dd>
              <LocalTime at={key.revokedAt} />
            </dd>
          </>
        ) : null}
        <dt>Last use</dt>
        <dd>{key.lastUsedAt ? <LocalTime at={key.lastUsedAt} /> : "never"}</dd>
      </dl>
      <h2 className="mt-4 mb-1">Clients of the last 30 days</h2>
      <ClientTable clients={key.clients} />
      <p className="mt-2 text-table">
        <Link className="link" href={`/console/usage?caller=${key.id}`}>
          Usage of this key, down to single requests
        </Link>
      </p>
    </>
  );
}
