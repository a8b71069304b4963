import { execFile } from "node:child_process";
import { promisify } from "node:util";
import type { Page } from "playwright-core";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { axeViolations } from "./accessibility";
import { base, closeBrowser } from "./browser";
import { type Bench, RESISTANCE, startBench } from "./calculation";

const run = promisify(execFile);

let bench: Bench;
beforeAll(async () => {
  bench = await startBench();
});
afterAll(async () => {
  await closeBrowser();
  await bench.stop();
});

/** Presses places of an empty board, which shows 60 units across its shorter side around (20, 20). */
async function presser(page: Page): Promise<(x: number, y: number) => Promise<void>> {
  const box = await page.getByTestId("board").boundingBox();
  if (!box) throw new Error("There is no board.");
  const scale = Math.min(box.width, box.height) / 60;
  return (x, y) =>
    page.mouse.click(box.x + box.width / 2 + (x - 20) * scale, box.y + box.height / 2 - (y - 20) * scale);
}

async function solve(page: Page): Promise<void> {
  await page.getByRole("button", { name: "Solve" }).click();
  await page.getByTestId("picture").waitFor({ timeout: 30_000 });
}

/** Its first edge is crossed by four others. */
const ZIGZAG = [
  [0, 0],
  [10, 0],
  [10, 10],
  [8, -2],
  [6, 10],
  [4, -2],
  [2, 10],
  [0, 10],
];

describe("an outline", () => {
  it("is drawn, gets its terminals by presses, and is solved to the known corner", async () => {
    const { page, complaints, close } = await bench.open("/outline");
    await page.getByLabel("Begin with").selectOption("An empty board");
    await page
      .getByText("“An empty board” has taken the place of your drawing. Undo brings yours back.", {
        exact: true,
      })
      .waitFor();
    expect(await page.getByRole("button", { name: "Solve" }).isDisabled()).toBe(true);
    await page.getByText(/^Draw the outer ring first/).waitFor();
    const press = await presser(page);
    for (const [x, y] of [
      [0, 0],
      [40, 0],
      [40, 10],
      [10, 10],
      [10, 40],
      [0, 40],
      [0, 0],
    ]) {
      await press(x, y);
    }
    expect(await page.getByLabel("Vertex 3, x").inputValue()).toBe("10");
    await page.getByText("Terminals", { exact: true }).first().click();
    await press(40, 5);
    await page.getByRole("button", { name: "Terminal", exact: true }).click();
    await press(5, 40);
    expect(await page.getByLabel("Terminal on edge 4").inputValue()).toBe("1");
    await page.getByLabel("Width of the bracket").selectOption("0.0001 %");
    await solve(page);
    // Six squares of leg and the corner, 1 − (2/π)·ln 2 = 0.558729 squares: P. M. Hall, Thin Solid Films 1 (1968) 277,
    // from memory.
    const [, lower, upper] =
      /\[([\d.]+) … ([\d.]+)\]/.exec((await page.getByTestId("squares").textContent()) ?? "") ?? [];
    expect(Number(lower) - 6).toBeLessThan(0.55873);
    expect(Number(upper) - 6).toBeGreaterThan(0.55872);
    expect(Number(upper) - Number(lower)).toBeLessThan(1e-5);
    expect(await page.locator(RESISTANCE).textContent()).toBe("327.94\u2009Ω");
    expect(await page.getByTestId("peak").textContent()).toMatch(/Unbounded at \(10, 10\) mm/);

    // The picture's layers, the probe and the profile.
    await page.getByText(/^Stream lines/).click();
    expect(await page.getByTestId("streamlines").count()).toBe(0);
    await page.getByText("Read off", { exact: true }).first().click();
    await press(39.9, 5);
    await page
      .getByTestId("probe")
      .getByText(/0\.99\d+ V/)
      .waitFor();
    await page.getByRole("button", { name: "Profile across the middle" }).click();
    await page.getByRole("slider", { name: /Potential along the line/ }).waitFor();
    expect(await axeViolations(page)).toEqual([]);
    await page.emulateMedia({ colorScheme: "dark" });
    expect(await axeViolations(page)).toEqual([]);
    expect(complaints).toEqual([]);
    await close();
  });

  it("is worked on by keyboard alone, step by step back, and travels in its link", async () => {
    const { page, close } = await bench.open("/outline");
    const x = page.getByLabel("Vertex 1, x");
    await x.focus();
    await page.keyboard.press("Control+A");
    await page.keyboard.type("1/2 in");
    await page.keyboard.press("Enter");
    expect(await x.inputValue()).toBe("12.7");
    await page.keyboard.press("Control+Z");
    expect(await x.inputValue()).toBe("40");
    await page.keyboard.press("Control+Shift+Z");
    expect(await x.inputValue()).toBe("12.7");
    await page.keyboard.press("Control+Z");
    // The marked vertex moves on the board by grid steps; an edge becomes an arc in the table.
    await page.locator("#board").focus();
    await page.keyboard.press("ArrowRight");
    expect(await x.inputValue()).toBe("41");
    await page.getByLabel("Edge 0", { exact: true }).focus();
    await page.getByLabel("Edge 0", { exact: true }).selectOption("arc ↻");
    await page.getByLabel("Edge 0, radius").fill("50");
    await page.keyboard.press("Enter");
    await page.getByRole("button", { name: "Add a vertex after 5" }).press("Enter");
    expect(await page.getByLabel("Vertex 6, y").inputValue()).toBe("20");
    await page.getByRole("button", { name: "Solve" }).press("Enter");
    await page.locator(RESISTANCE).waitFor({ timeout: 30_000 });
    const shown = await page.locator(RESISTANCE).textContent();
    await page.waitForFunction(() => window.location.hash.includes("41"));
    const link = new URL(page.url());
    await close();

    const again = await bench.open(link.pathname + link.hash);
    await again.page.waitForFunction(
      () => document.querySelector<HTMLInputElement>('[aria-label="Edge 0, radius"]')?.value === "50",
    );
    await solve(again.page);
    expect(await again.page.locator(RESISTANCE).textContent()).toBe(shown);
    await again.close();
  });

  it("shows the coordinates of what was just drawn", async () => {
    const { page, close } = await bench.open("/outline");
    await page.getByLabel("Begin with").selectOption("An empty board");
    const draw = async (corners: readonly (readonly [number, number])[]) => {
      const press = await presser(page);
      for (const [x, y] of [...corners, corners[0]]) await press(x, y);
    };
    await draw([
      [0, 0],
      [40, 0],
      [40, 40],
      [0, 40],
    ]);
    for (const [target, title, from] of [
      ["Hole", "Hole 0", 5],
      ["Hole", "Hole 1", 15],
      ["Region", "Region 0", 25],
    ] as const) {
      await page.getByText("Draw", { exact: true }).first().click();
      await page.getByText(target, { exact: true }).first().click();
      await draw([
        [from, from],
        [from + 5, from],
        [from + 5, from + 5],
      ]);
      await expect
        .poll(() => page.getByLabel("Ring", { exact: true }).locator("option:checked").textContent())
        .toBe(title);
      expect(await page.getByLabel("Vertex 0, x").inputValue()).toBe(String(from));
    }
    await close();
  });

  it("is pressed under a message, whose Undo brings the drawing before back also after further steps", async () => {
    const { page, close } = await bench.open("/outline");
    const x = page.getByLabel("Vertex 1, x");
    expect(await x.inputValue()).toBe("40");
    await page.getByLabel("Begin with").selectOption("An empty board");
    const message = page.getByRole("listitem").filter({ hasText: "has taken the place of your drawing" });
    await message.waitFor();
    const takesPresses = (part: Element) => getComputedStyle(part).pointerEvents !== "none";
    expect(await message.evaluate(takesPresses)).toBe(false);
    const press = await presser(page);
    await press(0, 0);
    await press(30, 0);
    await message.getByRole("button", { name: "Undo" }).click();
    await page.waitForFunction(
      () => document.querySelector<HTMLInputElement>('[aria-label="Vertex 1, x"]')?.value === "40",
    );
    await close();
  });

  it("takes rows of coordinates from a spreadsheet, whole or not at all", async () => {
    const { page, close } = await bench.open("/outline");
    const x = (k: number) => page.getByLabel(`Vertex ${k}, x`);
    const paste = (k: number, text: string) =>
      x(k).evaluate((cell, pasted) => {
        const clipboardData = new DataTransfer();
        clipboardData.setData("text/plain", pasted);
        cell.dispatchEvent(new ClipboardEvent("paste", { clipboardData, bubbles: true, cancelable: true }));
      }, text);
    const before = await x(1).inputValue();
    await paste(1, "50\t0\n50\twide\n");
    await page.getByText('Nothing was pasted. Line 2, column 2: "wide" is no number.').waitFor();
    expect(await x(1).inputValue()).toBe(before);
    await paste(1, "50\t0\n50\t10\n");
    await page.waitForFunction(
      () => document.querySelector<HTMLInputElement>('[aria-label="Vertex 2, x"]')?.value === "50",
    );
    expect(await x(1).inputValue()).toBe("50");
    expect(await page.getByText("Nothing was pasted").count()).toBe(0);
    await close();
  });

  it("says at the place what is wrong, waits out a limit, and takes JSON", async () => {
    const { page, close } = await bench.open("/outline");
    await page.getByRole("button", { name: "JSON", exact: true }).click();
    await page.getByRole("textbox", { name: "JSON" }).fill('{"outer": [[0, 0], [1]]}');
    await page.getByRole("button", { name: "Take over" }).click();
    await page.getByText("#/outer/1", { exact: true }).waitFor();
    // A file that the API would not take is refused unread, and what stands in the field stays.
    await page.locator("input[type=file]").setInputFiles({
      name: "huge.json",
      mimeType: "application/json",
      buffer: Buffer.alloc(10_100_000, " "),
    });
    await page.getByText("has 10.1 MB; at most 10 MB are taken.").waitFor();
    expect(await page.getByRole("textbox", { name: "JSON" }).inputValue()).toContain('"outer"');
    const crossing = {
      outline: {
        unit: "mm",
        outer: [
          [0, 0],
          [10, 10],
          [10, 0],
          [0, 10],
        ],
      },
      terminals: [
        { name: "a", parts: [{ ring: 0, edge: 1 }] },
        { name: "b", parts: [{ ring: 0, edge: 7 }] },
      ],
      medium: { sheetResistance: "5 kg" },
    };
    await page.getByRole("textbox", { name: "JSON" }).fill(JSON.stringify(crossing));
    await page.getByRole("button", { name: "Take over" }).click();
    await page.getByRole("button", { name: "Solve" }).click();
    const field = page.getByLabel(/^Sheet resistance/).first();
    await page.locator("[aria-invalid]").first().waitFor();
    expect(await field.getAttribute("aria-invalid")).toBe("true");
    await field.fill("5");
    await page.getByRole("button", { name: "Solve" }).click();
    await page.getByRole("button", { name: "Outer ring, edge 2" }).click();
    await page.locator("tr", { hasText: "cross at (5, 5)" }).waitFor();
    expect(await page.getByTestId("selection").textContent()).toContain("Outer ring, edge 2");
    // Every crossing has its mark and its sentence; a terminal's complaint leads to its fields.
    await page.getByRole("button", { name: "Terminal b, part 1" }).click();
    expect(await page.locator("#terminal-1 :focus").count()).toBe(1);
    expect(await page.locator("#board svg [data-complaint]").count()).toBe(1);
    await page.getByRole("button", { name: "JSON", exact: true }).click();
    const zigzag = { ...crossing, outline: { unit: "mm", outer: ZIGZAG }, medium: { sheetResistance: 5 } };
    await page.getByRole("textbox", { name: "JSON" }).fill(JSON.stringify(zigzag));
    await page.getByRole("button", { name: "Take over" }).click();
    await page.getByRole("button", { name: "Solve" }).click();
    await page.getByRole("button", { name: "Outer ring, edge 5" }).waitFor();
    expect(await page.locator("#board svg [data-complaint]").count()).toBe(4);
    expect(await page.locator("tr", { hasText: "cross at" }).count()).toBe(4);
    expect(await page.getByText("#/").count()).toBe(0);
    expect(await axeViolations(page)).toEqual([]);

    // A coordinate that cannot be read says so in its cell, and what holds instead.
    const cell = page.getByLabel("Vertex 1, x");
    const stands = await cell.inputValue();
    await cell.fill("5 kg");
    await cell.press("Enter");
    await page.getByText(`This is no length. ${stands} still holds.`).waitFor();
    await cell.press("Escape");
    expect(await cell.inputValue()).toBe(stands);
    expect(await page.getByText("still holds").count()).toBe(0);

    // A limit passes by itself; the same attempt is then answered.
    let refused = 0;
    await page.route("**/api/v1/fields", async (route) => {
      if (refused++ > 0) return route.continue();
      await route.fulfill({
        status: 429,
        headers: { "Retry-After": "1", "Content-Type": "application/problem+json" },
        body: JSON.stringify({ title: "Too many requests", status: 429 }),
      });
    });
    await page.getByLabel("Begin with").selectOption("Strip with a tap");
    await page.getByRole("button", { name: "Solve" }).click();
    await page.getByText("A short pause").waitFor();
    await page.getByTestId("pairs").waitFor({ timeout: 20_000 });
    expect(await page.getByTestId("pairs").locator("tbody tr").count()).toBe(3);
    expect(await page.getByTestId("matrix").locator("tbody tr").count()).toBe(3);
    expect(refused).toBe(2);
    await close();
  });

  it("gives calls that work elsewhere", async () => {
    const { page, close } = await bench.open("/outline");
    const codes: string[] = [];
    for (const tab of ["curl", "Python"]) {
      await page.getByRole("tab", { name: tab }).click();
      codes.push((await page.locator("section[aria-labelledby=elsewhere] pre").textContent()) ?? "");
    }
    await close();
    // The page tells the address of the configuration; the test's server may be reached by another name.
    const [curl, python] = codes.map((code) => code.replaceAll(/https?:\/\/[^/"' ]+(?=\/api\/v1)/g, base()));
    const env = { ...process.env, RHOFORM_KEY: bench.key, PYTHONIOENCODING: "utf-8" };
    const answer = JSON.parse((await run("bash", ["-c", curl], { env })).stdout);
    expect(answer.result.resistance.text).toBe("327.94\u2009Ω");
    const { lower, upper } = answer.result.resistance;
    expect((await run("python3", ["-c", python], { env })).stdout.trim()).toBe(
      `327.94\u2009Ω ${lower} ${upper}`,
    );
  });

  it("closes its bracket live and can be stopped", async () => {
    const { page, close } = await bench.open("/outline");
    // Three steps of a solution, as the stream tells them, with time to look in between.
    const view = (status: string, progress: object | null) => ({
      id: "fld_x",
      status,
      progress,
      result: null,
    });
    await page.route("**/api/v1/fields", (route) =>
      route.fulfill({
        status: 202,
        contentType: "application/json",
        body: JSON.stringify(view("queued", null)),
      }),
    );
    const progress = { lower: 300, upper: 350, unknowns: 1200, refinements: 3 };
    await page.route("**/api/v1/fields/fld_x/events", (route) =>
      route.fulfill({
        contentType: "text/event-stream",
        body: `event: progress\ndata: ${JSON.stringify(view("running", progress))}\n\n`,
      }),
    );
    let deleted = 0;
    await page.route("**/api/v1/fields/fld_x", (route) => {
      deleted += Number(route.request().method() === "DELETE");
      return route.fulfill({ status: 204 });
    });
    await page.getByRole("button", { name: "Solve" }).click();
    await page.getByTestId("closing").getByText("1,200 unknowns").waitFor();
    await page.getByText("The connection broke").waitFor();
    await page.getByRole("button", { name: "Cancel" }).click();
    await page.getByText("Cancelled").waitFor();
    await expect.poll(() => deleted).toBe(1);

    // One that the service has lost is told as such.
    await page.unroute("**/api/v1/fields/fld_x/events");
    await page.route("**/api/v1/fields/fld_x/events", (route) =>
      route.fulfill({
        status: 404,
        contentType: "application/problem+json",
        body: JSON.stringify({ title: "Not found", status: 404 }),
      }),
    );
    await page.getByRole("button", { name: "Solve" }).click();
    await page.getByText("This solution is gone").waitFor();
    await close();
  });
});
