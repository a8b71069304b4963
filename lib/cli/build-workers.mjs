/**
 * Bundles what is loaded as one file: by worker threads, whatever the server was started with, and by the pages of other
 * teams, which load a widget.
 */
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

await build({
  absWorkingDir: ROOT,
  entryPoints: { v1: "app/embed/_loader/main.ts" },
  outdir: "dist/embed",
  bundle: true,
  minify: true,
  platform: "browser",
  format: "iife",
  target: "es2022",
  charset: "utf8",
  logLevel: "warning",
});
