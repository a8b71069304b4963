"use client";

import { Button } from "../../../_ui/button";
import { Dialog } from "../../../_ui/dialog";
import { LocalTime } from "../../../_ui/local-time";
import { actionWords, type ActShown, differences } from "./activity-words";

/** One act with all that is kept of it: who, from where, before and after. */
export function ActDialog({ act, onClose }: { readonly act: ActShown; readonly onClose: () => void }) {
  const { actor, subject, team, before, after, address, requestId } = act;
  const changed = differences(before, after);
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
          {subject.name ? `${subject.name}, ` : ""}
          {subject.kind} <code>{subject.id}</code>
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
        <div tabIndex={0} role="group" aria-label="What changed" className="mt-2 overflow-x-auto">
          <table className="w-full border-collapse text-table">
            <caption className="sr-only">What changed</caption>
            <thead>
              <tr className="text-start text-ink-soft">
                <th scope="col" className="pe-2 pb-0.5 text-start font-medium">
                  Member
                </th>
                <th scope="col" className="pe-2 pb-0.5 text-start font-medium">
                  Before
                </th>
                <th scope="col" className="pb-0.5 text-start font-medium">
                  After
                </th>
              </tr>
            </thead>
            <tbody>
              {changed.map(({ member, before: was, after: is }) => (
                <tr key={member} className="border-t border-rule align-top">
                  <th scope="row" className="py-0.5 pe-2 text-start font-normal">
                    {member}
                  </th>
                  <td className="py-0.5 pe-2 font-mono text-small [overflow-wrap:anywhere]">{was}</td>
                  <td className="py-0.5 font-mono text-small [overflow-wrap:anywhere]">{is}</td>
                </tr>
              ))}
            </tbody>
          </table>
        </div>
      ) : null}
    </Dialog>
  );
}
