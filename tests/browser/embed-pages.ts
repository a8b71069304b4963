import type { BrowserContext, Frame, Page } from "playwright-core";
import { afterAll, afterEach, beforeAll, vi } from "vitest";
import type { EmbedDefinition } from "@/lib/embeds/definition";
import { startServer, type TestServer } from "../support/server";
import { publishedWidget } from "../support/widget";
import { base, browser, closeBrowser } from "./browser";
import { type HostServer, startHost } from "./host-page";

export interface Told {
  readonly type: string;
  readonly id: string;
  readonly detail: {
    readonly code?: string;
    readonly message?: string;
    readonly resistance?: { readonly text: string; readonly value: number };
  };
}

declare global {
  interface Window {
    events: Told[];
  }
}

export let server: TestServer;
export let host: HostServer;
export const open: BrowserContext[] = [];

/** Starts what the tests of widgets in pages need; call it once at the top of a file. */
export function setUpPages(): void {
  // Several pages a test, on two busy cores.
  vi.setConfig({ testTimeout: 120_000 });
  beforeAll(async () => {
    server = await startServer();
    host = await startHost();
  });
  afterEach(async () => {
    await Promise.all(open.splice(0).map((context) => context.close()));
  });
  afterAll(async () => {
    await closeBrowser();
    await host.stop();
    await server.stop();
  });
}

export async function newPage(locale = "en-US"): Promise<{ page: Page; complaints: string[] }> {
  const context = await (await browser()).newContext({ locale, viewport: { width: 900, height: 900 } });
  open.push(context);
  const page = await context.newPage();
  const complaints: string[] = [];
  page.on("pageerror", (error) => complaints.push(String(error)));
  page.on("console", (message) => {
    if (message.type() === "error") complaints.push(message.text());
  });
  return { page, complaints };
}

export const widget = (change: Partial<EmbedDefinition> = {}, monthQuota = 1000) =>
  publishedWidget(server, change, { origins: [host.origin, host.otherSite], monthQuota });

export const told = (page: Page, type: string, id: string, count = 1) =>
  page
    .waitForFunction(
      ({ type, id, count }) =>
        window.events.filter((event) => event.type === type && event.id === id).length >= count,
      { type, id, count },
      { timeout: 45_000 },
    )
    .then(() => page.evaluate(() => window.events));

export function frameOf(page: Page, id: string): Frame {
  const frame = page.frames().find((each) => each.url().includes(id));
  if (!frame) throw new Error(`No frame of ${id}.`);
  return frame;
}

export const shownText = (frame: Frame) => frame.getByTestId("resistance").innerText();

/** Whether the server under test runs from source: its scripts have no size to speak of, and need eval. */
export async function isDevelopment(id: string): Promise<boolean> {
  const response = await fetch(`${base()}/embed/${id}`);
  return response.headers.get("content-security-policy")?.includes("'unsafe-eval'") ?? false;
}
