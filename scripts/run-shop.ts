import type { Env } from "#app/services/env.server.ts";
import { endProcess, spawnTied } from "./child-process.ts";
import { loadDemoIfEmpty } from "./demo.ts";
import { migrate } from "./migrate.ts";
import { explain } from "./run-script.ts";
import { startSurroundings } from "./surroundings.ts";
import { untilItAnswers, webProcessEnded } from "./web-process.ts";
import { welcome } from "./welcome.ts";

/** How one way of running the shop differs from another. */
export interface ShopRun {
  mode: "production" | "development";
  /** What has to be made before it can answer. */
  prepare?: (say: (line: string) => void, signal: AbortSignal) => Promise<void>;
  /** The arguments of node for the process that answers. */
  webProcess: (env: Env) => string[];
}

const say = (line: string) => console.log(line);

/** Starts everything the shop needs, says where it is, and runs until Ctrl-C or SIGTERM; then ends all that it started and this process. */
export async function runShop(run: ShopRun): Promise<never> {
  // The pinned S3 client is the last that runs on Node 20, and would say so at every start.
  process.env.AWS_SDK_JS_NODE_VERSION_SUPPORT_WARNING_DISABLED = "true";
  const asked = new AbortController();
  const askedToStop = new Promise<void>((resolve) => asked.signal.addEventListener("abort", () => resolve()));
  for (const name of ["SIGINT", "SIGTERM", "SIGHUP"]) process.on(name, () => asked.abort());

  const started: (() => Promise<void>)[] = [];
  let code = 0;
  try {
    await Promise.race([open(run, started, asked.signal), askedToStop]);
  } catch (error) {
    if (!asked.signal.aborted) {
      console.error(explain(error));
      code = 1;
    }
  }
  if (asked.signal.aborted) say("Stopping…");
  for (const stop of started.reverse()) await stop();
  process.exit(code);
}

/** Ends only by an error: the shop runs until somebody stops it. */
async function open(run: ShopRun, started: (() => Promise<void>)[], signal: AbortSignal): Promise<never> {
  const starting = startSurroundings({ ...process.env, NODE_ENV: run.mode });
  // Also when somebody stops us before they have come up.
  started.push(async () => (await starting.catch(() => null))?.stop());
  const { settings, env, ownsDatabase, inboxUrl } = await starting;
  signal.throwIfAborted();
  await run.prepare?.(say, signal);
  signal.throwIfAborted();
  await migrate(env.DATABASE_URL, { verifyTls: env.DATABASE_TLS === "verify" });
  // Nobody wants a demonstration in a database of their own.
  const people = ownsDatabase ? await loadDemoIfEmpty(env, say) : [];
  signal.throwIfAborted();

  // In a demonstration the log would bury what is printed below.
  const quiet = ownsDatabase && !process.env.LOG_LEVEL ? { LOG_LEVEL: "warn" } : {};
  const web = spawnTied(process.execPath, run.webProcess(env), { env: { ...settings, ...quiet }, show: true });
  started.push(() => endProcess(web));
  await untilItAnswers(web, env);
  say(welcome({ address: env.PUBLIC_URL, people, inboxUrl }));
  await new Promise((resolve) => web.once("exit", resolve));
  throw webProcessEnded(web);
}
