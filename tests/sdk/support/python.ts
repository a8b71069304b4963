import { execFile } from "node:child_process";
import { join } from "node:path";

export interface Ran {
  readonly code: number;
  readonly out: string;
  readonly err: string;
}

/** Runs Debian's Python with the client at hand; the service it calls may live in this very process. */
export function python(
  args: readonly string[],
  variables: Readonly<Record<string, string>> = {},
  input = "",
): Promise<Ran> {
  return new Promise((resolve, reject) => {
    const child = execFile(
      "python3",
      [...args],
      {
        env: {
          ...process.env,
          PYTHONPATH: join(process.cwd(), "sdk/python"),
          PYTHONDONTWRITEBYTECODE: "1",
          PYTHONIOENCODING: "utf-8",
          ...variables,
        },
        timeout: 60_000,
      },
      (error, out, err) => {
        if (error && typeof error.code !== "number") reject(error);
        else resolve({ code: typeof error?.code === "number" ? error.code : 0, out, err });
      },
    );
    child.stdin?.end(input);
  });
}
