import { describe, expect, test } from "vitest";
import { SHELL } from "@/lib/activity/append";
import { withdrawEmbed } from "@/lib/embeds/manage-embeds";
import { publishedWidget } from "../support/widget";
import { base, browser } from "./browser";
import {
  frameOf,
  host,
  isDevelopment,
  newPage,
  open,
  server,
  setUpPages,
  shownText,
  told,
  widget,
} from "./embed-pages";
import { loaderPage } from "./host-page";

setUpPages();

describe("a page of another origin", () => {
  test("shows two widgets by the loader: events, sizes, values, keyboard, and nothing of theirs in the page", async () => {
    const { page, complaints } = await newPage("de-DE");
    const [one, two] = [widget().id, widget({ title: "Zweiter", accent: "#1f6f62", theme: "light" }).id];
    const path = host.serve(
      loaderPage(
        base(),
        `<style>p { color: red } input { width: 1px }</style>
         <rhoform-embed id="one" embed="${one}" lang="de" style="width: 640px"></rhoform-embed>
         <rhoform-embed id="two" embed="${two}" values='{"length":"1 m"}' theme="dark" style="width: 320px"></rhoform-embed>`,
      ),
    );
    await page.goto(host.otherSite + path);
    await told(page, "result", "one");
    const events = await told(page, "result", "two");
    expect(events.filter(({ type }) => type === "error")).toEqual([]);
    const ratio =
      (events.find(({ type, id }) => type === "result" && id === "two")?.detail.resistance?.value ?? 0) /
      (events.find(({ type, id }) => type === "result" && id === "one")?.detail.resistance?.value ?? 1);
    expect(ratio).toBeCloseTo(4, 9);

    // Words and numbers in the page's language, for the first; the second speaks the page's, English.
    const [first, second] = [frameOf(page, one), frameOf(page, two)];
    expect(await shownText(first)).toMatch(/^\d+,\d+\s?µΩ$/);
    expect(await first.locator("label", { hasText: "Länge" }).count()).toBe(1);
    expect(await second.locator("label", { hasText: "Length" }).count()).toBe(1);

    // The frame is as high as its content, which never scrolls.
    await page.waitForFunction(() =>
      [...document.querySelectorAll("rhoform-embed")].every((element) => {
        const frame = element.shadowRoot?.querySelector("iframe");
        return frame && frame.style.height !== "320px";
      }),
    );
    for (const frame of [first, second]) {
      await frame.waitForFunction(
        () => document.documentElement.scrollHeight <= window.innerHeight + 1,
        undefined,
        { timeout: 5_000 },
      );
      expect(await frame.evaluate(() => document.documentElement.scrollWidth <= window.innerWidth)).toBe(
        true,
      );
    }
    expect(await page.evaluate(() => document.querySelectorAll("iframe").length)).toBe(0);

    // Keyboard alone: into the first field, another value with a decimal comma, the answer follows.
    const before = (await page.evaluate(() => window.events)).length;
    await first.locator("input").first().focus();
    await page.keyboard.press("Control+A");
    await page.keyboard.type("500,5");
    await page.waitForFunction((count) => window.events.length > count, before);
    const typed = (await page.evaluate(() => window.events)).at(-1);
    expect([typed?.type, typed?.id]).toEqual(["result", "one"]);
    await page.keyboard.press("Tab");
    expect(await first.evaluate(() => document.activeElement?.tagName)).toBe("SELECT");

    // The page sets open values and asks again; the other widget stays as it was.
    const text = await shownText(second);
    await page.evaluate(() => {
      const element = document.getElementById("one") as HTMLElement & {
        set: (values: object) => void;
        compute: () => void;
      };
      element.set({ length: "2 m", width: "999 mm", unknown: "1" });
      element.compute();
    });
    const set = await page.waitForFunction(() => {
      const last = window.events.at(-1);
      return last?.id === "one" && Math.abs((last.detail.resistance?.value ?? 0) * 1e6 - 101) < 3
        ? last
        : null;
    });
    expect((await set.jsonValue())?.type).toBe("result");
    expect(await shownText(second)).toBe(text);

    // Removed and brought back, once more alone: one frame, one listener, and only its own events.
    const counts = await page.evaluate(async () => {
      const element = document.getElementById("one");
      const parent = element?.parentNode;
      const before = window.events.length;
      let listeners = 0;
      const add = window.addEventListener.bind(window);
      const remove = window.removeEventListener.bind(window);
      window.addEventListener = ((type: string, ...rest: [never]) => {
        listeners += type === "message" ? 1 : 0;
        add(type, ...rest);
      }) as typeof window.addEventListener;
      window.removeEventListener = ((type: string, ...rest: [never]) => {
        listeners -= type === "message" ? 1 : 0;
        remove(type, ...rest);
      }) as typeof window.removeEventListener;
      for (let i = 0; i < 5; i++) {
        element?.remove();
        parent?.append(element as Node);
      }
      element?.remove();
      const frames = element?.shadowRoot?.querySelectorAll("iframe").length;
      return { listeners, frames, events: window.events.length - before };
    });
    // Six removals, five additions; what was there before is taken off as well.
    expect(counts).toEqual({ listeners: -1, frames: 0, events: 0 });

    expect(await page.context().cookies()).toEqual([]);
    expect(complaints).toEqual([]);
  });

  test("keeps what was typed when the page around changes its theme or its language", async () => {
    const { page } = await newPage();
    const { id } = widget({ theme: "host" });
    const path = host.serve(
      loaderPage(
        base(),
        `<rhoform-embed id="one" embed="${id}" values='{"length":"1 m"}' theme="light"></rhoform-embed>`,
      ),
    );
    await page.goto(host.origin + path);
    await told(page, "result", "one");
    await frameOf(page, id).locator("input").first().fill("1.5");
    await told(page, "result", "one", 2);
    const text = await shownText(frameOf(page, id));
    // Both at once, as a framework sets them one after the other.
    await page.evaluate(() => {
      const element = document.getElementById("one");
      element?.setAttribute("theme", "dark");
      element?.setAttribute("lang", "de");
    });
    await told(page, "ready", "one", 2);
    await told(page, "result", "one", 3);
    const frame = frameOf(page, id);
    expect(await frame.locator("html").getAttribute("data-theme")).toBe("dark");
    expect(await frame.locator("label", { hasText: "Länge" }).count()).toBe(1);
    expect(await frame.locator("input").first().inputValue()).toBe("1,5");
    expect((await shownText(frame)).replace(",", ".")).toBe(text);
    // Another widget in the same element has nothing to do with it.
    const other = widget().id;
    await page.evaluate((next) => document.getElementById("one")?.setAttribute("embed", next), other);
    await told(page, "result", "one", 4);
    expect(await frameOf(page, other).locator("input").first().inputValue()).toBe("1");
  });

  test("changes nothing by hostile messages, and reads nothing", async () => {
    const { page } = await newPage();
    const { id } = widget();
    const path = host.serve(
      loaderPage(
        base(),
        `<rhoform-embed id="one" embed="${id}"></rhoform-embed><iframe id="other" src="about:blank"></iframe>`,
      ),
    );
    await page.goto(host.origin + path);
    await told(page, "result", "one");
    const frame = frameOf(page, id);
    const [before, height] = await Promise.all([
      shownText(frame),
      page.evaluate(
        () => document.querySelector("rhoform-embed")?.shadowRoot?.querySelector("iframe")?.style.height,
      ),
    ]);
    const count = (await page.evaluate(() => window.events)).length;
    await page.evaluate((embed) => {
      const inside = document
        .querySelector("rhoform-embed")
        ?.shadowRoot?.querySelector("iframe")?.contentWindow;
      const good = { source: "rhoform", version: 1, type: "set", embed, data: { values: { length: "3 m" } } };
      const bad = [
        null,
        "set",
        42,
        [],
        { ...good, version: 2 },
        { ...good, source: "other" },
        { ...good, embed: "emb_0000000000000000" },
        { ...good, data: { values: { length: { toString: 1 } } } },
        { ...good, data: { values: { length: "9".repeat(500) } } },
        {
          ...good,
          data: { values: Object.fromEntries(Array.from({ length: 99 }, (_, i) => [`x${i}`, "1"])) },
        },
        { ...good, data: { values: { width: "1 m", temperature: "0 degC", ["__proto__"]: "1" } } },
        { ...good, type: "result", data: { resistance: "no" } },
      ];
      for (const message of bad) inside?.postMessage(message, "*");
      // From a window that is not the one around, and to the loader from a window that is not the frame.
      const other = (document.getElementById("other") as HTMLIFrameElement).contentWindow as Window &
        typeof globalThis;
      const script = other.document.createElement("script");
      script.textContent = `parent.inside.postMessage(${JSON.stringify(good)}, "*");
        parent.postMessage(${JSON.stringify({ ...good, type: "size", data: { height: 9999 } })}, "*");`;
      Object.assign(window, { inside });
      other.document.body.append(script);
      window.postMessage({ ...good, type: "size", data: { height: 9999 } }, "*");
      window.postMessage({ ...good, type: "error", data: { code: "x", message: "y" } }, "*");
    }, id);
    // A good message comes after all of these, so that whatever they do has been done.
    await page.evaluate(() =>
      (document.getElementById("one") as HTMLElement & { compute: () => void }).compute(),
    );
    await told(page, "result", "one", 2);
    expect(await shownText(frame)).toBe(before);
    const later = await page.evaluate(() => ({
      height: document.querySelector("rhoform-embed")?.shadowRoot?.querySelector("iframe")?.style.height,
      events: window.events.length,
    }));
    expect(later).toEqual({ height, events: count + 1 });
    const reading = await page.evaluate(() => {
      try {
        return String(
          document.querySelector("rhoform-embed")?.shadowRoot?.querySelector("iframe")?.contentDocument,
        );
      } catch {
        return "refused";
      }
    });
    expect(["null", "refused"]).toContain(reading);
  });

  test("that is not allowed gets a calm line in place of the frame, and what is gone a calm card", async () => {
    const { page } = await newPage();
    const foreign = publishedWidget(server, {}, { origins: ["https://elsewhere.example"] }).id;
    const gone = widget().id;
    withdrawEmbed(server.service.db, { actor: SHELL, now: Date.now() }, gone);
    const path = host.serve(
      loaderPage(
        base(),
        `<rhoform-embed id="foreign" embed="${foreign}"></rhoform-embed>
         <rhoform-embed id="gone" embed="${gone}"></rhoform-embed>
         <rhoform-embed id="none" embed="emb_0000000000000000"></rhoform-embed>`,
      ),
    );
    await page.goto(host.origin + path);
    await told(page, "error", "gone");
    await told(page, "error", "none");
    const events = await told(page, "error", "foreign");
    const codes = Object.fromEntries(events.map(({ id, detail }) => [id, detail.code]));
    expect(codes).toEqual({ foreign: "refused", gone: "withdrawn", none: "not-found" });
    expect(await page.locator("#foreign p").innerText()).toContain(host.origin);
    expect(await frameOf(page, gone).locator("h1").innerText()).toBe("This calculator was withdrawn");
    const status = async (id: string) => (await fetch(`${base()}/embed/${id}`)).status;
    expect([await status(gone), await status("emb_0000000000000000"), await status("%3Cscript%3E")]).toEqual([
      410, 404, 404,
    ]);
    // A draft is nobody's but its team's.
    expect(await status(`${foreign}?preview=1`)).not.toBe(200);
  });

  test("with a strict policy needs the three directives and nothing else", async () => {
    const { page, complaints } = await newPage();
    const { id } = widget();
    const policy = [
      "default-src 'none'",
      `script-src 'nonce-abc' ${base()}/embed/v1.js`,
      `frame-src ${base()}`,
      `connect-src ${base()}`,
    ].join("; ");
    const content = `<rhoform-embed id="one" embed="${id}"></rhoform-embed>`;
    const path = host.serve(loaderPage(base(), content, "abc"), { "Content-Security-Policy": policy });
    await page.goto(host.origin + path);
    expect((await told(page, "result", "one")).at(-1)?.detail.resistance?.text).toMatch(/µΩ/);
    expect(complaints).toEqual([]);
  });

  test("may put the frame into a sandbox that allows scripts and nothing else", async () => {
    const { page } = await newPage();
    const { id } = widget();
    // The development server keeps its scripts from frames without an origin; the built one does not.
    if (await isDevelopment(id)) {
      await page.route(`${base()}/_next/**`, async (route) => {
        const response = await route.fetch();
        await route.fulfill({
          response,
          headers: { ...response.headers(), "access-control-allow-origin": "*" },
        });
      });
    }
    const path = host.serve(
      `<!doctype html><title>x</title><iframe title="w" sandbox="allow-scripts" width="480" height="700" src="${base()}/embed/${id}?length=1m"></iframe>`,
    );
    await page.goto(host.origin + path);
    const frame = page.frameLocator("iframe");
    await frame.getByTestId("resistance").waitFor({ timeout: 45_000 });
    expect(await frame.getByTestId("resistance").innerText()).toMatch(/µΩ/);
    // Without scripts it says what is missing. (A frame without them cannot be looked into from outside.)
    const context = await (await browser()).newContext({ javaScriptEnabled: false });
    open.push(context);
    const still = await context.newPage();
    await still.goto(`${base()}/embed/${id}`);
    expect(await still.locator("noscript").innerText()).toContain("allow-scripts");
  });
});
