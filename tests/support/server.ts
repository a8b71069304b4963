import { mkdtempSync, rmSync } from "node:fs";
import type { AddressInfo } from "node:net";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { insertTeam, teamBySlug } from "@/db/queries/teams";
import { SHELL } from "@/lib/activity/append";
import type { KeySettings } from "@/lib/auth/key-settings";
import { issueKey } from "@/lib/auth/manage-keys";
import { readConfig } from "@/lib/config/environment";
import { createApiServer } from "@/lib/cli/api-server";
import { newId } from "@/lib/service/identifier";
import { closeService, openService, type Service } from "@/lib/service/service";

export interface TestServer {
  /** Scheme, host and port. */
  readonly base: string;
  /** The service behind it, or one on the same data where the server is another process. */
  readonly service: Service;
  /** File of the structured logs. */
  readonly logFile: string;
  /** Issues a key as the shell does; the team is made if it is missing. */
  readonly issue: (settings?: Partial<KeySettings> & { team?: string }) => { key: string; id: string };
  readonly stop: () => Promise<void>;
}

/** Environment variables of a server under test, in place of the defaults of tests. */
type Variables = Readonly<Record<string, string>>;

/**
 * The server under test: the one at RHOFORM_TEST_BASE with the data folder RHOFORM_TEST_DATA (it must run with
 * RHOFORM_ADDRESS_QUOTA=1000000), else the lean process on a free port with a data folder of its own. A test that needs
 * special settings names them and always gets the lean process.
 */
export async function startServer(variables?: Variables): Promise<TestServer> {
  const { RHOFORM_TEST_BASE, RHOFORM_TEST_DATA } = process.env;
  if (variables === undefined && RHOFORM_TEST_BASE && RHOFORM_TEST_DATA) {
    const service = openService(readConfig({ RHOFORM_DATA: RHOFORM_TEST_DATA, RHOFORM_LOG: "off" }));
    return {
      base: RHOFORM_TEST_BASE.replace(/\/$/, ""),
      service,
      logFile: join(RHOFORM_TEST_DATA, "log", "rhoform.jsonl"),
      issue: issuer(service),
      stop: async () => closeService(service),
    };
  }
  const folder = mkdtempSync(join(tmpdir(), "rhoform-"));
  const service = openService(
    readConfig({ RHOFORM_DATA: folder, RHOFORM_ADDRESS_QUOTA: "1000000", PORT: "0", ...variables }),
  );
  const server = createApiServer(service);
  await new Promise<void>((resolve) => server.listen(0, "127.0.0.1", resolve));
  const { port } = server.address() as AddressInfo;
  return {
    base: `http://127.0.0.1:${port}`,
    service,
    logFile: join(folder, "log", "rhoform.jsonl"),
    issue: issuer(service),
    stop: async () => {
      server.closeAllConnections();
      await new Promise((resolve) => server.close(resolve));
      closeService(service);
      rmSync(folder, { recursive: true, force: true });
    },
  };
}

export function issuer(service: Service): TestServer["issue"] {
  return ({ team = "busbar", ...settings } = {}) => {
    const { db } = service;
    if (!teamBySlug(db, team))
      insertTeam(db, { id: newId("team"), slug: team, name: team, createdAt: Date.now() });
    const teamId = teamBySlug(db, team)?.id ?? "";
    const { view, text } = issueKey(db, {
      teamId,
      settings: {
        name: "Test",
        scopes: ["compute", "field", "materials:read", "materials:write", "records:read"],
        quotas: { minute: 100_000, month: 1_000_000 },
        ...settings,
      },
      actor: SHELL,
      now: Date.now(),
    });
    return { key: text, id: view.id };
  };
}
