import cluster from "node:cluster";
import { log } from "#app/services/log.server.ts";

/** One that ends sooner than this has not come up at all, and would not the next time. */
const comesUpWithinMs = 10_000;

/** Keeps so many copies of this script running on one port, until asked to stop. A copy that breaks is replaced. */
export async function keepWorkers(count: number): Promise<never> {
  let stopping = false;
  const stop = () => {
    stopping = true;
    for (const worker of Object.values(cluster.workers ?? {})) worker?.process.kill("SIGTERM");
  };
  process.once("SIGTERM", stop);
  process.once("SIGINT", stop);

  const startOne = () => {
    const began = Date.now();
    cluster.fork().once("exit", (code, signal) => {
      if (stopping) return endWhenLast();
      if (Date.now() - began < comesUpWithinMs) process.exit(1);
      log().error({ code, signal }, "a web process ended by itself and is replaced");
      startOne();
    });
  };
  const endWhenLast = () => {
    if (Object.keys(cluster.workers ?? {}).length === 0) process.exit(0);
  };
  for (let started = 0; started < count; started++) startOne();
  return new Promise<never>(() => {});
}
