"use client";

import { useCallback, useEffect, useRef, useState } from "react";
import type { EmbedDefinition } from "@/lib/embeds/definition";
import type { VersionView } from "@/lib/embeds/embed-view";
import type { Problem } from "@/lib/engine";
import { callConsole, ConsoleProblem } from "../../_shell/call-console";
import type { EmbedDetail } from "../../../api/console/embeds/_server/embed-detail";

const PAUSE_MS = 600;

export interface Draft {
  readonly definition: EmbedDefinition;
  readonly change: (change: Partial<EmbedDefinition>) => void;
  /** What stands in the way of publishing; pointers go into the definition. */
  readonly problems: readonly Problem[];
  readonly state: "saved" | "saving" | "failed";
  /** Why the last save was refused, where it was not for what stands in the fields. */
  readonly failure: ConsoleProblem | null;
  /** The saved version that the preview shows: it changes with every save. */
  readonly shown: { readonly number: number; readonly savedAt: number };
}

/**
 * The draft as it is edited: saved by itself when typing rests, one save at a time, so that an older one never wins.
 * A change to a published version starts the next draft.
 */
export function useDraft(detail: EmbedDetail, onStarted: () => void): Draft {
  const [newest] = detail.versions;
  const [definition, setDefinition] = useState(newest.definition);
  const [problems, setProblems] = useState(detail.problems);
  const [shown, setShown] = useState({ number: newest.number, savedAt: newest.savedAt });
  const [state, setState] = useState<Draft["state"]>("saved");
  const [failure, setFailure] = useState<ConsoleProblem | null>(null);
  const from = useRef(newest.state === "draft" ? newest.savedAt : null);
  const wanted = useRef<EmbedDefinition | null>(null);
  const busy = useRef(false);
  const timer = useRef<ReturnType<typeof setTimeout>>(undefined);
  const { id } = detail.embed;

  const save = useCallback(async () => {
    if (busy.current) return;
    busy.current = true;
    while (wanted.current) {
      const next = wanted.current;
      wanted.current = null;
      const starts = from.current === null;
      try {
        const saved = await callConsole<{ version: VersionView; problems: readonly Problem[] }>(
          "PUT",
          `embeds/${id}/draft`,
          { definition: next, from: from.current },
        );
        from.current = saved.version.savedAt;
        setShown({ number: saved.version.number, savedAt: saved.version.savedAt });
        setProblems(saved.problems);
        setFailure(null);
        setState(wanted.current ? "saving" : "saved");
        if (starts) onStarted();
      } catch (error) {
        if (!(error instanceof ConsoleProblem)) throw error;
        setState("failed");
        if (error.status === 422) {
          setProblems(
            (error.problem.errors ?? []).map(({ pointer = "#", detail: text }) => ({
              pointer: pointer.replace("#/definition", "#"),
              detail: text,
            })),
          );
          setFailure(null);
        } else setFailure(error);
      }
    }
    busy.current = false;
  }, [id, onStarted]);

  const change = useCallback(
    (part: Partial<EmbedDefinition>) => {
      setDefinition((before) => {
        const next = { ...before, ...part };
        wanted.current = next;
        return next;
      });
      setState("saving");
      clearTimeout(timer.current);
      timer.current = setTimeout(() => void save(), PAUSE_MS);
    },
    [save],
  );

  useEffect(() => () => clearTimeout(timer.current), []);
  return { definition, change, problems, state, failure, shown };
}
