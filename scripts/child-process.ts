import { type ChildProcess, spawn } from "node:child_process";
import { existsSync } from "node:fs";
import { setTimeout as sleep } from "node:timers/promises";

/** From util-linux: asks the kernel to end a program when the one that started it is gone. */
const setpriv = "/usr/bin/setpriv";

/**
 * Starts a program in a process group of its own, so that Ctrl-C reaches only us and we end things in order,
 * and tied to us, so that it does not stay behind when we are killed.
 */
export function spawnTied(
  program: string,
  args: string[],
  options: { env?: NodeJS.ProcessEnv; show?: boolean } = {},
): ChildProcess {
  const [command, all] = existsSync(setpriv) ? [setpriv, ["--pdeathsig", "TERM", program, ...args]] : [program, args];
  return spawn(command, all, {
    env: options.env ?? process.env,
    detached: true,
    stdio: options.show ? "inherit" : "ignore",
  });
}

/** Asks a program to end, and makes it end when it has not after a while. */
export async function endProcess(child: ChildProcess, patienceMs = 20_000): Promise<void> {
  if (child.exitCode !== null || child.signalCode !== null || child.pid === undefined) return;
  const ended = new Promise<void>((resolve) => child.once("exit", () => resolve()));
  child.kill("SIGTERM");
  const inTime = await Promise.race([ended.then(() => true), sleep(patienceMs, false, { ref: false })]);
  if (!inTime) child.kill("SIGKILL");
  await ended;
}
