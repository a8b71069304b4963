"use client";

import { useState } from "react";
import { Button } from "../../../_ui/button";
import { ProblemNotice } from "../../../_ui/problem-notice";
import { Select } from "../../../_ui/select";
import { Loading } from "../../../_ui/states";
import { useToast } from "../../../_ui/toast";
import { ConfirmDialog } from "../../_parts/confirm-dialog";
import { PageHead } from "../../_parts/page-head";
import { SessionList, type SessionShown } from "../../_parts/session-list";
import { callConsole } from "../../_shell/call-console";
import { useConsole } from "../../_shell/use-console";
import { AccountForm } from "./account-form";

interface TeamChoice {
  readonly id: string;
  readonly name: string;
}

/** What `/api/console/account` tells. */
interface AccountShown {
  readonly name: string;
  readonly email: string;
  readonly role: string;
  readonly teams: readonly TeamChoice[];
  /** The team on whose behalf this browser's pages work. */
  readonly team: TeamChoice | null;
  readonly choices: readonly TeamChoice[];
  readonly sessions: readonly SessionShown[];
}

/** The person's own name, address, password, team and devices. */
export function AccountPage() {
  const { data, error, mutate } = useConsole<AccountShown>("account");
  const say = useToast();

  if (!data) {
    return (
      <>
        <PageHead title="My account" />
        {error ? <ProblemNotice problem={error.problem} /> : <Loading what="your account" className="h-40" />}
      </>
    );
  }
  const { name, email, role, teams, team, choices } = data;
  const changed = async (what: string) => {
    say(what);
    await mutate();
  };

  return (
    <>
      <PageHead title="My account">
        {email} · {role} · {teams.map((each) => each.name).join(", ") || "no team"}
      </PageHead>
      <div className="grid max-w-page gap-x-6 gap-y-4 wide:grid-cols-2">
        <section>
          <h2 className="mb-1.5 text-h3">Name and team</h2>
          <AccountForm
            method="PATCH"
            path="account"
            submit="Save the name"
            fields={[{ name: "name", label: "Name", value: name, autoComplete: "name" }]}
            onDone={() => changed("Your name is saved.")}
          />
          {choices.length > 1 ? (
            <Select
              label="Team of this browser's pages"
              help="What you compute and save on the pages counts for this team and belongs to it."
              className="mt-2"
              value={team?.id}
              options={choices.map((each) => ({ value: each.id, label: each.name }))}
              onChange={async (event) => {
                await callConsole("PATCH", "account", { team: event.target.value });
                await changed("The pages of this browser work for another team.");
              }}
            />
          ) : null}
        </section>
        <section>
          <h2 className="mb-1.5 text-h3">E-mail address</h2>
          <AccountForm
            method="POST"
            path="account/email"
            submit="Send the confirmation"
            fields={[
              { name: "email", label: "New address", type: "email", autoComplete: "email" },
              {
                name: "currentPassword",
                label: "Current password",
                type: "password",
                autoComplete: "current-password",
              },
            ]}
            done="A link went to the new address. It counts once you follow it there."
            onDone={() => mutate()}
          />
        </section>
        <section>
          <h2 className="mb-1.5 text-h3">Password</h2>
          <AccountForm
            method="POST"
            path="account/password"
            submit="Change the password"
            fields={[
              {
                name: "currentPassword",
                label: "Current password",
                type: "password",
                autoComplete: "current-password",
              },
              {
                name: "password",
                label: "New password",
                type: "password",
                autoComplete: "new-password",
                help: "12 characters or more. Other devices are signed out.",
              },
            ]}
            done="The password is changed, and other devices are signed out."
            onDone={() => mutate()}
          />
        </section>
        <Devices sessions={data.sessions} onChanged={changed} />
      </div>
    </>
  );
}

interface DevicesProps {
  readonly sessions: readonly SessionShown[];
  readonly onChanged: (what: string) => Promise<void>;
}

function Devices({ sessions, onChanged }: DevicesProps) {
  const [asked, setAsked] = useState<SessionShown | "all" | null>(null);
  const others = sessions.filter(({ current }) => !current);

  async function end() {
    if (!asked) return;
    await callConsole("DELETE", asked === "all" ? "account/sessions" : `account/sessions/${asked.id}`);
    setAsked(null);
    await onChanged("Signed out there.");
  }

  return (
    <section>
      <div className="mb-1.5 flex items-center gap-1">
        <h2 className="grow text-h3">Signed in on</h2>
        {others.length > 0 ? (
          <Button variant="quiet" onClick={() => setAsked("all")}>
            End all others
          </Button>
        ) : null}
      </div>
      <SessionList sessions={sessions} onEnd={setAsked} />
      {asked ? (
        <ConfirmDialog
          title={asked === "all" ? "Sign out all other devices?" : `Sign out ${asked.client}?`}
          action="Sign out"
          onConfirm={end}
          onClose={() => setAsked(null)}
        >
          What is open there and not saved is lost. Signing in again needs your password.
        </ConfirmDialog>
      ) : null}
    </section>
  );
}
