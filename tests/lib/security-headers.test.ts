import { describe, expect, it } from "vitest";
import { contentSecurityPolicy, documentHeaders } from "@/lib/http/security-headers";

const options = { nonce: "abc", development: false, secure: false };

describe("contentSecurityPolicy", () => {
  it("runs scripts by nonce only and loads nothing from elsewhere", () => {
    expect(contentSecurityPolicy(options)).toBe(
      "default-src 'self'; script-src 'self' 'nonce-abc' 'strict-dynamic'; style-src 'self' 'unsafe-inline'; " +
        "img-src 'self' data: blob:; font-src 'self'; connect-src 'self'; object-src 'none'; base-uri 'none'; " +
        "form-action 'self'; frame-ancestors 'none'",
    );
  });

  it("lets named pages frame a document", () => {
    const policy = contentSecurityPolicy({ ...options, frameAncestors: ["https://intranet.example"] });
    expect(policy).toContain("frame-ancestors https://intranet.example");
    expect(policy).not.toContain("frame-ancestors 'none'");
  });

  it("allows eval and sockets in development only", () => {
    expect(contentSecurityPolicy({ ...options, development: true })).toMatch(/'unsafe-eval'.*ws:/);
    expect(contentSecurityPolicy(options)).not.toMatch(/unsafe-eval|ws:/);
  });

  it("upgrades to https where the service is on it", () => {
    expect(contentSecurityPolicy({ ...options, secure: true })).toContain("upgrade-insecure-requests");
  });
});

describe("documentHeaders", () => {
  const names = (secure: boolean) => documentHeaders(secure).map(({ key }) => key);

  it("has Strict-Transport-Security on https only", () => {
    expect(names(true)).toContain("Strict-Transport-Security");
    expect(names(false)).not.toContain("Strict-Transport-Security");
  });

  it("forbids sniffing and devices", () => {
    const headers = new Map(documentHeaders(false).map(({ key, value }) => [key, value]));
    expect(headers.get("X-Content-Type-Options")).toBe("nosniff");
    expect(headers.get("Permissions-Policy")).toBe("camera=(), microphone=(), geolocation=()");
  });
});
