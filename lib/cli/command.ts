import { ConfigError } from "../config/environment";
import { Refusal } from "../service/refusal";
import { closeService, type Service } from "../service/service";

/** What a person typed wrongly; its message is all that is printed. */
export class UsageError extends Error {}

export interface CommandResult {
  readonly code: number;
  readonly stdout: string;
  readonly stderr: string;
}

/** Runs a shell command on a service of its own: what was asked for on stdout, or one message on stderr. */
export function runCommand(
  argv: string[],
  usage: string,
  open: () => Service,
  run: (service: Service, argv: string[]) => string,
): CommandResult {
  if (argv.length === 0 || argv.includes("--help")) {
    return { code: argv.length === 0 ? 2 : 0, stdout: "", stderr: usage };
  }
  let service: Service | undefined;
  try {
    service = open();
    return { code: 0, stdout: run(service, argv), stderr: "" };
  } catch (error) {
    return { code: 1, stdout: "", stderr: messageOf(error) };
  } finally {
    if (service) closeService(service);
  }
}

/** What a person did wrong, in one line or two; anything else is thrown on. */
function messageOf(error: unknown): string {
  if (error instanceof Refusal) {
    const details = (error.more.errors ?? []).map(({ detail }) => detail).join("; ");
    return details ? `${error.message} (${details})` : error.message;
  }
  if (error instanceof UsageError || error instanceof ConfigError) return error.message;
  const parsing =
    error instanceof TypeError && "code" in error && String(error.code).startsWith("ERR_PARSE_ARGS");
  if (parsing) return error.message;
  throw error;
}
