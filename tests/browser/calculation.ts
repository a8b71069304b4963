/** What the tests of the calculation pages share: a page that calls with a generous key, and the API to compare with. */
import type { Page } from "playwright-core";
import { exampleParameters, type Parameters } from "@/app/(site)/calculate/_model/parameters";
import { requestBody, type RequestBody } from "@/app/(site)/calculate/_model/request";
import { readState } from "@/app/(site)/calculate/_model/variants";
import { findShape, type ResistanceResult, shapeEntry } from "@/lib/engine";
import { startServer, type TestServer } from "../support/server";
import { base, visit, type Visit } from "./browser";

export const RESISTANCE = "[data-testid=resistance]";

export interface Bench {
  readonly server: TestServer;
  readonly key: string;
  readonly open: (path: string, options?: Parameters0) => Promise<Visit>;
  /** Leads an open page elsewhere: quicker than a new one, whose scripts come afresh. */
  readonly go: (visit: Visit, path: string) => Promise<void>;
  readonly stop: () => Promise<void>;
}

type Parameters0 = NonNullable<globalThis.Parameters<typeof visit>[1]>;

/** Pages opened here call with a key in place of the signed-out token, so that no limit of an address is met. */
export async function startBench(): Promise<Bench> {
  const server = await startServer();
  const { key } = server.issue({ name: "Browser tests", allowedInUrl: true });
  return {
    server,
    key,
    open: async (path, options = {}) => {
      const opened = await visit(path, {
        ...options,
        prepare: async (page) => {
          await page.route("**/api/site/token", (route) =>
            route.fulfill({
              contentType: "application/json",
              body: JSON.stringify({ token: key, expiresAt: new Date(Date.now() + 3_600_000).toISOString() }),
            }),
          );
          await options.prepare?.(page);
        },
      });
      if (options.scripts !== false) await alive(opened.page);
      return opened;
    },
    go: async ({ page }, path) => {
      await page.goto(base() + path, { waitUntil: "load" });
      await alive(page);
    },
    stop: server.stop,
  };
}

/** Waits until the page's script has taken over what the server sent, so that fields answer to typing. */
export async function alive(page: Page): Promise<void> {
  await page.waitForFunction(() => {
    const control = document.querySelector("main form :is(input, select), main input, main button");
    return control === null || Object.keys(control).some((key) => key.startsWith("__reactProps"));
  });
}

/** The API's answer to a body. */
export async function ask(key: string, body: object): Promise<ResistanceResult> {
  const response = await fetch(`${base()}/api/v1/resistance`, {
    method: "POST",
    headers: { Authorization: `Bearer ${key}`, "Content-Type": "application/json" },
    body: JSON.stringify(body),
  });
  if (!response.ok) throw new Error(`${response.status}: ${await response.text()}`);
  return response.json();
}

/** The bodies that an address of a calculation page stands for, one a variant. */
export function bodiesOf(address: string): readonly RequestBody[] {
  const url = new URL(address);
  const entry = shapeEntry(findShape(url.pathname.split("/").at(-1) ?? "") ?? fail(address));
  const pairs = [...url.searchParams, ...new URLSearchParams(url.hash.slice(1))];
  return readState(pairs, entry, exampleParameters(entry)).variants.map((variant: Parameters) =>
    requestBody(entry, variant),
  );
}

function fail(address: string): never {
  throw new Error(`${address} is no page of a shape.`);
}

/** Waits until the page shows a resistance for which `test` holds, and nothing is under way; answers with its text. */
export async function settled(page: Page, test: (text: string) => boolean = () => true): Promise<string> {
  const deadline = Date.now() + 15_000;
  let text = "";
  while (Date.now() < deadline) {
    // Both at one moment: an answer may arrive between two readings.
    const seen = await page.evaluate((selector) => {
      const answer = document.querySelector("#answer");
      return {
        text: document.querySelector(selector)?.textContent ?? "",
        busy: answer?.getAttribute("aria-busy") !== "false",
      };
    }, RESISTANCE);
    text = seen.text;
    if (!seen.busy && text !== "" && test(text)) return text;
    await page.waitForTimeout(50);
  }
  throw new Error(`The page does not settle; it shows "${text}".`);
}

/**
 * The address once it has caught up with the fields. The page's own clock is waited for: on a busy machine its timers run
 * late, and ours in the same page run later still.
 */
export async function addressOf(page: Page): Promise<string> {
  return page.evaluate(async () => {
    let address = "";
    while (address !== window.location.href) {
      address = window.location.href;
      await new Promise((resolve) => setTimeout(resolve, 600));
    }
    return address;
  });
}
