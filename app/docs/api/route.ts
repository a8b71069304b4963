import { readFile } from "node:fs/promises";
import { join } from "node:path";
import { ApiReference } from "@scalar/nextjs-api-reference";
import type { NextRequest } from "next/server";
import { KEY_PLACE } from "../../_ui/docs-key";
import { THEME_COOKIE, parseTheme } from "../../_ui/theme";
import { referenceScript } from "./reference-script";

const TITLE = "API reference · Rhoform";

/** The interactive reference: the package's own page, with everything served from here. */
export async function GET(request: NextRequest): Promise<Response> {
  const theme = parseTheme(request.cookies.get(THEME_COOKIE)?.value);
  const nonce = request.headers.get("X-Nonce") ?? "";
  const { path } = await referenceScript();
  // Wider than the adapter's own type, which lags behind the script that reads it.
  const configuration = {
    url: "/api/v1/openapi.json",
    cdn: path,
    pageTitle: TITLE,
    theme: "none" as const,
    customCss: CSS,
    withDefaultFonts: false,
    telemetry: false,
    showDeveloperTools: "never" as const,
    agent: { disabled: true },
    mcp: { disabled: true },
    hideClientButton: true,
    hideDarkModeToggle: true,
    ...(theme === "system" ? {} : { forceDarkModeState: theme }),
    defaultHttpClient: { targetKey: "shell", clientKey: "curl" } as const,
    authentication: { preferredSecurityScheme: "key" },
    metaData: { title: TITLE },
  };
  const page = await ApiReference(configuration)().text();
  const tokens = await readFile(join(process.cwd(), "app/_ui/tokens.css"), "utf8");
  const html = page
    .replace("<html>", `<html lang="en"${theme === "system" ? "" : ` data-theme="${theme}"`}>`)
    .replace(
      "</head>",
      `<link rel="icon" href="/icon.svg" type="image/svg+xml"><style>${tokens}${FRAME_CSS}</style></head>`,
    )
    .replace("<body>", `<body>${HEADER}`)
    // In the place where the script mounts its own: the page has one first heading, before and after.
    .replace('<div id="app"></div>', '<div id="app"><h1>Rhoform API reference</h1></div>')
    .replace("Scalar.createApiReference(", "createWithKey(Scalar.createApiReference, ")
    .replace("</header>", `</header><script>${WITH_KEY}</script>`)
    .replaceAll("<script", `<script nonce="${nonce}"`);
  return new Response(html, {
    headers: { "Content-Type": "text/html; charset=utf-8", "Cache-Control": "no-store" },
  });
}

const HEADER = `
    <header class="frame">
      <a class="frame-home" href="/">Rhoform</a>
      <a href="/docs">Docs</a>
      <span aria-current="page">API reference</span>
    </header>
    <noscript><p class="frame-note">The interactive reference needs scripts. The same contract is the
      <a href="/api/v1/openapi.json">OpenAPI document</a>.</p></noscript>`;

/** The key that the reader typed on the start page, from this tab's own storage: it is in no answer of the server. */
const WITH_KEY = `
function createWithKey(create, place, configuration) {
  let key = null;
  try { key = sessionStorage.getItem("${KEY_PLACE}"); } catch { /* Storage may be forbidden. */ }
  if (key) configuration.authentication.securitySchemes = { key: { token: key } };
  return create(place, configuration);
}`;

const FRAME_CSS = `
@font-face { font-family: "Spline Sans"; font-weight: 300 700; font-display: swap;
  src: url("/fonts/spline-sans.woff2") format("woff2"); }
@font-face { font-family: "Spline Sans Mono"; font-weight: 400; font-display: swap;
  src: url("/fonts/spline-sans-mono-400.woff2") format("woff2"); }
@font-face { font-family: "Spline Sans Mono"; font-weight: 600; font-display: swap;
  src: url("/fonts/spline-sans-mono-600.woff2") format("woff2"); }
body { margin: 0; background: var(--paper); color: var(--ink); font-family: "Spline Sans", system-ui, sans-serif; }
.frame { display: flex; flex-wrap: wrap; align-items: baseline; gap: 4px 20px; padding: 12px 24px;
  border-bottom: 1px solid var(--rule); font-size: 14px; }
.frame a { color: var(--ink-soft); }
.frame a.frame-home { color: var(--ink); font-size: 19px; font-weight: 600; text-decoration: none; }
.frame [aria-current] { font-weight: 600; }
#app > h1 { padding: 24px; margin: 0; font-size: 34px; font-weight: 600; }
.frame-note { padding: 24px; }
`;

/** The package's colours, set to ours. */
const CSS = `
.light-mode, .dark-mode {
  --scalar-font: "Spline Sans", system-ui, sans-serif;
  --scalar-font-code: "Spline Sans Mono", ui-monospace, monospace;
  --scalar-background-1: var(--paper);
  --scalar-background-2: var(--sheet);
  --scalar-background-3: color-mix(in oklab, var(--rule) 55%, var(--sheet));
  --scalar-background-accent: color-mix(in oklab, var(--verdigris) 14%, var(--sheet));
  --scalar-color-1: var(--ink);
  --scalar-color-2: var(--ink-soft);
  --scalar-color-3: var(--ink-soft);
  --scalar-color-accent: var(--verdigris);
  --scalar-link-color: var(--verdigris);
  --scalar-border-color: var(--rule);
  --scalar-button-1: var(--copper);
  --scalar-button-1-color: var(--sheet);
  --scalar-button-1-hover: var(--ink);
  --scalar-color-green: var(--verdigris);
  --scalar-color-red: var(--oxide);
  --scalar-color-yellow: var(--amber);
  --scalar-color-orange: var(--amber);
  --scalar-color-blue: var(--verdigris);
  --scalar-color-purple: var(--copper);
  --scalar-scrollbar-color: var(--rule);
  --scalar-scrollbar-color-active: var(--edge);
  --scalar-radius: 2px;
  --scalar-radius-lg: 2px;
  --scalar-radius-xl: 2px;
  --scalar-shadow-1: none;
  --scalar-shadow-2: 0 0 0 1px var(--rule);
}
.sidebar {
  --scalar-sidebar-background-1: var(--paper);
  --scalar-sidebar-color-1: var(--ink);
  --scalar-sidebar-color-2: var(--ink-soft);
  --scalar-sidebar-color-active: var(--ink);
  --scalar-sidebar-item-hover-background: var(--sheet);
  --scalar-sidebar-item-active-background: var(--sheet);
  --scalar-sidebar-border-color: var(--rule);
  --scalar-sidebar-search-background: var(--sheet);
  --scalar-sidebar-search-border-color: var(--edge);
}
`;
