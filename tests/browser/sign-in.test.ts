import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { latestMails, mailById } from "@/db/queries/mails";
import { updatePerson, personByEmail } from "@/db/queries/people";
import { insertPerson } from "@/db/queries/teams";
import { hashPassword } from "@/lib/auth/password";
import { newId } from "@/lib/service/identifier";
import { startServer, type TestServer } from "../support/server";
import { signedInCookie } from "../support/signed-in";
import { axeViolations } from "./accessibility";
import { base, closeBrowser, visit } from "./browser";
import { alive } from "./calculation";

const PASSWORD = "copper on drawing paper";

let server: TestServer;
beforeAll(async () => {
  server = await startServer();
});
afterAll(async () => {
  await closeBrowser();
  await server.stop();
});

const address = () => `${newId("per").slice(-10).toLowerCase()}@merrow-pike.example`;

/** Somebody with a password. */
async function somebody(role: "admin" | "viewer"): Promise<string> {
  const [id, email] = [newId("per"), address()];
  insertPerson(server.service.db, { id, email, name: "Petra Lindqvist-Shaw", role, createdAt: Date.now() });
  updatePerson(server.service.db, id, { passwordHash: await hashPassword(PASSWORD) });
  return email;
}

/** The link in the latest mail to an address. */
async function mailedLink(recipient: string): Promise<string> {
  const { db } = server.service;
  const mail = () => latestMails(db, 200).find((each) => each.recipient === recipient);
  await expect.poll(mail, { timeout: 10_000 }).toBeDefined();
  const url = /http\S+/.exec(mailById(db, mail()?.id ?? "")?.text ?? "")?.[0] ?? "";
  return new URL(url).pathname;
}

describe("signing in", () => {
  it("keeps what was typed after a refusal, goes where it was asked to, and out again", async () => {
    const email = await somebody("admin");
    const { page, close } = await visit("/console/people?role=admin");
    expect(new URL(page.url()).pathname).toBe("/sign-in");
    await page.getByLabel("E-mail address").fill(email);
    await page.getByLabel("Password").fill("not the password");
    await page.getByRole("button", { name: "Sign in" }).click();
    await page.getByRole("alert").getByText("do not belong together").waitFor();
    expect(await page.getByLabel("E-mail address").inputValue()).toBe(email);
    await page.getByLabel("Password").fill(PASSWORD);
    await page.getByRole("button", { name: "Sign in" }).click();
    await page.waitForURL(`${base()}/console/people?role=admin`);
    await page.getByRole("heading", { level: 1, name: "People" }).waitFor();
    await page.getByRole("button", { name: "Sign out" }).click();
    await page.waitForURL(`${base()}/sign-in`);
    await page.goto(`${base()}/console/people`);
    expect(new URL(page.url()).pathname).toBe("/sign-in");
    await close();
  });

  it("with a new password by a link that works once", async () => {
    const email = await somebody("viewer");
    const { page, close } = await visit("/forgotten");
    await page.getByLabel("E-mail address").fill("no address");
    await page.getByRole("button", { name: "Send the link" }).click();
    await page.getByText("must be an e-mail address").waitFor();
    expect(
      await page.getByLabel("E-mail address").evaluate((field) => field === document.activeElement),
    ).toBe(true);
    await page.getByLabel("E-mail address").fill(email);
    await page.getByRole("button", { name: "Send the link" }).click();
    await page.getByText("Look into your mail").waitFor();
    const link = await mailedLink(email);
    await page.goto(base() + link);
    await page.getByLabel("Password").fill("verdigris and drawing ink");
    await page.getByRole("button", { name: "Set the password" }).click();
    await page.waitForURL(`${base()}/console`);
    await page.goto(base() + link);
    await page.getByRole("heading", { name: "This link is over" }).waitFor();
    await close();
  });
});

describe("an administrator", () => {
  it("makes a team, invites somebody who begins, finds it in the activity, removes them", async () => {
    const email = await somebody("admin");
    const slug = `t${newId("per").slice(-8).toLowerCase()}`;
    const invited = address();
    const { page, context, close } = await visit("/sign-in?next=/console/people");
    await page.getByLabel("E-mail address").fill(email);
    await page.getByLabel("Password").fill(PASSWORD);
    await page.getByRole("button", { name: "Sign in" }).click();
    await page.getByRole("button", { name: "New team" }).waitFor();
    await alive(page);
    await page.getByRole("button", { name: "New team" }).click();
    await page.getByLabel("Name", { exact: true }).fill(`Team ${slug}`);
    await page.getByLabel("Short name").fill("No Short Name");
    await page.getByRole("button", { name: "Make the team" }).click();
    await page.getByText("lower-case letters, digits and hyphens, a letter first").waitFor();
    await page.getByLabel("Short name").fill(slug);
    await page.getByRole("button", { name: "Make the team" }).click();
    await page.getByRole("button", { name: `Team ${slug}` }).waitFor();

    await page.getByRole("button", { name: "Invite", exact: true }).click();
    await page.getByLabel("E-mail address").fill(invited);
    await page.getByLabel("Name", { exact: true }).fill("Jori Banfield");
    await page.getByLabel(`Team ${slug}`, { exact: true }).check();
    await page.getByRole("dialog").getByRole("button", { name: "Invite" }).click();
    await page.getByText("pass this link on yourself").waitFor();
    const link = new URL((await page.getByRole("dialog").locator("code").textContent()) ?? "").pathname;
    await page.getByRole("button", { name: "Done" }).click();

    const other = await visit(link);
    await other.page.getByLabel("Password").fill(PASSWORD);
    await other.page.getByRole("button", { name: "Begin" }).click();
    await other.page.waitForURL(`${base()}/console`);

    await page.goto(
      `${base()}/console/activity?subject=${personByEmail(server.service.db, invited)?.id ?? ""}`,
    );
    await page.getByRole("button", { name: "accepted the invitation" }).waitFor();
    await page.getByRole("link", { name: "Jori Banfield" }).first().waitFor();
    await page.getByRole("button", { name: "invited", exact: true }).click();
    await page
      .getByRole("dialog")
      .getByRole("row", { name: `E-mail address ${invited}` })
      .waitFor();

    await page.goto(`${base()}/console/people?q=${encodeURIComponent(invited)}`);
    await page.getByRole("button", { name: "Jori Banfield" }).click();
    await page.getByRole("button", { name: "Remove …" }).click();
    await page.getByText("One device is signed out at once.").waitFor();
    await page.getByRole("dialog").getByRole("button", { name: "Remove" }).click();
    await page.getByText("Nothing fits the search").waitFor();
    await other.page.goto(`${base()}/console`);
    expect(new URL(other.page.url()).pathname).toBe("/sign-in");
    await other.close();
    await context.close();
    await close();
  });
});

describe.each(["/console/people", "/console/activity", "/console/settings", "/console/account"])(
  "%s",
  (path) => {
    it("passes axe in both themes and fits a phone", async () => {
      const cookie = await signedInCookie(server.service, { role: "admin", team: "busbar" });
      const { page, context, complaints, close } = await visit("/sign-in", { width: 360 });
      await context.addCookies([{ ...cookie, url: base() }]);
      for (const colorScheme of ["light", "dark"] as const) {
        await page.emulateMedia({ colorScheme, reducedMotion: "reduce" });
        await page.goto(base() + path);
        await page.locator("main h1").waitFor();
        await page.getByText(/^Loading/).waitFor({ state: "detached" });
        const excess = await page.evaluate(
          () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
        );
        expect(excess).toBe(0);
        expect(await axeViolations(page)).toEqual([]);
      }
      expect(complaints).toEqual([]);
      await close();
    });
  },
);
