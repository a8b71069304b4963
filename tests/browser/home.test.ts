import { afterAll, describe, expect, it } from "vitest";
import { base, closeBrowser, visit } from "./browser";

afterAll(closeBrowser);

const RESISTANCE = "[data-testid=resistance]";

/** Answers the API's call with a status, once. */
function refuse(status: number, body: object, headers: Record<string, string> = {}) {
  return {
    status,
    contentType: "application/problem+json",
    headers: { "Retry-After": "1", ...headers },
    body: JSON.stringify({ type: `${base()}/docs/problems/x`, status, ...body }),
  };
}

describe("the live calculation", () => {
  it("shows an answer before any script", async () => {
    const { page, close } = await visit("/", { scripts: false });
    // R = ln(5/2)/(2π·1e-12·1) = 145.83 GΩ (closed form, by hand).
    expect(await page.locator(RESISTANCE).textContent()).toBe("145.83\u2009GΩ");
    await close();
  });

  it("computes through the API when a number changes", async () => {
    const { page, requests, close } = await visit("/");
    const answered = page.waitForResponse(
      (response) =>
        response.url().endsWith("/api/v1/resistance") &&
        (response.request().postData() ?? "").includes('"length":"2 m"'),
    );
    await page.getByLabel(/^Length/).fill("2 m");
    expect((await answered).status()).toBe(200);
    await page.waitForFunction(
      (selector) => document.querySelector(selector)?.textContent?.startsWith("72.916"),
      RESISTANCE,
    );
    expect(requests).toContain(`${base()}/api/site/token`);
    const bracket = await page.locator("[data-testid=bracket]").textContent();
    const [, lower, upper] = /^\[([\d.]+) … ([\d.]+)\] GΩ$/.exec(bracket ?? "") ?? [];
    expect(Number(lower)).toBeLessThan(Number(upper));
    // The drawing and the snippet follow.
    expect(await page.getByRole("img", { name: /L = 2 m/ }).count()).toBeGreaterThan(0);
    expect(await page.locator("pre").textContent()).toContain('"length": "2 m"');
    await close();
  });

  it("says at the field what is wrong with it, and keeps the last answer", async () => {
    const { page, close } = await visit("/");
    const field = page.getByLabel(/^Outer radius/);
    await field.fill("1 mm");
    const error = page.getByText(/outer radius greater than inner radius/);
    await error.waitFor();
    expect(await field.getAttribute("aria-invalid")).toBe("true");
    expect(await field.getAttribute("aria-describedby")).toContain(await error.getAttribute("id"));
    expect(await page.locator(RESISTANCE).textContent()).toBe("145.83\u2009GΩ");
    await field.fill("5 mm");
    await error.waitFor({ state: "detached" }).catch(() => undefined);
    await page.waitForFunction(() => !document.querySelector("[aria-invalid=true]"));
    await close();
  });

  it("never lets a slow answer replace a newer one", async () => {
    const { page, close } = await visit("/", {
      prepare: async (page) => {
        await page.route("**/api/v1/resistance", async (route) => {
          // The first change is answered late, after the second.
          if (route.request().postData()?.includes('"length":"2 m"')) {
            await new Promise((resolve) => setTimeout(resolve, 1500));
          }
          await route.continue();
        });
      },
    });
    const length = page.getByLabel(/^Length/);
    const sent = page.waitForRequest((request) => (request.postData() ?? "").includes('"length":"2 m"'));
    await length.fill("2 m");
    await sent;
    await length.fill("4 m");
    await page.waitForFunction(
      (selector) => document.querySelector(selector)?.textContent?.startsWith("36.458"),
      RESISTANCE,
    );
    await page.waitForTimeout(2000);
    expect(await page.locator(RESISTANCE).textContent()).toMatch(/^36\.458/);
    await close();
  });

  it("stays calm at a 429 and asks again by itself", async () => {
    let refused = 0;
    const { page, close } = await visit("/", {
      prepare: async (page) => {
        await page.route("**/api/v1/resistance", async (route) => {
          if (refused > 0) return route.continue();
          refused += 1;
          await route.fulfill(refuse(429, { title: "Too many requests", detail: "Used up." }));
        });
      },
    });
    await page.getByText("A short pause").waitFor();
    expect(await page.locator(RESISTANCE).textContent()).toBe("145.83\u2009GΩ");
    await page.getByText("A short pause").waitFor({ state: "detached", timeout: 10_000 });
    await close();
  });

  it("renews its token once when the service no longer takes it", async () => {
    let refused = 0;
    const { page, requests, close } = await visit("/", {
      prepare: async (page) => {
        await page.route("**/api/v1/resistance", async (route) => {
          if (refused > 0) return route.continue();
          refused += 1;
          await route.fulfill(refuse(401, { title: "The page's token does not count", detail: "Over." }));
        });
      },
    });
    await page.waitForTimeout(1500);
    expect(requests.filter((url) => url.endsWith("/api/site/token"))).toHaveLength(2);
    expect(await page.getByText("does not count").count()).toBe(0);
    await close();
  });

  it("says so when the service cannot be reached, and tries again when asked", async () => {
    let broken = true;
    const { page, close } = await visit("/", {
      prepare: async (page) => {
        await page.route("**/api/v1/resistance", (route) => (broken ? route.abort() : route.continue()));
      },
    });
    await page.getByText("The service cannot be reached").waitFor();
    broken = false;
    await page.getByRole("button", { name: "Try again" }).click();
    await page.getByText("The service cannot be reached").waitFor({ state: "detached" });
    await close();
  });

  it("marks the dimension whose field has focus", async () => {
    const { page, close } = await visit("/");
    await page.getByLabel(/^Inner radius/).focus();
    await page.waitForFunction(() =>
      document.querySelector('[data-dimension="innerRadius"]')?.classList.contains("text-copper"),
    );
    await close();
  });
});

describe("the theme switch", () => {
  it("changes at once, without a flash on the next page, and can be undone", async () => {
    const { page, close } = await visit("/");
    const ground = () => page.evaluate(() => getComputedStyle(document.documentElement).backgroundColor);
    expect(await ground()).toBe("rgb(250, 248, 243)");
    await page.getByLabel("Dark").check({ force: true });
    expect(await ground()).toBe("rgb(20, 24, 26)");
    const html = await (await page.context().request.get(`${base()}/docs`)).text();
    expect(html).toMatch(/<html[^>]* data-theme="dark"/);
    await page.getByLabel("As the device").check({ force: true });
    expect(await ground()).toBe("rgb(250, 248, 243)");
    await close();
  });
});

describe("the snippet", () => {
  it("can be read in three languages by keyboard", async () => {
    const { page, close } = await visit("/");
    await page.getByRole("tab", { name: "curl" }).focus();
    await page.keyboard.press("ArrowRight");
    expect(await page.locator("pre").textContent()).toContain("await fetch(");
    await page.keyboard.press("ArrowRight");
    expect(await page.locator("pre").textContent()).toContain("urllib.request");
    await close();
  });
});
