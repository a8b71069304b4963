import { gzipSync } from "node:zlib";
import { existsSync, readFileSync } from "node:fs";
import { AxeBuilder } from "@axe-core/playwright";
import { describe, expect, test } from "vitest";
import { BUSBAR } from "../support/widget";
import { base } from "./browser";
import { isDevelopment, newPage, setUpPages, widget } from "./embed-pages";

setUpPages();

describe("the frame", () => {
  test("renews its token, keeps inputs while the service is away, and says when a quota returns", async () => {
    const { page } = await newPage();
    const { id } = widget();
    let refusals = 0;
    const asked: string[] = [];
    page.on("request", (request) => asked.push(new URL(request.url()).pathname));
    await page.route("**/api/v1/resistance", async (route) => {
      if (refusals++ > 0) return route.fallback();
      await route.fulfill({ status: 401, contentType: "application/problem+json", body: "{}" });
    });
    await page.goto(`${base()}/embed/${id}`);
    await page.getByTestId("resistance").waitFor({ timeout: 45_000 });
    expect(asked).toContain("/api/embed/token");

    await page.unroute("**/api/v1/resistance");
    await page.route("**/api/v1/resistance", (route) => route.abort());
    const before = await page.getByTestId("resistance").innerText();
    await page.locator("input").first().fill("1234");
    await page.getByText("The service cannot be reached").waitFor();
    expect(await page.locator("input").first().inputValue()).toBe("1234");
    await page.unroute("**/api/v1/resistance");
    await page.getByRole("button", { name: "Try again" }).click();
    await page.waitForFunction(
      (text) => document.querySelector('[data-testid="resistance"]')?.textContent !== text,
      before,
    );
    expect(await page.getByText("The service cannot be reached").count()).toBe(0);

    await page.locator("input").first().fill("5");
    await page.getByText("must lie between 50 mm and 4 m", { exact: false }).waitFor();

    const spent = widget({}, 0).id;
    await page.goto(`${base()}/embed/${spent}`);
    await page.getByText("This month’s calculations are used up").waitFor({ timeout: 45_000 });
  });

  test("runs no script that comes with titles, labels, defaults, colours or its address", async () => {
    const { page, complaints } = await newPage();
    const evil = `"><img src=x onerror="window.hacked=1"><script>window.hacked=1</script>`;
    const { id } = widget({
      title: `${evil}`.slice(0, 100),
      intro: evil,
      inputs: BUSBAR.inputs.map(({ name, rule }) => ({
        name,
        rule: rule.mode === "hidden" ? rule : { ...rule, label: evil.slice(0, 60) },
      })),
    });
    const query = new URLSearchParams({
      length: `1 m${evil}`.slice(0, 119),
      lang: evil,
      theme: evil,
      material: "javascript:alert(1)",
      nothing: evil,
    });
    await page.goto(`${base()}/embed/${id}?${query}`);
    await page.getByRole("heading", { level: 1 }).waitFor();
    await page.locator("[aria-invalid]").first().waitFor({ timeout: 45_000 });
    expect(await page.locator("h1").innerText()).toBe(evil.slice(0, 100));
    expect(await page.evaluate(() => "hacked" in window)).toBe(false);
    expect(await page.locator("img").count()).toBe(0);
    expect(complaints.filter((text) => !text.includes("422"))).toEqual([]);
  });

  test.each([
    [320, "light"],
    [720, "dark"],
  ] as const)("has no accessibility complaint at %i px, %s", async (width, theme) => {
    const { page } = await newPage();
    await page.setViewportSize({ width, height: 900 });
    const { id } = widget({
      requirement: { max: "40 uohm" },
      show: { drawing: true, bounds: true, plots: true },
      language: theme === "dark" ? "de" : "en",
    });
    await page.goto(`${base()}/embed/${id}?theme=${theme}`);
    await page.getByTestId("resistance").waitFor({ timeout: 45_000 });
    await page.getByRole("slider").first().waitFor({ timeout: 45_000 });
    const { violations } = await new AxeBuilder({ page }).analyze();
    expect(violations.map(({ id: rule, nodes }) => [rule, nodes.map(({ html }) => html)])).toEqual([]);
    expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(width);
  });

  test("loads at most 60 kB of script beyond the framework's own", async () => {
    const { page } = await newPage();
    const { id } = widget({ show: { drawing: true, bounds: true, plots: true } });
    // Only what was built for production has a size to speak of.
    if ((await isDevelopment(id)) || !existsSync(".next/build-manifest.json")) return;
    const manifest: { rootMainFiles: string[]; polyfillFiles: string[] } = JSON.parse(
      readFileSync(".next/build-manifest.json", "utf8"),
    );
    const framework = new Set([...manifest.rootMainFiles, ...manifest.polyfillFiles]);
    const sizes = new Map<string, number>();
    page.on("response", async (response) => {
      const path = new URL(response.url()).pathname.replace(/^\/_next\//, "");
      if (!path.endsWith(".js") || framework.has(path)) return;
      sizes.set(path, gzipSync(await response.body()).byteLength);
    });
    await page.goto(`${base()}/embed/${id}`, { waitUntil: "networkidle" });
    await page.getByTestId("resistance").waitFor();
    await page.getByRole("slider").first().waitFor();
    const total = [...sizes.values()].reduce((sum, size) => sum + size, 0);
    expect(total, JSON.stringify([...sizes])).toBeLessThanOrEqual(60_000);
    expect(total).toBeGreaterThan(1_000);
  });
});

describe("the examples", () => {
  test.each(["plain", "react", "strict-policy", "two-widgets"])("%s runs as it is served", async (name) => {
    const { page, complaints } = await newPage();
    const { id } = widget({
      inputs: [
        ...BUSBAR.inputs,
        { name: "current", rule: { mode: "open", value: "630 A", min: "1 A", max: "4 kA" } },
      ],
    });
    await page.addInitScript(() => {
      window.events = [];
      document.addEventListener("rhoform:result", (event) => {
        window.events.push({ type: "result", id: "", detail: (event as CustomEvent).detail });
      });
    });
    await page.goto(`${base()}/embed-examples/${name}?embed=${id}`);
    await page.waitForFunction((count) => window.events.length >= count, name === "two-widgets" ? 2 : 1, {
      timeout: 45_000,
    });
    if (name === "two-widgets") {
      const second = page.frames().find((frame) => frame.url().includes("length=1"));
      await second?.locator('input[name="current"]').fill("1000");
      await page.waitForFunction(
        () => window.events.filter(({ detail }) => Object(detail).operating.current === 1000).length >= 2,
      );
    }
    expect(complaints).toEqual([]);
  });
});
