import { teamBySlug } from "@/db/queries/teams";
import { SHELL } from "@/lib/activity/append";
import type { EmbedDefinition } from "@/lib/embeds/definition";
import { createEmbed, type EmbedSettings, publishEmbed } from "@/lib/embeds/manage-embeds";
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
