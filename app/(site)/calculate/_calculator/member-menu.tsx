"use client";

import type { FormDimension } from "../_server/form-facts";

interface MemberMenuProps {
  readonly members: readonly FormDimension[];
  readonly chosen: FormDimension;
  readonly onChoose: (member: FormDimension) => void;
}

/** Which of the ways to say a dimension is used: radius, diameter, wall. The value is carried over. */
export function MemberMenu({ members, chosen, onChoose }: MemberMenuProps) {
  const others = members.filter(({ name }) => name !== chosen.name);
  const offer = others.length === 1 ? `give ${others[0].label.toLowerCase()}` : "give another";
  return (
    <span className="relative inline-flex min-h-2.5 items-center rounded text-small text-verdigris has-focus-visible:outline-2 has-focus-visible:outline-offset-2 has-focus-visible:outline-verdigris">
      <span aria-hidden className="underline decoration-1 underline-offset-4">
        {offer}
      </span>
      <select
        aria-label={`Given in place of ${others.map(({ label }) => label.toLowerCase()).join(" or ")}`}
        value={chosen.name}
        onChange={(event) => {
          const next = members.find(({ name }) => name === event.target.value);
          if (next) onChoose(next);
        }}
        className="absolute -inset-y-1.5 inset-x-0 w-full cursor-pointer opacity-0"
      >
        {members.map(({ name, label, symbol }) => (
          <option key={name} value={name}>
            {symbol === "" ? label : `${label} (${symbol})`}
          </option>
        ))}
      </select>
    </span>
  );
}
