import { existsSync } from "node:fs";
import path from "node:path";
import { pathToFileURL } from "node:url";
import { createRequestHandler } from "@react-router/express";
import { appDb } from "#app/services/db.server.ts";
import { env } from "#app/services/env.server.ts";
import { log } from "#app/services/log.server.ts";
import { runScript, WantedError } from "./run-script.ts";
import { createWebServer } from "./web-server.ts";

/** Serves the production build: one web process. Run as many as one likes, on the same services, behind a proxy. */
await runScript(async () => {
  const { HOST, PORT, TRUST_PROXY, NODE_ENV } = env();
  const build = path.resolve("build/server/index.js");
  if (!existsSync(build)) throw new WantedError("There is no build yet: npm run build");
  const handler = createRequestHandler({ build: await import(pathToFileURL(build).href), mode: NODE_ENV });
  const app = createWebServer({ handler, clientFolder: path.resolve("build/client"), trustProxy: TRUST_PROXY });

  const server = app.listen(PORT, HOST, () => log().info({ host: HOST, port: PORT }, "serving"));
  await new Promise<void>((_resolve, reject) => {
    server.once("error", (error: NodeJS.ErrnoException) =>
      reject(
        error.code === "EADDRINUSE" ? new WantedError(`Port ${PORT} is in use: choose another with PORT.`) : error,
      ),
    );
    process.once("SIGTERM", stop);
    process.once("SIGINT", stop);
  });

  /** Answers what was asked, takes nothing new, then ends. */
  function stop() {
    server.close(async () => {
      await appDb().destroy();
      process.exit(0);
    });
    server.closeIdleConnections();
    setTimeout(() => server.closeAllConnections(), 5_000).unref();
  }
});
