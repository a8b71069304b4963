"use client";

import { type ReactNode, useRef } from "react";
import { Dialog as Primitive } from "radix-ui";
import { X } from "lucide-react";

interface DialogProps {
  readonly open: boolean;
  readonly onOpenChange: (open: boolean) => void;
  readonly title: string;
  /** What it is about, in a sentence; read with the title. */
  readonly description?: string;
  readonly children: ReactNode;
  /** The buttons, the one that goes on last. */
  readonly actions?: ReactNode;
  readonly wide?: boolean;
  /** Only its own buttons close it: a stray press would lose what it shows. */
  readonly deliberate?: boolean;
}

/** Where the focus was before the newest dialog: one that follows another begins with no focus of its own. */
let lastOpener: HTMLElement | null = null;

/** A question or a task that must be finished or left first; focus stays inside and returns afterwards. */
export function Dialog(props: DialogProps) {
  const { open, onOpenChange, title, description, children, actions, wide, deliberate = false } = props;
  const opener = useRef<HTMLElement | null>(null);

  function rememberOpener() {
    const { activeElement, body } = document;
    if (activeElement instanceof HTMLElement && activeElement !== body) lastOpener = activeElement;
    opener.current = lastOpener;
  }

  function returnFocus(event: Event) {
    event.preventDefault();
    opener.current?.focus();
    lastOpener = null;
  }

  const stay = (event: Event) => {
    if (deliberate) event.preventDefault();
  };

  return (
    <Primitive.Root open={open} onOpenChange={onOpenChange}>
      <Primitive.Portal>
        <Primitive.Overlay className="fixed inset-0 z-30 bg-[rgb(0_0_0/0.5)]" />
        <Primitive.Content
          {...(description ? {} : { "aria-describedby": undefined })}
          onOpenAutoFocus={rememberOpener}
          onCloseAutoFocus={returnFocus}
          onEscapeKeyDown={stay}
          onInteractOutside={stay}
          className={`fixed inset-x-2 top-1/2 z-40 mx-auto flex max-h-[calc(100dvh-32px)] -translate-y-1/2 flex-col rounded border border-ink bg-sheet outline-none ${wide ? "max-w-[68rem]" : "max-w-[32rem]"}`}
        >
          <div className="flex items-start gap-2 border-b border-rule px-2 py-1.5">
            <div className="grow">
              <Primitive.Title className="text-h3">{title}</Primitive.Title>
              {description ? (
                <Primitive.Description className="mt-0.5 text-table text-ink-soft">
                  {description}
                </Primitive.Description>
              ) : null}
            </div>
            {deliberate ? null : (
              <Primitive.Close
                aria-label="Close"
                className="grid size-5.5 shrink-0 cursor-pointer place-items-center rounded text-ink-soft hover:text-ink medium:size-4"
              >
                <X aria-hidden size={18} />
              </Primitive.Close>
            )}
          </div>
          <div className="overflow-y-auto px-2 py-2">{children}</div>
          {actions ? (
            <div className="flex flex-wrap justify-end gap-1 border-t border-rule px-2 py-1.5">{actions}</div>
          ) : null}
        </Primitive.Content>
      </Primitive.Portal>
    </Primitive.Root>
  );
}
