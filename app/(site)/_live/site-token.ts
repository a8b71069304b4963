/** The short-lived token with which our own pages call the API; fetched when first needed, renewed before it ends. */

interface Token {
  readonly text: string;
  /** Unix time, ms. */
  readonly expiresAt: number;
}

/** Renewed this long before its end, ms. */
const MARGIN = 60_000;

let current: Promise<Token> | undefined;

export async function siteToken(): Promise<string> {
  const known = await current?.catch(() => undefined);
  if (known && known.expiresAt - MARGIN > Date.now()) return known.text;
  current = fetchToken();
  return (await current).text;
}

/** Forgets the token, after the service refused it. */
export function dropSiteToken(): void {
  current = undefined;
}

async function fetchToken(): Promise<Token> {
  const response = await fetch("/api/site/token", { method: "POST" });
  if (!response.ok) throw new Error(`No token: the service answered ${response.status}.`);
  const { token, expiresAt }: { token: string; expiresAt: string } = await response.json();
  return { text: token, expiresAt: Date.parse(expiresAt) };
}
