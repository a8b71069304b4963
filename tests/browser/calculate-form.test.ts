import type { Page } from "playwright-core";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { base, closeBrowser } from "./browser";
import { addressOf, ask, type Bench, bodiesOf, RESISTANCE, settled, startBench } from "./calculation";

let bench: Bench;
beforeAll(async () => {
  bench = await startBench();
});
afterAll(async () => {
  await closeBrowser();
  await bench.stop();
});

const input = (page: Page, name: string) => page.locator(`[name="${name}"]`);
const unitOf = (page: Page, label: string) => page.getByLabel(`Unit of ${label}`, { exact: true });

describe("a quantity's field", () => {
  it("understands what is pasted, shows how it was understood, and converts by the menu", async () => {
    const { page, close } = await bench.open("/calculate/bar");
    const width = input(page, "width");
    await width.fill("12,5 mm");
    await width.blur();
    expect(await width.inputValue()).toBe("12.5");
    // ρL/(wt) = 1/58e6·0.25/(0.0125·0.005) Ω = 68.966 µΩ, by hand.
    expect(await settled(page, (text) => text.startsWith("68.966"))).toContain("µΩ");
    await width.fill("1/2 in");
    await width.blur();
    expect([await width.inputValue(), await unitOf(page, "Width").inputValue()]).toEqual(["0.5", "in"]);
    const inches = await settled(page, (text) => text.startsWith("67.87"));
    await unitOf(page, "Width").selectOption("mm");
    expect(await width.inputValue()).toBe("12.7");
    expect(await settled(page)).toBe(inches);
    await unitOf(page, "Width").selectOption("um");
    await unitOf(page, "Width").selectOption("in");
    expect(await width.inputValue()).toBe("0.5");
    const [body] = bodiesOf(await addressOf(page));
    expect(body.dimensions.width).toBe("0.5 in");
    await close();
  });

  it("keeps the menu's unit however a number is typed, key by key", async () => {
    const { page, close } = await bench.open("/calculate/bar");
    const width = input(page, "width");
    const read = async () => [await width.inputValue(), await unitOf(page, "Width").inputValue()];
    const type = async (keys: string) => {
      await width.selectText();
      await width.pressSequentially(keys);
    };
    expect(await read()).toEqual(["40", "mm"]);
    await type(".5");
    expect(await read()).toEqual([".5", "mm"]);
    await type("-4");
    expect(await read()).toEqual(["-4", "mm"]);
    await type("what");
    await type("40");
    expect(await read()).toEqual(["40", "mm"]);
    // A unit that is typed counts; deleted again, the one before stands again, and no remainder of it.
    await type("30 mm");
    await width.press("Backspace");
    await width.press("Backspace");
    expect(await read()).toEqual(["30 ", "mm"]);
    await type("12 kg");
    await page.locator("[name=width][aria-invalid]").waitFor();
    await type("12");
    expect(await read()).toEqual(["12", "mm"]);
    await type("3 in");
    await type("2");
    expect(await read()).toEqual(["2", "in"]);
    const temperature = input(page, "temperature");
    for (const keys of ["-40 °F", "-4"]) {
      await temperature.selectText();
      await temperature.pressSequentially(keys);
    }
    expect(await unitOf(page, "Temperature").inputValue()).toBe("degF");
    await close();
  });

  it("takes a foil by weight and a wire by gauge", async () => {
    const bar = await bench.open(
      "/calculate/bar?length=10mm&width=1mm&thickness=1oz/ft^2&material=copper-annealed",
    );
    expect(await unitOf(bar.page, "Thickness").inputValue()).toBe("oz/ft^2");
    await unitOf(bar.page, "Thickness").selectOption("um");
    expect(await input(bar.page, "thickness").inputValue()).toBe("34.3");
    await bar.close();
    const wire = await bench.open("/calculate/round-wire");
    await input(wire.page, "diameter").fill("AWG 24");
    await settled(wire.page);
    const [body] = bodiesOf(await addressOf(wire.page));
    expect(body.dimensions.diameter).toBe("AWG 24");
    const shown = await settled(wire.page);
    expect(shown).toBe((await ask(bench.key, body)).resistance.text);
    // A gauge converts to a diameter; it is no number of millimetres. 0.127 mm · 92^(12/39) = 0.51056 mm (ASTM B258).
    await unitOf(wire.page, "Diameter").selectOption("mm");
    expect(await input(wire.page, "diameter").inputValue()).toMatch(/^0\.51055922/);
    expect(await settled(wire.page)).toBe(shown);
    await wire.close();
  });

  it("keeps what cannot be read, says so at the field, and keeps the last answer", async () => {
    const { page, close } = await bench.open("/calculate/bar");
    const before = await settled(page);
    const width = input(page, "width");
    await width.fill("5 kg");
    await page.getByText(/measures a mass/).waitFor();
    await width.blur();
    expect(await width.getAttribute("aria-invalid")).toBe("true");
    expect(await page.locator(RESISTANCE).textContent()).toBe(before);
    await page.getByText("No answer to this input", { exact: true }).waitFor();
    // What is kept says on itself that it is not of this input, and looks it.
    await page.getByText("To the input before", { exact: true }).waitFor();
    await page.getByText("Drawn with other dimensions", { exact: true }).waitFor();
    const dimmed = () =>
      page
        .locator("figure svg[role=img]:visible")
        .first()
        .evaluate((sheet) => getComputedStyle(sheet).opacity);
    expect(Number(await dimmed())).toBeLessThan(0.5);
    await width.fill("1,234");
    await page.getByText(/thousands separator or a decimal comma/).waitFor();
    await width.blur();
    expect(await width.inputValue()).toBe("1,234");
    await width.fill("40 mm");
    await page.getByText("No answer to this input", { exact: true }).waitFor({ state: "detached" });
    expect(await settled(page)).toBe(before);
    expect(Number(await dimmed())).toBe(1);
    expect(await page.getByText("To the input before").count()).toBe(0);
    await close();
  });

  it("does not move while answers and complaints come and go", async () => {
    const { page, close } = await bench.open("/calculate/bar");
    const places = () =>
      page
        .locator("form[aria-label=Inputs] :is(input, select)")
        .evaluateAll((fields) =>
          fields.map((field) => Math.round(field.getBoundingClientRect().top + window.scrollY)),
        );
    const before = await places();
    await input(page, "width").fill("41 mm");
    await settled(page);
    expect(await places()).toEqual(before);
    await input(page, "width").fill("-1 mm");
    await page.getByText("Must be greater than 0.").waitFor();
    expect(await places()).toEqual(before);
    await close();
  });
});

describe("a dimension with alternatives", () => {
  it("carries its value over to the other way of giving it", async () => {
    const { page, close } = await bench.open("/calculate/cylindrical-shell");
    const before = await settled(page);
    await page.getByLabel(/^Given in place of.*wall/).selectOption("wall");
    expect(await input(page, "wall").inputValue()).toBe("3");
    expect(await settled(page)).toBe(before);
    await page.getByLabel(/^Given in place of inner diameter/).selectOption("innerDiameter");
    expect(await input(page, "innerDiameter").inputValue()).toBe("4");
    const [body] = bodiesOf(await addressOf(page));
    expect(body.dimensions).toMatchObject({ innerDiameter: "4 mm", wall: "3 mm" });
    expect(await settled(page)).toBe(before);
    await close();
  });

  it("marks the dimension line of the field that has focus", async () => {
    const { page, close } = await bench.open(
      "/calculate/cylindrical-shell?innerDiameter=4mm&wall=3mm&length=1m&conductivity=1e-12",
    );
    await input(page, "innerDiameter").focus();
    await page.waitForFunction(() =>
      document.querySelector('[data-dimension="innerRadius"]')?.classList.contains("text-copper"),
    );
    await close();
  });
});

describe("a medium", () => {
  it("keeps the answer when it is given another way, and what was typed when it is given back", async () => {
    const { page, close } = await bench.open("/calculate/bar");
    const before = await settled(page);
    const given = page.getByLabel("Given as");
    await given.selectOption("resistivity");
    expect(await settled(page)).toBe(before);
    await given.selectOption("conductivity");
    expect(await input(page, "conductivity").inputValue()).toBe("58");
    expect(await unitOf(page, "Conductivity").inputValue()).toBe("MS/m");
    expect(await settled(page)).toBe(before);
    await input(page, "conductivity").fill("30 MS/m");
    await settled(page, (text) => text !== before);
    await given.selectOption("material");
    expect(await settled(page, (text) => text === before)).toBe(before);
    await given.selectOption("conductivity");
    expect(await input(page, "conductivity").inputValue()).toBe("30");
    await close();
  });

  it("shows a material's resistivity at the operating temperature, and asks before it leaves its range", async () => {
    const { page, close } = await bench.open("/calculate/bar");
    const card = page.locator("dl", { hasText: "ρ here" });
    expect(await card.textContent()).toContain("17.24");
    await input(page, "temperature").fill("75");
    // 1/58e6·(1 + 0.00393·55) = 20.968 nΩ·m, by hand.
    await page.waitForFunction(() => document.body.textContent?.includes("20.97"));
    const warm = await settled(page);
    expect(warm).toBe((await ask(bench.key, bodiesOf(await addressOf(page))[0])).resistance.text);
    await input(page, "temperature").fill("400");
    await page.getByRole("switch", { name: /outside its range/ }).waitFor();
    await page.waitForFunction(() => document.querySelector('[name="temperature"][aria-invalid=true]'));
    await page.getByRole("switch", { name: /outside its range/ }).check({ force: true });
    await page
      .getByText(/Cautions?/)
      .first()
      .waitFor();
    await settled(page, (text) => text !== warm);
    await close();
  });

  it("is chosen from a table of all materials", async () => {
    const { page, close } = await bench.open("/calculate/bar");
    const before = await settled(page);
    await page.getByRole("button", { name: "Compare all" }).click();
    const dialog = page.getByRole("dialog");
    await dialog.getByRole("searchbox").fill("nichrome");
    await dialog
      .getByRole("button", { name: /nichrome/i })
      .first()
      .click();
    await dialog.waitFor({ state: "detached" });
    await settled(page, (text) => text !== before);
    const [body] = bodiesOf(await addressOf(page));
    expect(body.medium).toMatchObject({ material: expect.stringContaining("nichrome") });
    await close();
  });

  it("may be two, each given its own way", async () => {
    const { page, close } = await bench.open("/calculate/clad-wire");
    await page.getByLabel("Given as").nth(1).selectOption("resistivity");
    await page.locator('[name$=".resistivity"]').fill("2e-7");
    await settled(page);
    const [body] = bodiesOf(await addressOf(page));
    expect(Object.keys(body.media ?? {})).toHaveLength(2);
    expect(await settled(page)).toBe((await ask(bench.key, body)).resistance.text);
    await close();
  });

  it("of a sheet is a sheet resistance, or a material with a thickness", async () => {
    const { page, close } = await bench.open("/calculate/sheet-strip");
    const given = page.getByLabel("Given as");
    await given.selectOption("material");
    await input(page, "thickness").fill("35 µm");
    await settled(page);
    const [body] = bodiesOf(await addressOf(page));
    expect(body.medium).toMatchObject({ thickness: "35 um" });
    const before = await settled(page);
    expect(before).toBe((await ask(bench.key, body)).resistance.text);
    await given.selectOption("conductivity");
    expect(await settled(page)).toBe(before);
    // What was there at first is there again.
    await given.selectOption("sheetResistance");
    const first = await ask(bench.key, bodiesOf(`${base()}/calculate/sheet-strip`)[0]);
    expect(await settled(page, (text) => text !== before)).toBe(first.resistance.text);
    await close();
  });
});

describe("operating point and requirement", () => {
  it("tell the other two quantities, the peak, and the verdict", async () => {
    const { page, close } = await bench.open("/calculate/bar");
    await page.getByRole("radio", { name: "Current" }).check({ force: true });
    await input(page, "current").fill("630");
    await input(page, "max").fill("30 uohm");
    await page.getByTestId("verdict").waitFor();
    expect(await page.getByTestId("verdict").textContent()).toContain("Requirement met");
    // U = 630 A · 21.5517 µΩ = 13.578 mV, P = 8.554 W, by hand.
    await page.getByText(/13\.58.mV/).waitFor();
    await page.getByText(/8\.554.W/).waitFor();
    await input(page, "max").fill("20 uohm");
    await page.getByText("Requirement not met.").waitFor();
    await page.getByRole("radio", { name: "Nothing" }).check({ force: true });
    await input(page, "current").waitFor({ state: "detached" });
    await close();
  });
});

describe("the answer", () => {
  it("is read out once it has settled", async () => {
    const { page, close } = await bench.open("/calculate/bar");
    await input(page, "width").fill("20 mm");
    const text = await settled(page, (found) => found.startsWith("43.10"));
    await page.waitForFunction(
      (wanted) =>
        [...document.querySelectorAll("[role=status]")].some(
          (region) => region.textContent === `Resistance ${wanted}`,
        ),
      text,
    );
    await close();
  });

  it("is copied in full precision", async () => {
    const { page, context, close } = await bench.open("/calculate/bar");
    await context.grantPermissions(["clipboard-read", "clipboard-write"], { origin: base() });
    await settled(page);
    await page.getByRole("button", { name: "Copy ohms" }).click();
    await page.getByText("Copied").waitFor();
    const [body] = bodiesOf(page.url());
    const { value } = (await ask(bench.key, body)).resistance;
    expect(Number(await page.evaluate(() => navigator.clipboard.readText()))).toBe(value);
    await close();
  });

  it("of an earlier input never replaces that of a later one", async () => {
    const { page, close } = await bench.open("/calculate/bar", {
      prepare: async (own) => {
        await own.route("**/api/v1/resistance", async (route) => {
          if (route.request().postData()?.includes('"20 mm"')) {
            await new Promise((resolve) => setTimeout(resolve, 1200));
          }
          await route.continue();
        });
      },
    });
    const sent = page.waitForRequest((request) => (request.postData() ?? "").includes('"20 mm"'));
    await input(page, "width").fill("20 mm");
    await sent;
    await input(page, "width").fill("80 mm");
    await settled(page, (text) => text.startsWith("10.776"));
    await page.waitForTimeout(1500);
    expect(await page.locator(RESISTANCE).textContent()).toMatch(/^10\.776/);
    await close();
  });

  it("waits calmly at a 429 and comes by itself", async () => {
    let refused = 0;
    const { page, close } = await bench.open("/calculate/bar", {
      prepare: async (own) => {
        await own.route("**/api/v1/resistance", async (route) => {
          if (refused > 0) return route.continue();
          refused += 1;
          await route.fulfill({
            status: 429,
            contentType: "application/problem+json",
            headers: { "Retry-After": "1" },
            body: JSON.stringify({
              type: "about:blank",
              title: "Too many requests",
              status: 429,
              detail: "Used up.",
            }),
          });
        });
      },
    });
    const before = await settled(page);
    await input(page, "width").fill("20 mm");
    await page.getByText("A short pause").waitFor();
    expect(await page.locator(RESISTANCE).textContent()).toBe(before);
    await settled(page, (text) => text.startsWith("43.10"));
    expect(await page.getByText("A short pause").count()).toBe(0);
    await close();
  });

  it("comes back after a lost connection", async () => {
    let broken = true;
    const { page, close } = await bench.open("/calculate/bar", {
      prepare: async (own) => {
        await own.route("**/api/v1/resistance", (route) => (broken ? route.abort() : route.continue()));
      },
    });
    await input(page, "width").fill("20 mm");
    await page.getByText("No connection").waitFor();
    broken = false;
    await page.getByRole("button", { name: "Try now" }).click();
    await settled(page, (text) => text.startsWith("43.10"));
    await page.getByText("No connection").waitFor({ state: "detached" });
    await close();
  });
});
