import { KEY_PLACE } from "../../_ui/docs-key";
import { NAVIGATION } from "../../_ui/site/navigation";
import { THEMES, THEME_COOKIE, THEME_LOOKS, type Theme } from "../../_ui/theme";

/**
 * The site's header and the page's heading, in markup: this page is served whole, without the application's script.
 * `reader` is the name of who is signed in.
 */
export function referenceHeader(theme: Theme, reader?: string): string {
  const links = NAVIGATION.map(({ href, label }) =>
    href === "/docs/api" ? `<span aria-current="page">${label}</span>` : `<a href="${href}">${label}</a>`,
  );
  const choices = THEMES.map(
    (option) => `<label title="${THEME_LOOKS[option].label}">
        <input type="radio" name="theme" value="${option}"${option === theme ? " checked" : ""}>
        <span class="frame-unseen">${THEME_LOOKS[option].label}</span>
        <svg viewBox="0 0 16 16" aria-hidden="true"><path d="${THEME_LOOKS[option].icon}"/></svg>
      </label>`,
  );
  return `
    <header class="frame">
      <a class="frame-home" href="/"><img src="/icon.svg" alt="" width="24" height="24">Rhoform</a>
      <nav aria-label="Site">${links.join("")}</nav>
      ${readerCorner(reader)}
      <fieldset class="frame-theme"><legend class="frame-unseen">Colours</legend>${choices.join("")}</fieldset>
    </header>
    <div class="frame-title">
      <h1>API reference</h1>
      <p>Every operation with its request, answers and refusals. “Test Request” sends a call to this service with
        the key that this tab keeps, never as whoever is signed in: give the tab <a href="/docs/start#key">your key</a>
        first. What it sends counts and stores as any call does. For generators and other tools there is the
        <a href="/api/v1/openapi.json">OpenAPI document</a>.</p>
    </div>
    <noscript><p class="frame-note">The operations are shown by a script; without scripts, read the OpenAPI
      document.</p></noscript>`;
}

/** Who is signed in, or the way to sign in. The menu of the other pages is a script of theirs. */
function readerCorner(reader: string | undefined): string {
  if (reader === undefined) return `<a href="/sign-in">Sign in</a>`;
  const name = reader.replace(/[&<>"]/g, (sign) => `&#${sign.charCodeAt(0)};`);
  return `<a class="frame-reader" href="/console/account" aria-label="Signed in as ${name}: account">${name}</a>`;
}

/**
 * Hands the key that this tab keeps to the reference (it is in no answer of the server), and changes the colours as the
 * switch of the other pages does.
 */
export const REFERENCE_SCRIPT = `
function createWithKey(create, place, configuration) {
  let key = null;
  try { key = sessionStorage.getItem("${KEY_PLACE}"); } catch { /* Storage may be forbidden. */ }
  if (key) configuration.authentication.securitySchemes = { key: { token: key } };
  return create(place, configuration);
}
const device = matchMedia("(prefers-color-scheme: dark)");
function colour() {
  const theme = document.documentElement.dataset.theme ?? "system";
  const dark = theme === "dark" || (theme === "system" && device.matches);
  document.body.classList.toggle("dark-mode", dark);
  document.body.classList.toggle("light-mode", !dark);
}
device.addEventListener("change", colour);
document.querySelector(".frame-theme").addEventListener("change", ({ target }) => {
  if (target.value === "system") delete document.documentElement.dataset.theme;
  else document.documentElement.dataset.theme = target.value;
  document.cookie = "${THEME_COOKIE}=" + target.value + "; path=/; max-age=31536000; samesite=lax";
  colour();
});`;

export const FRAME_CSS = `
@font-face { font-family: "Spline Sans"; font-weight: 300 700; font-display: swap;
  src: url("/fonts/spline-sans.woff2") format("woff2"); }
@font-face { font-family: "Spline Sans Mono"; font-weight: 400; font-display: swap;
  src: url("/fonts/spline-sans-mono-400.woff2") format("woff2"); }
@font-face { font-family: "Spline Sans Mono"; font-weight: 600; font-display: swap;
  src: url("/fonts/spline-sans-mono-600.woff2") format("woff2"); }
body { margin: 0; background: var(--paper); color: var(--ink); font-family: "Spline Sans", system-ui, sans-serif; }
.frame { display: flex; flex-wrap: wrap; align-items: center; gap: 4px 24px; padding: 12px 16px;
  border-bottom: 1px solid var(--rule); font-size: 14px; }
.frame a { color: var(--ink-soft); text-decoration: none; }
.frame a:hover { color: var(--ink); text-decoration: underline; }
.frame a.frame-home { display: flex; align-items: center; gap: 8px; color: var(--ink); font-size: 19px;
  font-weight: 600; }
.frame-reader { max-width: 18ch; overflow: hidden; text-overflow: ellipsis; white-space: nowrap; }
.frame nav { display: flex; flex-wrap: wrap; gap: 4px 20px; flex: 1 1 auto; }
.frame [aria-current] { font-weight: 600; }
.frame-theme { display: flex; margin: 0; padding: 0; border: 1px solid var(--edge); border-radius: 2px; }
.frame-theme label { display: grid; place-items: center; width: 32px; height: 32px; cursor: pointer;
  color: var(--ink-soft); }
.frame-theme label:has(:checked) { background: var(--ink); color: var(--paper); }
.frame-theme label:has(:focus-visible) { outline: 2px solid var(--verdigris); outline-offset: 2px; }
.frame-theme svg { width: 16px; height: 16px; fill: none; stroke: currentColor; stroke-width: 1.4;
  stroke-linecap: round; stroke-linejoin: round; }
.frame-unseen, .frame-theme input { position: absolute; width: 1px; height: 1px; margin: -1px; overflow: hidden;
  clip-path: inset(50%); white-space: nowrap; }
.frame-title { padding: 24px 16px; border-bottom: 1px solid var(--rule); }
.frame-title h1 { margin: 0; font-size: 34px; font-weight: 600; line-height: 1.15; }
.frame-title p { max-width: 68ch; margin: 8px 0 0; color: var(--ink-soft); line-height: 1.5; }
.frame-title a { color: var(--verdigris); text-decoration: underline; text-underline-offset: 0.2em; }
.frame-note { padding: 0 16px; }
@media (min-width: 768px) { .frame, .frame-title { padding-inline: 32px; } }
@media (max-width: 767px) { .frame { padding-block: 4px; gap: 0 12px; } .frame a.frame-reader { max-width: 9ch; }
  .frame a, .frame [aria-current] { display: flex; align-items: center; min-height: 44px; }
  .frame-theme label { height: 44px; }
  .frame nav { order: 1; flex-basis: 100%; } .frame nav + a { margin-inline-start: auto; } }
@media (prefers-reduced-motion: reduce) { *, ::before, ::after { animation: none !important;
  transition: none !important; scroll-behavior: auto !important; } }
`;
