"use client";

import type { EmbedDetail } from "../../../api/console/embeds/_server/embed-detail";
import type { VersionView } from "@/lib/embeds/embed-view";
import { Button } from "../../../_ui/button";
import { DataTable } from "../../../_ui/data-table";
import { callConsole } from "../../_shell/call-console";

interface VersionProps {
  readonly detail: EmbedDetail;
  readonly act: (work: () => Promise<unknown>) => Promise<void>;
}

/** Every version there was; an earlier one can be brought back, as a new one. */
export function VersionList({ detail, act }: VersionProps) {
  const { embed, versions, mayManage } = detail;
  const withdrawn = embed.state === "withdrawn";
  return (
    <div className="pt-2">
      <DataTable
        caption="Versions, the newest first"
        rows={versions}
        rowKey={({ number }: VersionView) => number}
        columns={[
          { key: "number", title: "Version", cell: ({ number }: VersionView) => number },
          { key: "state", title: "State", cell: (version: VersionView) => stateText(version) },
          { key: "title", title: "Title", cell: ({ definition }: VersionView) => definition.title },
          {
            key: "published",
            title: "Published",
            cell: ({ publishedAt, publishedBy }: VersionView) =>
              publishedAt === null ? (
                "not yet"
              ) : (
                <>
                  <time dateTime={publishedAt} title={publishedAt} suppressHydrationWarning>
                    {new Date(publishedAt).toLocaleString("en-GB", {
                      dateStyle: "medium",
                      timeStyle: "short",
                    })}
                  </time>{" "}
                  by {publishedBy}
                </>
              ),
          },
          {
            key: "act",
            title: "Actions",
            cell: (version: VersionView) => (
              <span className="flex flex-wrap gap-1">
                <a
                  className="link"
                  href={`/embed/${embed.id}?preview=1&version=${version.number}`}
                  target="_blank"
                  rel="noopener"
                >
                  Look
                </a>
                {mayManage && version.state === "earlier" ? (
                  <Button
                    variant="quiet"
                    onClick={() =>
                      void act(() =>
                        callConsole("POST", `embeds/${embed.id}/roll-back`, { version: version.number }),
                      )
                    }
                  >
                    {withdrawn ? "Show again" : "Roll back to it"}
                  </Button>
                ) : null}
              </span>
            ),
          },
        ]}
      />
      <p className="mt-1 max-w-prose text-table text-ink-soft">
        Pages follow at once: a frame that is open is asked to reload with its next calculation, and keeps
        what was typed.
      </p>
    </div>
  );
}

function stateText({ state, restores }: VersionView): string {
  const words = { draft: "draft", published: "on pages now", earlier: "earlier" };
  return restores === null ? words[state] : `${words[state]}, version ${restores} again`;
}
