import { join } from "node:path";
import { type Database, migrateDatabase, sharedDatabase } from "@/db/client";
import { GroupCommit } from "@/db/group-commit";
import { type Config, readConfig } from "../config/environment";
import { AddressBook } from "../http/client-address";
import { FieldJobs } from "../jobs/field-jobs";
import { type TaskRunner, WorkerPool } from "../jobs/worker-pool";
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
  /** Field solutions; nothing runs before the first one comes or `open` is called. */
  readonly fields: FieldJobs;
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
export function assembleService(
  config: Config,
  db: Database,
  log: Log,
  now: () => number,
  parts: { readonly limiter?: Limiter; readonly runner?: TaskRunner } = {},
): Service {
  const limiter = parts.limiter ?? new Limiter(db);
  const fields = new FieldJobs({
    db,
    limiter,
    log,
    folder: join(config.dataFolder, "fields"),
    runner: parts.runner ?? new WorkerPool(config.workers),
    secondsAllowed: config.fieldSeconds,
    now,
  });
  return {
    config,
    db,
    commits: GroupCommit.of(db),
    log,
    limiter,
    addresses: new AddressBook(config.trustedProxies),
    fields,
    now,
  };
}

/** Ends a service: unfinished field solutions are handed back and the write-ahead log is folded into the database file. */
export function closeService(service: Service): void {
  if (!service.db.$client.open) return;
  service.fields.close();
  service.db.$client.close();
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
