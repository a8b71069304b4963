const KINDS: readonly (readonly [RegExp, string])[] = [
  [/rhoform-typescript/i, "typescript-client"],
  [/rhoform-python/i, "python-client"],
  [/excel|libreoffice|google-?apps-?script|googledocs/i, "spreadsheet"],
  [/^(curl|wget|httpie|xh)\b/i, "command-line"],
  [/postman|insomnia|bruno/i, "request-builder"],
  [/python|aiohttp|httpx/i, "python"],
  [/node|undici|axios|deno|bun/i, "javascript"],
  [/java\/|okhttp|apache-httpclient|kotlin/i, "java"],
  [/\.net|powershell|restsharp/i, "dotnet"],
  [/go-http-client/i, "go"],
  [/^mozilla\//i, "browser"],
];

/** What kind of client calls, by its User-Agent: enough to know whom a revoked key would hurt, and no more. */
export function clientKind(userAgent: string | null): string {
  if (userAgent === null || userAgent === "") return "unnamed";
  return KINDS.find(([pattern]) => pattern.test(userAgent))?.[1] ?? "other";
}
