import { describe, expect, it } from "vitest";
import { base } from "./browser";
import { PAGES } from "./pages";

function directives(policy: string): Map<string, string[]> {
  return new Map(
    policy.split("; ").map((directive) => {
      const [name, ...values] = directive.split(" ");
      return [name, values];
    }),
  );
}

describe.each([...PAGES, "/docs/api"])("headers of %s", (path) => {
  it("carry the policy and its companions", async () => {
    const { headers } = await fetch(base() + path);
    const policy = directives(headers.get("Content-Security-Policy") ?? "");
    expect(policy.get("default-src")).toEqual(["'self'"]);
    expect(policy.get("script-src")).toEqual([
      "'self'",
      expect.stringMatching(/^'nonce-[0-9a-f]{32}'$/),
      "'strict-dynamic'",
    ]);
    expect(policy.get("connect-src")).toEqual(["'self'"]);
    expect(policy.get("object-src")).toEqual(["'none'"]);
    expect(policy.get("base-uri")).toEqual(["'none'"]);
    expect(policy.get("form-action")).toEqual(["'self'"]);
    expect(policy.get("frame-ancestors")).toEqual(["'none'"]);
    expect(headers.get("X-Content-Type-Options")).toBe("nosniff");
    expect(headers.get("Referrer-Policy")).toBe("strict-origin-when-cross-origin");
    expect(headers.get("Permissions-Policy")).toBe("camera=(), microphone=(), geolocation=()");
    // This server is reached by http, where the header must not be sent (RFC 6797, 7.2).
    expect(headers.get("Strict-Transport-Security")).toBeNull();
    expect(headers.get("X-Powered-By")).toBeNull();
  });

  it("have a fresh nonce each time, and every script carries it", async () => {
    const nonceOf = (response: Response) =>
      /'nonce-([0-9a-f]+)'/.exec(response.headers.get("Content-Security-Policy") ?? "")?.[1];
    const first = await fetch(base() + path);
    const second = await fetch(base() + path);
    expect(nonceOf(first)).not.toBe(nonceOf(second));
    const html = await first.text();
    const scripts = [...html.matchAll(/<script\b[^>]*>/g)].map(([tag]) => tag);
    expect(scripts.length).toBeGreaterThan(0);
    for (const tag of scripts) expect(tag).toContain(`nonce="${nonceOf(first)}"`);
  });
});

it("built files may be kept and are not sniffed", async () => {
  const html = await (await fetch(base())).text();
  const asset = /\/_next\/static\/[^"]+\.js/.exec(html)?.[0];
  const { status, headers } = await fetch(base() + asset);
  expect(status).toBe(200);
  expect(headers.get("X-Content-Type-Options")).toBe("nosniff");
  expect(headers.get("Cache-Control")).toContain("immutable");
});

it("the public API keeps its own headers", async () => {
  const { headers } = await fetch(`${base()}/api/v1/health`);
  expect(headers.get("Request-Id")).toBeTruthy();
  expect(headers.get("X-Content-Type-Options")).toBe("nosniff");
});
