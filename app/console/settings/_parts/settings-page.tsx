"use client";

import { ProblemNotice } from "../../../_ui/problem-notice";
import { Loading } from "../../../_ui/states";
import { useToast } from "../../../_ui/toast";
import { PageHead } from "../../_parts/page-head";
import { useConsole } from "../../_shell/use-console";
import { MailPanel, type MailStateShown } from "./mail-panel";
import { SettingForm } from "./setting-form";

/** What `/api/console/settings` tells. */
interface SettingsShown {
  readonly organisation: { readonly name: string };
  readonly retention: { readonly usageDays: number; readonly mailDays: number };
  readonly signedOut: { readonly minuteQuota: number; readonly monthQuota: number };
  readonly mail: MailStateShown;
  readonly origin: string;
}

/** What administrators set for the whole installation, and the state of its mails. */
export function SettingsPage() {
  const { data, error, mutate } = useConsole<SettingsShown>("settings");
  const say = useToast();

  if (!data) {
    return (
      <>
        <PageHead title="Settings" />
        {error ? <ProblemNotice problem={error.problem} /> : <Loading what="the settings" className="h-40" />}
      </>
    );
  }
  const saved = async () => {
    say("Saved.");
    await mutate();
  };
  return (
    <>
      <PageHead title="Settings">
        This service answers at <code>{data.origin}</code>; where it listens and what it trusts is set in its
        environment.
      </PageHead>
      <div className="grid gap-x-6 gap-y-4 wide:grid-cols-3">
        <SettingForm
          title="Organisation"
          group="organisation"
          fields={[
            {
              name: "name",
              label: "Name",
              value: data.organisation.name,
              help: "Whose service this is, as widgets say it.",
            },
          ]}
          onSaved={saved}
        />
        <SettingForm
          title="Without signing in"
          group="signedOut"
          fields={[
            {
              name: "minuteQuota",
              label: "Requests a minute",
              value: data.signedOut.minuteQuota,
              help: "From one address. 0 lets nobody compute without signing in.",
            },
            {
              name: "monthQuota",
              label: "Computations a month",
              value: data.signedOut.monthQuota,
              help: "From one address.",
            },
          ]}
          onSaved={saved}
        />
        <SettingForm
          title="Kept for"
          group="retention"
          fields={[
            {
              name: "usageDays",
              label: "Single requests of the usage, days",
              value: data.retention.usageDays,
              help: "Their sums by hour and day stay.",
            },
            { name: "mailDays", label: "Mails, days", value: data.retention.mailDays },
          ]}
          onSaved={saved}
        />
      </div>
      <MailPanel state={data.mail} onSent={() => void mutate()} />
    </>
  );
}
