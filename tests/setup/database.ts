import { execFile } from "node:child_process";
import { randomBytes } from "node:crypto";
import { promisify } from "node:util";
import { createConnection } from "mysql2/promise";
import type { TestProject } from "vitest/node";
import { explain } from "#scripts/run-script.ts";
import { startTestMariadb } from "./mariadb.ts";

declare module "vitest" {
  interface ProvidedContext {
    /** A migrated database without rows. */
    databaseUrl: string;
  }
}

/** Before the first database test: a server, and on it a migrated database that every test starts from. */
export default async function setup(project: TestProject): Promise<() => Promise<void>> {
  try {
    const server = await startTestMariadb();
    const database = `rayfleck_test_${randomBytes(4).toString("hex")}`;
    const url = server.url(database);
    project.provide("databaseUrl", url);
    await migrateApart(url).catch(async (error) => {
      await server.stop();
      throw error;
    });
    return async () => {
      await drop(url, database);
      await server.stop();
    };
  } catch (error) {
    // Vitest would bury the one line that matters under its own stack.
    console.error(explain(error));
    process.exit(1);
  }
}

/** In a process of its own, as migrations are TypeScript and knex loads them by itself. */
async function migrateApart(url: string): Promise<void> {
  await promisify(execFile)(process.execPath, ["--import", "tsx", "scripts/migrate.ts", url]);
}

async function drop(url: string, database: string): Promise<void> {
  const connection = await createConnection(url);
  await connection.query("DROP DATABASE ??", [database]);
  await connection.end();
}
