import cluster from "node:cluster";
import { env } from "#app/services/env.server.ts";
import { keepWorkers } from "./keep-workers.ts";
import { runScript } from "./run-script.ts";
import { serveBuild } from "./serve-build.ts";

/** Serves the production build, by as many processes as WEB_PROCESSES says; they share nothing but the services. */
await runScript(async () => {
  const { WEB_PROCESSES } = env();
  if (cluster.isPrimary && WEB_PROCESSES > 1) await keepWorkers(WEB_PROCESSES);
  else await serveBuild(env());
});
