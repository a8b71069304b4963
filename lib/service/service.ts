import { type Database, migrateDatabase, sharedDatabase } from "@/db/client";
import { GroupCommit } from "@/db/group-commit";
import { type Config, readConfig } from "../config/environment";
import { AddressBook } from "../http/client-address";
import { Limiter } from "../limits/limiter";
import { type Log, openLog } from "./log";

/** What every call needs; made once a process. */
export interface Service {
  readonly config: Config;
  readonly db: Database;
  /** Where calls write what they change and what they cost. */
  readonly commits: GroupCommit;
  readonly log: Log;
  readonly limiter: Limiter;
  readonly addresses: AddressBook;
  /** Unix time, ms. */
  readonly now: () => number;
}

/** Opens and migrates the database and puts the service together. */
export function openService(config: Config, now: () => number = Date.now): Service {
  const db = sharedDatabase(config.databasePath);
  migrateDatabase(db);
  return assembleService(config, db, openLog(config.log), now);
}

/** A service on a database that is open and migrated. */
export function assembleService(config: Config, db: Database, log: Log, now: () => number): Service {
  return {
    config,
    db,
    commits: new GroupCommit(db),
    log,
    limiter: new Limiter(db),
    addresses: new AddressBook(config.trustedProxies),
    now,
  };
}

/** Ends a service: the write-ahead log is folded into the database file. */
export function closeService(service: Service): void {
  if (service.db.$client.open) service.db.$client.close();
}

const SHARED = Symbol.for("rhoform.service");
type Holder = typeof globalThis & { [SHARED]?: Service };

/** The service of this process, by its environment. Bundles that each hold a copy of this module share one. */
export function sharedService(): Service {
  const holder: Holder = globalThis;
  return (holder[SHARED] ??= openService(readConfig(process.env)));
}

/** Closes what `sharedService` opened, if anything. */
export function closeSharedService(): void {
  const holder: Holder = globalThis;
  if (holder[SHARED]) closeService(holder[SHARED]);
  delete holder[SHARED];
}
