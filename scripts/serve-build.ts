import { existsSync } from "node:fs";
import path from "node:path";
import { pathToFileURL } from "node:url";
import { createRequestHandler } from "@react-router/express";
import type { Env } from "#app/services/env.server.ts";
import { log } from "#app/services/log.server.ts";
import { WantedError } from "./run-script.ts";
import { createWebServer } from "./web-server.ts";

/**
 * Serves the production build in this process until it is asked to stop.
 *
 * @throws WantedError when there is no build, or the port is in use.
 */
export async function serveBuild({ HOST, PORT, TRUST_PROXY, NODE_ENV }: Env): Promise<void> {
  const build = path.resolve("build/server/index.js");
  if (!existsSync(build)) throw new WantedError("There is no build yet: npm run build");
  const handler = createRequestHandler({ build: await import(pathToFileURL(build).href), mode: NODE_ENV });
  const app = createWebServer({ handler, clientFolder: path.resolve("build/client"), trustProxy: TRUST_PROXY });

  const server = app.listen(PORT, HOST, () => log().info({ host: HOST, port: PORT }, "serving"));
  /** Answers what was asked, takes nothing new, then ends. */
  const stop = () => {
    server.close(() => process.exit(0));
    server.closeIdleConnections();
    setTimeout(() => server.closeAllConnections(), 5_000).unref();
  };
  process.once("SIGTERM", stop);
  process.once("SIGINT", stop);
  await new Promise<void>((_resolve, reject) => {
    server.once("error", (error: NodeJS.ErrnoException) =>
      reject(
        error.code === "EADDRINUSE" ? new WantedError(`Port ${PORT} is in use: choose another with PORT.`) : error,
      ),
    );
  });
}
