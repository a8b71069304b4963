import { fileURLToPath } from "node:url";
import { defineConfig } from "vitest/config";

const alias = { "@": fileURLToPath(new URL(".", import.meta.url)).replace(/\/$/, "") };

/** One project a kind of test; `server` projects share a built server started by their global setup. */
export default defineConfig({
  resolve: { alias },
  test: {
    projects: [
      {
        resolve: { alias },
        test: {
          name: "engine",
          include: ["tests/engine/**/*.test.ts", "tests/reference/**/*.test.ts", "tests/field/**/*.test.ts"],
          testTimeout: 60_000,
        },
      },
      {
        resolve: { alias },
        test: { name: "db", include: ["tests/db/**/*.test.ts"], testTimeout: 30_000 },
      },
    ],
  },
});
