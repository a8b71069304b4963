"use client";

import Link from "next/link";
import { Button } from "../../../_ui/button";
import { Dialog } from "../../../_ui/dialog";
import { LocalTime } from "../../../_ui/local-time";
import { ScrollFrame } from "../../../_ui/scroll-frame";
import { actionWords, type ActShown, subjectName, subjectPage } from "./activity-words";
import { toldChanges } from "./told-changes";

/** One act with all that is kept of it: who, from where, before and after. */
export function ActDialog({ act, onClose }: { readonly act: ActShown; readonly onClose: () => void }) {
  const { actor, subject, team, before, after, address, requestId } = act;
  const changed = toldChanges(act);
  const page = subjectPage(act);
  const has = (side: "before" | "after") => changed.some((each) => each[side] !== "");
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={`${actor.name} ${actionWords(act.action)}`}
      actions={<Button onClick={onClose}>Close</Button>}
      wide={changed.length > 0}
    >
      <dl className="grid grid-cols-[auto_1fr] gap-x-2 gap-y-0.5 text-table">
        <dt className="text-ink-soft">When</dt>
        <dd>
          <LocalTime at={act.at} />
        </dd>
        <dt className="text-ink-soft">About</dt>
        <dd className="[overflow-wrap:anywhere]">
          {page ? (
            <Link className="link" href={page}>
              {subjectName(act)}
            </Link>
          ) : (
            subjectName(act)
          )}
          , {subject.kind} <code>{subject.id}</code>
        </dd>
        {team ? (
          <>
            <dt className="text-ink-soft">Team</dt>
            <dd>{team.name}</dd>
          </>
        ) : null}
        {address ? (
          <>
            <dt className="text-ink-soft">From</dt>
            <dd>
              <code>{address}</code>
            </dd>
          </>
        ) : null}
        {requestId ? (
          <>
            <dt className="text-ink-soft">Request</dt>
            <dd>
              <code>{requestId}</code>
            </dd>
          </>
        ) : null}
      </dl>
      {changed.length > 0 ? (
        <ScrollFrame label="What changed" className="mt-2">
          <table className="w-full border-collapse text-table">
            <caption className="sr-only">What changed</caption>
            <thead>
              <tr className="text-start text-ink-soft">
                <th scope="col" className="pe-2 pb-0.5 text-start font-medium">
                  What
                </th>
                {has("before") ? (
                  <th scope="col" className="pe-2 pb-0.5 text-start font-medium">
                    Before
                  </th>
                ) : null}
                {has("after") ? (
                  <th scope="col" className="pb-0.5 text-start font-medium">
                    After
                  </th>
                ) : null}
              </tr>
            </thead>
            <tbody>
              {changed.map(({ member, before: was, after: is }) => (
                <tr key={member} className="border-t border-rule align-top">
                  <th scope="row" className="py-0.5 pe-2 text-start font-normal">
                    {member}
                  </th>
                  {has("before") ? (
                    <td className="py-0.5 pe-2 [overflow-wrap:anywhere]">{was || "–"}</td>
                  ) : null}
                  {has("after") ? <td className="py-0.5 [overflow-wrap:anywhere]">{is || "–"}</td> : null}
                </tr>
              ))}
            </tbody>
          </table>
        </ScrollFrame>
      ) : null}
      {before === null && after === null ? null : (
        <details className="mt-2 text-table">
          <summary className="cursor-pointer rounded py-0.5 text-ink-soft">
            Everything that is kept of it
          </summary>
          <pre
            tabIndex={0}
            className="mt-0.5 max-h-40 overflow-auto rounded border border-rule bg-paper p-1 font-mono text-small"
          >
            {JSON.stringify({ before, after }, null, 2)}
          </pre>
        </details>
      )}
    </Dialog>
  );
}
