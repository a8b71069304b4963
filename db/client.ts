import { closeSync, mkdirSync, openSync } from "node:fs";
import { dirname, join } from "node:path";
import Sqlite from "better-sqlite3";
import { type BetterSQLite3Database, drizzle } from "drizzle-orm/better-sqlite3";
import { migrate } from "drizzle-orm/better-sqlite3/migrator";

/** The open database. Queries take it first, also inside `transact`: there is one connection, so they join. */
export type Database = BetterSQLite3Database & { readonly $client: Sqlite.Database };

/**
 * Opens a SQLite file (or `:memory:`), creating its folder. Write-ahead log, so that readers never wait; a writer in
 * another process (a shell command) is waited for up to five seconds.
 */
export function openDatabase(path: string): Database {
  if (path !== ":memory:") {
    // Whoever else has an account on the machine reads no keys' digests, people and records; the log files follow suit.
    mkdirSync(dirname(path), { recursive: true, mode: 0o700 });
    closeSync(openSync(path, "a", 0o600));
  }
  const client = new Sqlite(path);
  client.pragma("journal_mode = WAL");
  client.pragma("busy_timeout = 5000");
  client.pragma("foreign_keys = ON");
  client.pragma("synchronous = NORMAL");
  client.pragma("cache_size = -32000");
  // A checkpoint waits for the disk: every 40 MB of log instead of every 4.
  client.pragma("wal_autocheckpoint = 10000");
  return drizzle({ client });
}

/** Applies the migrations that the file lacks. Two processes may start at once: the later one finds them applied. */
export function migrateDatabase(db: Database, folder = join(process.cwd(), "db", "migrations")): void {
  try {
    migrate(db, { migrationsFolder: folder });
  } catch {
    // Another process held the lock or created the tables between our look and our write: look again.
    if (db.$client.inTransaction) db.$client.exec("ROLLBACK");
    migrate(db, { migrationsFolder: folder });
  }
}

/**
 * Runs `work` as one write transaction that takes the lock at its start. `work` must be synchronous: an await inside
 * would let other calls into the transaction. A throw rolls everything back.
 */
export function transact<Result>(db: Database, work: () => Result): Result {
  return db.$client.transaction(work).immediate();
}

const SHARED = Symbol.for("rhoform.database");
type Holder = typeof globalThis & { [SHARED]?: Map<string, Database> };

/** The process's one open database of that path; bundles that each hold a copy of this module share it. */
export function sharedDatabase(path: string): Database {
  const holder: Holder = globalThis;
  const open = (holder[SHARED] ??= new Map<string, Database>());
  let db = open.get(path);
  if (!db?.$client.open) {
    db = openDatabase(path);
    open.set(path, db);
  }
  return db;
}

const STATEMENTS = new WeakMap<Database, Map<string, unknown>>();

/** A statement built once a database and name: building a query costs more than running it. */
export function prepared<Statement>(
  db: Database,
  name: string,
  build: (db: Database) => Statement,
): Statement {
  let statements = STATEMENTS.get(db);
  if (!statements) STATEMENTS.set(db, (statements = new Map()));
  let statement = statements.get(name);
  if (statement === undefined) statements.set(name, (statement = build(db)));
  return statement as Statement;
}
