import { fileURLToPath } from "node:url";
import knex from "knex";
import { type Connection, type ConnectionOptions, createConnection } from "mysql2/promise";
import { type DbOptions, knexConfig } from "#app/services/db.server.ts";

const folder = fileURLToPath(new URL("../db/migrations", import.meta.url));

/**
 * Brings a database up to date, and creates it when the server has none of this name. Several processes may call it at once: they take turns.
 * Runs under tsx, as migrations are TypeScript.
 *
 * @returns how many migrations were needed.
 */
export async function migrate(url: string, options: DbOptions = {}): Promise<number> {
  const config = knexConfig(url, { ...options, poolMax: 1 });
  const turn = await connect(config.connection as ConnectionOptions);
  const db = knex({ ...config, migrations: { directory: folder, loadExtensions: [".ts"] } });
  try {
    await turn.query("SELECT GET_LOCK('rayfleck_migrations', 300)");
    const [, done] = (await db.migrate.latest()) as [number, string[]];
    return done.length;
  } finally {
    await db.destroy();
    await turn.end();
  }
}

const unknownDatabase = 1049;

async function connect(options: ConnectionOptions): Promise<Connection> {
  try {
    return await createConnection(options);
  } catch (error) {
    if ((error as { errno?: number }).errno !== unknownDatabase) throw error;
  }
  const connection = await createConnection({ ...options, database: undefined });
  await connection.query("CREATE DATABASE IF NOT EXISTS ?? CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_ci", [
    options.database,
  ]);
  return connection;
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  const url = process.argv[2] ?? process.env.DATABASE_URL;
  if (!url) throw new Error("DATABASE_URL is not set");
  console.log(`${await migrate(url, { verifyTls: process.env.DATABASE_TLS === "verify" })} migrations run`);
}
