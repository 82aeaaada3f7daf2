import { knexConfig } from "#app/services/db.server.ts";
import { env } from "#app/services/env.server.ts";

/** For the knex command line, which runs it through tsx: `npm run migrate`. */
export default {
  ...knexConfig(env().DATABASE_URL, { verifyTls: env().DATABASE_TLS === "verify" }),
  migrations: { directory: "./db/migrations", extension: "ts", loadExtensions: [".ts"] },
  seeds: { directory: "./db/seeds", extension: "ts", loadExtensions: [".ts"] },
};
