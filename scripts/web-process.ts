import type { ChildProcess } from "node:child_process";
import { setTimeout as sleep } from "node:timers/promises";
import { WantedError } from "./run-script.ts";

/**
 * Waits until a web process answers.
 *
 * @throws WantedError when it ends instead; it has told why itself.
 */
export async function untilItAnswers(web: ChildProcess, { HOST, PORT }: { HOST: string; PORT: number }): Promise<void> {
  const host = HOST === "0.0.0.0" || HOST === "::" ? "127.0.0.1" : HOST;
  while (web.exitCode === null && web.signalCode === null) {
    const answer = await fetch(`http://${host}:${PORT}/icon.svg`).catch(() => null);
    if (answer?.ok) return;
    await sleep(100);
  }
  throw webProcessEnded(web);
}

/** What to tell when a web process ended and nobody asked it to. */
export function webProcessEnded(web: ChildProcess): WantedError {
  return new WantedError(`The web process ended by itself (${web.signalCode ?? `code ${web.exitCode}`}).`);
}
