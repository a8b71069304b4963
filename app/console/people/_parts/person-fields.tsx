"use client";

import { TextField } from "../../../_ui/text-field";
import { Choices } from "../../_parts/choices";
import { ROLE_CHOICES, type RoleShown, type TeamShown } from "./person";

interface PersonFieldsProps {
  readonly name: string;
  readonly role: RoleShown;
  readonly teamIds: readonly string[];
  readonly teams: readonly TeamShown[];
  readonly errorOf: (name: string) => string | undefined;
}

/** Name, role and teams: the same in an invitation and in a change. */
export function PersonFields({ name, role, teamIds, teams, errorOf }: PersonFieldsProps) {
  return (
    <>
      <TextField
        label="Name"
        name="name"
        defaultValue={name}
        required
        maxLength={100}
        error={errorOf("name")}
      />
      <Choices legend="Role" error={errorOf("role")}>
        {ROLE_CHOICES.map(({ value, label, help }) => (
          <label key={value} className="flex min-h-4 cursor-pointer items-baseline gap-1 py-0.5 text-table">
            <input type="radio" name="role" value={value} defaultChecked={value === role} />
            <span>
              {label} <span className="block text-small text-ink-soft">{help}</span>
            </span>
          </label>
        ))}
      </Choices>
      <Choices legend="Teams" error={teams.length > 0 ? errorOf("teams") : undefined}>
        {teams.length === 0 ? (
          <p className="text-small text-ink-soft">
            There are no teams yet, and only an admin may be without one. Make one below the list of people.
          </p>
        ) : (
          <div className="flex flex-wrap gap-x-2">
            {teams.map((team) => (
              <label key={team.id} className="flex min-h-4 cursor-pointer items-center gap-0.5 text-table">
                <input
                  type="checkbox"
                  name="teams"
                  value={team.id}
                  defaultChecked={teamIds.includes(team.id)}
                />
                {team.name}
              </label>
            ))}
          </div>
        )}
      </Choices>
    </>
  );
}

/** What the fields hold. */
export function readPersonFields(form: HTMLFormElement) {
  const given = new FormData(form);
  return { name: given.get("name"), role: given.get("role"), teams: given.getAll("teams") };
}
