import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { axeViolations } from "./accessibility";
import { base, closeBrowser, visit, type Visit } from "./browser";

/** What holds for every page: own host only, a heading before any script, axe in both themes, three widths. */
export function checkPages(paths: readonly string[]): void {
  afterAll(closeBrowser);

  describe.each(paths)("%s", (path) => {
    let opened: Visit;
    beforeAll(async () => {
      opened = await visit(path);
    });
    afterAll(() => opened.close());

    it("asks no other host, breaks no policy, throws nothing", async () => {
      const { page, requests, complaints } = opened;
      await page.waitForTimeout(800);
      expect(requests.filter((url) => !url.startsWith(base()) && !url.startsWith("data:"))).toEqual([]);
      // The browser itself notes the status of the page that is not there, and of an input that is wrong on purpose.
      const expected = path === "/no-such-page" ? "404" : path.includes("5kg") ? "422" : undefined;
      expect(complaints.filter((text) => expected === undefined || !text.includes(expected))).toEqual([]);
    });

    it("has a title, a language and one first heading, before any script", async () => {
      const html = await (await fetch(base() + path)).text();
      expect(/<title>(.*?)<\/title>/.exec(html)?.[1]).toMatch(/Rhoform/);
      expect(html).toMatch(/<html[^>]* lang="en"/);
      expect(html.match(/<h1[\s>]/g)).toHaveLength(1);
    });

    it.each(["light", "dark"] as const)("passes axe in %s", async (colorScheme) => {
      const { page, context } = opened;
      await page.emulateMedia({ colorScheme, reducedMotion: "reduce" });
      await page.waitForTimeout(300);
      expect(await axeViolations(page)).toEqual([]);
      expect(context.pages()).toHaveLength(1);
    });

    it.each([1440, 768, 360])("fits %i px without scrolling sideways", async (width) => {
      const { page } = opened;
      await page.setViewportSize({ width, height: 900 });
      const excess = await page.evaluate(
        () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
      );
      expect(excess).toBe(0);
    });
  });
}
