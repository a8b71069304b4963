import { describe, expect, test } from "vitest";
import { parseDuration } from "@/lib/auth/duration";
import { demoSecret, formatKey, hashSecret, newSecret, parseKey, secretMatches } from "@/lib/auth/key-text";
import { bytesToText, newId, newKeyId, randomText } from "@/lib/service/identifier";
import { clientKind } from "@/lib/usage/client-kind";

describe("keys as text", () => {
  test("are read as they are written", () => {
    const parts = { id: newKeyId(), secret: newSecret() };
    expect(parseKey(formatKey(parts))).toEqual(parts);
    for (const wrong of ["", "rho_", "rho_k1_x", `rho_k1_${"a".repeat(42)}`, `Rho_k1234_${"a".repeat(43)}`]) {
      expect(parseKey(wrong)).toBeUndefined();
    }
  });

  test("only the very secret matches its hash", () => {
    const secret = newSecret();
    const hash = hashSecret(secret);
    expect(hash).toMatch(/^[0-9a-f]{64}$/);
    expect(secretMatches(secret, hash)).toBe(true);
    expect(secretMatches(newSecret(), hash)).toBe(false);
    expect(secretMatches(secret, "")).toBe(false);
  });

  test("demo secrets are the same each time, another for each key and installation", () => {
    const secrets = [demoSecret("s1", "k1"), demoSecret("s1", "k2"), demoSecret("s2", "k1")];
    expect(demoSecret("s1", "k1")).toBe(secrets[0]);
    expect(new Set(secrets).size).toBe(3);
    for (const secret of secrets) expect(secret).toMatch(/^[0-9A-Za-z]{43}$/);
  });
});

describe("identifiers", () => {
  test("have their prefix, do not repeat and use every letter", () => {
    const ids = Array.from({ length: 2000 }, () => newId("rec"));
    expect(new Set(ids).size).toBe(ids.length);
    for (const id of ids) expect(id).toMatch(/^rec_[0-9A-Za-z]{16}$/);
    expect(new Set(randomText(10_000)).size).toBe(62);
  });

  test("32 bytes become 43 letters and digits, no two the same", () => {
    expect(bytesToText(new Uint8Array(32))).toBe("0".repeat(43));
    expect(bytesToText(new Uint8Array(32).fill(255))).toMatch(/^[0-9A-Za-z]{43}$/);
    const one = new Uint8Array(32);
    one[31] = 1;
    expect(bytesToText(one)).toBe(`${"0".repeat(42)}1`);
  });
});

describe("durations and clients", () => {
  test.each([
    ["0", 0],
    ["90s", 90_000],
    ["30m", 1_800_000],
    ["12h", 43_200_000],
    ["7d", 604_800_000],
    ["2 w", 1_209_600_000],
  ])("%s is %i ms", (text, ms) => expect(parseDuration(text)).toBe(ms));

  test.each(["", "7", "d", "-1d", "1.5h", "1y", "7d7d", "9999999d"])("%j is none", (text) =>
    expect(parseDuration(text)).toBeUndefined(),
  );

  test.each([
    ["python-requests/2.32.3", "python"],
    ["curl/8.5.0", "command-line"],
    ["Mozilla/5.0 (X11; Linux x86_64) AppleWebKit/537.36", "browser"],
    ["node", "javascript"],
    ["Microsoft Office Excel", "spreadsheet"],
    ["something else", "other"],
    [null, "unnamed"],
  ])("%s is a client of kind %s", (userAgent, kind) => expect(clientKind(userAgent)).toBe(kind));
});
