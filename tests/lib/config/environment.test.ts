import { mkdtempSync, readFileSync, rmSync, statSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterEach, beforeEach, describe, expect, test } from "vitest";
import { ConfigError, readConfig } from "@/lib/config/environment";
import { deriveKey } from "@/lib/config/secret";

let folder: string;
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), "rhoform-config-"));
});
afterEach(() => rmSync(folder, { recursive: true, force: true }));

const read = (variables: Record<string, string> = {}) => readConfig({ RHOFORM_DATA: folder, ...variables });

describe("settings", () => {
  test("have defaults that serve this machine only", () => {
    expect(read()).toMatchObject({
      host: "127.0.0.1",
      port: 3000,
      origin: "http://127.0.0.1:3000",
      demo: true,
      trustedProxies: [],
      databasePath: join(folder, "rhoform.sqlite"),
      log: join(folder, "log", "rhoform.jsonl"),
    });
  });

  test("empty variables count as missing", () => {
    expect(read({ HOST: "", PORT: "", RHOFORM_ORIGIN: "", RHOFORM_DEMO: "", RHOFORM_SECRET: "" })).toEqual(
      read(),
    );
  });

  test("come from the environment", () => {
    const config = read({
      HOST: "0.0.0.0",
      PORT: "8080",
      RHOFORM_DEMO: "0",
      RHOFORM_TRUSTED_PROXIES: "10.0.0.0/8, 192.0.2.7",
      RHOFORM_LOG: "stdout",
    });
    expect(config).toMatchObject({ origin: "http://127.0.0.1:8080", demo: false, log: "stdout" });
    expect(config.trustedProxies).toEqual(["10.0.0.0/8", "192.0.2.7"]);
    expect(read({ RHOFORM_ORIGIN: "https://rhoform.example/" }).origin).toBe("https://rhoform.example");
    expect(read({ HOST: "::1" }).origin).toBe("http://[::1]:3000");
  });

  test.each([
    ["PORT", "many"],
    ["PORT", "70000"],
    ["RHOFORM_ORIGIN", "rhoform.example"],
    ["RHOFORM_ORIGIN", "https://rhoform.example/path"],
    ["RHOFORM_SECRET", "short"],
    ["RHOFORM_DEMO", "maybe"],
    ["RHOFORM_ADDRESS_QUOTA", "0"],
  ])("a wrong %s is named", (name, value) => {
    expect(() => read({ [name]: value })).toThrow(ConfigError);
    expect(() => read({ [name]: value })).toThrow(name);
  });
});

describe("the secret", () => {
  test("is made once, kept, and readable by its owner only", () => {
    const { secret } = read();
    expect(secret.length).toBeGreaterThanOrEqual(43);
    expect(read().secret).toBe(secret);
    expect(statSync(join(folder, "secret")).mode & 0o777).toBe(0o600);
    expect(readFileSync(join(folder, "secret"), "utf8")).toBe(`${secret}\n`);
  });

  test("of the environment goes before it, and a damaged one is told", () => {
    expect(read({ RHOFORM_SECRET: "a long enough secret" }).secret).toBe("a long enough secret");
    writeFileSync(join(folder, "secret"), "");
    expect(() => read()).toThrow(/damaged/);
  });

  test("gives each purpose a key of its own", () => {
    const of = (secret: string, purpose: string) => Buffer.from(deriveKey(secret, purpose)).toString("hex");
    expect(of("a", "x")).toHaveLength(64);
    expect(of("a", "x")).toBe(of("a", "x"));
    expect(new Set([of("a", "x"), of("a", "y"), of("b", "x")]).size).toBe(3);
  });
});
