import { afterAll, beforeAll, expect, it } from "vitest";
import { latestMails, mailById } from "@/db/queries/mails";
import { newId } from "@/lib/service/identifier";
import { call, SLEEVE } from "../support/call";
import { startServer, type TestServer } from "../support/server";
import { signedInCookie } from "../support/signed-in";
import { base, browser, closeBrowser, visit } from "./browser";
import { alive } from "./calculation";

/** A team of its own, so that its console is empty. */
const TEAM = `first-${newId("per").slice(-8).toLowerCase()}`;
const INVITED = `${newId("per").slice(-10).toLowerCase()}@merrow-pike.example`;

let server: TestServer;
beforeAll(async () => {
  server = await startServer();
});
afterAll(async () => {
  await closeBrowser();
  await server.stop();
});

/** The link of an invitation, read where its reader reads it: in the mail, on a phone and on a desk. */
async function linkInMail(): Promise<string> {
  const { db } = server.service;
  const mail = latestMails(db, 200).find(({ recipient }) => recipient === INVITED);
  const { html = "", text = "" } = mailById(db, mail?.id ?? "") ?? {};
  const link = /http\S+\/invitation\/\S+/.exec(text)?.[0] ?? "";
  for (const width of [360, 720]) {
    const page = await (await browser()).newPage({ viewport: { width, height: 600 } });
    const requests: string[] = [];
    page.on("request", (request) => requests.push(request.url()));
    await page.setContent(html);
    const button = page.getByRole("link", { name: "Choose a password" });
    expect(await button.getAttribute("href")).toBe(link);
    expect((await button.boundingBox())?.height).toBeGreaterThan(24);
    const excess = await page.evaluate(
      () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
    );
    expect([width, excess, requests]).toEqual([width, 0, []]);
    await page.close();
  }
  return new URL(link).pathname;
}

it("invited by an administrator, somebody begins, issues the first key, calls, and sees the call", async () => {
  const admin = await signedInCookie(server.service, { role: "admin", team: TEAM, name: "Ines Harrow" });
  const desk = await visit("/sign-in", {
    prepare: (page) => page.context().addCookies([{ ...admin, url: base() }]),
  });
  await desk.page.goto(`${base()}/console/people`);
  await desk.page.getByRole("button", { name: "New team" }).waitFor();
  await alive(desk.page);
  await desk.page.getByRole("button", { name: "Invite", exact: true }).click();
  const dialog = desk.page.getByRole("dialog");
  await dialog.getByLabel("E-mail address").fill(INVITED);
  await dialog.getByLabel("Name", { exact: true }).fill("Tomas Vell");
  // A developer without a team is refused at the teams, and what was typed stays.
  await dialog.getByRole("button", { name: "Invite" }).click();
  await dialog.getByText("must name at least one team").waitFor();
  expect(await desk.page.evaluate(() => document.activeElement?.getAttribute("name"))).toBe("teams");
  expect(await dialog.getByLabel("E-mail address").inputValue()).toBe(INVITED);
  await dialog.getByLabel(TEAM, { exact: true }).check();
  await dialog.getByRole("button", { name: "Invite" }).click();
  await dialog.getByText("pass this link on yourself").waitFor();

  const { page, close } = await visit(await linkInMail());
  await page.getByLabel("Password").fill("copper on drawing paper");
  await page.getByRole("button", { name: "Begin" }).click();
  await page.waitForURL(`${base()}/console`);
  await page.getByText("No calls yet").waitFor();
  await page.getByRole("main").getByRole("link", { name: "Issue a key" }).click();
  await page.getByText("No keys yet").waitFor();
  await page.getByRole("button", { name: "Issue a key" }).click();
  await page.getByRole("dialog").getByLabel("Name").fill("First program");
  await page.getByRole("dialog").getByRole("button", { name: "Issue" }).click();
  const key = (await page.getByTestId("secret").textContent()) ?? "";
  await page.getByRole("dialog").getByRole("button", { name: "I have copied it" }).click();

  const answer = await call(server, "post", "/resistance", { key, body: SLEEVE });
  expect(answer.status).toBe(200);

  await page.getByRole("link", { name: "First program" }).click();
  await page.getByRole("link", { name: "Usage of this key" }).click();
  await page.getByRole("heading", { level: 1, name: "Usage" }).waitFor();
  const row = page
    .getByRole("row")
    .filter({ hasText: "First program" })
    .filter({ hasText: "compute resistance" });
  await row.getByText("200 answered").waitFor();
  expect(await row.count()).toBe(1);

  await desk.page.goto(`${base()}/console/activity?q=First program`);
  await desk.page.getByRole("button", { name: "issued the key" }).waitFor();
  expect(await desk.page.getByRole("row").filter({ hasText: "Tomas Vell" }).count()).toBe(1);
  expect([...desk.complaints.filter((text) => !text.includes("422"))]).toEqual([]);
  await desk.close();
  await close();
}, 180_000);
