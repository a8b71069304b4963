import { availableParallelism } from "node:os";
import { fileURLToPath } from "node:url";
import { defineConfig } from "vitest/config";

const alias = {
  "@": fileURLToPath(new URL(".", import.meta.url)).replace(/\/$/, ""),
  // Resolves only inside Next; in tests a server module is a module.
  "server-only": fileURLToPath(new URL("tests/support/server-only.ts", import.meta.url)),
};

/** One project a kind of test; `server` tests share one built server that their global setup starts. */
export default defineConfig({
  resolve: { alias },
  test: {
    // Files share what they import (`isolate: false` below): no test replaces a module, and loading the engine anew for
    // each file would cost more than most files' tests.
    // Half of most tests is waiting for a server, a browser or the database.
    maxWorkers: Math.max(2, availableParallelism() - 1),
    projects: [
      {
        resolve: { alias },
        test: {
          name: "engine",
          isolate: false,
          include: ["tests/engine/**/*.test.ts", "tests/reference/**/*.test.ts", "tests/field/**/*.test.ts"],
          testTimeout: 60_000,
        },
      },
      {
        resolve: { alias },
        test: {
          name: "units",
          isolate: false,
          include: [
            "tests/ui/**/*.test.ts",
            "tests/lib/**/*.test.ts",
            "tests/cli/**/*.test.ts",
            "tests/sdk/**/*.test.ts",
          ],
          testTimeout: 60_000,
        },
      },
      {
        resolve: { alias },
        test: { name: "db", isolate: false, include: ["tests/db/**/*.test.ts"], testTimeout: 30_000 },
      },
      {
        resolve: { alias },
        test: {
          name: "api",
          isolate: false,
          include: ["tests/api/**/*.test.ts"],
          globalSetup: ["tests/support/worker-bundle.ts"],
          // The set-up of the `server` tests names their service to all; these have the lean process, each file its own.
          env: { RHOFORM_TEST_BASE: "", RHOFORM_TEST_DATA: "" },
          testTimeout: 60_000,
          hookTimeout: 60_000,
        },
      },
      {
        resolve: { alias },
        test: {
          name: "server",
          isolate: false,
          include: ["tests/api/**/*.test.ts", "tests/server/**/*.test.ts", "tests/browser/**/*.test.ts"],
          globalSetup: ["tests/support/start-server.ts"],
          // Services and browsers are started and waited for; on a busy machine that takes its time.
          testTimeout: 180_000,
          hookTimeout: 180_000,
        },
      },
    ],
  },
});
