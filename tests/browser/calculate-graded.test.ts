import type { Page } from "playwright-core";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { PROFILE_FORMS } from "@/app/(site)/calculate/_model/profile-forms";
import { profileKinds } from "@/lib/engine";
import { closeBrowser } from "./browser";
import { addressOf, ask, type Bench, bodiesOf, settled, startBench } from "./calculation";

let bench: Bench;
beforeAll(async () => {
  bench = await startBench();
});
afterAll(async () => {
  await closeBrowser();
  await bench.stop();
});

const SHELL = "/calculate/cylindrical-shell?innerRadius=2mm&outerRadius=5mm&length=1m&conductivity=1e-12S/m";

async function openGraded(query = SHELL) {
  const visit = await bench.open(query);
  await visit.page.getByLabel("Given as").selectOption("graded");
  await visit.page.getByLabel("Law", { exact: true }).waitFor();
  return visit;
}

const field = (page: Page, name: string) => page.locator(`[name="profile.${name}"]`);

/** The page shows what the API answers to its address; both may lag behind the fields for a moment. */
async function agrees(page: Page): Promise<string> {
  await expect
    .poll(
      async () => {
        const [body] = bodiesOf(await addressOf(page));
        const asked = (await ask(bench.key, body)).resistance.text;
        return [asked, await settled(page)];
      },
      { timeout: 30_000 },
    )
    .toSatisfy(([asked, shown]: string[]) => asked === shown);
  // The profile as entered is plotted.
  await page.getByText(/^Profile as entered$/).waitFor();
  return settled(page);
}

describe("the profile editor", () => {
  it("has a form for every kind of the engine, and for no other", () => {
    expect(Object.keys(PROFILE_FORMS).sort()).toEqual(profileKinds.map(({ kind }) => kind).sort());
    for (const { kind, schema } of profileKinds) {
      const asked = PROFILE_FORMS[kind].flatMap(({ name }) =>
        name === "table" ? ["positions", "values"] : [name],
      );
      expect([kind, asked.sort()]).toEqual([
        kind,
        Object.keys(schema.shape)
          .filter((name) => name !== "kind")
          .sort(),
      ]);
    }
  });

  it.each(profileKinds.map(({ kind }) => kind))(
    "starts %s level, and answers as the API does",
    async (kind) => {
      const { page, complaints, close } = await openGraded();
      const level = await settled(page);
      expect(level).toBe("145.83\u2009GΩ");
      await page.getByLabel("Law", { exact: true }).selectOption(kind === "linear" ? "constant" : kind);
      if (kind === "linear") await page.getByLabel("Law", { exact: true }).selectOption("linear");
      const shown = await agrees(page);
      // A temperature and a dopant bring a resistivity of their own.
      if (kind !== "temperature" && kind !== "dopant") expect(shown).toBe(level);
      expect(complaints).toEqual([]);
      await close();
    },
  );

  it("follows what is typed, plots it, and says at the field what is wrong", async () => {
    const { page, close } = await openGraded();
    const before = await settled(page);
    await page.getByLabel("Law", { exact: true }).selectOption("expression");
    await field(page, "value").fill("1e-12*(1+3*u^2)");
    await settled(page, (text) => text !== before);
    await agrees(page);
    await field(page, "value").fill("1e-12*(1+3*v^2)");
    await page.waitForFunction(() => document.querySelector('[name="profile.value"][aria-invalid=true]'));
    await page.getByText(/Profile as entered before the last change/).waitFor();
    await close();
  });

  it("edits layers as a table: adds, moves, scales to fit", async () => {
    const { page, close } = await openGraded();
    await page.getByLabel("Law", { exact: true }).selectOption("layers");
    await page.getByLabel("Layer 1, value", { exact: true }).fill("5e-12");
    await page.getByRole("button", { name: "Layer", exact: true }).click();
    await page.getByText(/Together 4.5 mm of 3 mm/).waitFor();
    await page.getByText("No answer to this input").waitFor();
    await page.getByRole("button", { name: "Scale to fit" }).click();
    expect(await page.getByLabel("Layer 1, thickness", { exact: true }).inputValue()).toBe("1");
    const ordered = await agrees(page);
    await page.getByRole("button", { name: "Move layer 2 up" }).click();
    await settled(page, (text) => text !== ordered);
    await agrees(page);
    await page.getByRole("button", { name: "Remove layer 3" }).press("Enter");
    await page.getByText(/Together 2 mm of 3 mm/).waitFor();
    // A button that is pressed away leaves the keyboard beside it.
    const focused = () =>
      page.evaluate(() => {
        const { activeElement: at } = document;
        return at?.getAttribute("aria-label") ?? at?.textContent?.trim();
      });
    await expect.poll(focused).toBe("Remove layer 2");
    await page.getByRole("button", { name: "Scale to fit" }).press("Enter");
    await expect.poll(focused).toBe("Together 3 mm of 3 mm");
    await page.getByRole("button", { name: "Remove layer 2" }).press("Enter");
    await expect.poll(focused).toBe("Layer");
    await close();
  });

  it("reads a table from a CSV file, with units in its head and decimal commas", async () => {
    const { page, close } = await openGraded();
    await page.getByLabel("Law", { exact: true }).selectOption("table");
    const rows = Array.from({ length: 61 }, (_, i) => `${String(2 + i * 0.05).replace(".", ",")};${i + 1}`);
    await page.locator("input[type=file]").setInputFiles({
      name: "measured.csv",
      mimeType: "text/csv",
      buffer: Buffer.from(["radius/mm;conductivity (pS/m)", ...rows].join("\n")),
    });
    await page.getByText("Columns taken: radius/mm and conductivity (pS/m).").waitFor();
    await page.getByText("61 points").waitFor();
    const [body] = bodiesOf(await addressOf(page));
    expect(body.medium).toMatchObject({ graded: { profile: { kind: "table" } } });
    await agrees(page);
    await page.getByLabel("Points, one a line").fill("2 mm; 1e-12\n3 mm; x\n5 mm; 2e-12");
    await page.getByText('Line 2, column 2: "x" is no number.').waitFor();
    await close();
  });

  it("reproduces a long table from a link", async () => {
    const { page, close } = await openGraded();
    await page.getByLabel("Law", { exact: true }).selectOption("table");
    const rows = Array.from({ length: 600 }, (_, i) => `${2 + (3 * i) / 599} mm; ${1 + i} pS/m`);
    await page.getByRole("button", { name: "Edit as text" }).click();
    await page.getByLabel("Points, one a line").fill(rows.join("\n"));
    await page.getByText("600 points").waitFor();
    const shown = await agrees(page);
    // Its call is copied whole, but the page stays one that can be scrolled.
    await page.getByText(/^1,?\d{3} more lines are not shown; Copy takes them all\.$/).waitFor();
    const lines = await page.locator("pre").first().textContent();
    expect(lines?.split("\n")).toHaveLength(200);
    const link = await addressOf(page);
    expect(new URL(link).hash).toContain("profile.table=");
    await close();
    const again = await bench.open(new URL(link).pathname + new URL(link).search + new URL(link).hash);
    expect(await settled(again.page, (text) => text === shown)).toBe(shown);
    await again.page.getByText("600 points").waitFor();
    await again.close();
  });

  it("varies across the flow as well, and plots that", async () => {
    const { page, close } = await openGraded(
      "/calculate/bar?length=250mm&width=40mm&thickness=5mm&conductivity=58MS/m",
    );
    await page.getByLabel("Varies along").selectOption("width");
    await page.getByLabel("Law", { exact: true }).selectOption("exponential");
    await field(page, "to").fill("20 MS/m");
    await agrees(page);
    await page.getByRole("heading", { name: "Along the flow" }).scrollIntoViewIfNeeded();
    await page.getByText("Conductivity across the flow").waitFor();
    // Read off by keyboard.
    const plot = page.getByRole("slider", { name: /^Conductivity across the flow/ });
    await plot.focus();
    await page.keyboard.press("End");
    expect(await plot.getAttribute("aria-valuetext")).toMatch(/40 mm: conductivity 20 MS\/m/);
    await close();
  });
});
