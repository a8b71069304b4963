"use client";

import { useId, useState } from "react";
import { THEMES, THEME_LOOKS, type Theme, applyTheme } from "./theme";

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
          title={THEME_LOOKS[option].label}
          className="relative grid h-5.5 w-4 cursor-pointer place-items-center text-ink-soft hover:text-ink has-checked:bg-ink has-checked:text-paper has-focus-visible:outline-2 has-focus-visible:outline-offset-2 has-focus-visible:outline-verdigris medium:h-4"
        >
          <input
            type="radio"
            name={name}
            value={option}
            checked={theme === option}
            onChange={() => choose(option)}
            className="sr-only"
          />
          <span className="sr-only">{THEME_LOOKS[option].label}</span>
          <svg
            viewBox="0 0 16 16"
            aria-hidden
            className="size-2 fill-none stroke-current [stroke-width:1.4]"
            strokeLinecap="round"
            strokeLinejoin="round"
          >
            <path d={THEME_LOOKS[option].icon} />
          </svg>
        </label>
      ))}
    </fieldset>
  );
}
