import { gzipSync } from "node:zlib";
import { existsSync, readFileSync } from "node:fs";
import { describe, expect, test } from "vitest";
import type { EmbedDefinition } from "@/lib/embeds/definition";
import type { Uncertainty } from "@/lib/engine";
import { BUSBAR } from "../support/widget";
import { axeViolations } from "./accessibility";
import { base } from "./browser";
import { host, isDevelopment, newPage, setUpPages, told, widget } from "./embed-pages";
import { loaderPage } from "./host-page";

setUpPages();

/** Open within limits, fixed, and of an input that is hidden. */
const TOLERANCES: EmbedDefinition["tolerances"] = {
  uncertainty: { method: "worst-case" },
  budget: true,
  inputs: [
    { name: "length", rule: { mode: "open", value: "2 mm", max: "5 mm" } },
    { name: "thickness", rule: { mode: "fixed", value: "1 %" } },
    { name: "temperature", rule: { mode: "fixed", value: "5 K" } },
  ],
};

const LAYERED: Partial<EmbedDefinition> = {
  shape: "earth-rod-layered",
  title: "EN 50522",
  inputs: [
    { name: "length", rule: { mode: "open", value: "3 m" } },
    { name: "diameter", rule: { mode: "open", value: "20 mm" } },
    { name: "upperDepth", rule: { mode: "open", value: "1 m" } },
    { name: "upper.resistivity", rule: { mode: "open", value: "300 ohm m" } },
    { name: "lower.resistivity", rule: { mode: "open", value: "60 ohm m" } },
  ],
};

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

  test("takes tolerances, and shows range, verdict and budget in the reader's language", async () => {
    const { page } = await newPage("de-DE");
    const { id } = widget({
      requirement: { max: "12 uohm" },
      tolerances: TOLERANCES,
      inputs: BUSBAR.inputs.map(({ name, rule }) =>
        name === "thickness" && rule.mode === "open"
          ? { name, rule: { ...rule, label: "Blechdicke" } }
          : { name, rule },
      ),
    });
    await page.goto(`${base()}/embed/${id}?lang=de&length.tolerance=1mm`);
    const range = page.getByTestId("stray-range");
    await range.waitFor({ timeout: 45_000 });
    expect(await range.innerText()).toMatch(
      /^Mit den Toleranzen [\d,]+\sµΩ … [\d,]+\sµΩ \(ungünstigster Fall/,
    );
    expect(await page.getByTestId("bracket").innerText()).toMatch(/Schranken .*bewiesen \(/);
    const verdict = page.getByTestId("verdict");
    expect(await verdict.innerText()).toContain("Nicht entschieden: Schranken oder Toleranzen");
    // The team's own wording, the catalogue's in the language, and what is hidden without its name.
    const rows = page.getByTestId("budget").getByRole("row");
    await rows.nth(3).waitFor({ timeout: 45_000 });
    const budget = await page.getByTestId("budget").innerText();
    for (const label of ["Länge", "Blechdicke", "hier nicht gezeigt"]) expect(budget).toContain(label);
    expect(budget).not.toContain("Temperatur");

    const length = page.getByLabel("Toleranz: Länge");
    expect(await length.inputValue()).toBe("1mm");
    const before = await range.innerText();
    // Typed as people write it: a decimal comma, and the unit of the value.
    await length.fill("2,5");
    await page.waitForFunction(
      (text) => document.querySelector('[data-testid="stray-range"]')?.textContent !== text,
      before,
    );
    await length.blur();
    expect(await length.inputValue()).toBe("2,5 mm");
    await length.fill("90 mm");
    await page.getByText("Dieser Wert kann nicht verwendet werden. Höchstens 5 mm").waitFor();
    expect(await length.getAttribute("aria-invalid")).toBe("true");
    await page.getByRole("button", { name: "Zurück zu den Vorgaben" }).click();
    expect(await length.inputValue()).toBe("2 mm");
  });

  test("tells the page around of its tolerances, and lets it set those that are open", async () => {
    const { page } = await newPage();
    const { id } = widget({ tolerances: TOLERANCES });
    await page.goto(
      host.origin + host.serve(loaderPage(base(), `<rhoform-embed id="one" embed="${id}"></rhoform-embed>`)),
    );
    const events = await told(page, "result", "one");
    const ready: unknown = events.find(({ type }) => type === "ready")?.detail;
    expect(ready).toMatchObject({
      inputs: expect.arrayContaining([{ name: "length.tolerance", value: "2 mm" }]),
    });
    const contribution = async (count: number) => {
      const all = await told(page, "result", "one", count);
      const { uncertainty }: { uncertainty?: Uncertainty } = Object(all.at(-1)?.detail);
      return uncertainty?.contributions.find(({ input }) => input === "dimensions.length")?.standard;
    };
    // Anywhere within ±2 mm: 2/√3 mm.
    expect(await contribution(1)).toBeCloseTo(0.002 / Math.sqrt(3), 10);
    await page.evaluate(() => {
      const element = document.getElementById("one") as HTMLElement & { set: (values: object) => void };
      element.set({
        "length.tolerance": "4 mm",
        "thickness.tolerance": "9 mm",
        "length.distribution": "normal",
      });
    });
    expect(await contribution(2)).toBeCloseTo(0.004 / Math.sqrt(3), 10);
  });

  test.each(["de", "fr", "es", "sv", "ja"])(
    "holds its words at 320 px in %s, cautions and labels among them",
    async (lang) => {
      const { page } = await newPage(lang);
      await page.setViewportSize({ width: 320, height: 900 });
      const { id } = widget({ ...LAYERED, tolerances: { ...TOLERANCES, inputs: [] } });
      await page.goto(`${base()}/embed/${id}?lang=${lang}`);
      await page.getByTestId("resistance").waitFor({ timeout: 45_000 });
      await page.getByTestId("stray-range").waitFor({ timeout: 45_000 });
      expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(320);
      const text = await page.locator("main").innerText();
      for (const english of [
        "Length",
        "Resistivity",
        "layer",
        "resistance",
        "This is a DC",
        "soil changes",
        "competent engineer",
      ]) {
        expect([english, text.includes(english)]).toEqual([english, false]);
      }
      expect(await page.locator('main [lang="en"]').count()).toBe(0);
    },
  );

  test.each([
    [320, "light"],
    [720, "dark"],
  ] as const)("has no accessibility complaint at %i px, %s", async (width, theme) => {
    const { page } = await newPage();
    await page.setViewportSize({ width, height: 900 });
    const { id } = widget({
      requirement: { max: "40 uohm" },
      tolerances: TOLERANCES,
      show: { drawing: true, bounds: true, plots: true },
      language: theme === "dark" ? "de" : "en",
    });
    await page.goto(`${base()}/embed/${id}?theme=${theme}`);
    await page.getByTestId("resistance").waitFor({ timeout: 45_000 });
    await page.getByRole("slider").first().waitFor({ timeout: 45_000 });
    expect(await axeViolations(page)).toEqual([]);
    expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(width);
  });

  test("loads at most 60 kB of script beyond the framework's own", async () => {
    const { page } = await newPage();
    const { id } = widget({ show: { drawing: true, bounds: true, plots: true }, tolerances: TOLERANCES });
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
  test("are listed, and lead to each other with the widget that was asked for", async () => {
    const { page, complaints } = await newPage();
    const { id } = widget();
    await page.goto(`${base()}/embed-examples?embed=${id}`);
    expect(await page.locator("dl a").allInnerTexts()).toEqual([
      "Plain HTML",
      "React",
      "A page with a strict policy",
      "Two widgets that feed each other",
    ]);
    await page.getByRole("link", { name: "A page with a strict policy" }).click();
    await page.waitForURL(`**/embed-examples/strict-policy?embed=${id}`);
    await page.getByRole("link", { name: "React" }).click();
    await page.waitForURL(`**/embed-examples/react?embed=${id}`);
    await page.getByRole("link", { name: "All examples" }).click();
    await page.waitForURL(`**/embed-examples?embed=${id}`);
    expect(await axeViolations(page)).toEqual([]);
    expect(complaints).toEqual([]);
  });

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
