import type { AddressInfo } from "node:net";
import { SMTPServer } from "smtp-server";
import { afterEach, describe, expect, test } from "vitest";
import { latestMails, mailById } from "@/db/queries/mails";
import { SHELL } from "@/lib/activity/append";
import { expiryText } from "@/lib/auth/key-expiry";
import { issueKey } from "@/lib/auth/manage-keys";
import { monthBucket } from "@/lib/limits/quota";
import { tellOfExpiry, tellOfQuotas } from "@/lib/mail/key-notices";
import { testLetter } from "@/lib/mail/letters";
import { post, sendDue } from "@/lib/mail/outbox";
import { makeRound } from "@/lib/mail/rounds";
import type { Service } from "@/lib/service/service";
import { overviewOf } from "@/lib/usage/overview";
import { scratchService } from "../../support/scratch-service";

const DAY = 86_400_000;
const START = Date.UTC(2026, 2, 1);

const subjects = ({ db }: Service) => latestMails(db, 100).map(({ subject }) => subject);

function keyOf(service: Service, teamId: string, days: number | null, month = 100) {
  const expiresAt = days === null ? undefined : new Date(service.now() + days * DAY).toISOString();
  const settings = { name: "CAD scripts", scopes: ["compute" as const], quotas: { month }, expiresAt };
  return issueKey(service.db, { teamId, settings, actor: SHELL, now: service.now() }).view.id;
}

describe("a key that ends", () => {
  test("is told of 14 and 3 days before and at its end, each once, to those who look after it", () => {
    const { service, setTime, team, person } = scratchService({}, START);
    const busbar = team("busbar");
    person("developer", [busbar], "dev@merrow-pike.example");
    person("viewer", [busbar], "viewer@merrow-pike.example");
    person("admin", [], "admin@merrow-pike.example");
    keyOf(service, busbar, 30);
    const told: string[] = [];
    for (let hour = 0; hour <= 34 * 24; hour += 6) {
      setTime(START + hour * 3_600_000);
      const mails = tellOfExpiry(service);
      if (mails > 0) told.push(`${mails} on day ${hour / 24}`);
    }
    expect(told).toEqual(["1 on day 16", "1 on day 27", "1 on day 30"]);
    const mails = latestMails(service.db, 10);
    expect(mails.map(({ recipient }) => recipient)).toEqual(Array(3).fill("dev@merrow-pike.example"));
    expect(mails.map(({ subject }) => subject)).toEqual([
      'The key "CAD scripts" has expired',
      'The key "CAD scripts" expires in 3 days',
      'The key "CAD scripts" expires in 14 days',
    ]);
  });

  test.each([
    [14 * DAY, "expires in 14 days"],
    [9.6 * DAY, "expires in 10 days"],
    [9.4 * DAY, "expires in 9 days"],
    [2 * DAY, "expires in 2 days"],
    [1.5 * DAY, "expires in 36 hours"],
    [3_700_000, "expires in 1 hour"],
    [3_599_000, "expires within the hour"],
    [0, "has expired"],
  ])("%d ms before its end is said to be so in mails and on the overview", (leftMs, words) => {
    expect(expiryText(leftMs)).toBe(words);
    const { service, setTime, team, person } = scratchService({}, START);
    const busbar = team("busbar");
    person("developer", [busbar], "dev@merrow-pike.example");
    keyOf(service, busbar, 30);
    setTime(START + 30 * DAY - leftMs);
    tellOfExpiry(service);
    expect(subjects(service)).toEqual([`The key "CAD scripts" ${words}`]);
    const { attention } = overviewOf(service.db, {
      scope: { teamIds: "all" },
      teamIds: [busbar],
      now: service.now(),
    });
    expect(attention.map(({ text }) => text)).toEqual(
      leftMs > 0 ? [`Key CAD scripts (busbar) ${words}.`] : [],
    );
  });

  test("is not told of at once where it was issued for a few days, nor when it was revoked or ended long ago", () => {
    const { service, setTime, team, person } = scratchService({}, START);
    const busbar = team("busbar");
    person("admin");
    keyOf(service, busbar, 2);
    const revoked = keyOf(service, busbar, 20);
    service.db.$client.prepare("update keys set revoked_at = 1 where id = ?").run(revoked);
    expect(tellOfExpiry(service)).toBe(0);
    setTime(START + 10 * DAY);
    expect(tellOfExpiry(service)).toBe(0);
    expect(subjects(service)).toEqual([]);
  });
});

describe("a quota", () => {
  test("is told of at 80 % and at 100 %, once each, and anew in the next month", async () => {
    // The limiter counts by the real clock; the months are those of the service's own.
    const now = Date.now();
    const { service, setTime, team, person } = scratchService({}, now);
    const busbar = team("busbar");
    person("developer", [busbar]);
    const id = keyOf(service, busbar, null, 100);
    const spend = (points: number) =>
      service.limiter.spend(monthBucket(`key:${id}`, 100, service.now()), points);
    await spend(79);
    expect(tellOfQuotas(service)).toBe(0);
    await spend(1);
    expect([tellOfQuotas(service), tellOfQuotas(service)]).toEqual([1, 0]);
    await spend(20);
    expect([tellOfQuotas(service), tellOfQuotas(service)]).toEqual([1, 0]);
    expect(subjects(service).sort()).toEqual([
      'The key "CAD scripts" has used 80 % of its month',
      'The key "CAD scripts" has used up its month',
    ]);
    setTime(now + 32 * DAY);
    expect(tellOfQuotas(service)).toBe(0);
  });
});

describe("mails", () => {
  const servers: SMTPServer[] = [];
  afterEach(async () => {
    await Promise.all(
      servers.splice(0).map((server) => new Promise<void>((resolve) => server.close(resolve))),
    );
  });

  interface Received {
    readonly to: string[];
    readonly source: string;
  }

  async function mailServer(refuse: () => boolean = () => false) {
    const received: Received[] = [];
    const server = new SMTPServer({
      authOptional: true,
      disabledCommands: ["STARTTLS"],
      onRcptTo: (_address, _session, done) => done(refuse() ? new Error("Mailbox is busy") : undefined),
      onData: (stream, session, done) => {
        let source = "";
        stream.on("data", (chunk: Buffer) => (source += chunk.toString()));
        stream.on("end", () => {
          received.push({ to: session.envelope.rcptTo.map(({ address }) => address), source });
          done();
        });
      },
    });
    servers.push(server);
    await new Promise<void>((resolve) => server.listen(0, "127.0.0.1", resolve));
    const { port } = server.server.address() as AddressInfo;
    return { url: `smtp://127.0.0.1:${port}`, received };
  }

  const to = {
    kind: "test",
    recipient: "ines.harrow@merrow-pike.example",
    letter: testLetter({ name: "Ines & Co" }),
  };

  test("go out with two parts, and what they said is forgotten here", async () => {
    const { url, received } = await mailServer();
    const { service } = scratchService({
      RHOFORM_SMTP_URL: url,
      RHOFORM_MAIL_FROM: "Rhoform <rhoform@merrow-pike.example>",
    });
    post(service, to, service.now());
    expect([await sendDue(service), await sendDue(service)]).toEqual([1, 0]);
    expect(received).toHaveLength(1);
    const [{ source }] = received;
    expect(received[0].to).toEqual(["ines.harrow@merrow-pike.example"]);
    expect(source).toMatch(/^From: Rhoform <rhoform@merrow-pike\.example>$/m);
    expect(source).toMatch(/^Content-Type: multipart\/alternative/m);
    expect(source).toContain("Content-Type: text/plain");
    expect(source).toContain("Hello Ines & Co,");
    expect(source).toContain("Hello Ines &amp; Co,");
    const [mail] = latestMails(service.db, 1);
    expect(mail.state).toBe("sent");
    expect(mailById(service.db, mail.id)).toMatchObject({ text: "", html: "" });
  });

  test("wait and are tried again where the mail server refuses them, and fail in the end", async () => {
    let refusing = true;
    const { url, received } = await mailServer(() => refusing);
    const { service, setTime } = scratchService({
      RHOFORM_SMTP_URL: url,
      RHOFORM_MAIL_FROM: "rhoform@merrow-pike.example",
    });
    post(service, to, service.now());
    post(service, to, service.now());
    await makeRound(service);
    expect(latestMails(service.db, 2).map(({ state }) => state)).toEqual(["queued", "queued"]);
    expect(latestMails(service.db, 1)[0].error).toContain("Mailbox is busy");
    expect(await sendDue(service)).toBe(0);
    setTime(START + 2 * 60_000);
    refusing = false;
    expect(await sendDue(service)).toBe(2);
    expect(received).toHaveLength(2);
    refusing = true;
    post(service, to, service.now());
    for (let day = 1; day <= 7; day++) {
      setTime(START + day * DAY);
      await sendDue(service);
    }
    expect(latestMails(service.db, 1)[0].state).toBe("failed");
  });

  test("are kept where there is no mail server", async () => {
    const { service } = scratchService();
    post(service, to, service.now());
    expect(await sendDue(service)).toBe(0);
    const [mail] = latestMails(service.db, 1);
    expect(mail.state).toBe("captured");
    expect(mailById(service.db, mail.id)?.text).toContain("Hello Ines & Co,");
  });
});
