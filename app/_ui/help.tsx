"use client";

import { Popover } from "radix-ui";

interface HelpProps {
  /** What it explains, for the button's name. */
  readonly about: string;
  readonly text: string;
}

/** A sentence of help behind a small button; opens on a press, by touch and keyboard alike, and closes with Escape. */
export function Help({ about, text }: HelpProps) {
  return (
    <Popover.Root>
      <Popover.Trigger
        type="button"
        aria-label={`Help: ${about}`}
        className="relative grid size-2.5 cursor-pointer place-items-center rounded-full! border border-edge text-small leading-none text-ink-soft before:absolute before:-inset-[13px] before:content-[''] hover:border-ink hover:text-ink aria-expanded:border-ink aria-expanded:bg-ink aria-expanded:text-paper"
      >
        ?
      </Popover.Trigger>
      <Popover.Portal>
        <Popover.Content
          side="top"
          sideOffset={6}
          collisionPadding={12}
          aria-label={about}
          className="z-20 max-w-[36ch] rounded border border-ink bg-sheet px-1.5 py-1 text-table text-ink outline-none"
        >
          {text}
          <Popover.Arrow className="fill-ink" />
        </Popover.Content>
      </Popover.Portal>
    </Popover.Root>
  );
}
