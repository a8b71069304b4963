import { mkdirSync, renameSync, statSync } from "node:fs";
import { dirname } from "node:path";
import pino, { type Logger } from "pino";

export type Log = Logger;

/** A log file is set aside when it has grown to this, bytes; one older file is kept. */
const LARGEST_FILE = 64 * 1024 * 1024;

/** Members that never reach a log, whoever passes them. */
const SECRET_MEMBERS = [
  "authorization",
  "headers.authorization",
  "headers.cookie",
  "cookie",
  "key",
  "secret",
  "token",
];

/** Structured logs: one JSON object a line, into a file, to `stdout`, or nowhere (`off`). */
export function openLog(target: string): Log {
  const options = { base: undefined, timestamp: pino.stdTimeFunctions.isoTime, redact: SECRET_MEMBERS };
  if (target === "off") return pino({ ...options, enabled: false });
  if (target === "stdout") return pino(options, pino.destination({ dest: 1, sync: true }));
  mkdirSync(dirname(target), { recursive: true });
  try {
    if (statSync(target).size > LARGEST_FILE) renameSync(target, `${target}.1`);
  } catch {
    // No file yet.
  }
  // Written at once: a line costs a few microseconds, and a crash loses none.
  return pino(options, pino.destination({ dest: target, sync: true, mkdir: true }));
}
