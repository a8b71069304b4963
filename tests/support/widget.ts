import { insertOutline } from "@/db/queries/fields";
import { teamBySlug } from "@/db/queries/teams";
import { SHELL } from "@/lib/activity/append";
import type { EmbedDefinition } from "@/lib/embeds/definition";
import { createEmbed, type EmbedSettings, publishEmbed } from "@/lib/embeds/manage-embeds";
import { cleanOutline } from "@/lib/engine";
import { teamOwner } from "@/lib/fields/owner";
import { newId } from "@/lib/service/identifier";
import { BEND } from "./field";
import type { TestServer } from "./server";

/** A busbar: length open within a range, thickness a list, width fixed, temperature hidden, material a list. */
export const BUSBAR: EmbedDefinition = {
  shape: "bar",
  title: "Copper bar",
  inputs: [
    { name: "length", rule: { mode: "open", value: "250 mm", min: "50 mm", max: "4 m" } },
    { name: "width", rule: { mode: "fixed", value: "40 mm" } },
    {
      name: "thickness",
      rule: { mode: "open", value: "10 mm", choices: [{ value: "5 mm" }, { value: "10 mm" }] },
    },
    {
      name: "material",
      rule: {
        mode: "open",
        value: "copper-annealed",
        choices: [{ value: "copper-annealed", label: "Copper" }, { value: "aluminium-electrical" }],
      },
    },
    { name: "temperature", rule: { mode: "hidden", value: "60 degC" } },
  ],
  show: { drawing: true, bounds: true, plots: false },
  theme: "host",
  density: "comfortable",
  language: "reader",
};

export function definition(change: Partial<EmbedDefinition> = {}): EmbedDefinition {
  return { ...BUSBAR, ...change };
}

/** A published widget of a team of its own. */
export function publishedWidget(
  server: TestServer,
  change: Partial<EmbedDefinition> = {},
  settings: Partial<EmbedSettings> & { team?: string } = {},
): { id: string; version: number; teamId: string } {
  const { team = "widgets", ...rest } = settings;
  // Issuing a key makes the team where it is missing.
  server.issue({ team });
  const { db } = server.service;
  const teamId = teamBySlug(db, team)?.id ?? "";
  const by = { actor: SHELL, now: Date.now() };
  const { id } = createEmbed(db, by, {
    teamId,
    settings: { name: "Bar", origins: [], monthQuota: 1000, ...rest },
    definition: definition(change),
  });
  const { version } = publishEmbed(db, by, id);
  return { id, version: version ?? 0, teamId };
}

/** What the definition of a widget on a stored outline has in place of a shape: a sheet, open from 10 to 100 ohm/sq. */
export function onOutline(
  outlineId: string,
  change: Partial<EmbedDefinition> = {},
): Partial<EmbedDefinition> {
  return {
    shape: undefined,
    outlineId,
    title: "Bent track",
    inputs: [
      {
        name: "sheetResistance",
        rule: { mode: "open", value: "50 ohm/sq", min: "10 ohm/sq", max: "100 ohm/sq" },
      },
      { name: "temperature", rule: { mode: "hidden", value: "23.75 degC" } },
      { name: "current", rule: { mode: "fixed", value: "2 mA" } },
    ],
    ...change,
  };
}

/** Stores the bend of the field tests for a team; the id. */
export function storedBend(server: TestServer, team = "widgets", name = "Bent track"): string {
  server.issue({ team });
  const { db } = server.service;
  const id = newId("out");
  const content = JSON.stringify(cleanOutline({ name, outline: BEND.outline, terminals: BEND.terminals }));
  insertOutline(db, { id, owner: teamOwner(teamBySlug(db, team)?.id ?? ""), createdAt: Date.now(), content });
  return id;
}
