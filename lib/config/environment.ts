import { availableParallelism } from "node:os";
import { isAbsolute, join, resolve } from "node:path";
import { z } from "zod";
import { type MailConfig, mailConfig, mailVariables } from "./mail";
import { keptSecret } from "./secret";

export interface Config {
  readonly host: string;
  readonly port: number;
  /** Folder of the database, uploads, logs and the secret; absolute. */
  readonly dataFolder: string;
  readonly databasePath: string;
  /** Where browsers and clients reach this service: scheme, host and port, without a slash at the end. */
  readonly origin: string;
  /** Everything signed or derived here comes from this. */
  readonly secret: string;
  readonly demo: boolean;
  /** Addresses and networks whose `X-Forwarded-For` counts. */
  readonly trustedProxies: readonly string[];
  /** Where structured logs go: a file, `stdout` or `off`. */
  readonly log: string;
  /** Requests a minute that an address has without a key: the catalogue, the document, refused credentials. */
  readonly addressMinuteQuota: number;
  /** Threads that solve fields. */
  readonly workers: number;
  /** Longest time a field solution may take, s. */
  readonly fieldSeconds: number;
  /** Longest time that the items of one batch may be computed for, s. */
  readonly batchSeconds: number;
  readonly mail: MailConfig;
}

const flag = z.enum(["0", "1", "false", "true"]).transform((value) => value === "1" || value === "true");
const text = (schema: z.ZodString) =>
  z.preprocess((value) => (value === "" ? undefined : value), schema.optional());

const environment = z.object({
  HOST: text(z.string()),
  PORT: z.preprocess(
    (value) => (value === "" ? undefined : value),
    z.coerce.number().int().min(0).max(65535).default(3000),
  ),
  RHOFORM_DATA: text(z.string()),
  RHOFORM_ORIGIN: text(
    z
      .string()
      .regex(/^https?:\/\/[^/\s?#]+\/?$/, "must be a scheme and a host, such as https://rhoform.example"),
  ),
  RHOFORM_SECRET: text(z.string().min(16, "must have at least 16 characters")),
  RHOFORM_DEMO: z.preprocess((value) => (value === "" ? undefined : value), flag.default(true)),
  RHOFORM_TRUSTED_PROXIES: text(z.string()),
  RHOFORM_LOG: text(z.string()),
  RHOFORM_ADDRESS_QUOTA: z.preprocess(
    (value) => (value === "" ? undefined : value),
    z.coerce.number().int().min(1).max(1_000_000).default(600),
  ),
  RHOFORM_WORKERS: z.preprocess(
    (value) => (value === "" ? undefined : value),
    z.coerce
      .number()
      .int()
      .min(1)
      .max(64)
      .default(Math.max(1, Math.min(4, availableParallelism() - 1))),
  ),
  RHOFORM_FIELD_SECONDS: z.preprocess(
    (value) => (value === "" ? undefined : value),
    z.coerce.number().min(1).max(3600).default(120),
  ),
  RHOFORM_BATCH_SECONDS: z.preprocess(
    (value) => (value === "" ? undefined : value),
    z.coerce.number().min(0.001).max(3600).default(60),
  ),
  ...mailVariables,
});

export class ConfigError extends Error {
  override readonly name = "ConfigError";
}

/**
 * Reads and checks the settings. Throws ConfigError with one sentence a wrong variable.
 * A missing secret is made once and kept in the data folder.
 */
export function readConfig(variables: Readonly<Record<string, string | undefined>>): Config {
  const parsed = environment.safeParse(variables);
  if (!parsed.success) {
    const sentences = parsed.error.issues.map((issue) => `${issue.path.join(".")}: ${issue.message}`);
    throw new ConfigError(`The environment has wrong settings. ${sentences.join("; ")}`);
  }
  const settings = parsed.data;
  const mail = mailConfig(settings.RHOFORM_SMTP_URL, settings.RHOFORM_MAIL_FROM);
  if (typeof mail === "string") throw new ConfigError(`The environment has wrong settings. ${mail}`);
  const host = settings.HOST ?? "127.0.0.1";
  const data = settings.RHOFORM_DATA ?? ".data";
  const dataFolder = isAbsolute(data) ? data : resolve(/* turbopackIgnore: true */ process.cwd(), data);
  const log = settings.RHOFORM_LOG ?? join(dataFolder, "log", "rhoform.jsonl");
  return {
    host,
    port: settings.PORT,
    dataFolder,
    databasePath: join(dataFolder, "rhoform.sqlite"),
    origin: (settings.RHOFORM_ORIGIN ?? `http://${urlHost(host)}:${settings.PORT}`).replace(/\/$/, ""),
    secret: settings.RHOFORM_SECRET ?? keptSecret(dataFolder),
    demo: settings.RHOFORM_DEMO,
    trustedProxies: (settings.RHOFORM_TRUSTED_PROXIES ?? "").split(/[\s,]+/).filter((entry) => entry !== ""),
    log:
      log === "stdout" || log === "off" || isAbsolute(log) ? log : resolve(/* turbopackIgnore: true */ log),
    addressMinuteQuota: settings.RHOFORM_ADDRESS_QUOTA,
    workers: settings.RHOFORM_WORKERS,
    fieldSeconds: settings.RHOFORM_FIELD_SECONDS,
    batchSeconds: settings.RHOFORM_BATCH_SECONDS,
    mail,
  };
}

/** The address to call where the server listens on all of them. */
function urlHost(host: string): string {
  if (host === "0.0.0.0" || host === "::") return "127.0.0.1";
  return host.includes(":") ? `[${host}]` : host;
}
