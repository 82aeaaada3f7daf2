import { pathToFileURL } from "node:url";
import knex from "knex";
import { createConnection } from "mysql2/promise";
import { knexConfig } from "#app/services/db.server.ts";

/**
 * Brings a database up to date, and creates it when the server has none of this name.
 * Runs under tsx, as migrations are TypeScript.
 *
 * @returns how many migrations were needed.
 */
export async function migrate(url: string): Promise<number> {
  await createDatabase(url);
  const folder = new URL("../db/migrations", import.meta.url).pathname;
  const db = knex({ ...knexConfig(url, { poolMax: 1 }), migrations: { directory: folder, loadExtensions: [".ts"] } });
  try {
    const [, done] = (await db.migrate.latest()) as [number, string[]];
    return done.length;
  } finally {
    await db.destroy();
  }
}

async function createDatabase(url: string): Promise<void> {
  const address = new URL(url);
  const database = decodeURIComponent(address.pathname.slice(1));
  address.pathname = "/";
  const connection = await createConnection(address.href);
  try {
    await connection.query("CREATE DATABASE IF NOT EXISTS ?? CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_ci", [
      database,
    ]);
  } finally {
    await connection.end();
  }
}

if (import.meta.url === pathToFileURL(process.argv[1] ?? "").href) {
  const url = process.argv[2] ?? process.env.DATABASE_URL;
  if (!url) throw new Error("DATABASE_URL is not set");
  console.log(`${await migrate(url)} migrations run`);
}
