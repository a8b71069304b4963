/** Keeps a number and its unit on one line. */
const NO_BREAK = "\u00a0";

/** A count as people read it: 12,345. */
export function countText(value: number): string {
  return value.toLocaleString("en");
}

/** A latency in ms with three digits; a dash where there was no call. */
export function msText(value: number | null): string {
  if (value === null) return "–";
  return value >= 1000
    ? `${(value / 1000).toPrecision(3)}${NO_BREAK}s`
    : `${Number(value.toPrecision(3))}${NO_BREAK}ms`;
}

/** A share of a whole in whole per cent; 100 % means all of it. */
export function shareText(part: number, whole: number): string {
  if (whole === 0) return "–";
  const percent = (100 * part) / whole;
  const shown = percent > 0 && percent < 1 ? "< 1" : Math.min(Math.round(percent), part < whole ? 99 : 100);
  return `${shown} %`.replaceAll(" ", NO_BREAK);
}

const CLIENTS: Readonly<Record<string, string>> = {
  "typescript-client": "Rhoform's TypeScript client",
  "python-client": "Rhoform's Python client",
  spreadsheet: "spreadsheet",
  "command-line": "command line",
  "request-builder": "request builder",
  python: "Python",
  javascript: "JavaScript",
  java: "Java",
  dotnet: ".NET",
  go: "Go",
  browser: "browser",
  unnamed: "no name given",
  other: "other",
};

/** A kind of client in words. */
export function clientText(kind: string): string {
  return CLIENTS[kind] ?? kind;
}

/** What an operation is called beside its id: `computeResistance` reads "compute resistance". */
export function operationText(id: string): string {
  if (id === "none") return "unknown path";
  return id.replace(/[A-Z]/g, (letter) => ` ${letter.toLowerCase()}`);
}
