import type { Page } from "playwright-core";
import { afterAll, beforeAll, expect, it } from "vitest";
import { newId } from "@/lib/service/identifier";
import { call, expectProblem, SLEEVE } from "../support/call";
import { startServer, type TestServer } from "../support/server";
import { signedInCookie } from "../support/signed-in";
import { axeViolations } from "./accessibility";
import { base, closeBrowser, visit, type Visit } from "./browser";

/** A team of its own, so that the tests of others find nothing of it. */
const TEAM = `console-${newId("per").slice(-8).toLowerCase()}`;

let server: TestServer;
let cookie: { name: string; value: string };
beforeAll(async () => {
  server = await startServer();
  cookie = await signedInCookie(server.service, { team: TEAM });
});
afterAll(async () => {
  await closeBrowser();
  await server.stop();
});

const open = (
  path: string,
  options: { width?: number; colorScheme?: "light" | "dark" } = {},
): Promise<Visit> =>
  visit(path, {
    ...options,
    prepare: (page) => page.context().addCookies([{ ...cookie, url: base() }]),
  });

async function accessible(page: Page): Promise<void> {
  expect(await axeViolations(page)).toEqual([]);
}

const compute = (key: string) => call(server, "post", "/resistance", { key, body: SLEEVE });

it("first key, first call, its usage; revoked in a second browser it is refused at the next call", async () => {
  const { page, close } = await open("/console/keys");
  await page.getByText("No keys yet").waitFor();
  await page.getByRole("button", { name: "Issue a key" }).click();
  const dialog = page.getByRole("dialog");
  await dialog.getByLabel("Computations a month").fill("many");
  await dialog.getByRole("button", { name: "Issue" }).click();
  // What is wrong is said at the fields, the first of them has the focus, and what was typed is still there.
  await page.waitForFunction(() => document.activeElement?.getAttribute("name") === "name");
  expect(await dialog.getByLabel("Computations a month").inputValue()).toBe("many");
  await dialog.getByLabel("Name").fill("Shop floor");
  await dialog.getByLabel("Computations a month").fill("500");
  // A switch is not seen itself; the dialog follows it all the same.
  await page.setViewportSize({ width: 1280, height: 500 });
  const mayTravel = dialog.getByRole("switch", { name: "May travel" });
  await mayTravel.focus();
  const [at, place] = [await mayTravel.boundingBox(), await dialog.boundingBox()];
  expect(at && place && at.y > place.y && at.y + at.height < place.y + place.height).toBe(true);
  await accessible(page);
  await dialog.getByRole("button", { name: "Issue" }).click();
  const key = (await page.getByTestId("secret").textContent()) ?? "";
  expect(key).toMatch(/^rho_/);
  // A stray press loses nothing; the button goes back to where it began.
  await page.keyboard.press("Escape");
  await page.mouse.click(5, 5);
  expect(await page.getByTestId("secret").textContent()).toBe(key);
  await dialog.getByRole("button", { name: "I have copied it" }).click();
  await page.waitForFunction(() => document.activeElement?.textContent?.includes("Issue a key"));
  await page.getByRole("link", { name: "Shop floor" }).waitFor();
  expect(await page.content()).not.toContain(key);

  expect((await compute(key)).status).toBe(200);
  await page.getByRole("link", { name: "Shop floor" }).click();
  await page.getByText("no name given").waitFor();
  await page.getByRole("link", { name: "Usage of this key" }).click();
  await page.getByRole("cell", { name: "200 answered" }).waitFor();

  const second = await open("/console/keys?q=Shop");
  await second.page.getByRole("link", { name: "Shop floor" }).click();
  await second.page.getByRole("button", { name: "Revoke" }).click();
  const question = second.page.getByRole("dialog");
  await question.getByText("These clients stop working").waitFor();
  await question.getByRole("button", { name: "Revoke for good" }).click();
  await second.page.getByText("The key is revoked.", { exact: true }).first().waitFor();
  expectProblem(await compute(key), 401, "revoked-key");
  await second.close();
  await close();
});

it.each([
  ["light", 360],
  ["dark", 1440],
] as const)("every section passes axe and fits, %s at %i px", async (colorScheme, width) => {
  const paths = [
    ["/console", "Today"],
    ["/console/keys", "Shop floor"],
    ["/console/usage", "200 answered"],
    ["/console/materials", "Copper, annealed (IACS)"],
    ["/console/materials/copper-annealed", "Versions"],
    ["/console/records", "No records yet"],
  ] as const;
  const { page, complaints, close } = await open("/console", { width, colorScheme });
  for (const [path, shown] of paths) {
    await page.goto(base() + path);
    await page.getByText(shown, { exact: true }).first().waitFor();
    await accessible(page);
    const excess = await page.evaluate(
      () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
    );
    expect([path, excess]).toEqual([path, 0]);
  }
  expect(complaints).toEqual([]);
  await close();
});
