import { execFile } from "node:child_process";
import { randomBytes } from "node:crypto";
import { promisify } from "node:util";
import { createConnection } from "mysql2/promise";
import type { TestProject } from "vitest/node";
import { startTestMariadb } from "./mariadb.ts";

declare module "vitest" {
  interface ProvidedContext {
    /** A migrated database without rows. */
    databaseUrl: string;
  }
}

/** Before the first database test: a server, and on it a migrated database that every test starts from. */
export default async function setup(project: TestProject): Promise<() => Promise<void>> {
  const server = await startTestMariadb();
  const database = `rayfleck_test_${randomBytes(4).toString("hex")}`;
  const url = server.url(database);
  try {
    // A process of its own, as migrations are TypeScript and knex loads them by itself.
    await promisify(execFile)(process.execPath, ["--import", "tsx", "scripts/migrate.ts", url]);
  } catch (error) {
    await server.stop();
    throw error;
  }
  project.provide("databaseUrl", url);
  return async () => {
    const connection = await createConnection(url);
    await connection.query("DROP DATABASE ??", [database]);
    await connection.end();
    await server.stop();
  };
}
