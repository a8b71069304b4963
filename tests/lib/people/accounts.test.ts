import { describe, expect, test } from "vitest";
import { activityOfSubject } from "@/db/queries/activity";
import { latestMails, mailById } from "@/db/queries/mails";
import { personByEmail, personById } from "@/db/queries/people";
import { SHELL } from "@/lib/activity/append";
import { choosePassword, confirmEmail, requestEmailChange, requestReset } from "@/lib/auth/account";
import { LINK_MS, openLink } from "@/lib/auth/links";
import { IDLE_MS, SESSION_MS, signedIn } from "@/lib/auth/session";
import { signIn } from "@/lib/auth/sign-in";
import { changePerson, invitePerson, removePerson } from "@/lib/people/manage-people";
import { Refusal } from "@/lib/service/refusal";
import type { Service } from "@/lib/service/service";
import { PASSWORD, type ScratchService, scratchService } from "../../support/scratch-service";

const EMAIL = "ines.harrow@merrow-pike.example";
const START = Date.UTC(2026, 2, 1);

const caller = (address = "192.0.2.7", headers: Record<string, string> = {}) => ({
  headers: new Headers(headers),
  address,
  requestId: "req_test",
});

const enter = (service: Service, password = PASSWORD, email = EMAIL, address?: string) =>
  signIn(service, { email, password }, caller(address));

async function codeOf(work: Promise<unknown> | (() => unknown)): Promise<string> {
  try {
    await (typeof work === "function" ? work() : work);
    return "no refusal";
  } catch (error) {
    if (error instanceof Refusal) return error.code;
    throw error;
  }
}

const secretOf = (url: string) => url.split("/").pop() ?? "";

/** The secret in the link of the latest mail to an address. */
function mailedSecret({ db }: Service, recipient: string): string {
  const mail = latestMails(db, 50).find((each) => each.recipient === recipient);
  return secretOf(/http\S+/.exec(mailById(db, mail?.id ?? "")?.text ?? "")?.[0] ?? "");
}

function withPerson(): ScratchService & { readonly id: string } {
  const scratch = scratchService({}, START);
  return { ...scratch, id: scratch.person("admin", [], EMAIL) };
}

describe("signing in", () => {
  test("opens a session that lasts a month, or a week without use", async () => {
    const { service, setTime } = withPerson();
    const { session, setCookies } = await enter(service);
    expect(setCookies[0]).toMatch(
      /^rhoform-session=ey[\w.-]+; Path=\/; Max-Age=2592000; HttpOnly; SameSite=Lax$/,
    );
    const person = (at: number) => signedIn(service.db, session.id, at, "192.0.2.7");
    expect(person(START)?.email).toBe(EMAIL);
    for (let day = 6; day < 30; day += 6) expect(person(START + day * 86_400_000)).toBeDefined();
    expect(person(START + SESSION_MS)).toBeUndefined();
    setTime(START + 40 * 86_400_000);
    const other = await enter(service);
    expect(signedIn(service.db, other.session.id, service.now() + IDLE_MS)).toBeUndefined();
  });

  test("is Secure and bound to the host behind https", async () => {
    const { service, person } = scratchService({ RHOFORM_ORIGIN: "https://rhoform.merrow-pike.example" });
    person("admin", [], EMAIL);
    const { setCookies } = await enter(service);
    for (const cookie of setCookies) {
      expect(cookie).toMatch(/^__Host-rhoform-(session|device)=/);
      expect(cookie).toMatch(/; Path=\/; Max-Age=\d+; HttpOnly; SameSite=Lax; Secure$/);
    }
  });

  test("is refused alike for a wrong password, an unknown address and somebody who was removed", async () => {
    const { service, person } = withPerson();
    const gone = person("viewer", [], "gone@merrow-pike.example");
    removePerson(service, gone, SHELL);
    const refusals = await Promise.all(
      [enter(service, "not the password"), enter(service, PASSWORD, "nobody@merrow-pike.example")].map(
        (work) =>
          work.then(
            () => undefined,
            (error: unknown) =>
              error instanceof Refusal ? { code: error.code, detail: error.detail } : error,
          ),
      ),
    );
    expect(refusals[0]).toMatchObject({ code: "sign-in-failed" });
    expect(refusals[1]).toEqual(refusals[0]);
    expect(await codeOf(enter(service, PASSWORD, "gone@merrow-pike.example"))).toBe("sign-in-failed");
  });

  test("takes as long where there is no such account", async () => {
    const { service } = withPerson();
    const time = async (email: string) => {
      const started = performance.now();
      await codeOf(enter(service, "not the password", email, `192.0.2.${Math.floor(Math.random() * 200)}`));
      return performance.now() - started;
    };
    // The quickest of several, in turns: what the machine does besides only ever adds.
    let [known, unknown] = [Infinity, Infinity];
    for (let i = 0; i < 8; i++) {
      known = Math.min(known, await time(EMAIL));
      unknown = Math.min(unknown, await time("nobody@merrow-pike.example"));
    }
    // Both hash once with 19 MiB; without the hash an answer would take a hundredth of it.
    expect(unknown / known).toBeGreaterThan(0.3);
    expect(unknown / known).toBeLessThan(3);
  });

  test("is limited by account, from wherever, and by address, for whatever account", async () => {
    const { service } = withPerson();
    for (let i = 0; i < 10; i++) {
      expect(await codeOf(enter(service, "wrong", EMAIL, `192.0.2.${i}`))).toBe("sign-in-failed");
    }
    expect(await codeOf(enter(service, PASSWORD, EMAIL, "192.0.2.99"))).toBe("too-many-requests");
    const other = "nobody@merrow-pike.example";
    for (let i = 0; i < 10; i++) await codeOf(enter(service, "wrong", other, `198.51.100.${i}`));
    // An address without an account is limited in the same way.
    expect(await codeOf(enter(service, "wrong", other, "198.51.100.99"))).toBe("too-many-requests");
  });

  test("from a new device is told by mail, from a known one not", async () => {
    const { service } = withPerson();
    const first = await enter(service);
    const device = first.setCookies[1].split(";")[0];
    await signIn(service, { email: EMAIL, password: PASSWORD }, caller("192.0.2.7", { cookie: device }));
    expect(latestMails(service.db, 10)).toEqual([]);
    await enter(service);
    expect(latestMails(service.db, 10).map(({ kind, recipient }) => [kind, recipient])).toEqual([
      ["new-device", EMAIL],
    ]);
  });
});

describe("links", () => {
  const invite = (scratch: ScratchService) =>
    secretOf(
      invitePerson(
        scratch.service,
        { email: "maud@merrow-pike.example", name: "Maud Okerlund", role: "admin", teams: [] },
        { ...SHELL, kind: "person", name: "Ines Harrow" },
      ).link.url,
    );

  test("of an invitation set a password once, and sign in", async () => {
    const scratch = withPerson();
    const { service } = scratch;
    const secret = invite(scratch);
    expect(mailedSecret(service, "maud@merrow-pike.example")).toBe(secret);
    const short = choosePassword(service, { secret, password: "too short" }, caller());
    expect(await codeOf(short)).toBe("invalid-input");
    const chosen = await choosePassword(service, { secret, password: PASSWORD, name: "Maud O." }, caller());
    expect(signedIn(service.db, chosen.session.id, service.now())?.name).toBe("Maud O.");
    expect(await codeOf(choosePassword(service, { secret, password: PASSWORD }, caller()))).toBe("link-over");
    await enter(service, PASSWORD, "maud@merrow-pike.example");
  });

  test("expire, and a newer one ends the one before", async () => {
    const scratch = withPerson();
    const { service, setTime } = scratch;
    const secret = invite(scratch);
    expect(openLink(service.db, secret, ["invitation"], START + LINK_MS.invitation - 1)).toBeDefined();
    expect(openLink(service.db, secret, ["reset"], START)).toBeUndefined();
    setTime(START + LINK_MS.invitation);
    expect(await codeOf(choosePassword(service, { secret, password: PASSWORD }, caller()))).toBe("link-over");
  });

  test("of a reset end all sessions; whoever asks learns nothing", async () => {
    const { service } = withPerson();
    const { session } = await enter(service);
    requestReset(service, "nobody@merrow-pike.example", caller());
    requestReset(service, EMAIL, caller());
    requestReset(service, EMAIL, caller());
    await expect.poll(() => latestMails(service.db, 10).length).toBe(2);
    const secret = mailedSecret(service, EMAIL);
    await choosePassword(service, { secret, password: "verdigris and drawing ink" }, caller());
    expect(signedIn(service.db, session.id, service.now())).toBeUndefined();
    expect(await codeOf(enter(service))).toBe("sign-in-failed");
    await enter(service, "verdigris and drawing ink");
  });

  test("change the e-mail address once it is confirmed; a taken one gets no mail", async () => {
    const { service, id, person } = withPerson();
    person("viewer", [], "taken@merrow-pike.example");
    const self = { personId: id, sessionId: "ses_none", actor: { ...SHELL, kind: "person" as const, id } };
    const change = (email: string, currentPassword = PASSWORD) =>
      requestEmailChange(service, self, { email, currentPassword });
    expect(await codeOf(change("new@merrow-pike.example", "wrong"))).toBe("invalid-input");
    await change("taken@merrow-pike.example");
    expect(latestMails(service.db, 10).map(({ recipient }) => recipient)).toEqual([EMAIL]);
    await change("new@merrow-pike.example");
    const secret = mailedSecret(service, "new@merrow-pike.example");
    expect(personById(service.db, id)?.email).toBe(EMAIL);
    expect(confirmEmail(service, secret, caller())).toBe("new@merrow-pike.example");
    expect(await codeOf(() => confirmEmail(service, secret, caller()))).toBe("link-over");
    await enter(service, PASSWORD, "new@merrow-pike.example");
  });
});

describe("people", () => {
  test("who are removed are signed out at once and leave their team's keys", async () => {
    const { service, person, team } = withPerson();
    const busbar = team("busbar");
    const id = person("developer", [busbar], "tomas@merrow-pike.example");
    const { session } = await enter(service, PASSWORD, "tomas@merrow-pike.example");
    expect(signedIn(service.db, session.id, service.now())).toBeDefined();
    removePerson(service, id, SHELL);
    expect(signedIn(service.db, session.id, service.now())).toBeUndefined();
    expect(activityOfSubject(service.db, id)[0]).toMatchObject({
      action: "person.remove",
      actorKind: "shell",
    });
    const back = invitePerson(
      service,
      { email: "Tomas@merrow-pike.example", name: "Tomas Vell", role: "viewer", teams: [busbar] },
      SHELL,
    );
    expect(back.person).toMatchObject({ id, state: "invited", teams: [{ id: busbar }] });
  });

  test("keep one administrator: the last is neither removed nor demoted", async () => {
    const { service, id, person, team } = withPerson();
    const teams = [team("busbar")];
    expect(await codeOf(() => removePerson(service, id, SHELL))).toBe("last-administrator");
    expect(await codeOf(() => changePerson(service, id, { role: "developer" }, SHELL))).toBe(
      "last-administrator",
    );
    const second = person("admin");
    changePerson(service, id, { role: "developer", teams }, SHELL);
    expect(await codeOf(() => removePerson(service, second, SHELL))).toBe("last-administrator");
  });

  test("keep an administrator who can sign in: one who was only invited does not count", async () => {
    const { service, id, person } = withPerson();
    const maud = {
      email: "maud@merrow-pike.example",
      name: "Maud Okerlund",
      role: "admin" as const,
      teams: [],
    };
    const invited = invitePerson(service, maud, SHELL);
    expect(await codeOf(() => removePerson(service, id, SHELL))).toBe("last-administrator");
    removePerson(service, invited.person.id, SHELL);
    const again = invitePerson(service, maud, SHELL);
    await choosePassword(service, { secret: secretOf(again.link.url), password: PASSWORD }, caller());
    removePerson(service, id, SHELL);
    const third = person("admin");
    removePerson(service, again.person.id, SHELL);
    expect(await codeOf(() => removePerson(service, third, SHELL))).toBe("last-administrator");
  });

  test("belong to a team, but for administrators: the complaint is about the teams", () => {
    const { service, id, person, team } = withPerson();
    person("admin");
    const busbar = team("busbar");
    const maud = { email: "maud@merrow-pike.example", name: "Maud Okerlund" };
    const complaints = (work: () => unknown) => {
      try {
        work();
        return [];
      } catch (error) {
        if (error instanceof Refusal) return error.more.errors;
        throw error;
      }
    };
    const wanted = [
      { pointer: "#/teams", detail: "must name at least one team: only an admin may be without." },
    ];
    for (const role of ["developer", "viewer"] as const)
      expect(complaints(() => invitePerson(service, { ...maud, role, teams: [] }, SHELL))).toEqual(wanted);
    const invited = invitePerson(service, { ...maud, role: "developer", teams: [busbar] }, SHELL).person;
    expect(complaints(() => changePerson(service, invited.id, { teams: [] }, SHELL))).toEqual(wanted);
    expect(complaints(() => changePerson(service, id, { role: "viewer" }, SHELL))).toEqual(wanted);
    expect(changePerson(service, invited.id, { role: "admin", teams: [] }, SHELL).teams).toEqual([]);
  });

  test("are one an address, whatever its case", async () => {
    const { service } = withPerson();
    const again = { email: EMAIL.toUpperCase(), name: "Ines", role: "viewer" as const, teams: [] };
    expect(await codeOf(() => invitePerson(service, again, SHELL))).toBe("invalid-input");
    expect(personByEmail(service.db, EMAIL.toUpperCase())?.email).toBe(EMAIL);
  });
});
