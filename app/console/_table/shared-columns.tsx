import { LocalTime } from "../../_ui/local-time";
import type { TeamChoice } from "../_shell/team-choices";
import type { ListColumn } from "./column";
import { ListFilter } from "./list-tools";
import type { ListState } from "./use-list-state";

/** Whose it is. */
export function teamColumn<Row extends { readonly teamName: string }>(
  from: ListColumn<Row>["from"] = "medium",
): ListColumn<Row> {
  return { id: "team", title: "Team", sortable: true, from, cell: ({ teamName }) => teamName };
}

/** When it was made, and by whom. */
export function madeColumn<Row extends { readonly createdAt: string; readonly createdBy: string }>(
  title: string,
  from: ListColumn<Row>["from"],
): ListColumn<Row> {
  return {
    id: "createdAt",
    title,
    sortable: true,
    from,
    cell: ({ createdAt, createdBy }) => (
      <>
        <LocalTime at={createdAt} />
        <span className="block text-small text-ink-soft">by {createdBy}</span>
      </>
    ),
  };
}

/** The columns without that of the team, where there is but one. */
export function columnsForTeams<Row>(
  columns: readonly ListColumn<Row>[],
  several: boolean,
): readonly ListColumn<Row>[] {
  return several ? columns : columns.filter(({ id }) => id !== "team");
}

interface TeamFilterProps {
  readonly state: ListState;
  readonly teams: readonly TeamChoice[];
}

/** One of several teams; nothing to choose where there is but one. */
export function TeamFilter({ state, teams }: TeamFilterProps) {
  if (teams.length < 2) return null;
  return (
    <ListFilter
      state={state}
      name="team"
      label="Team"
      options={teams.map(({ id, name }) => ({ value: id, label: name }))}
    />
  );
}
