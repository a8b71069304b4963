import type { Page } from "playwright-core";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { startServer, type TestServer } from "../support/server";
import { signedInCookie } from "../support/signed-in";
import { axeViolations } from "./accessibility";
import { base, closeBrowser, visit, type Visit } from "./browser";

let server: TestServer;
beforeAll(async () => {
  server = await startServer();
});
afterAll(async () => {
  await closeBrowser();
  await server.stop();
});

const NAME = "Magnus Oyelaran-Whitcombe";

async function openAs(path: string, width?: number): Promise<Visit> {
  const cookie = await signedInCookie(server.service, { team: "busbar", name: NAME });
  return visit(path, { width, prepare: (page) => page.context().addCookies([{ ...cookie, url: base() }]) });
}

const excess = (page: Page) =>
  page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth);

describe("the corner of a page", () => {
  it("says who is signed in and for which team, leads on, and signs out", async () => {
    const { page, close } = await openAs("/docs/start", 360);
    await page.waitForLoadState("networkidle");
    const menu = page.locator("header details");
    expect(await menu.locator("summary").getAttribute("aria-label")).toBe(`Signed in as ${NAME}`);
    await menu.locator("summary").click();
    expect(await menu.innerText()).toContain(NAME);
    for (const width of [360, 479, 480, 768]) {
      await page.setViewportSize({ width, height: 900 });
      const list = await menu.locator("summary + div").boundingBox();
      if (!list) throw new Error("The menu is not shown.");
      expect(list.x, `${width} px`).toBeGreaterThanOrEqual(8);
      expect(list.x + list.width, `${width} px`).toBeLessThanOrEqual(width - 8);
    }
    await page.setViewportSize({ width: 360, height: 900 });
    expect(await menu.innerText()).toContain("These pages work for the team ");
    for (const [name, href] of [
      ["Console", "/console"],
      ["Account", "/console/account"],
    ]) {
      expect(await menu.getByRole("link", { name }).getAttribute("href")).toBe(href);
    }
    expect(await excess(page)).toBe(0);
    expect(await axeViolations(page, { include: "header" })).toEqual([]);
    await page.keyboard.press("Escape");
    await expect.poll(() => menu.getByRole("button", { name: "Sign out" }).isVisible()).toBe(false);
    await menu.locator("summary").click();
    await menu.getByRole("button", { name: "Sign out" }).click();
    await page.getByRole("link", { name: "Sign in" }).waitFor();
    expect(new URL(page.url()).pathname).toBe("/docs/start");
    expect(await page.locator("header details").count()).toBe(0);
    await close();
  });

  it("leads to the account from the reference, which the application's script does not reach", async () => {
    const { page, close } = await openAs("/docs/api", 360);
    const account = page.locator("header").getByRole("link", { name: `Signed in as ${NAME}: account` });
    expect(await account.getAttribute("href")).toBe("/console/account");
    expect(await excess(page)).toBe(0);
    await close();
    const out = await visit("/docs/api", { scripts: false });
    expect(await out.page.locator("header").getByRole("link", { name: "Sign in" }).count()).toBe(1);
    await out.close();
  });

  it("loads nothing of the menu for a signed-out reader", async () => {
    const { page, requests, close } = await visit("/docs/start", { width: 360 });
    await page.waitForLoadState("networkidle");
    expect(await page.locator("header").getByRole("link", { name: "Sign in" }).getAttribute("href")).toBe(
      "/sign-in",
    );
    expect(await excess(page)).toBe(0);
    for (const address of requests.filter((url) => url.includes("/_next/static/") && url.includes(".js"))) {
      expect(await (await fetch(address)).text(), address).not.toContain("auth/sign-out");
    }
    await close();
  });
});

describe.each([360, 768, 1024, 1440])("at %i px", (width) => {
  it("the header and the row of a calculator's actions stand alike, signed in or not", async () => {
    const places: object[] = [];
    for (const open of [() => openAs("/calculate/bar", width), () => visit("/calculate/bar", { width })]) {
      const { page, close } = await open();
      const box = (locator: ReturnType<Page["locator"]>) => locator.first().boundingBox();
      await page.evaluate(() => document.fonts.ready);
      places.push({
        header: await box(page.locator("header")),
        compare: await box(page.getByRole("button", { name: "Compare with a variant" })),
        link: await box(page.getByRole("button", { name: "Copy link" })),
        form: await box(page.locator("form[aria-label=Inputs]")),
      });
      await close();
    }
    expect(places[0]).toEqual(places[1]);
  });
});

it.each([openAs, (path: string, width: number) => visit(path, { width })])(
  "what is pressed in header, trail and footer is 44 px high at phone width (%#)",
  async (open) => {
    const { page, close } = await open("/calculate/bar", 360);
    const parts = page.locator(":is(header, footer, nav[aria-label=Breadcrumb]) :is(a, summary, label)");
    await parts.first().waitFor();
    const heights = await parts.evaluateAll((all) =>
      all
        .filter((part) => part.checkVisibility())
        .map((part) => ({ name: part.textContent, height: part.getBoundingClientRect().height })),
    );
    expect(heights.length).toBeGreaterThan(10);
    expect(heights.filter(({ height }) => height < 44)).toEqual([]);
    await close();
  },
);
