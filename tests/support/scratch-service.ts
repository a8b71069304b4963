import { migrateDatabase, openDatabase } from "@/db/client";
import { insertMembership, insertPerson, insertTeam } from "@/db/queries/teams";
import type { Role } from "@/db/schema/organisation";
import { hashPasswordNow } from "@/lib/auth/password";
import { readConfig } from "@/lib/config/environment";
import { newId } from "@/lib/service/identifier";
import { openLog } from "@/lib/service/log";
import { assembleService, type Service } from "@/lib/service/service";

/** A password that is long enough. */
export const PASSWORD = "copper on drawing paper";

export interface ScratchService {
  readonly service: Service;
  /** Sets the service's clock, Unix ms. */
  readonly setTime: (at: number) => void;
  readonly team: (slug: string) => string;
  readonly person: (role: Role, teamIds?: readonly string[], email?: string) => string;
}

/** A service on a database in memory, with a clock that the test sets. */
export function scratchService(
  variables: Readonly<Record<string, string>> = {},
  startsAt = Date.UTC(2026, 2, 1),
): ScratchService {
  const db = openDatabase(":memory:");
  migrateDatabase(db);
  let at = startsAt;
  const config = readConfig({ RHOFORM_SECRET: "a secret for tests only", RHOFORM_LOG: "off", ...variables });
  const service = assembleService(config, db, openLog("off"), () => at);
  return {
    service,
    setTime: (time) => {
      at = time;
    },
    team: (slug) => {
      const id = newId("team");
      insertTeam(db, { id, slug, name: slug, createdAt: at });
      return id;
    },
    person: (role, teamIds = [], email = `${newId("per").toLowerCase()}@merrow-pike.example`) => {
      const id = newId("per");
      insertPerson(db, { id, email, name: `Person ${role}`, role, createdAt: at });
      db.$client.prepare("update people set password_hash = ? where id = ?").run(hash(), id);
      for (const teamId of teamIds) insertMembership(db, id, teamId, at);
      return id;
    },
  };
}

let kept: string | undefined;

/** Hashed once: it takes as long as it is meant to. */
function hash(): string {
  return (kept ??= hashPasswordNow(PASSWORD));
}
