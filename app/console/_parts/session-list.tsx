"use client";

import { Button } from "../../_ui/button";
import { LocalTime } from "../../_ui/local-time";

/** A device that somebody is signed in with. */
export interface SessionShown {
  readonly id: string;
  readonly client: string;
  readonly address: string;
  readonly createdAt: string;
  readonly lastSeenAt: string;
  readonly current: boolean;
}

interface SessionListProps {
  readonly sessions: readonly SessionShown[];
  readonly onEnd: (session: SessionShown) => void;
}

/** Devices that are signed in, each with a way to end it. */
export function SessionList({ sessions, onEnd }: SessionListProps) {
  return (
    <ul className="divide-y divide-rule rounded border border-rule bg-sheet text-table">
      {sessions.map((session) => (
        <li key={session.id} className="flex flex-wrap items-center gap-x-2 gap-y-0.5 px-1.5 py-0.5">
          <div className="min-w-0 grow">
            <p className="font-medium">
              {session.client}
              {session.current ? <span className="font-normal text-ink-soft"> · this browser</span> : null}
            </p>
            <p className="text-small text-ink-soft">
              {session.address} · signed in <LocalTime at={session.createdAt} /> · last used{" "}
              <LocalTime at={session.lastSeenAt} />
            </p>
          </div>
          {session.current ? null : (
            <Button variant="quiet" onClick={() => onEnd(session)} aria-label={`End ${session.client}`}>
              End
            </Button>
          )}
        </li>
      ))}
    </ul>
  );
}
