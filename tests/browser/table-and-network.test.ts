import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { closeBrowser } from "./browser";
import { type Bench, RESISTANCE, startBench } from "./calculation";

let bench: Bench;
beforeAll(async () => {
  bench = await startBench();
});
afterAll(async () => {
  await bench.stop();
  await closeBrowser();
});

describe("the table", () => {
  it("takes an uploaded file, computes it, marks what is refused and goes on from there", async () => {
    const { page, close } = await bench.open("/calculate/table?shape=bar");
    const text =
      "shape;length/m;width/mm;thickness/mm;material;Remark\nbar;1,2;50;10;copper-annealed;a\nbar;1,2;50 kg;10;copper-annealed;b\n";
    await page
      .locator("input[type=file]")
      .setInputFiles({ name: "bars.csv", mimeType: "text/csv", buffer: Buffer.from(text) });
    await page.getByText("One column is left out").waitFor();
    await page.getByRole("button", { name: "Compute 2 rows" }).click();
    await page.getByText("1 row answered, 1 refused").waitFor();
    // 1.2 m of 50 mm × 10 mm in annealed copper (IEC 60028, 1/58 Ω·mm²/m): 41.379 µΩ.
    expect(await page.getByRole("row", { name: /^1/ }).textContent()).toContain("41.379\u2009µΩ");
    const cell = page.getByRole("textbox", { name: "width, row 2" });
    expect(await cell.getAttribute("aria-invalid")).toBe("true");
    expect(await page.locator("tbody").textContent()).toContain("width must be a length");

    await cell.fill("50");
    await page.getByRole("button", { name: "Compute the 1 open row" }).click();
    await page.getByText("2 rows answered, 0 refused").waitFor();

    const download = page.waitForEvent("download");
    await page.getByRole("button", { name: "Download CSV" }).click();
    const chunks: Buffer[] = [];
    for await (const chunk of await (await download).createReadStream()) chunks.push(Buffer.from(chunk));
    const lines = Buffer.concat(chunks).toString("utf8").split("\r\n");
    expect(lines[0]).toContain(
      "thickness/mm;material;Remark;resistance/ohm;lower/ohm;upper/ohm;text;problem",
    );
    expect(lines[2]).toContain("41.379\u2009µΩ");
    await close();
  });

  it("is still there after a reload", async () => {
    const { page, close } = await bench.open("/calculate/table");
    await page.getByRole("textbox", { name: "label, row 1" }).fill("Kept");
    await page.waitForFunction(() => sessionStorage.getItem("rhoform-table")?.includes("Kept"));
    await page.reload({ waitUntil: "load" });
    await page.waitForFunction(() =>
      [...document.querySelectorAll("input")].some((input) => input.value === "Kept"),
    );
    await close();
  });
});

describe("the network", () => {
  it("is solved before any script, and again when an element changes", async () => {
    const still = await bench.open("/network", { scripts: false });
    // 42 µΩ beside 48.697 µΩ, then 6 µΩ, then 36 beside 38 µΩ, by hand.
    expect(await still.page.locator(RESISTANCE).textContent()).toBe("47.037\u2009µΩ");
    await still.close();

    const { page, close } = await bench.open("/network");
    await page.getByRole("textbox", { name: "Resistance of element 3" }).fill("16 uohm");
    await page.waitForFunction(
      (selector) => document.querySelector(selector)?.textContent?.startsWith("57.037"),
      RESISTANCE,
    );
    expect(await page.getByRole("img", { name: /Resistance 57\.037/ }).count()).toBe(1);
    expect(await page.locator("pre").first().textContent()).toContain('"resistance": "16 uohm"');
    await page.waitForFunction(() => location.hash.startsWith("#network="));

    // A mistake stands at its element, a link reproduces the page.
    await page.getByLabel("Second node of element 3").fill("lugg");
    await page.getByText(/No chain of elements joins/).waitFor();
    await page.getByRole("textbox", { name: "Resistance of element 1" }).fill("0");
    await page.getByText(/must be greater than 0; nodes that nothing parts/).waitFor();
    await page.reload({ waitUntil: "load" });
    await page.waitForFunction(() =>
      [...document.querySelectorAll("input")].some((input) => input.value === "lugg"),
    );
    await page.getByRole("button", { name: "Start over" }).click();
    await page.waitForFunction(
      (selector) => document.querySelector(selector)?.textContent?.startsWith("47.037"),
      RESISTANCE,
    );
    await close();
  });
});
