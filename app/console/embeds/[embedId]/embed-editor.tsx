"use client";

import { useState } from "react";
import type { EmbedDetail } from "../../../api/console/embeds/_server/embed-detail";
import { Breadcrumb } from "../../../_ui/breadcrumb";
import { Button } from "../../../_ui/button";
import { Dialog } from "../../../_ui/dialog";
import { ProblemNotice } from "../../../_ui/problem-notice";
import { Tabs } from "../../../_ui/tabs";
import { callConsole, ConsoleProblem } from "../../_shell/call-console";
import { useConsole } from "../../_shell/use-console";
import { StateMark } from "../state-mark";
import { Builder } from "./builder";
import { HostsTable } from "./hosts-table";
import { Placing } from "./placing";
import { VersionList } from "./version-list";

interface EditorProps {
  readonly first: EmbedDetail;
  /** Where the service answers, for the snippets. */
  readonly origin: string;
}

/** One widget: what it is, where it may stand, what became of it. */
export function EmbedEditor({ first, origin }: EditorProps) {
  const { embed: before } = first;
  const path = `embeds/${before.id}`;
  const { data: detail = first, mutate } = useConsole<EmbedDetail>(path, {
    fallbackData: first,
    revalidateOnFocus: false,
  });
  const { embed } = detail;
  const [withdrawing, setWithdrawing] = useState(false);
  const [problem, setProblem] = useState<ConsoleProblem | null>(null);

  async function act(work: () => Promise<unknown>) {
    setProblem(null);
    try {
      await work();
    } catch (error) {
      if (!(error instanceof ConsoleProblem)) throw error;
      setProblem(error);
    }
    await mutate();
  }

  return (
    <>
      <Breadcrumb trail={[{ label: "Embeds", href: "/console/embeds" }]} />
      <div className="mt-1 mb-2 flex flex-wrap items-start gap-x-2 gap-y-1">
        <div className="grow">
          <h1>{embed.name}</h1>
          <p className="text-table text-ink-soft">
            {detail.subject}, {embed.teamName}. <StateMark state={embed.state} version={embed.version} />
          </p>
        </div>
        {detail.mayManage && embed.state === "published" ? (
          <Button variant="danger" onClick={() => setWithdrawing(true)}>
            Withdraw
          </Button>
        ) : null}
      </div>
      {problem ? <ProblemNotice problem={problem.problem} /> : null}
      <Tabs
        label="Parts of the embed"
        tabs={[
          {
            id: "build",
            label: "Build",
            content: <Builder detail={detail} onChanged={() => void mutate()} act={act} />,
          },
          {
            id: "place",
            label: "Place",
            content: (
              <Placing key={embed.id} detail={detail} origin={origin} onChanged={() => void mutate()} />
            ),
          },
          {
            id: "versions",
            label: "Versions",
            content: <VersionList detail={detail} act={act} />,
          },
          { id: "usage", label: "Usage", content: <HostsTable detail={detail} /> },
        ]}
      />
      <Dialog
        open={withdrawing}
        onOpenChange={setWithdrawing}
        title="Withdraw this embed?"
        description="Every page that shows it will show a card saying that it was withdrawn."
        actions={
          <>
            <Button onClick={() => setWithdrawing(false)}>Keep it</Button>
            <Button
              variant="danger"
              onClick={() => {
                setWithdrawing(false);
                void act(() => callConsole("POST", `${path}/withdraw`));
              }}
            >
              Withdraw
            </Button>
          </>
        }
      >
        {detail.hosts.length > 0 ? (
          <>
            <p className="text-table">Pages of these hosts used it in the last 31 days:</p>
            <ul className="mt-0.5 text-table">
              {detail.hosts.map(({ host, requests }) => (
                <li key={host}>
                  {host === "" ? "hosts that browsers did not tell" : host}: {requests.toLocaleString("en")}{" "}
                  calls
                </li>
              ))}
            </ul>
          </>
        ) : (
          <p className="text-table">No page used it in the last 31 days.</p>
        )}
        <p className="mt-1 text-table">Publishing a draft or rolling back brings it back.</p>
      </Dialog>
    </>
  );
}
