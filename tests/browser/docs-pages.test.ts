import { expect, it } from "vitest";
import { visit } from "./browser";
import { checkPages } from "./page-checks";
import { DOCS_PAGES } from "./pages";

checkPages(DOCS_PAGES);

it("long lines of code break on paper, where nothing scrolls", async () => {
  const { page, close } = await visit("/docs/spreadsheets");
  const cut = () =>
    page.locator("article pre").evaluateAll((blocks) => {
      return blocks.filter(({ scrollWidth, clientWidth }) => scrollWidth > clientWidth).length;
    });
  expect(await cut()).toBeGreaterThan(0);
  await page.emulateMedia({ media: "print" });
  expect(await cut()).toBe(0);
  await close();
});
