import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { closeBrowser } from "./browser";
import { addressOf, type Bench, settled, startBench } from "./calculation";

let bench: Bench;
beforeAll(async () => {
  bench = await startBench();
});
afterAll(async () => {
  await closeBrowser();
  await bench.stop();
});

const BAR = "/calculate/bar?length=1m&width=50mm&thickness=10mm&resistivity=17nohm+m&temperature=20degC";

describe("tolerances and sizing on a shape's page", () => {
  it("a tolerance is evaluated, shown beside the bounds and in the budget, and travels in the address", async () => {
    const { page, complaints, close } = await bench.open(BAR);
    const focused = () => page.evaluate(() => document.activeElement?.getAttribute("aria-label"));
    await page.getByRole("button", { name: "Give width a tolerance" }).press("Enter");
    // By keyboard alone: the field that comes has the focus, and what is typed takes the place of its text.
    await expect.poll(focused).toBe("Tolerance of width");
    await page.keyboard.type("2 %");
    await page.getByLabel("Evaluated by").selectOption("worst-case");
    const range = page.getByTestId("stray-range");
    // 34 µΩ over 1 ± 2 %
    await range.getByText(/33\.33\sµΩ … 34\.69\sµΩ/u).waitFor();
    await page
      .getByTestId("budget")
      .getByRole("row", { name: /Width 100\.0 %/ })
      .waitFor();
    const address = new URL(await addressOf(page));
    expect(address.searchParams.get("width.tolerance")).toBe("2%");
    expect(address.searchParams.get("uncertainty")).toBe("worst-case");
    await page.getByRole("tab", { name: "Spreadsheet" }).click();
    await page.getByText("width=50mm%C2%B12%25").first().waitFor();

    await page.getByRole("textbox", { name: "Tolerance of width" }).fill("60 mm");
    await page.getByText("it must be smaller than the value").waitFor();

    // Plus and minus apart: 34 µΩ over 1 + 4 % and over 1 − 2 %.
    await page.getByRole("button", { name: "plus and minus apart for width" }).click();
    await page.getByRole("textbox", { name: "Upper tolerance of width" }).fill("4 %");
    await page.getByRole("textbox", { name: "Lower tolerance of width" }).fill("2 %");
    await range.getByText(/32\.7\sµΩ … 34\.7\sµΩ/u).waitFor();
    expect(new URL(await addressOf(page)).searchParams.get("width.minus")).toBe("2%");
    await page.getByRole("textbox", { name: "Lower tolerance of width" }).fill("60 mm");
    await page.getByText("it must be smaller than the value").waitFor();
    await page.getByRole("button", { name: "Take the tolerance of width away" }).press("Enter");
    await expect.poll(focused).toBe("Give width a tolerance");
    await settled(page);
    // The browser notes the answer to the tolerance that cannot be; nothing else is wrong.
    expect(complaints.filter((text) => !text.includes("422"))).toEqual([]);
    await close();
  });

  it("a dimension is found for a resistance, and one press puts it in", async () => {
    const { page, close } = await bench.open(`${BAR}&solveFor=width&target=20uohm`);
    const solutions = page.getByTestId("solutions");
    await solutions.getByText("85\u2009mm").waitFor();
    await solutions.getByText("1 % more makes it 1 % smaller").waitFor();
    await page.getByRole("button", { name: /Use width/ }).click();
    expect(await settled(page, (text) => text.startsWith("20"))).toMatch(/^20\sµΩ$/);
    expect(await page.locator('[name="width"]').inputValue()).toBe("85");
    await page.locator('[name="from"]').fill("1 mm");
    await page.locator('[name="to"]').fill("2 mm");
    await page.getByText(/Is not reached: the resistance is 1\.7\smΩ at width = 1\smm/).waitFor();
    await page.locator('[name="thickness"]').fill("");
    await page.getByText("Thickness: is required.").waitFor();
    await close();
  });
});
