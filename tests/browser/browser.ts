import { existsSync } from "node:fs";
import { type Browser, type BrowserContext, type Page, chromium } from "playwright-core";
import PACKAGES from "@/lib/cli/chromium.json";

let shared: Promise<Browser> | undefined;

/** One headless Chromium for all tests of a file. */
export function browser(): Promise<Browser> {
  return (shared ??= chromium.launch({
    executablePath: PACKAGES.map((name) => `/usr/bin/${name}`).find(existsSync),
    args: [
      "--no-sandbox",
      "--disable-gpu",
      "--disable-quic",
      "--no-first-run",
      "--disable-background-networking",
      "--disable-component-update",
      "--disable-sync",
    ],
  }));
}

export async function closeBrowser(): Promise<void> {
  const open = await shared;
  shared = undefined;
  await open?.close();
}

/** Where the server under test answers. */
export function base(): string {
  const { RHOFORM_TEST_BASE } = process.env;
  if (!RHOFORM_TEST_BASE)
    throw new Error("The server tests need RHOFORM_TEST_BASE, which their set-up provides.");
  return RHOFORM_TEST_BASE;
}

export interface Visit {
  readonly page: Page;
  readonly context: BrowserContext;
  /** Addresses of all requests, in order. */
  readonly requests: readonly string[];
  /** Errors that the page wrote to the console or threw, refused policies among them. */
  readonly complaints: readonly string[];
  readonly close: () => Promise<void>;
}

interface VisitOptions {
  readonly width?: number;
  readonly height?: number;
  readonly colorScheme?: "light" | "dark";
  readonly scripts?: boolean;
  /** Called before the first request, for instance to answer some of them. */
  readonly prepare?: (page: Page) => Promise<void>;
}

/** Opens a page of the service in a context of its own and waits until it is loaded. */
export async function visit(path: string, options: VisitOptions = {}): Promise<Visit> {
  const { width = 1280, height = 900, colorScheme = "light", scripts = true, prepare } = options;
  const context = await (
    await browser()
  ).newContext({
    viewport: { width, height },
    colorScheme,
    javaScriptEnabled: scripts,
    reducedMotion: "reduce",
  });
  const page = await context.newPage();
  const requests: string[] = [];
  const complaints: string[] = [];
  page.on("request", (request) => requests.push(request.url()));
  page.on("pageerror", (error) => complaints.push(String(error)));
  page.on("console", (message) => {
    if (message.type() === "error") complaints.push(message.text());
  });
  await prepare?.(page);
  await page.goto(base() + path, { waitUntil: "load" });
  return { page, context, requests, complaints, close: () => context.close() };
}
