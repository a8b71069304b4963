import { execFile } from "node:child_process";
import { promisify } from "node:util";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { base, closeBrowser } from "./browser";
import { addressOf, ask, type Bench, bodiesOf, RESISTANCE, settled, startBench } from "./calculation";

const run = promisify(execFile);

let bench: Bench;
beforeAll(async () => {
  bench = await startBench();
});
afterAll(async () => {
  await closeBrowser();
  await bench.stop();
});

const STATE =
  "/calculate/cylindrical-shell?innerDiameter=4mm&wall=3mm&length=1m&material=copper-annealed&temperature=75degC&current=2A&max=1uohm";

describe("a link", () => {
  it("reproduces the page: fields, answer, address", async () => {
    const { page, close } = await bench.open(STATE);
    await page.locator('[name="length"]').fill("0.5 m");
    const shown = await settled(page);
    const link = await addressOf(page);
    await close();
    expect(new URL(link).search).toBe(
      "?innerDiameter=4mm&wall=3mm&length=0.5m&material=copper-annealed&temperature=75degC&current=2A&max=1uohm",
    );
    const again = await bench.open(new URL(link).pathname + new URL(link).search, { scripts: false });
    expect(await again.page.locator(RESISTANCE).textContent()).toBe(shown);
    expect(await again.page.locator('[name="innerDiameter"]').inputValue()).toBe("4");
    expect(await again.page.locator('[name="length"]').inputValue()).toBe("0.5");
    expect(await again.page.locator('[name="current"]').inputValue()).toBe("2");
    await again.close();
  });

  it("is there again after a step back in the history", async () => {
    const { page, close } = await bench.open(STATE);
    await page.locator('[name="length"]').fill("0.25 m");
    const shown = await settled(page);
    await addressOf(page);
    await page.getByRole("link", { name: "Calculate" }).first().click();
    await page.getByRole("searchbox").waitFor();
    await page.goBack();
    expect(await settled(page, (text) => text === shown)).toBe(shown);
    expect(await page.locator('[name="length"]').inputValue()).toBe("0.25");
    await close();
  });
});

describe("variants", () => {
  it("stand side by side, with the inputs that differ marked, and travel in the link", async () => {
    const { page, close } = await bench.open("/calculate/bar");
    await page.getByRole("button", { name: "Compare with a variant" }).click();
    await page.locator('[name="width"]').fill("80 mm");
    const second = await settled(page, (text) => text.startsWith("10.776"));
    await page.getByRole("button", { name: "Variant", exact: true }).click();
    await page.getByLabel("Given as").selectOption("resistivity");
    await page.locator('[name="resistivity"]').fill("28 nohm m");
    const third = await settled(page, (text) => text !== second);
    const table = page.getByTestId("comparison");
    expect(await table.locator("tr", { hasText: "Resistance" }).first().textContent()).toBe(
      `Resistance21.552\u2009µΩ${second}${third}`,
    );
    await table.locator("tr", { hasText: /differs: Width/ }).waitFor();
    expect(await table.locator("tr", { hasText: /Length/ }).count()).toBe(0);
    expect(await table.locator("tr", { hasText: "Against A" }).textContent()).toContain("−50 %");
    await page.getByRole("switch", { name: "Only inputs that differ" }).uncheck({ force: true });
    expect(await table.locator("tr", { hasText: /Length/ }).count()).toBe(1);

    const link = await addressOf(page);
    const bodies = bodiesOf(link);
    expect(bodies).toHaveLength(3);
    expect(bodies[2].medium).toEqual({ resistivity: "28 nohm m" });
    const again = await bench.open(new URL(link).pathname + new URL(link).search);
    expect(await again.page.locator(RESISTANCE).textContent()).toBe(third);
    expect(await again.page.getByTestId("comparison").textContent()).toContain(second);
    await again.page.getByRole("button", { name: "Variant A" }).click();
    expect(await again.page.locator('[name="width"]').inputValue()).toBe("40");
    await again.page.getByRole("button", { name: "Variant B" }).click();
    await again.page.getByRole("button", { name: "Remove variant B" }).click();
    expect(bodiesOf(await addressOf(again.page))).toHaveLength(2);
    await again.close();
    await close();
  });
});

describe("a picture to keep", () => {
  it("has the light colours also where the page is dark", async () => {
    const { page, close } = await bench.open(STATE, { colorScheme: "dark" });
    await page.locator("[data-whole]").waitFor({ state: "attached" });
    const [download] = await Promise.all([
      page.waitForEvent("download"),
      page.getByRole("button", { name: "Drawing as SVG" }).click(),
    ]);
    const chunks: Buffer[] = [];
    for await (const chunk of await download.createReadStream()) chunks.push(Buffer.from(chunk));
    const svg = Buffer.concat(chunks).toString();
    const colours = new Set(svg.match(/rgb\(\d+, \d+, \d+\)/g));
    // Copper and ink of the light look; nothing of the dark one's.
    expect([...colours]).toEqual(expect.arrayContaining(["rgb(156, 74, 31)", "rgb(27, 34, 38)"]));
    for (const dark of ["rgb(227, 154, 106)", "rgb(236, 232, 223)", "rgb(28, 33, 36)"]) {
      expect(colours).not.toContain(dark);
    }
    await close();
  });
});

describe("use this elsewhere", () => {
  const codeOf = async (path: string, tab: string): Promise<readonly string[]> => {
    const { page, close } = await bench.open(path);
    await page.getByRole("tab", { name: tab, exact: true }).click();
    const codes = await page.locator("section[aria-labelledby=elsewhere] pre").allTextContents();
    await close();
    return codes;
  };
  /** The page tells the address of the configuration; the test's server may be reached by another name. */
  const here = (code: string) => code.replaceAll(/https?:\/\/[^/"' ]+(?=\/api\/v1)/g, base());
  const environment = () => ({ ...process.env, RHOFORM_KEY: bench.key });
  const GRADED =
    "/calculate/cylindrical-shell?innerRadius=2mm&outerRadius=5mm&length=1m&graded=radius&quantity=conductivity&profile=layers&profile.layers=1mm:1pS/m,2mm:5pS/m&voltage=500V";

  it.each([STATE, GRADED])("gives a curl call that works: %s", async (path) => {
    const [code] = await codeOf(path, "curl");
    const { stdout } = await run("bash", ["-c", here(code)], { env: environment() });
    const [body] = bodiesOf(base() + path);
    expect(JSON.parse(stdout).resistance).toEqual((await ask(bench.key, body)).resistance);
  });

  it.each([STATE, GRADED])("gives TypeScript that works: %s", async (path) => {
    const [code] = await codeOf(path, "TypeScript");
    const { stdout } = await run("node", ["--input-type=module", "-e", here(code)], { env: environment() });
    const { text, lower, upper } = (await ask(bench.key, bodiesOf(base() + path)[0])).resistance;
    expect(stdout.trim()).toBe(`${text} ${lower} ${upper}`);
  });

  it.each([STATE, GRADED])("gives Python that works: %s", async (path) => {
    const [code] = await codeOf(path, "Python");
    const { stdout } = await run("python3", ["-c", here(code)], {
      env: { ...environment(), PYTHONIOENCODING: "utf-8" },
    });
    expect(stdout).toContain((await ask(bench.key, bodiesOf(base() + path)[0])).resistance.text);
  });

  it("gives a frame whose address says dimensions, medium and temperature", async () => {
    const [code] = await codeOf(
      "/calculate/bar?length=250mm&width=40mm&thickness=10mm&material=aluminium-electrical&temperature=75degC&current=630A&max=1mohm",
      "iframe",
    );
    const address = /src="([^"]+)"/.exec(code)?.[1].replaceAll("&amp;", "&") ?? "";
    expect(Object.fromEntries(new URL(address.replace("…", "")).searchParams)).toEqual({
      length: "250mm",
      width: "40mm",
      thickness: "10mm",
      material: "aluminium-electrical",
      temperature: "75degC",
    });
  });

  it("gives an address and a formula for spreadsheets, and says when there is none", async () => {
    const path = STATE.replace("&max=1uohm", "");
    const [formula, address] = await codeOf(path, "Spreadsheet");
    const response = await fetch(here(address) + bench.key);
    const [body] = bodiesOf(base() + path);
    expect(Number(await response.text())).toBe((await ask(bench.key, body)).resistance.value);
    // The formula's texts, joined, are the address.
    const inside = /WEBSERVICE\((.*)&\$B\$1\)/s.exec(formula)?.[1] ?? "";
    const literals = [...inside.matchAll(/"((?:[^"]|"")*)"/g)].map(([, text]) => text.replaceAll('""', '"'));
    expect(literals.join("")).toBe(address);
    expect(literals.every((text) => text.length <= 255)).toBe(true);
    const { page, close } = await bench.open(GRADED);
    await page.getByRole("tab", { name: "Spreadsheet" }).click();
    await page.getByText("A graded medium does not fit an address").waitFor();
    await close();
  });
});
