import type { Page } from "playwright-core";
import { afterAll, beforeAll, expect, it } from "vitest";
import { teamBySlug } from "@/db/queries/teams";
import { insertUsage } from "@/db/queries/usage";
import { newId } from "@/lib/service/identifier";
import { startServer, type TestServer } from "../support/server";
import { signedInCookie } from "../support/signed-in";
import { base, closeBrowser, visit, type Visit } from "./browser";

const TEAM = `look-${newId("per").slice(-8).toLowerCase()}`;

let server: TestServer;
let cookie: { name: string; value: string };
beforeAll(async () => {
  server = await startServer();
  cookie = await signedInCookie(server.service, { role: "admin", team: TEAM });
  const { id: keyId } = server.issue({ team: TEAM, name: "CAD scripts" });
  const { db, now } = server.service;
  const teamId = teamBySlug(db, TEAM)?.id ?? "";
  // Calls on two days: a line needs two.
  for (const at of [now() - 86_400_000, now()]) {
    insertUsage(db, {
      ...{ at, keyId, teamId, requestId: newId("req"), operation: "computeResistance", shape: "bar" },
      ...{ status: 200, latencyUs: 900, computations: 1, client: "python" },
    });
  }
});
afterAll(async () => {
  await closeBrowser();
  await server.stop();
});

const open = (path: string, width: number, more?: (page: Page) => Promise<void>): Promise<Visit> =>
  visit(path, {
    width,
    prepare: async (page) => {
      await page.context().addCookies([{ ...cookie, url: base() }]);
      await more?.(page);
    },
  });

it.each([360, 768, 1440])("shows all sections at %i px, and which one it is in", async (width) => {
  const { page, close } = await open("/console/", width);
  const links = page.getByRole("navigation", { name: "Console" }).getByRole("link");
  expect(await links.count()).toBe(9);
  for (const link of await links.all()) {
    const box = await link.boundingBox();
    expect(box && box.x >= 0 && box.x + box.width <= width).toBe(true);
  }
  // Also with a slash at its end an address is that of its section.
  const current = page.getByRole("navigation", { name: "Console" }).locator("[aria-current=page]");
  expect(await current.allTextContents()).toEqual(["Overview"]);
  await close();
});

it("shades the edge behind which a table goes on, and only there", async () => {
  const { page, close } = await open("/console/keys", 360);
  const frame = page.getByRole("group", { name: "Keys" });
  await frame.getByRole("link", { name: "CAD scripts" }).first().waitFor();
  await frame.focus();
  expect(await frame.evaluate((element) => element.scrollWidth > element.clientWidth)).toBe(true);
  const edges = async () => {
    const shot = (await frame.screenshot()).toString("base64");
    return page.evaluate(async (data) => {
      const image = new Image();
      image.src = `data:image/png;base64,${data}`;
      await image.decode();
      const canvas = new OffscreenCanvas(image.width, image.height);
      const context = canvas.getContext("2d");
      context?.drawImage(image, 0, 0);
      const red = (x: number) => context?.getImageData(x, 6, 1, 1).data[0] ?? 0;
      return [red(4), red(image.width - 5)];
    }, shot);
  };
  const [left, right] = await edges();
  expect(right).toBeLessThan(left - 8);
  await frame.evaluate((element) => element.scrollTo({ left: element.scrollWidth }));
  const [after, end] = await edges();
  expect(after).toBeLessThan(end - 8);
  await close();
});

it("writes days on the axis of the latency, with the numbers behind it", async () => {
  const { page, close } = await open("/console/usage", 1440);
  const plot = page.getByRole("slider", { name: /^Latency/ });
  await plot.waitFor();
  expect(await plot.locator("text").allTextContents()).toEqual(
    expect.arrayContaining([
      "Day (UTC)",
      expect.stringMatching(/^\d\d-\d\d$/),
      expect.stringMatching(/^Latency \/ m?s$/),
    ]),
  );
  const figure = page.locator("figure").filter({ has: plot });
  await figure.getByRole("button", { name: "Numbers" }).click();
  await figure.getByRole("columnheader", { name: "Day (UTC)" }).waitFor();
  await close();
});

it.each([
  ["2026-12-01", "It began today"],
  ["2026-12-02", "Computations"],
])("on %s tells the month apart from today: %s", async (today, shown) => {
  const { page, close } = await open("/console", 1440, async (each) => {
    await each.route("**/api/console/overview", async (route) => {
      const answer = await (await route.fetch()).json();
      const days = answer.days.map((day: object, index: number) => ({
        ...day,
        at: new Date(Date.parse(today) - (answer.days.length - 1 - index) * 86_400_000).toISOString(),
      }));
      await route.fulfill({ json: { ...answer, days } });
    });
  });
  const month = page.locator("section").filter({ has: page.getByRole("heading", { name: "This month" }) });
  await month.getByText(shown).waitFor();
  expect(await month.locator("figure").count()).toBe(0);
  const thirty = page.locator("section").filter({ has: page.getByRole("heading", { name: "Last 30 days" }) });
  expect(await thirty.locator("figure").count()).toBe(1);
  await close();
});
