import { type Logger, pino } from "pino";
import { env } from "./env.server.ts";

let root: Logger | undefined;

/** The log of this process: a JSON line an event on standard output. Never give it personal data, codes or cookies. */
export function log(): Logger {
  root ??= pino({ level: env().LOG_LEVEL, base: { pid: process.pid } });
  return root;
}
