import { execFile } from "node:child_process";
import { existsSync, mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { promisify } from "node:util";
import type { Page } from "playwright-core";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { recordCode } from "@/app/(site)/records/_content/record-code";
import { pdfPages } from "../support/pdf-text";
import { insertMembership, insertTeam, teamBySlug } from "@/db/queries/teams";
import { newId } from "@/lib/service/identifier";
import { BEND } from "../support/field";
import { startServer, type TestServer } from "../support/server";
import { signedInCookie } from "../support/signed-in";
import { axeViolations } from "./accessibility";
import { base, closeBrowser, visit, type Visit } from "./browser";
import { alive } from "./calculation";

const run = promisify(execFile);
const PDFTOPPM = "/usr/bin/pdftoppm";

let server: TestServer;
beforeAll(async () => {
  server = await startServer();
});
afterAll(async () => {
  await closeBrowser();
  await server.stop();
});

const BAR =
  "/calculate/bar?length=250mm&width=40mm&thickness=5mm&material=copper-annealed&current=630A&max=1mohm";

/** Opens a page as a person of a team. */
async function openAs(team: string, path: string, role?: "viewer"): Promise<Visit> {
  const cookie = await signedInCookie(server.service, { team, role });
  return visit(path, {
    prepare: (page) => page.context().addCookies([{ ...cookie, url: base() }]),
  });
}

const cookieOf = async (page: Page) =>
  (await page.context().cookies()).map(({ name, value }) => `${name}=${value}`).join("; ");

/** Share of dark pixels of a page on paper, as a program that knows nothing of ours draws it; null without that program. */
async function inkOf(pdf: Uint8Array): Promise<number | null> {
  if (!existsSync(PDFTOPPM)) return null;
  const folder = mkdtempSync(join(tmpdir(), "rhoform-sheet-"));
  try {
    writeFileSync(join(folder, "sheet.pdf"), pdf);
    const { stdout } = await run(
      PDFTOPPM,
      ["-gray", "-r", "40", "-f", "1", "-l", "1", join(folder, "sheet.pdf")],
      {
        encoding: "buffer",
        maxBuffer: 5_000_000,
      },
    );
    const dark = stdout.subarray(20).filter((grey) => grey < 128).length;
    return dark / stdout.length;
  } finally {
    rmSync(folder, { recursive: true });
  }
}

describe("a record", () => {
  it("asks a signed-out reader to sign in, and leads back to exactly this state", async () => {
    const { page, close } = await visit(BAR);
    await page.locator('[name="width"]').fill("50 mm");
    await page.getByRole("link", { name: "Sign in to save" }).click();
    await page.waitForURL("**/sign-in?**");
    expect(new URL(page.url()).searchParams.get("next")).toBe(BAR.replace("width=40mm", "width=50mm"));
    await page.goto(`${base()}/records/rec_0`);
    expect(new URL(page.url()).pathname + new URL(page.url()).search).toBe(
      "/sign-in?next=%2Frecords%2Frec_0",
    );
    await close();
  });

  it("of what cannot be answered is refused in the page's own words", async () => {
    const { page, close } = await openAs("busbar", "/outline");
    await alive(page);
    await page.getByLabel("Begin with").selectOption("An empty board");
    const dialog = page.getByRole("dialog");
    const refused = async () => {
      await dialog.getByText("The input cannot be used").waitFor();
      const text = await dialog.innerText();
      expect(text).toContain("Outer ring: The outer ring has 0 points");
      expect(text).not.toContain("#/");
      expect(text.split("has 0 points")).toHaveLength(2);
      await page.keyboard.press("Escape");
    };
    await page.getByRole("button", { name: "Save as a record" }).click();
    await dialog.getByRole("button", { name: "Save", exact: true }).click();
    await refused();
    await page.getByRole("button", { name: "Keep outline" }).click();
    await page.getByLabel("Name of the outline").fill("Nothing yet");
    await dialog.getByRole("button", { name: "Keep", exact: true }).click();
    await refused();
    await page.goto(`${base()}${BAR.replace("width=40mm", "width=-40mm")}`);
    await alive(page);
    await page.getByRole("button", { name: "Save as a record" }).click();
    await dialog.getByRole("button", { name: "Save", exact: true }).click();
    await dialog.getByText("Width: must be greater than 0").waitFor();
    await close();
  });

  it("keeps a dimension that was found", async () => {
    const { page, close } = await openAs("busbar", `${BAR}&solveFor=width&target=20uohm`);
    await page.getByTestId("solutions").waitFor();
    await page.getByRole("button", { name: "Save what was found" }).click();
    await page.getByRole("button", { name: "Save", exact: true }).click();
    await page.getByRole("link", { name: "Open the record" }).click();
    await page.waitForURL("**/records/rec_*");
    await page.getByRole("heading", { level: 1, name: /^Rectangular bar: width for 20/ }).waitFor();
    await close();
  });

  it("tells its code and its team, which is chosen where there are several", async () => {
    const { page, close } = await openAs("busbar", "/docs/changelog");
    const { db } = server.service;
    const { id: personId } = db.$client
      .prepare("select id from people order by created_at desc, rowid desc limit 1")
      .get() as { id: string };
    if (!teamBySlug(db, "thin-film")) {
      insertTeam(db, { id: newId("team"), slug: "thin-film", name: "Thin film", createdAt: Date.now() });
    }
    const other = teamBySlug(db, "thin-film");
    insertMembership(db, personId, other?.id ?? "", Date.now());
    await page.goto(base() + BAR);
    await alive(page);
    await page.getByRole("button", { name: "Save as a record" }).click();
    await page.getByLabel("Team that owns it").selectOption(other?.name ?? "");
    await page.getByRole("button", { name: "Save", exact: true }).click();
    const stored = page.getByTestId("stored");
    await stored.waitFor();
    const link = stored.getByRole("link").first();
    const id = (await link.getAttribute("href"))?.split("/").at(-1) ?? "";
    expect(await link.textContent()).toBe(recordCode(id));
    expect(await stored.innerText()).toContain(other?.name);
    expect(db.$client.prepare("select team_id from records where id = ?").get(id)).toEqual({
      team_id: other?.id,
    });
    await close();
  });

  it("of a field is opened again in Outline and solves to the same, a stored outline in it", async () => {
    const { key } = server.issue({ team: "busbar" });
    const post = async (path: string, body: object) => {
      const response = await fetch(`${base()}/api/v1${path}`, {
        method: "POST",
        headers: {
          Authorization: `Bearer ${key}`,
          "Content-Type": "application/json",
          Prefer: "wait=30",
        },
        body: JSON.stringify(body),
      });
      return response.json();
    };
    const terminals = [
      { name: "in", parts: [{ ring: 0, edge: 1 }] },
      { name: "out", parts: [{ ring: 0, edge: 4 }] },
    ];
    const outline = await post("/outlines", { outline: BEND.outline });
    const { record, result } = await post("/fields", {
      outlineId: outline.id,
      terminals,
      medium: BEND.medium,
      record: { label: "Bend" },
    });
    const { page, close } = await openAs("busbar", `/records/${record.id}`);
    // Places are called as the page of the outline calls them.
    for (const edge of [1, 4]) await page.getByText(`outer ring, edge ${edge}`).first().waitFor();
    await page.getByRole("link", { name: "Open in Outline" }).click();
    await page.waitForURL(/\/outline/);
    await alive(page);
    await expect.poll(() => page.getByLabel("Vertex 1, x").inputValue()).toBe("4");
    await page.getByRole("button", { name: "Solve" }).click();
    await page.getByTestId("picture").waitFor({ timeout: 30_000 });
    expect(await page.getByTestId("resistance").first().textContent()).toBe(result.resistance.text);
    await close();
  });

  it("has a sheet whose refusals are problem documents", async () => {
    const cookie = await signedInCookie(server.service, { team: "busbar" });
    const signedIn = { cookie: `${cookie.name}=${cookie.value}` };
    const ask = async (path: string, headers: Record<string, string> = {}) => {
      const response = await fetch(base() + path, { headers, redirect: "manual" });
      return { response, body: response.status === 303 ? null : await response.json() };
    };
    const paper = await ask("/records/rec_0/sheet.pdf?paper=a5", signedIn);
    expect(paper.response.status).toBe(422);
    expect(paper.response.headers.get("content-type")).toMatch(/^application\/problem\+json/);
    expect(paper.body.errors).toEqual([
      { parameter: "paper", detail: expect.stringMatching(/"a4".*"letter"/) },
    ]);
    const unknown = await ask("/records/rec_0/sheet.pdf", signedIn);
    expect([unknown.response.status, unknown.body.type.split("/").at(-1)]).toEqual([404, "not-found"]);
    const signedOut = await ask("/records/rec_0/sheet.pdf", { accept: "application/pdf" });
    expect([signedOut.response.status, signedOut.body.type.split("/").at(-1)]).toEqual([
      401,
      "sign-in-required",
    ]);
    const person = await ask("/records/rec_0/sheet.pdf?paper=letter", { accept: "text/html,*/*" });
    expect(person.response.headers.get("location")).toBe(
      "/sign-in?next=%2Frecords%2Frec_0%2Fsheet.pdf%3Fpaper%3Dletter",
    );
  });

  it("is stored from the page, stands alone, prints, replays, is relabelled and deleted", async () => {
    const { page, close, complaints } = await openAs("busbar", BAR);
    await page.getByRole("button", { name: "Save as a record" }).click();
    await page.getByLabel("Name of the record").fill("Main bar, panel 2");
    await page.getByRole("button", { name: "Save", exact: true }).click();
    await page.getByRole("link", { name: "Open the record" }).click();
    await page.waitForURL("**/records/rec_*");
    await page.getByRole("heading", { level: 1, name: "Main bar, panel 2" }).waitFor();
    const id = page.url().split("/").at(-1) ?? "";
    const row = server.service.db.$client.prepare("select * from records where id = ?").get(id) as {
      result: string;
      by_name: string;
    };
    const { resistance } = JSON.parse(row.result) as { resistance: { text: string } };
    expect(row.by_name).toBe("Ines Hartwell");
    expect(await page.getByTestId("resistance").textContent()).toBe(resistance.text);
    expect(await page.getByTestId("verdict").textContent()).toContain("Requirement met.");
    const text = await page.locator("article").innerText();
    for (const part of ["250 mm", "0.25", recordCode(id), "Ines Hartwell", "IEC 60028", "Two routes agree"]) {
      expect(text).toContain(part);
    }

    await page.setViewportSize({ width: 360, height: 800 });
    expect(await axeViolations(page)).toEqual([]);
    const excess = await page.evaluate(
      () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
    );
    expect(excess).toBe(0);

    const cookie = await cookieOf(page);
    for (const paper of ["a4", "letter"]) {
      const response = await fetch(`${base()}/records/${id}/sheet.pdf?paper=${paper}`, {
        headers: { cookie },
      });
      expect(response.headers.get("content-type")).toBe("application/pdf");
      const pdf = new Uint8Array(await response.arrayBuffer());
      expect(pdfPages(pdf)[0]).toContain("Main bar, panel 2");
      const ink = await inkOf(pdf);
      if (ink !== null) expect(ink).toBeGreaterThan(0.004);
    }
    const printed = await page.pdf({ preferCSSPageSize: true });
    const ink = await inkOf(printed);
    if (ink !== null) expect(ink).toBeGreaterThan(0.004);

    await page.getByRole("button", { name: "Replay" }).click();
    await page.getByText("Identical:").waitFor();

    await page.getByRole("button", { name: "Relabel" }).click();
    await page.getByLabel("Name of the record").fill("Main bar, panel 2, approved");
    await page.getByRole("button", { name: "Save", exact: true }).click();
    await page.getByRole("heading", { level: 1, name: "Main bar, panel 2, approved" }).waitFor();

    const lower = recordCode(id).toLowerCase();
    await page.goto(`${base()}/records/${lower}`);
    expect(new URL(page.url()).pathname).toBe(`/records/${id}`);

    await page.getByRole("button", { name: "Delete" }).click();
    await page.getByRole("button", { name: "Delete for good" }).click();
    await page.waitForURL("**/console/records**");
    expect((await fetch(`${base()}/records/${id}`, { headers: { cookie } })).status).toBe(404);
    expect(complaints.filter((line) => !line.includes("404"))).toEqual([]);
    await close();
  });

  it("is unknown to another team, and a viewer only reads it", async () => {
    const { key } = server.issue({ team: "busbar" });
    const stored = await fetch(`${base()}/api/v1/resistance`, {
      method: "POST",
      headers: { Authorization: `Bearer ${key}`, "Content-Type": "application/json" },
      body: JSON.stringify({
        shape: "bar",
        dimensions: { length: 1, width: 0.01, thickness: 0.01 },
        medium: { resistivity: 1e-8 },
        record: { label: "Kept" },
      }),
    });
    const { record } = (await stored.json()) as { record: { id: string } };
    const viewer = await openAs("busbar", `/records/${record.id}`, "viewer");
    expect(await viewer.page.getByText("Your role reads records").count()).toBe(1);
    expect(await viewer.page.getByRole("button", { name: "Delete" }).count()).toBe(0);
    await viewer.close();
    const other = await signedInCookie(server.service, { team: "earthing" });
    const headers = { cookie: `${other.name}=${other.value}` };
    const code = recordCode(record.id);
    for (const path of [`/records/${record.id}`, `/records/${code}`, `/records/${record.id}/sheet.pdf`]) {
      expect((await fetch(base() + path, { headers, redirect: "manual" })).status, path).toBe(404);
    }
  });
});
