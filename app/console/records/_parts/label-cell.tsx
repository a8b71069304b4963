"use client";

import Link from "next/link";
import { type FormEvent, useState } from "react";
import { PenLine } from "lucide-react";
import type { KeyedMutator } from "swr";
import { Button } from "../../../_ui/button";
import { CONTROL } from "../../../_ui/field";
import { useToast } from "../../../_ui/toast";
import { callConsole, ConsoleProblem } from "../../_shell/call-console";
import type { ListPage } from "../../_table/column";
import type { ListedRecord } from "./record-list";

interface LabelCellProps {
  readonly record: ListedRecord;
  readonly mayManage: boolean;
  readonly open: boolean;
  readonly onOpen: (open: boolean) => void;
  readonly mutate: KeyedMutator<ListPage<ListedRecord>>;
}

/** A record's label with the way to its page; changed in place, shown at once and taken back if it is refused. */
export function LabelCell({ record, mayManage, open, onOpen, mutate }: LabelCellProps) {
  const [typed, setTyped] = useState(record.label);
  const toast = useToast();

  async function save(event: FormEvent) {
    event.preventDefault();
    const label = typed.trim();
    onOpen(false);
    if (label === "" || label === record.label) return;
    const relabelled = (page: ListPage<ListedRecord> | undefined): ListPage<ListedRecord> => ({
      total: page?.total ?? 0,
      rows: (page?.rows ?? []).map((row) => (row.id === record.id ? { ...row, label } : row)),
    });
    try {
      await mutate(
        async (page) => {
          await callConsole("PATCH", `records/${record.id}`, { label });
          return relabelled(page);
        },
        { optimisticData: relabelled, rollbackOnError: true, revalidate: true },
      );
    } catch (failure) {
      if (!(failure instanceof ConsoleProblem)) throw failure;
      toast(`The label stays as it was: ${failure.message}`);
    }
  }

  if (open) {
    return (
      <form
        onSubmit={(event) => void save(event)}
        onKeyDown={(event) => event.key === "Escape" && onOpen(false)}
        className="flex min-w-20 gap-0.5"
      >
        <input
          // The reader has just asked to type here.
          autoFocus
          aria-label="Label"
          value={typed}
          maxLength={200}
          onChange={(event) => setTyped(event.target.value)}
          className={`${CONTROL} font-sans!`}
        />
        <Button type="submit">Save</Button>
      </form>
    );
  }
  return (
    <span className="flex items-start gap-0.5">
      <Link className="link font-medium [overflow-wrap:anywhere]" href={`/records/${record.id}`}>
        {record.label}
      </Link>
      {mayManage ? (
        <button
          type="button"
          aria-label={`Relabel ${record.label}`}
          onClick={() => {
            setTyped(record.label);
            onOpen(true);
          }}
          className="grid size-3 shrink-0 cursor-pointer place-items-center rounded text-ink-soft hover:text-ink"
        >
          <PenLine aria-hidden size={14} />
        </button>
      ) : null}
    </span>
  );
}
