import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { newId } from "@/lib/service/identifier";
import { startServer, type TestServer } from "../support/server";
import { signedInCookie } from "../support/signed-in";
import { base, closeBrowser, visit, type Visit } from "./browser";

let server: TestServer;
beforeAll(async () => {
  server = await startServer();
});
afterAll(async () => {
  await closeBrowser();
  await server.stop();
});

/** What the copy button of a snippet puts on the clipboard. */
async function copied({ page, context }: Visit, name: string): Promise<string> {
  await context.grantPermissions(["clipboard-read", "clipboard-write"], { origin: base() });
  await page.getByRole("button", { name }).first().click();
  return page.evaluate(() => navigator.clipboard.readText());
}

describe("the reader's key in the docs", { timeout: 120_000 }, () => {
  it("stands in the snippets of all pages, hidden until asked for, and in no address", async () => {
    const { key } = server.issue();
    const opened = await visit("/docs/start");
    const { page, requests, close } = opened;
    await page.getByLabel("Your key").fill(key);
    await page.getByText(`Bearer ${key.slice(0, 8)}••••`).waitFor();
    expect(await copied(opened, "Copy curl")).toContain(`-H "Authorization: Bearer ${key}"`);
    await page.getByRole("tab", { name: "Python client" }).click();
    expect(await copied(opened, "Copy Python client")).toContain(`key="${key}"`);

    await page.getByRole("navigation", { name: "Docs", exact: true }).getByText("Batches").click();
    await page.getByRole("heading", { level: 1, name: "Batches" }).waitFor();
    const main = page.locator("main");
    expect(await main.textContent()).not.toContain(key);
    await page.getByRole("button", { name: "Show the key" }).first().click();
    expect(await main.textContent()).toContain(key);
    expect(requests.filter((url) => url.includes(key))).toEqual([]);

    await page.goto(`${base()}/docs/start`);
    await page.getByRole("button", { name: "Forget it" }).click();
    await page.getByText("Bearer $RHOFORM_KEY").waitFor();
    await page.reload();
    expect(await page.getByLabel("Your key").inputValue()).toBe("");
    await close();
  });

  it("comes from the console in the same tab, without an address that holds it", async () => {
    const cookie = await signedInCookie(server.service, {
      team: `docs-${newId("per").slice(-8).toLowerCase()}`,
    });
    const opened = await visit("/console/keys", {
      prepare: (page) => page.context().addCookies([{ ...cookie, url: base() }]),
    });
    const { page, requests, close } = opened;
    await page.getByRole("button", { name: "Issue a key" }).click();
    const dialog = page.getByRole("dialog");
    await dialog.getByLabel("Name").fill("First steps");
    await dialog.getByRole("button", { name: "Issue" }).click();
    const key = (await page.getByTestId("secret").textContent()) ?? "";
    await dialog.getByRole("button", { name: "Open the start page with this key" }).click();
    await page.waitForURL(`${base()}/docs/start`);
    expect(await page.getByLabel("Your key").inputValue()).toBe(key);
    expect(await copied(opened, "Copy curl")).toContain(`Bearer ${key}`);
    expect(requests.filter((url) => url.includes(key))).toEqual([]);
    await close();
  });
});
