"use client";

import { type ReactNode, useId, useState } from "react";
import { THEMES, type Theme, applyTheme } from "./theme";

const LABELS: Record<Theme, string> = { system: "As the device", light: "Light", dark: "Dark" };

const ICONS: Record<Theme, ReactNode> = {
  system: <path d="M2.5 3.5h11v7h-11zM5.5 13.5h5M8 10.5v3" />,
  light: (
    <path d="M8 5a3 3 0 1 0 0 6 3 3 0 0 0 0-6ZM8 1.5v1.5M8 13v1.5M1.5 8H3M13 8h1.5M3.4 3.4l1.1 1.1M11.5 11.5l1.1 1.1M12.6 3.4l-1.1 1.1M4.5 11.5l-1.1 1.1" />
  ),
  dark: <path d="M13 9.6A5.5 5.5 0 0 1 6.4 3a5.5 5.5 0 1 0 6.6 6.6Z" />,
};

/** Light, dark or as the device has it; remembered for a year. */
export function ThemeSwitch({ initial }: { readonly initial: Theme }) {
  const [theme, setTheme] = useState(initial);
  const name = useId();

  function choose(next: Theme) {
    setTheme(next);
    applyTheme(next);
  }

  return (
    <fieldset className="flex border border-edge rounded">
      <legend className="sr-only">Colours</legend>
      {THEMES.map((option) => (
        <label
          key={option}
          title={LABELS[option]}
          className="grid size-4 cursor-pointer place-items-center text-ink-soft hover:text-ink has-checked:bg-ink has-checked:text-paper has-focus-visible:outline-2 has-focus-visible:outline-offset-2 has-focus-visible:outline-verdigris"
        >
          <input
            type="radio"
            name={name}
            value={option}
            checked={theme === option}
            onChange={() => choose(option)}
            className="sr-only"
          />
          <span className="sr-only">{LABELS[option]}</span>
          <svg
            viewBox="0 0 16 16"
            aria-hidden
            className="size-2 fill-none stroke-current [stroke-width:1.4]"
            strokeLinecap="round"
            strokeLinejoin="round"
          >
            {ICONS[option]}
          </svg>
        </label>
      ))}
    </fieldset>
  );
}
