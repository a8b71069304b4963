import { beforeAll, describe, expect, it } from "vitest";
import { PROBLEMS } from "@/api/problem";
import { catalogue } from "@/lib/engine";
import { base } from "../browser/browser";

interface Walked {
  readonly status: number;
  readonly ids: ReadonlySet<string>;
  readonly headings: number;
  readonly title: string;
  readonly links: readonly string[];
  /** Addresses of scripts, styles, pictures. */
  readonly loaded: readonly string[];
  readonly type: string;
}

const walked = new Map<string, Walked>();
/** The first page that leads to an address, for complaints. */
const foundOn = new Map<string, string>();

const attributes = (html: string, pattern: RegExp) =>
  [...html.matchAll(pattern)].map(([, value]) => value.replaceAll("&amp;", "&"));

async function visit(path: string): Promise<Walked> {
  const response = await fetch(base() + path, { redirect: "manual" });
  const type = response.headers.get("Content-Type") ?? "";
  const html = type.startsWith("text/html") ? await response.text() : "";
  if (html === "") await response.body?.cancel();
  return {
    status: response.status,
    type,
    ids: new Set(attributes(html, / id="([^"]+)"/g)),
    headings: html.match(/<h1[ >]/g)?.length ?? 0,
    title: /<title>([^<]*)<\/title>/.exec(html)?.[1] ?? "",
    links: attributes(html, /<a [^>]*href="([^"]+)"/g),
    loaded: attributes(html, /<(?:script|link|img)[^>]* (?:src|href)="([^"]+)"/g),
  };
}

/** The calculator's pages have tests of their own; here only their shape must exist. */
const calculators = new Set(catalogue.map(({ id }) => `/calculate/${id}`));

/** The docs are walked; what they lead to beside themselves is visited and not walked on. */
const within = (path: string) => /^\/docs(\/|$)/.test(path) && !path.startsWith("/docs/api");

beforeAll(async () => {
  const waiting = ["/docs"];
  foundOn.set("/docs", "/docs");
  const take = async () => {
    for (let path = waiting.shift(); path !== undefined; path = waiting.shift()) {
      const found = await visit(path);
      walked.set(path, found);
      if (!within(path)) continue;
      for (const link of found.links) {
        const url = new URL(link, base() + path);
        if (url.origin !== base() || foundOn.has(url.pathname + url.search)) continue;
        foundOn.set(url.pathname + url.search, path);
        if (!calculators.has(url.pathname)) waiting.push(url.pathname + url.search);
      }
    }
  };
  while (waiting.length > 0) await Promise.all([take(), take(), take()]);
}, 300_000);

describe("the docs", () => {
  it("lead to every shape and every problem", () => {
    for (const { id } of catalogue) expect(walked.has(`/docs/shapes/${id}`), id).toBe(true);
    for (const code of Object.keys(PROBLEMS)) expect(walked.has(`/docs/problems/${code}`), code).toBe(true);
  });

  it("have no link that leads nowhere", () => {
    const lost = [...walked].filter(
      ([path, { status }]) => status !== 200 && !(/^\/console(\/|$)/.test(path) && status === 303),
    );
    expect(lost.map(([path, { status }]) => `${status} ${path} on ${foundOn.get(path)}`)).toEqual([]);
  });

  it("have no anchor that is missing", () => {
    const missing: string[] = [];
    for (const [path, page] of walked) {
      for (const link of within(path) ? page.links : []) {
        const url = new URL(link, base() + path);
        const target = walked.get(url.pathname + url.search);
        const id = decodeURIComponent(url.hash.slice(1));
        if (url.origin === base() && id !== "" && target && !target.ids.has(id))
          missing.push(`${link} on ${path}`);
      }
    }
    expect(missing).toEqual([]);
  });

  it("have one first heading and a title on each page, before any script", () => {
    const pages = [...walked].filter(([path, { type }]) => within(path) && type.startsWith("text/html"));
    expect(pages.length).toBeGreaterThan(100);
    expect(pages.filter(([, { headings, title }]) => headings !== 1 || !title.includes("Rhoform"))).toEqual(
      [],
    );
    const titles = pages.filter(([path]) => !path.includes("?")).map(([, { title }]) => title);
    expect(titles.filter((title, index) => titles.indexOf(title) !== index)).toEqual([]);
  });

  it("name no other host, neither to load from nor to lead to", () => {
    const foreign = [...walked].flatMap(([path, { links, loaded }]) =>
      [...links, ...loaded]
        .filter((link) => new URL(link, base() + path).origin !== base() && !link.startsWith("data:"))
        .map((link) => `${link} on ${path}`),
    );
    expect(foreign).toEqual([]);
  });

  it("are found by their own search, by the beginning of a word and in spite of a slip", async () => {
    for (const [query, expected] of [
      ["rayleigh", "/docs/bounds#bases"],
      ["spreadsheet form", "/docs/spreadsheets"],
      ["taperd strip", "/docs/shapes/tapered-strip"],
      ["Retry-After", "/docs/errors#retries"],
      ["quota-exhausted", "/docs/problems/quota-exhausted"],
    ]) {
      const { links } = await visit(`/docs/search?q=${encodeURIComponent(query)}`);
      expect(links.filter((link) => link.startsWith(expected)).length, query).toBeGreaterThan(0);
    }
  });

  it("show every form of a call without scripts, and no marks of their source", async () => {
    const start = await (await fetch(`${base()}/docs/start`)).text();
    const unscripted = [...start.matchAll(/<noscript>(.*?)<\/noscript>/gs)].map(([, html]) => html).join("");
    expect(unscripted).toContain("@rhoform/client");
    expect(unscripted).toContain("rhoform.Client(");
    for (const path of [...walked.keys()].filter((path) => /^\/docs\/[a-z-]+$/.test(path))) {
      const html = await (await fetch(base() + path)).text();
      const prose = [...html.matchAll(/<(p|li|th|td)\b[^>]*>(.*?)<\/\1>/gs)].map(([, , text]) =>
        text.replace(/<(code|script)\b.*?<\/\1>/gs, "").replace(/<[^>]+>/g, ""),
      );
      expect(
        prose.filter((text) => /`|\*\w/.test(text)),
        path,
      ).toEqual([]);
    }
  });

  it("hand out the Python client, its examples and a table for a shape", async () => {
    const client = await fetch(`${base()}/docs/python/rhoform.py`);
    expect(client.headers.get("Content-Disposition")).toContain("rhoform.py");
    expect(await client.text()).toContain("class Client(");
    const example = await fetch(`${base()}/docs/python/examples/replay_records.py`);
    expect(example.headers.get("Content-Disposition")).toContain("replay_records.py");
    expect(await example.text()).toContain("sys.exit(1 if drifted else 0)");
    expect((await fetch(`${base()}/docs/python/examples/nothing.py`)).status).toBe(404);
    const table = await fetch(`${base()}/docs/shapes/bar/template.csv`);
    expect((await table.text()).split("\r\n")[0]).toMatch(/^shape,length,width,thickness,/);
    expect((await fetch(`${base()}/docs/shapes/nothing/template.csv`)).status).toBe(404);
  });
});
