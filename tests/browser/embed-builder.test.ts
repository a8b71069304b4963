import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { embedHistory, listEmbeds } from "@/db/queries/embeds";
import type { EmbedDefinition } from "@/lib/embeds/definition";
import { startServer, type TestServer } from "../support/server";
import { signedInCookie } from "../support/signed-in";
import { BUSBAR, publishedWidget } from "../support/widget";
import { axeViolations } from "./accessibility";
import { base, closeBrowser, visit, type Visit } from "./browser";
import { type HostServer, loaderPage, startHost } from "./host-page";

let server: TestServer;
let host: HostServer;
beforeAll(async () => {
  server = await startServer();
  host = await startHost();
});
afterAll(async () => {
  await closeBrowser();
  await host.stop();
  await server.stop();
});

async function openAs(team: string, path: string, width?: number, role?: "viewer"): Promise<Visit> {
  const cookie = await signedInCookie(server.service, { team, role });
  return visit(path, {
    width,
    prepare: (page) => page.context().addCookies([{ ...cookie, url: base() }]),
  });
}

const LONG = { timeout: 45_000 };

const OPEN_LENGTH: EmbedDefinition["tolerances"] = {
  uncertainty: { method: "propagation" },
  budget: true,
  inputs: [{ name: "length", rule: { mode: "open", value: "3 mm", max: "5 mm" } }],
};

describe("the builder", () => {
  test("from a calculation to a snippet that works in a bare file of another origin, and back to version 1", async () => {
    const team = `builders-${Date.now()}`;
    const { page, close } = await openAs(
      team,
      "/console/embeds?shape=bar&length=300mm&width=40mm&thickness=5mm&material=copper-annealed",
    );
    await page.getByRole("dialog").getByLabel("Name").fill("Section", LONG);
    await page.getByRole("button", { name: "Make the draft" }).click();
    await page.waitForURL(/\/console\/embeds\/emb_/, LONG);
    const id = page.url().split("/").pop() ?? "";
    const preview = page.frameLocator('iframe[title="Preview of the embed"]');
    await preview.getByTestId("resistance").waitFor(LONG);
    expect(await preview.locator('input[name="length"]').inputValue()).toBe("300");

    // What is typed is saved as the draft and shown.
    await page.getByLabel("Title", { exact: true }).fill("Our section");
    await preview.getByRole("heading", { name: "Our section" }).waitFor(LONG);
    const width = page.getByRole("group", { name: "Width", exact: true });
    await width.getByLabel("Visitors").selectOption({ label: "Fixed, hidden" });
    await preview.locator('input[name="width"]').waitFor({ state: "detached", ...LONG });
    // A contradiction stands in the way of publishing, at its field and above the preview.
    const length = page.getByRole("group", { name: "Length", exact: true });
    await length.getByLabel("Visitors").selectOption({ label: "Open within a range" });
    await length.getByLabel("To", { exact: true }).fill("100 mm");
    await page.getByText("Before it can be published").waitFor(LONG);
    expect(await page.getByRole("button", { name: "Publish version 1" }).isDisabled()).toBe(true);
    await length.getByLabel("To", { exact: true }).fill("2 m");
    await length.getByLabel("Help").fill("Between the joints");
    await preview.getByText("Between the joints").waitFor(LONG);
    await page.getByText("Before it can be published").waitFor({ state: "detached", ...LONG });
    await page.getByRole("button", { name: "Publish version 1" }).click();
    await page.getByText("published, version 1").waitFor(LONG);

    // An address is pasted, its origin is what counts; the snippet runs in a bare file.
    await page.getByRole("tab", { name: "Place" }).click();
    await page.getByLabel("Origins, one a line").fill(`${host.origin}/wiki/page.html`);
    await page.getByRole("button", { name: "Save" }).click();
    await page.getByText("Saved; it counts at once").waitFor(LONG);
    const snippet = await page.locator("pre").first().innerText();
    const bare = await visit("/docs");
    await bare.page.goto(
      host.origin + host.serve(loaderPage(base(), snippet.replace(/<script.*<\/script>/, ""))),
    );
    await bare.page.waitForFunction(
      () => window.events.some(({ type }) => type === "result"),
      undefined,
      LONG,
    );
    await bare.close();

    // Another version, and back.
    await page.getByRole("tab", { name: "Build" }).click();
    await page.getByLabel("Title", { exact: true }).fill("Second");
    await page.getByRole("button", { name: "Publish version 2" }).click(LONG);
    await page.getByText("published, version 2").waitFor(LONG);
    await page.getByRole("tab", { name: "Versions" }).click();
    await page.getByRole("button", { name: "Roll back to it" }).click();
    await page.getByText("on pages now, version 1 again").waitFor(LONG);
    const [newest] = embedHistory(server.service.db, id);
    expect([newest.number, newest.restores, Object(newest.definition).title]).toEqual([3, 1, "Our section"]);

    await page.getByRole("tab", { name: "Usage" }).click();
    await page.getByRole("cell", { name: host.origin }).waitFor(LONG);
    await close();
  }, 120_000);

  test("gives inputs tolerances, says what is wrong with one, and shows them in the preview", async () => {
    const team = `tolerances-${Date.now()}`;
    const { id } = publishedWidget(server, {}, { team });
    const { page, close } = await openAs(team, `/console/embeds/${id}`);
    const preview = page.frameLocator('iframe[title="Preview of the embed"]');
    await preview.getByTestId("resistance").waitFor(LONG);
    expect(await preview.getByTestId("stray-range").count()).toBe(0);
    await page.getByText("Evaluate tolerances").click();
    const length = page.getByRole("group", { name: "Tolerance of Length", exact: true });
    await length.getByLabel("Tolerance", { exact: true }).selectOption({ label: "Open to visitors" });
    await length.getByLabel("± starts with").fill("3 mm");
    await length.getByLabel("Up to").fill("2 mm");
    await page.getByText("Tolerance of Length: must be at most 2 mm.").waitFor(LONG);
    await length.getByLabel("Up to").fill("5 mm");
    const temperature = page.getByRole("group", { name: "Tolerance of Temperature", exact: true });
    await temperature.getByLabel("Tolerance", { exact: true }).selectOption({ label: "Fixed" });
    expect(await temperature.getByLabel("±", { exact: true }).inputValue()).toBe("5 K");
    // What is chosen from a list of materials takes none.
    expect(await page.getByRole("group", { name: "Tolerance of Material" }).count()).toBe(0);
    await page.getByLabel("Evaluated by").selectOption({ label: "Monte Carlo (GUM Supplement 1)" });
    await page.getByLabel("Trials").fill("200000");
    await page.getByText("Before it can be published").waitFor(LONG);
    await page.getByLabel("Trials").fill("5000");
    await page.getByText("Before it can be published").waitFor({ state: "detached", ...LONG });
    await preview.getByTestId("stray-range").waitFor(LONG);
    await preview.getByTestId("budget").waitFor(LONG);
    expect(await preview.getByLabel("Tolerance: Length").inputValue()).toBe("3 mm");
    const [{ definition: saved }] = embedHistory(server.service.db, id);
    expect(Object(saved).tolerances).toEqual({
      uncertainty: { method: "monte-carlo", trials: 5000 },
      budget: true,
      inputs: [
        { name: "length", rule: { mode: "open", value: "3 mm", max: "5 mm" } },
        { name: "temperature", rule: { mode: "fixed", value: "5 K" } },
      ],
    });
    await page.getByRole("button", { name: "Remove Temperature" }).click();
    await temperature.waitFor({ state: "detached", ...LONG });
    await close();
  });

  test("has no accessibility complaint at 360 px", async () => {
    const team = `axe-${Date.now()}`;
    const { id } = publishedWidget(server, { tolerances: OPEN_LENGTH }, { team });
    const { page, close } = await openAs(team, `/console/embeds/${id}`, 360);
    await page.frameLocator("iframe").getByTestId("resistance").waitFor(LONG);
    // The preview begins with a width that the screen has room for.
    await page.getByRole("group", { name: "Frame of 320 px" }).waitFor(LONG);
    expect(await axeViolations(page, { exclude: "iframe" })).toEqual([]);
    expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(360);
    await page.goto(`${base()}/console/embeds`);
    await page.getByRole("link", { name: "Bar" }).waitFor(LONG);
    expect(await axeViolations(page)).toEqual([]);
    await close();
  });
});

describe("behind the console", () => {
  test("401 signed out, 404 for another team's, 403 for a viewer, 409 for a draft that somebody else saved", async () => {
    const team = `owners-${Date.now()}`;
    const { id, teamId } = publishedWidget(server, {}, { team });
    const call = async (
      method: string,
      path: string,
      cookie?: { name: string; value: string },
      body?: object,
    ) => {
      const response = await fetch(`${base()}/api/console/embeds${path}`, {
        method,
        headers: {
          Origin: base(),
          "Sec-Fetch-Site": "same-origin",
          ...(cookie ? { Cookie: `${cookie.name}=${cookie.value}` } : {}),
          ...(body ? { "Content-Type": "application/json" } : {}),
        },
        body: body && JSON.stringify(body),
      });
      return response.status;
    };
    const own = await signedInCookie(server.service, { team });
    const viewer = await signedInCookie(server.service, { team, role: "viewer" });
    const other = await signedInCookie(server.service, { team: `others-${Date.now()}` });
    const draft = { definition: { ...BUSBAR, title: "Draft" }, from: null };
    expect(await call("GET", `/${id}`)).toBe(401);
    expect(await call("GET", `/${id}`, other)).toBe(404);
    expect(await call("PUT", `/${id}/draft`, other, draft)).toBe(404);
    expect(await call("POST", `/${id}/withdraw`, other)).toBe(404);
    expect(await call("GET", `/${id}`, viewer)).toBe(200);
    expect(await call("PUT", `/${id}/draft`, viewer, draft)).toBe(403);
    expect(await call("POST", `/${id}/roll-back`, viewer, { version: 1 })).toBe(403);
    expect(await call("POST", "", other, { teamId, name: "Theirs", shape: "bar" })).toBe(404);
    expect(await call("PUT", `/${id}/draft`, own, draft)).toBe(200);
    expect(await call("PUT", `/${id}/draft`, own, draft)).toBe(409);
    expect(await call("PUT", `/${id}/draft`, own, { definition: { title: 1 }, from: null })).toBe(422);
    expect(await call("PATCH", `/${id}`, own, { name: "x", origins: ["*"], monthQuota: 1 })).toBe(422);
    expect(await call("POST", `/${id}/roll-back`, own, { version: 9 })).toBe(404);
    expect(listEmbeds(server.service.db, [teamId]).map(({ name }) => name)).toEqual(["Bar"]);
    // A preview is for the team, and for nobody by its address.
    const seen = (cookie?: { name: string; value: string }) =>
      fetch(`${base()}/embed/${id}?preview=1`, {
        headers: cookie ? { Cookie: `${cookie.name}=${cookie.value}` } : {},
      }).then((response) => response.text());
    expect(await seen(own)).toContain(">Draft</h1>");
    expect(await seen(other)).not.toContain(">Draft</h1>");
    expect(await seen()).not.toContain(">Draft</h1>");
  });
});
