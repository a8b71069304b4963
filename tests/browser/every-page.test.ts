import AxeBuilder from "@axe-core/playwright";
import { afterAll, describe, expect, it } from "vitest";
import { base, closeBrowser, visit } from "./browser";
import { PAGES } from "./pages";

afterAll(closeBrowser);

describe.each(PAGES)("%s", (path) => {
  it("asks no other host, breaks no policy, throws nothing", async () => {
    const { page, requests, complaints, close } = await visit(path);
    await page.waitForTimeout(800);
    expect(requests.filter((url) => !url.startsWith(base()) && !url.startsWith("data:"))).toEqual([]);
    // The browser itself notes the status of the page that is not there, and of an input that is wrong on purpose.
    const expected = path === "/no-such-page" ? "404" : path.includes("5kg") ? "422" : undefined;
    expect(complaints.filter((text) => expected === undefined || !text.includes(expected))).toEqual([]);
    await close();
  });

  it("has a title, a language and one first heading, before any script", async () => {
    const { page, close } = await visit(path, { scripts: false });
    expect(await page.title()).toMatch(/Rhoform/);
    expect(await page.locator("html").getAttribute("lang")).toBe("en");
    expect(await page.locator("h1").count()).toBe(1);
    await close();
  });

  it.each([360, 768, 1440])("fits %i px without scrolling sideways", async (width) => {
    const { page, close } = await visit(path, { width });
    const excess = await page.evaluate(
      () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
    );
    expect(excess).toBe(0);
    await close();
  });

  it.each(["light", "dark"] as const)("passes axe in %s", async (colorScheme) => {
    const { page, context, close } = await visit(path, { colorScheme });
    await page.waitForTimeout(300);
    const { violations } = await new AxeBuilder({ page })
      .withTags(["wcag2a", "wcag2aa", "wcag21a", "wcag21aa", "wcag22aa", "best-practice"])
      .analyze();
    expect(
      violations.map(({ id, nodes }) => `${id}: ${nodes.map(({ target }) => String(target)).join(" | ")}`),
    ).toEqual([]);
    expect(context.pages()).toHaveLength(1);
    await close();
  });
});
