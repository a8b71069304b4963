import { execFile } from "node:child_process";
import { join } from "node:path";

export interface Ran {
  readonly code: number;
  readonly out: string;
  readonly err: string;
}

/** Runs a program to its end; the service it calls may live in this very process. */
export function execute(
  program: string,
  args: readonly string[],
  variables: Readonly<Record<string, string>> = {},
): Promise<Ran> {
  return new Promise((resolve, reject) => {
    const env = { ...process.env, ...variables };
    execFile(program, [...args], { env, timeout: 60_000 }, (error, out, err) => {
      if (error && typeof error.code !== "number") reject(error);
      else resolve({ code: typeof error?.code === "number" ? error.code : 0, out, err });
    });
  });
}

/** Runs Debian's Python with the client at hand. */
export function python(
  args: readonly string[],
  variables: Readonly<Record<string, string>> = {},
): Promise<Ran> {
  return execute("python3", args, {
    PYTHONPATH: join(process.cwd(), "sdk/python"),
    PYTHONDONTWRITEBYTECODE: "1",
    PYTHONIOENCODING: "utf-8",
    ...variables,
  });
}
