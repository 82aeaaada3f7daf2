import { SettingsError } from "#app/services/env.server.ts";

/** Something that the person who started a script can put right: told in one line, without a stack. */
export class WantedError extends Error {
  override name = "WantedError";
}

/** Runs a script's work. What goes wrong is told in plain lines and ends the process with 1. */
export async function runScript(work: () => Promise<void>): Promise<void> {
  try {
    await work();
  } catch (error) {
    console.error(explain(error));
    process.exit(1);
  }
}

/** What to tell about an error: a line for those one can put right, everything for a bug. */
export function explain(error: unknown): string {
  if (error instanceof WantedError) return error.message;
  if (error instanceof SettingsError)
    return `Some settings are missing or wrong:\n${error.lines.map((line) => `  ${line}`).join("\n")}`;
  return error instanceof Error ? (error.stack ?? error.message) : String(error);
}
