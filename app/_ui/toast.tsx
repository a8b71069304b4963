"use client";

import { createContext, type ReactNode, useCallback, useContext, useMemo, useState } from "react";
import { Toast as Primitive } from "radix-ui";
import { X } from "lucide-react";

interface Message {
  readonly id: number;
  readonly text: string;
  /** A way back, where there is one. */
  readonly undo?: () => void;
  /** What it is about: of messages about one thing only the last is shown. */
  readonly about?: string;
}

type Show = (text: string, options?: Pick<Message, "undo" | "about">) => void;

const Context = createContext<Show>(() => undefined);

/** Says that something was done; for what needs an answer there is the dialog. */
export function useToast(): Show {
  return useContext(Context);
}

const SHOWN_MS = 6000;

/** Holds the short messages of the pages inside it, at the lower edge, and reads them out. */
export function ToastArea({ children }: { readonly children: ReactNode }) {
  const [messages, setMessages] = useState<readonly Message[]>([]);
  const show = useCallback<Show>((text, { undo, about } = {}) => {
    setMessages((before) => {
      const others = before.filter((message) => about === undefined || message.about !== about);
      return [...others.slice(-2), { id: (before.at(-1)?.id ?? 0) + 1, text, undo, about }];
    });
  }, []);
  const drop = (id: number) => setMessages((before) => before.filter((message) => message.id !== id));
  const value = useMemo(() => show, [show]);
  return (
    <Context value={value}>
      <Primitive.Provider duration={SHOWN_MS} label="Message" swipeDirection="down">
        {children}
        {messages.map(({ id, text, undo }) => (
          <Primitive.Root
            key={id}
            onOpenChange={(open) => !open && drop(id)}
            className="pointer-events-none! flex items-center gap-2 rounded border border-ink bg-ink py-0.5 ps-2 pe-0.5 text-table text-paper [&_button]:pointer-events-auto"
          >
            <Primitive.Description className="grow py-1">{text}</Primitive.Description>
            {undo ? (
              <Primitive.Action
                altText="Undo"
                onClick={undo}
                className="min-h-5.5 cursor-pointer rounded px-1 underline underline-offset-4 hover:decoration-2 focus-visible:outline-paper! medium:min-h-4"
              >
                Undo
              </Primitive.Action>
            ) : null}
            <Primitive.Close
              aria-label="Close"
              className="grid size-5.5 cursor-pointer place-items-center rounded focus-visible:outline-paper! medium:size-4"
            >
              <X aria-hidden size={16} />
            </Primitive.Close>
          </Primitive.Root>
        ))}
        {/* What lies under a message can be pressed: only its buttons take presses. */}
        <Primitive.Viewport className="pointer-events-none fixed inset-x-2 bottom-2 z-50 mx-auto flex max-w-[28rem] flex-col gap-1 outline-none" />
      </Primitive.Provider>
    </Context>
  );
}
