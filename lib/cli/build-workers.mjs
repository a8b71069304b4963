/** Bundles what runs in worker threads: they load one file, whatever the server was started with. */
import { build } from "esbuild";
import { ROOT } from "./setup.mjs";

await build({
  absWorkingDir: ROOT,
  entryPoints: ["lib/jobs/field-worker.ts"],
  outdir: "dist/workers",
  outExtension: { ".js": ".mjs" },
  bundle: true,
  platform: "node",
  format: "esm",
  target: "node20",
  alias: { "@": "." },
  logLevel: "warning",
});
