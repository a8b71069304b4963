/**
 * `npm run backup -- [folder]`: a consistent copy of everything the service keeps, taken while it runs. The database is
 * copied by SQLite's own online backup; the other files of the data folder are copied beside it.
 */
import { cpSync, existsSync, mkdirSync } from "node:fs";
import { basename, join, resolve } from "node:path";
import Sqlite from "better-sqlite3";
import { ConfigError, readConfig } from "../config/environment";

/** Parts of the data folder that a copy must not take as files: the live database and the logs. */
const LEFT_OUT = /^(log|rhoform\.sqlite(-wal|-shm|-journal)?)$/;

async function main(): Promise<void> {
  const { dataFolder, databasePath } = readConfig(process.env);
  if (!existsSync(databasePath)) throw new ConfigError(`There is no database at ${databasePath} yet.`);
  const stamp = new Date().toISOString().slice(0, 19).replaceAll(":", "-");
  const target = resolve(process.argv[2] ?? join("backup", stamp));
  if (existsSync(join(target, basename(databasePath)))) {
    throw new ConfigError(`${target} holds a copy already; name another folder.`);
  }
  mkdirSync(target, { recursive: true, mode: 0o700 });
  const source = new Sqlite(databasePath, { readonly: true });
  await source.backup(join(target, basename(databasePath)));
  source.close();
  cpSync(dataFolder, target, {
    recursive: true,
    filter: (path) => !LEFT_OUT.test(basename(path)) && resolve(path) !== target,
  });
  console.log(
    `Copied to ${target}. It holds the service's secret: keep it as safe as the data folder itself.`,
  );
}

main().catch((error: unknown) => {
  if (!(error instanceof ConfigError)) throw error;
  console.error(error.message);
  process.exitCode = 1;
});
