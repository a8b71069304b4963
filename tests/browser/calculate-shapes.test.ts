import { gzipSync } from "node:zlib";
import type { Page } from "playwright-core";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { catalogue, exampleRequest, shapeEntry } from "@/lib/engine";
import { base, closeBrowser, type Visit } from "./browser";
import { ask, type Bench, bodiesOf, RESISTANCE, settled, startBench } from "./calculation";

let bench: Bench;
let visit: Visit;
beforeAll(async () => {
  bench = await startBench();
  visit = await bench.open("/calculate");
});
afterAll(async () => {
  await closeBrowser();
  await bench.stop();
});

describe.each(catalogue.map((shape) => [shape.id, shape] as const))("%s", (id, shape) => {
  it("opens with its example's answer, and answers as the API does when a dimension changes", async () => {
    const { page, complaints } = visit;
    await page.setViewportSize({ width: 1280, height: 900 });
    await bench.go(visit, `/calculate/${id}`);
    const first = await ask(bench.key, exampleRequest(shape));
    expect(await page.locator(RESISTANCE).textContent()).toBe(first.resistance.text);
    expect(await page.getByRole("img").count()).toBeGreaterThan(0);

    // One per cent more of the first dimension that has a unit.
    const { name } = shapeEntry(shape).dimensions.find(
      (dimension) => dimension.type === "quantity" && dimension.name in shape.example.dimensions,
    ) ?? { name: "" };
    const field = page.locator(`input[name="${name}"]`);
    const more = String(Number((Number(await field.inputValue()) * 1.01).toPrecision(12)));
    await field.fill(more);
    await field.blur();
    await expect.poll(() => bodiesOf(page.url())[0].dimensions[name]).toContain(more);
    const [body] = bodiesOf(page.url());
    const second = await ask(bench.key, body);
    expect(await settled(page, (text) => text === second.resistance.text)).toBe(second.resistance.text);
    expect(complaints).toEqual([]);

    for (const width of [360, 768]) {
      await page.setViewportSize({ width, height: 800 });
      const excess = await page.evaluate(
        () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
      );
      expect([width, excess]).toEqual([width, 0]);
    }
  });
});

describe("the page of a shape", () => {
  it.each([360, 1440])("moves nothing at %i px while it loads and is scrolled", async (width) => {
    const prepare = async (page: Page) => {
      await page.addInitScript(() => {
        const moved: number[] = [];
        Object.assign(window, { moved });
        new PerformanceObserver((list) => {
          for (const entry of list.getEntries()) if ("value" in entry) moved.push(Number(entry.value));
        }).observe({ type: "layout-shift", buffered: true });
      });
    };
    const { page, close } = await bench.open("/calculate/cylindrical-shell", { width, prepare });
    await page.locator(RESISTANCE).waitFor();
    for (let step = 0; step < 12; step++) {
      await page.evaluate(() => window.scrollBy(0, 450));
      await page.waitForTimeout(150);
    }
    await page.locator("svg[role=slider]").first().waitFor();
    const moved = await page.evaluate(() => (window as unknown as { moved: number[] }).moved);
    expect(moved.reduce((sum, value) => sum + value, 0)).toBeLessThan(0.02);
    await close();
  });

  it("loads at most 120 kB of scripts beyond what every page loads", async () => {
    const scripts = async (path: string) => {
      const html = await (await fetch(base() + path)).text();
      return new Set(html.match(/\/_next\/static\/chunks\/[^"]+?\.js/g));
    };
    const common = await scripts("/docs/problems");
    const own = [...(await scripts("/calculate/cylindrical-shell"))].filter((path) => !common.has(path));
    let size = 0;
    for (const path of own) {
      size += gzipSync(Buffer.from(await (await fetch(base() + path)).arrayBuffer())).length;
    }
    expect(own.length).toBeGreaterThan(0);
    expect(size).toBeLessThan(120_000);
  });

  it("answers 404 for a shape that is not there", async () => {
    expect((await fetch(`${base()}/calculate/no-such-shape`)).status).toBe(404);
    expect((await fetch(`${base()}/calculate/no-such-shape/geometry`)).status).toBe(404);
  });

  it("takes any rubbish in its address", async () => {
    for (const query of [
      "length=",
      "length=5kg&width=%00&nonsense=1",
      "graded=&profile=nothing",
      "graded=length&profile=layers&profile.layers=,,:,",
      "graded=length&profile=expression&profile.value=1/0",
      "B&C&D&show=Z&B.without=length",
      "temperature=-400&min=x&max=-1",
      `length=${"9".repeat(5000)}`,
    ]) {
      const response = await fetch(`${base()}/calculate/bar?${query}`);
      expect([query, response.status]).toEqual([query, 200]);
    }
  });
});

describe("the catalogue", () => {
  it("shows every shape, finds by word and symbol, and says when nothing is found", async () => {
    const { page, close } = await bench.open("/calculate");
    const shown = () =>
      page
        .locator("a[data-shape]")
        .evaluateAll((links) => links.map((link) => link.getAttribute("data-shape")));
    expect((await shown()).sort()).toEqual(catalogue.map(({ id }) => id).sort());
    const search = page.getByRole("searchbox");
    await search.fill("cylindrical radial");
    expect(await shown()).toEqual(["cylindrical-shell"]);
    await search.fill("φ");
    expect(await shown()).toContain("cylindrical-shell");
    expect(await shown()).not.toContain("bar");
    await search.fill("zzz");
    await page.getByText("No shape has “zzz”").waitFor();
    await page.getByRole("button", { name: "Show all shapes" }).click();
    expect(await shown()).toHaveLength(catalogue.length);
    await close();
  });

  it("goes by keyboard from the search to a shape and computes there", async () => {
    const { page, close } = await bench.open("/calculate");
    const search = page.getByLabel("Search by word or symbol");
    // Until the page's script runs, a key goes nowhere.
    await expect
      .poll(async () => {
        await page.keyboard.press("/");
        return search.evaluate((field) => field === document.activeElement);
      })
      .toBe(true);
    await search.fill("");
    await page.keyboard.type("spherical shell radial");
    await expect.poll(() => page.locator("a[data-shape]").count()).toBe(1);
    await page.keyboard.press("ArrowDown");
    expect(await page.evaluate(() => document.activeElement?.getAttribute("data-shape"))).toBe(
      "spherical-shell",
    );
    await page.keyboard.press("Enter");
    await page.waitForURL("**/calculate/spherical-shell");
    await page.locator(RESISTANCE).waitFor();
    // Tab until the first dimension has focus, then type without the pointer.
    for (let presses = 0; presses < 40; presses += 1) {
      await page.keyboard.press("Tab");
      if (await page.evaluate(() => document.activeElement?.matches("form[aria-label=Inputs] input"))) break;
    }
    const before = await settled(page);
    await page.keyboard.press("Control+A");
    await page.keyboard.type("1/8 in");
    expect(await settled(page, (text) => text !== before)).not.toBe(before);
    // The unit's menu: inches are taken, and converted by an arrow key.
    await page.keyboard.press("Tab");
    expect(await page.evaluate(() => (document.activeElement as HTMLSelectElement).value)).toBe("in");
    const inches = await settled(page);
    await page.keyboard.press("ArrowUp");
    expect(await page.evaluate(() => (document.activeElement as HTMLSelectElement).value)).toBe("mil");
    expect(await settled(page)).toBe(inches);
    expect(await page.locator("form[aria-label=Inputs] input").first().inputValue()).toBe("125");
    await close();
  });
});
