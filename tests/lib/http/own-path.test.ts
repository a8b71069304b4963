import { expect, test } from "vitest";
import { agentName } from "@/lib/http/agent-name";
import { ownPath } from "@/lib/http/own-path";

test.each([
  ["/console/keys?state=active#top", "/console/keys?state=active#top"],
  ["/calculate/bar", "/calculate/bar"],
])("a sign-in leads on to %s", (wanted, path) => {
  expect(ownPath(wanted)).toBe(path);
});

test.each([
  "https://elsewhere.example/",
  "//elsewhere.example",
  "/\\elsewhere.example",
  "\\\\elsewhere.example",
  "/console\\..",
  "javascript:alert(1)",
  "console",
  "",
  null,
  "/api/console/keys",
  "/a\nb",
  "/%0d%0a /x",
  "/\t/elsewhere.example",
])("not to %j", (wanted) => {
  expect(ownPath(wanted)).toBe("/console");
});

test.each([
  ["Mozilla/5.0 (X11; Linux x86_64; rv:140.0) Gecko/20100101 Firefox/140.0", "Firefox on Linux"],
  [
    "Mozilla/5.0 (Windows NT 10.0; Win64; x64) AppleWebKit/537.36 (KHTML, like Gecko) Chrome/140.0.0.0 Safari/537.36 Edg/140.0",
    "Edge on Windows",
  ],
  [
    "Mozilla/5.0 (iPhone; CPU iPhone OS 18_0 like Mac OS X) AppleWebKit/605.1.15 (KHTML, like Gecko) Version/18.0 Mobile/15E148 Safari/604.1",
    "Safari on iOS",
  ],
  ["curl/8.5", "Unknown program"],
  [null, "Unknown program"],
])("%s is a session of %s", (agent, name) => {
  expect(agentName(agent)).toBe(name);
});
