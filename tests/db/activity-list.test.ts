import { expect, test } from "vitest";
import { pageOfActivity } from "@/db/queries/activity-list";
import { SHELL } from "@/lib/activity/append";
import { createEmbed } from "@/lib/embeds/manage-embeds";
import { DEMO_EMBED } from "@/lib/embeds/demo";
import { createMaterial } from "@/lib/materials/team-materials";
import { addTeam } from "@/lib/people/manage-teams";
import { invitePerson, removePerson } from "@/lib/people/manage-people";
import { removeRecord, storeRecord } from "@/lib/records/records";
import { scratchService } from "../support/scratch-service";

test("acts name what they are about: also what was deleted, and it is found by that name", () => {
  const { service } = scratchService();
  const { db } = service;
  const now = service.now();
  const write = { teamId: addTeam(service, { slug: "busbar", name: "Busbar" }, SHELL).id, actor: SHELL, now };
  const { id: material } = createMaterial(db, write, {
    name: "Contact bronze",
    kind: "alloy",
    resistivity: { model: "constant", resistivity: 1e-7 },
    range: { from: 0, to: 50 },
    uncertainty: { lower: 0.9, upper: 1.1, note: "guess" },
    source: "own bench",
    provenance: "measured",
  });
  const embed = createEmbed(db, write, {
    teamId: write.teamId,
    settings: { name: "Busbar section", origins: [], monthQuota: 10 },
    definition: DEMO_EMBED,
  });
  const record = storeRecord(db, write, {
    operation: "resistance",
    label: "Main bar",
    shape: "bar",
    request: {},
    result: {},
    materials: [],
  });
  removeRecord(db, write, record);
  const maud = {
    email: "maud@merrow-pike.example",
    name: "Maud",
    role: "viewer" as const,
    teams: [write.teamId],
  };
  removePerson(service, invitePerson(service, maud, SHELL).person.id, SHELL);

  const page = (search = "") =>
    pageOfActivity(db, { readers: null, search, oldestFirst: true, limit: 50, offset: 0 });
  expect(page().rows.map((act) => [act.action, act.subjectName, act.subjectPresent])).toEqual([
    ["team.add", "Busbar", true],
    ["material.create", "Contact bronze", true],
    ["embed.create", "Busbar section", true],
    ["record.delete", "Main bar", false],
    ["person.invite", "Maud", false],
    ["person.remove", "Maud", false],
  ]);
  expect(page("bronze").rows.map(({ subjectId }) => subjectId)).toEqual([material]);
  expect(page("busbar SECTION").rows.map(({ subjectId }) => subjectId)).toEqual([embed.id]);
  expect(page("main bar")).toMatchObject({ total: 1, rows: [{ action: "record.delete" }] });
});
