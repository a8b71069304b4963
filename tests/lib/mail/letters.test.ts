import { describe, expect, test } from "vitest";
import { type Letter, writeMessage } from "@/lib/mail/letter";
import {
  emailChangeLetter,
  emailChangeNotice,
  invitationLetter,
  keyExpiryLetter,
  newDeviceLetter,
  passwordChangedNotice,
  quotaLetter,
  resetLetter,
  testLetter,
} from "@/lib/mail/letters";

const ORIGIN = "https://rhoform.merrow-pike.example";
const AT = Date.UTC(2026, 4, 3, 14, 5);
const MOMENT = "3 May 2026, 14:05 UTC";
/** What HTML would read as its own, and longer than a line. */
const TO = { name: 'Ines "Bar" <Harrow> & Söhne of the workshop for very long names beside the river' };
const url = `${ORIGIN}/invitation/abc_DEF-123?a=1&b=2`;
const key = { key: "CAD & <scripts>", team: "Thin film", url };

/** Every letter with the facts that it must tell. */
const LETTERS: readonly (readonly [string, Letter, readonly string[]])[] = [
  [
    "invitation",
    invitationLetter(TO, { by: "Maud <Okerlund>", url, until: AT }),
    ["Maud <Okerlund>", MOMENT],
  ],
  ["reset", resetLetter(TO, { url, until: AT }), [MOMENT]],
  ["e-mail change", emailChangeLetter(TO, { url, until: AT }), [MOMENT]],
  ["e-mail notice", emailChangeNotice(TO, { email: "new@a.example" }), ["new@a.example"]],
  ["password", passwordChangedNotice(TO, { at: AT }), [MOMENT]],
  [
    "new device",
    newDeviceLetter(TO, { client: "Firefox on Linux", address: "192.0.2.7", at: AT, url }),
    ["Firefox on Linux", "192.0.2.7", MOMENT],
  ],
  [
    "key expires",
    keyExpiryLetter(TO, { ...key, leftMs: 3 * 86_400_000, expiresAt: AT }),
    ["CAD & <scripts>", "Thin film", MOMENT],
  ],
  [
    "key has expired",
    keyExpiryLetter(TO, { ...key, leftMs: 0, expiresAt: AT }),
    ["CAD & <scripts>", "Thin film", MOMENT],
  ],
  [
    "quota nearly used",
    quotaLetter(TO, { ...key, percent: 80, used: 8_123, quota: 10_000, resetsAt: AT }),
    ["8,123 of 10,000 computations", MOMENT],
  ],
  [
    "quota used",
    quotaLetter(TO, { ...key, percent: 100, used: 10_000, quota: 10_000, resetsAt: AT }),
    ["10,000 of 10,000 computations", MOMENT],
  ],
  ["test", testLetter(TO), []],
];

const words = (text: string) => text.replace(/\s+/g, " ").trim();

/** What a reader of the HTML part sees. */
function seen(html: string): string {
  const [, body] = html.split(/<body[^>]*>/);
  return words(
    body
      .replace(/<[^>]+>/g, " ")
      .replaceAll("&lt;", "<")
      .replaceAll("&gt;", ">")
      .replaceAll("&quot;", '"')
      .replaceAll("&#39;", "'")
      .replaceAll("&amp;", "&"),
  );
}

describe.each(LETTERS)("%s", (_name, letter, facts) => {
  const { subject, text, html } = writeMessage(letter, ORIGIN);

  test("says the same in both parts", () => {
    const parts = [
      ...facts,
      TO.name,
      letter.greeting,
      ...letter.paragraphs,
      ...letter.closing,
      ORIGIN,
      ...(letter.action ? [letter.action.label, letter.action.url] : []),
    ];
    for (const part of parts) {
      expect(words(text)).toContain(words(part));
      expect(seen(html)).toContain(words(part));
    }
    expect(subject).not.toMatch(/[\r\n]/);
  });

  test("fetches nothing, and leads nowhere but where it says", () => {
    expect(html).not.toMatch(/<(img|link|script|style|iframe|object|video|audio|source|form)\b/i);
    expect(html).not.toMatch(/\b(src|srcset|background|poster)\s*=|url\(|@import/i);
    const links = [...html.matchAll(/href="([^"]*)"/g)].map(([, address]) =>
      address.replaceAll("&amp;", "&"),
    );
    expect(links).toEqual(letter.action ? [letter.action.url] : []);
    expect(html).not.toContain("<Harrow>");
  });

  test("keeps its lines short enough to be sent as they are", () => {
    const long = text.split("\n").filter((line) => line.length > 100 && !line.startsWith("http"));
    expect(long).toEqual([]);
  });
});
