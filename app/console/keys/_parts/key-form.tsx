"use client";

import { useState } from "react";
import { CONTROL, Field } from "../../../_ui/field";
import { TextField } from "../../../_ui/text-field";
import { Toggle } from "../../../_ui/toggle";
import { Choices } from "../../_parts/choices";
import { type useFormErrors } from "../../_shell/use-form-errors";

/** What each scope allows, as the form and the document say it. */
const SCOPES: readonly (readonly [string, string])[] = [
  ["compute", "compute; store, relabel, replay and delete records"],
  ["field", "store outlines and solve fields on them"],
  ["materials:read", "read materials"],
  ["materials:write", "create, change and retire materials"],
  ["records:read", "read records"],
  ["keys:manage", "issue, rotate and revoke keys of the team"],
];

export interface KeyDraft {
  readonly name: string;
  readonly scopes: readonly string[];
  readonly minute: string;
  readonly month: string;
  readonly origins: string;
  readonly allowedInUrl: boolean;
  /** A day, `2030-01-31`; empty: never. */
  readonly expires: string;
}

export const NEW_KEY: KeyDraft = {
  name: "",
  scopes: ["compute", "materials:read"],
  minute: "600",
  month: "100000",
  origins: "",
  allowedInUrl: false,
  expires: "",
};

/** The draft as the server takes it; a day ends at its end in UTC. */
export function keyBody(draft: KeyDraft): Record<string, unknown> {
  const whole = (text: string) => (/^\d+$/.test(text.trim()) ? Number(text) : text);
  return {
    name: draft.name,
    scopes: draft.scopes,
    quotas: { minute: whole(draft.minute), month: whole(draft.month) },
    origins: draft.origins.split(/[\s,]+/).filter(Boolean),
    allowedInUrl: draft.allowedInUrl,
    ...(draft.expires === "" ? {} : { expiresAt: `${draft.expires}T23:59:59Z` }),
  };
}

type Errors = Pick<ReturnType<typeof useFormErrors>, "of">;

interface KeyFieldsProps {
  readonly start: KeyDraft;
  readonly errors: Errors;
  readonly onChange: (draft: KeyDraft) => void;
}

/** The settings of a key, to be issued or changed. */
export function KeyFields({ start, errors, onChange }: KeyFieldsProps) {
  const [draft, setDraft] = useState(start);
  const change = (part: Partial<KeyDraft>) => {
    const next = { ...draft, ...part };
    setDraft(next);
    onChange(next);
  };
  return (
    <>
      <TextField
        label="Name"
        name="name"
        maxLength={100}
        required
        autoComplete="off"
        help="What calls with it, so that a colleague knows: CAD scripts, test bench 3."
        value={draft.name}
        error={errors.of("name")}
        onChange={(event) => change({ name: event.target.value })}
      />
      <Choices legend="Scopes" error={errors.of("scopes")}>
        <div className="grid gap-x-2 narrow:grid-cols-2">
          {SCOPES.map(([scope, meaning]) => (
            <label
              key={scope}
              className="flex min-h-5.5 cursor-pointer items-start gap-1 text-table medium:min-h-4"
            >
              <input
                type="checkbox"
                name="scopes"
                className="mt-0.5"
                checked={draft.scopes.includes(scope)}
                onChange={(event) =>
                  change({
                    scopes: event.target.checked
                      ? [...draft.scopes, scope]
                      : draft.scopes.filter((other) => other !== scope),
                  })
                }
              />
              <span>
                <code>{scope}</code>
                <span className="block text-small text-ink-soft">{meaning}</span>
              </span>
            </label>
          ))}
        </div>
      </Choices>
      <div className="grid gap-x-2 narrow:grid-cols-2">
        <TextField
          label="Requests a minute"
          name="quotas.minute"
          inputMode="numeric"
          value={draft.minute}
          error={errors.of("quotas.minute")}
          onChange={(event) => change({ minute: event.target.value })}
        />
        <TextField
          label="Computations a month"
          name="quotas.month"
          inputMode="numeric"
          help="A calendar month in UTC."
          value={draft.month}
          error={errors.of("quotas.month")}
          onChange={(event) => change({ month: event.target.value })}
        />
      </div>
      <TextField
        label="Last day"
        name="expiresAt"
        type="date"
        help="Empty: no end. The key works until the end of this day in UTC."
        value={draft.expires}
        error={errors.of("expiresAt")}
        onChange={(event) => change({ expires: event.target.value })}
      />
      <Field
        label="Origins of browser pages"
        help="One a line, such as https://intranet.example. Programs need none."
        error={originsError(errors)}
      >
        {(control) => (
          <textarea
            {...control}
            name="origins"
            rows={2}
            value={draft.origins}
            onChange={(event) => change({ origins: event.target.value })}
            className={CONTROL}
          />
        )}
      </Field>
      <Toggle
        label="May travel in a URL, as ?key="
        checked={draft.allowedInUrl}
        onChange={(allowedInUrl) => change({ allowedInUrl, ...quotasFor(draft, allowedInUrl) })}
        help="For spreadsheets that cannot send headers. Logs and histories on the way then see the key."
      />
    </>
  );
}

/** A key that may travel gets the small quotas, unless others were typed. */
function quotasFor({ minute, month }: KeyDraft, allowedInUrl: boolean): Partial<KeyDraft> {
  const small = { minute: "120", month: "5000" };
  const usual = { minute: NEW_KEY.minute, month: NEW_KEY.month };
  const [before, after] = allowedInUrl ? [usual, small] : [small, usual];
  return minute === before.minute && month === before.month ? after : {};
}

function originsError({ of }: Errors): string | undefined {
  const first = Array.from({ length: 50 }, (_, index) => of(`origins.${index}`)).find(Boolean);
  return of("origins") ?? first;
}
