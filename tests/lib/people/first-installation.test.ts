import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { expect, test } from "vitest";
import { dispatch } from "@/api/dispatch";
import { registry } from "@/api/registry";
import { pageOfActivity } from "@/db/queries/activity-list";
import { SHELL } from "@/lib/activity/append";
import { choosePassword } from "@/lib/auth/account";
import { issueKey } from "@/lib/auth/manage-keys";
import { signedIn } from "@/lib/auth/session";
import { peopleCommand } from "@/lib/cli/people-command";
import { readConfig } from "@/lib/config/environment";
import { addTeam } from "@/lib/people/manage-teams";
import { invitePerson } from "@/lib/people/manage-people";
import { closeService, openService } from "@/lib/service/service";
import { overviewOf } from "@/lib/usage/overview";
import { SLEEVE } from "../../support/call";

const caller = { headers: new Headers(), address: "192.0.2.7", requestId: "req_test" };
const password = "copper on drawing paper";
const secretOf = (url: string) => url.trim().split("/").pop() ?? "";

test("an empty installation: administrator, team, person, key, call, all of it in the activity", async () => {
  const folder = mkdtempSync(join(tmpdir(), "rhoform-first-"));
  const open = () => openService(readConfig({ RHOFORM_DATA: folder, RHOFORM_LOG: "off", RHOFORM_DEMO: "0" }));
  const shell = peopleCommand(["add-admin", "ines.harrow@merrow-pike.example"], open);
  expect(shell).toMatchObject({ code: 0, stderr: "" });
  const service = open();
  try {
    const { db } = service;
    const overview = () => overviewOf(db, { scope: { teamIds: "all" }, teamIds: [], now: service.now() });
    expect(overview()).toMatchObject({ today: { requests: 0 }, attention: [], quotas: [], slowest: [] });

    const begun = await choosePassword(service, { secret: secretOf(shell.stdout), password }, caller);
    const ines = signedIn(db, begun.session.id, service.now());
    expect(ines).toMatchObject({ name: "Ines Harrow", role: "admin", teamIds: [] });
    const actor = { ...SHELL, kind: "person" as const, id: ines?.personId ?? "", name: "Ines Harrow" };
    const team = addTeam(service, { slug: "busbar", name: "Busbar" }, actor);
    const tomas = { email: "tomas.vell@merrow-pike.example", name: "Tomas Vell" };
    const { link } = invitePerson(service, { ...tomas, role: "developer", teams: [team.id] }, actor);
    const second = { secret: secretOf(link.url), password, name: "Tomas A. Vell" };
    await choosePassword(service, second, caller);
    const settings = { name: "CAD scripts", scopes: ["compute" as const] };
    const { text } = issueKey(db, { teamId: team.id, settings, actor, now: service.now() });
    const call = new Request("http://h/api/v1/resistance", {
      method: "POST",
      headers: { Authorization: `Bearer ${text}`, "Content-Type": "application/json" },
      body: JSON.stringify(SLEEVE),
    });
    expect((await dispatch(call, service, registry)).status).toBe(200);
    await expect.poll(() => overview().today.requests).toBe(1);

    const acts = pageOfActivity(db, { readers: null, search: "", oldestFirst: true, limit: 50, offset: 0 });
    const told = acts.rows.filter(({ action }) => action !== "session.start");
    expect(told.map(({ actorName, action, subjectName }) => [actorName, action, subjectName])).toEqual([
      ["shell", "person.invite", "Ines Harrow"],
      ["Ines Harrow", "invitation.accept", "Ines Harrow"],
      ["Ines Harrow", "team.add", "Busbar"],
      // What is told of a person has the name that the person goes by now.
      ["Ines Harrow", "person.invite", "Tomas A. Vell"],
      ["Tomas A. Vell", "invitation.accept", "Tomas A. Vell"],
      ["Ines Harrow", "key.issue", "CAD scripts"],
    ]);
  } finally {
    closeService(service);
    rmSync(folder, { recursive: true, force: true });
  }
});
