/** `npm run db:migrate`: brings the database to the current schema without starting the service. */
import { migrateDatabase, openDatabase } from "@/db/client";
import { ConfigError, readConfig } from "../config/environment";

try {
  const { databasePath } = readConfig(process.env);
  const db = openDatabase(databasePath);
  migrateDatabase(db);
  db.$client.close();
  console.log(`${databasePath} is up to date.`);
} catch (error) {
  if (!(error instanceof ConfigError)) throw error;
  console.error(error.message);
  process.exitCode = 1;
}
