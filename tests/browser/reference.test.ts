import type { Page } from "playwright-core";
import { afterAll, describe, expect, it } from "vitest";
import { NAVIGATION } from "@/app/_ui/site/navigation";
import { THEME_COOKIE } from "@/app/_ui/theme";
import { startServer } from "../support/server";
import { axeViolations } from "./accessibility";
import { base, closeBrowser, visit } from "./browser";

afterAll(closeBrowser);

/** The page draws a thousand controls: on a busy machine that takes its time. */
const LONG = { timeout: 90_000 };

/** Waits until the operations are there. */
function shown(page: Page): Promise<void> {
  return page.getByText("Compute one resistance").first().waitFor(LONG);
}

/** The package's own markup has faults of structure that we cannot mend; its colours are ours, and their contrast. */
function contrastViolations(page: Page): Promise<readonly string[]> {
  return axeViolations(page, { rules: ["color-contrast", "html-has-lang"] });
}

describe("/docs/api", () => {
  it("has a title, a language and one first heading before its script, and says what it needs", async () => {
    const { page, close } = await visit("/docs/api", { scripts: false });
    expect(await page.title()).toBe("API reference · Rhoform");
    expect(await page.locator("html").getAttribute("lang")).toBe("en");
    expect(await page.locator("h1").allTextContents()).toEqual(["API reference"]);
    expect(await page.locator("a[href='/api/v1/openapi.json']").count()).toBe(1);
    const places = page.getByRole("navigation", { name: "Site" }).getByRole("link");
    expect(await places.allTextContents()).toEqual(
      NAVIGATION.filter(({ href }) => href !== "/docs/api").map(({ label }) => label),
    );
    await close();
  });

  it("is served wholly from this host, under the policy, shows the operations and fits its window", async () => {
    const { page, requests, complaints, close } = await visit("/docs/api");
    await shown(page);
    await page.waitForTimeout(2000);
    expect(requests.filter((url) => !/^(data|blob):/.test(url) && !url.startsWith(base()))).toEqual([]);
    expect(requests).toContain(`${base()}/api/v1/openapi.json`);
    expect(complaints).toEqual([]);
    // The heading that was there before the script stays, and nothing of the package's own name is shown.
    expect(await page.locator("h1:visible").allTextContents()).toEqual(["API reference"]);
    for (const foreign of [/Powered by/, /Client Libraries/])
      expect(await page.getByText(foreign).filter({ visible: true }).count()).toBe(0);
    expect(await contrastViolations(page)).toEqual([]);
    // The reader of these tests wants no motion; the package would move its own parts.
    const moving = await page.evaluate(() =>
      [...document.querySelectorAll("*")]
        .filter((element) => {
          const { transitionDuration, animationName } = getComputedStyle(element);
          return /[1-9]/.test(transitionDuration) || animationName !== "none";
        })
        .map(({ className }) => String(className)),
    );
    expect(moving).toEqual([]);
    for (const width of [1440, 768, 360]) {
      await page.setViewportSize({ width, height: 900 });
      const excess = await page.evaluate(
        () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
      );
      expect(excess, `${width} px`).toBe(0);
    }
    await close();
  });

  it("changes its colours by the switch of the other pages, and keeps the choice", async () => {
    const { page, context, close } = await visit("/docs/api", { colorScheme: "light" });
    await shown(page);
    const ground = () => page.evaluate(() => getComputedStyle(document.body).backgroundColor);
    const light = await ground();
    await page.getByTitle("Dark").click();
    expect(await ground()).not.toBe(light);
    expect(await page.evaluate(() => document.body.className)).toContain("dark-mode");
    expect((await context.cookies()).find(({ name }) => name === THEME_COOKIE)?.value).toBe("dark");
    // Anew, and not by a reload: the page goes on where the reader was, which need not show the first operations.
    await page.goto(`${base()}/docs/api`);
    await shown(page);
    expect(await ground()).not.toBe(light);
    expect(await contrastViolations(page)).toEqual([]);
    await close();
  });

  it("sends a call with a key to this host", async () => {
    const server = await startServer();
    const { page, close } = await visit("/docs/api#tag/resistance/POST/resistance");
    const button = page.getByRole("button", { name: /Test Request.*resistance/i }).first();
    await button.waitFor(LONG);
    await page.getByPlaceholder("Token").first().fill(server.issue().key);
    await button.click();
    const answered = page.waitForResponse((response) => response.url().endsWith("/api/v1/resistance"));
    await page.getByRole("button", { name: /^Send/ }).first().click();
    expect((await answered).status()).toBe(200);
    await close();
    await server.stop();
  });

  it("takes the key that was typed on the start page, and it stays in the browser", async () => {
    const server = await startServer();
    const { key } = server.issue();
    const { page, requests, close } = await visit("/docs/start");
    await page.getByLabel("Your key").fill(key);
    await page.getByRole("button", { name: "Forget it" }).waitFor();
    await page.goto(`${base()}/docs/api#tag/resistance/POST/resistance`);
    const token = page.getByPlaceholder("Token").first();
    await token.waitFor(LONG);
    expect(await token.inputValue()).toBe(key);
    expect(requests.filter((url) => url.includes(key))).toEqual([]);
    await close();
    await server.stop();
  });
});
