import { readFile } from "node:fs/promises";
import { join } from "node:path";
import { ApiReference } from "@scalar/nextjs-api-reference";
import type { NextRequest } from "next/server";
import { THEME_COOKIE, parseTheme } from "../../_ui/theme";
import { currentPerson } from "../../console/_shell/require-session";
import { FRAME_CSS, REFERENCE_SCRIPT, referenceHeader } from "./reference-frame";
import { referenceScript } from "./reference-script";

const TITLE = "API reference · Rhoform";

/** The interactive reference: the package's own page, with everything served from here. */
export async function GET(request: NextRequest): Promise<Response> {
  const theme = parseTheme(request.cookies.get(THEME_COOKIE)?.value);
  const nonce = request.headers.get("X-Nonce") ?? "";
  const { path } = await referenceScript();
  const reader = await currentPerson();
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
    hiddenClients: OTHER_CLIENTS,
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
    // By a function: a name may hold what a replacement text would take for a sign of its own.
    .replace(
      "<body>",
      () => `<body>${referenceHeader(theme, reader?.name)}<script>${REFERENCE_SCRIPT}</script>`,
    )
    .replace("Scalar.createApiReference(", "createWithKey(Scalar.createApiReference, ")
    .replaceAll("<script", `<script nonce="${nonce}"`);
  return new Response(html, {
    headers: { "Content-Type": "text/html; charset=utf-8", "Cache-Control": "no-store" },
  });
}

/** Forms of a call that the list does not offer: the docs have clients of our own, and curl for everything else. */
const OTHER_CLIENTS = {
  ...Object.fromEntries(
    "c clojure csharp dart fsharp go http java kotlin node objc ocaml php r ruby rust swift"
      .split(" ")
      .map((language) => [language, true as const]),
  ),
  js: ["axios", "jquery", "ofetch", "xhr"],
  python: ["aiohttp", "httpx_async", "httpx_sync", "python3"],
  shell: ["httpie", "wget"],
};

/** The package's colours, set to ours, and what is not ours to show: its own heading, its name, its list of clients. */
const CSS = `
.introduction-section h1, .introduction-section .badge, .scalar-reference-intro-clients, .darklight-reference,
.scalar-version-number { display: none !important; }
/* Room for the heading that is not shown. */
.introduction-section.section { padding-top: 0 !important; }
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
