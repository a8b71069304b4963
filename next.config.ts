import type { NextConfig } from "next";
import { assetHeaders } from "./lib/http/security-headers";

const config: NextConfig = {
  poweredByHeader: false,
  reactStrictMode: true,
  // The API answers every address itself, also one with a slash too many; a page answers with or without it.
  skipTrailingSlashRedirect: true,
  // `npm run typecheck` checks the whole tree, tests included; a start need not wait for it.
  typescript: { ignoreBuildErrors: true },
  // Workers start files of their own and native modules load binaries: neither survives bundling.
  serverExternalPackages: ["better-sqlite3", "piscina", "pino", "pdfkit", "svg-to-pdfkit"],
  turbopack: { root: process.cwd() },
  headers: async () => [{ source: "/_next/static/:path*", headers: assetHeaders() }],
};

export default config;
