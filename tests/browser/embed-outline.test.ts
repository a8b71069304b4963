import { describe, expect, test } from "vitest";
import { embedHistory, listEmbeds } from "@/db/queries/embeds";
import { teamBySlug } from "@/db/queries/teams";
import { signedInCookie } from "../support/signed-in";
import { onOutline, storedBend } from "../support/widget";
import { axeViolations } from "./accessibility";
import { base } from "./browser";
import { frameOf, host, newPage, server, setUpPages, shownText, told, widget } from "./embed-pages";
import { loaderPage } from "./host-page";

setUpPages();

const LONG = { timeout: 60_000 };
const onBend = (change: Parameters<typeof onOutline>[1] = {}) =>
  widget(onOutline(storedBend(server), change));
const shown = { drawing: true, bounds: true, plots: true };

describe("a widget on an outline", () => {
  test("solves in a page of another origin: bracket, drawing, picture, and the API's result for the page", async () => {
    const { page, complaints } = await newPage();
    const { id } = onBend({ requirement: { max: "400 ohm" }, show: shown, accuracy: 1e-5 });
    const path = host.serve(loaderPage(base(), `<rhoform-embed id="one" embed="${id}"></rhoform-embed>`));
    await page.goto(host.origin + path);
    const first = (await told(page, "result", "one")).find(({ type }) => type === "result");
    // 6 + 0.5587… squares of 50 Ω each.
    expect(first?.detail.resistance?.value).toBeCloseTo(327.94, 1);
    expect(Object(first?.detail).method).toBe("field");
    const frame = frameOf(page, id);
    expect(await shownText(frame)).toMatch(/^327\.94\s?Ω$/);
    expect(await frame.getByTestId("bracket").innerText()).toContain("bounds proved");
    expect(await frame.getByTestId("verdict").innerText()).toContain("Met, bounds included.");
    expect(await frame.getByRole("region", { name: "Cautions" }).innerText()).toContain(
      "no proof of compliance",
    );
    await frame.getByRole("img", { name: "Outline of 4 × 4 mm with the terminals in, out" }).waitFor(LONG);
    await frame.getByRole("img", { name: "Current density, equipotentials and stream lines" }).waitFor(LONG);
    // Neither the hidden temperature nor anything of the request is in the page.
    expect(await frame.content()).not.toContain("23.75");

    await page.evaluate(() =>
      (document.getElementById("one") as HTMLElement & { set: (values: object) => void }).set({
        sheetResistance: "20 ohm/sq",
        current: "5 A",
      }),
    );
    const events = await told(page, "result", "one", 2);
    expect(events.at(-1)?.detail.resistance?.value).toBeCloseTo(131.17, 1);
    await frame.locator("input").first().fill("5");
    await frame.getByText("must lie between 10 ohm/sq and 100 ohm/sq", { exact: false }).waitFor(LONG);
    expect(complaints.filter((text) => !text.includes("422"))).toEqual([]);
  });

  test("shows the bracket closing in, says calmly what went wrong, and cancels what nobody waits for", async () => {
    const { page } = await newPage();
    const { id } = onBend();
    const field = (more: object) => ({
      id: "fld_1",
      status: "running",
      progress: null,
      result: null,
      ...more,
    });
    let answer: object = field({ progress: { lower: 300, upper: 350, unknowns: 50, refinements: 1 } });
    const dropped: string[] = [];
    await page.route("**/api/v1/fields", (route) => route.fulfill({ status: 202, json: field({}) }));
    await page.route("**/api/v1/fields/fld_1", async (route) => {
      if (route.request().method() === "DELETE") {
        dropped.push(route.request().url());
        return route.fulfill({ status: 204 });
      }
      expect(route.request().headers().prefer).toMatch(/^wait=\d$/);
      await new Promise((resolve) => setTimeout(resolve, 100));
      await route.fulfill({ json: answer });
    });
    await page.goto(`${base()}/embed/${id}?lang=de`);
    const closing = page.getByTestId("closing");
    await closing.getByText("Die Schranken rücken zusammen").waitFor(LONG);
    expect(await closing.innerText()).toMatch(/300,0\d* … 350,0\d*\] Ω/);
    await page.locator("input").first().fill("60");
    await expect.poll(() => dropped.length, LONG).toBeGreaterThan(0);
    answer = field({ status: "failed", failure: "The medium cannot be solved." });
    await page.getByText("Für diese Werte gibt es keine Lösung").waitFor(LONG);
    expect(await page.getByText("The medium cannot be solved.").count()).toBe(1);
    await page.unroute("**/api/v1/fields");
    await page.route("**/api/v1/fields", (route) =>
      route.fulfill({ status: 503, headers: { "Retry-After": "30" }, json: {} }),
    );
    await page.locator("input").first().fill("70");
    await page.getByText("Eine kurze Pause").waitFor(LONG);
    expect(await page.locator("input").first().inputValue()).toBe("70");
  });

  test("has no accessibility complaint at 320 px", async () => {
    const { page } = await newPage();
    await page.setViewportSize({ width: 320, height: 900 });
    const { id } = onBend({ show: shown });
    await page.goto(`${base()}/embed/${id}?theme=dark`);
    await page.getByTestId("resistance").waitFor(LONG);
    await page.getByRole("img", { name: "Current density" }).waitFor(LONG);
    expect(await axeViolations(page)).toEqual([]);
    expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(320);
  });
});

describe("the builder", () => {
  test("from an outline that the outline page keeps to a published widget", async () => {
    const team = `outlines-${Date.now()}`;
    const { page } = await newPage();
    const cookie = await signedInCookie(server.service, { team });
    await page.context().addCookies([{ ...cookie, url: base() }]);
    await page.goto(`${base()}/console/embeds`);
    await page.getByRole("button", { name: "New embed" }).click(LONG);
    await page.getByText("A saved outline").click(LONG);
    await page.getByText("This team has stored no outline").waitFor(LONG);

    await page.goto(`${base()}/outline`);
    await page.getByRole("button", { name: "Keep outline" }).click(LONG);
    await page.getByLabel("Name of the outline").fill("Bent track, rev B", LONG);
    await page.getByRole("button", { name: "Keep", exact: true }).click();
    await page.getByRole("link", { name: "Make an embed of it" }).click(LONG);
    await page.getByRole("dialog").getByLabel("Name").fill("Track", LONG);
    expect(await page.getByLabel("Bent track, rev B").isChecked()).toBe(true);
    await page.getByRole("button", { name: "Make the draft" }).click();
    await page.waitForURL(/\/console\/embeds\/emb_/, LONG);
    await page.frameLocator("iframe").getByTestId("resistance").waitFor(LONG);
    await page.getByRole("button", { name: "Publish version 1" }).click(LONG);
    await page.getByText("published, version 1").waitFor(LONG);
    expect(await axeViolations(page, { exclude: "iframe" })).toEqual([]);

    const teamId = teamBySlug(server.service.db, team)?.id ?? "";
    const [embed] = listEmbeds(server.service.db, [teamId]);
    expect(Object(embedHistory(server.service.db, embed.id)[0].definition)).toMatchObject({
      outlineId: expect.stringMatching(/^out_/),
      title: "Bent track, rev B",
    });
    // Another team's outline is none.
    const foreign = await page.evaluate(
      async (body) =>
        (
          await fetch("/api/console/embeds", {
            method: "POST",
            headers: { "Content-Type": "application/json" },
            body: JSON.stringify(body),
          })
        ).status,
      { teamId, name: "Theirs", outlineId: storedBend(server, "another-team") },
    );
    expect(foreign).toBe(404);
  });
});
