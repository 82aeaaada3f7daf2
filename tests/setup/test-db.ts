import { randomBytes } from "node:crypto";
import type { Knex } from "knex";
import { afterAll, afterEach, beforeAll, beforeEach, inject } from "vitest";
import { createDb } from "#app/services/db.server.ts";
import { copySchema } from "./copy-schema.ts";

/**
 * For most database tests: each runs in a transaction that is rolled back, so that none sees another's rows.
 * A transaction inside it becomes a savepoint. Call it once at the top of a file or describe.
 *
 * @returns gives the transaction of the running test.
 */
export function useTestDb(): () => Knex.Transaction {
  let pool: Knex;
  let transaction: Knex.Transaction;
  beforeAll(() => {
    pool = createDb(inject("databaseUrl"), { poolMax: 2 });
  });
  beforeEach(async () => {
    transaction = await pool.transaction();
  });
  afterEach(async () => {
    await transaction.rollback();
  });
  afterAll(async () => {
    await pool.destroy();
  });
  return () => transaction;
}

export interface FreshDatabase {
  url: string;
  db: Knex;
  /** One more pool on it, as another process would have. */
  open(poolMax?: number): Knex;
  /** Closes every pool and drops the database. */
  drop(): Promise<void>;
}

/** For tests where people meet, which need several connections and commits: an empty, migrated database of its own. */
export async function freshDatabase(): Promise<FreshDatabase> {
  const template = inject("databaseUrl");
  const address = new URL(template);
  const name = `${address.pathname.slice(1)}_${randomBytes(4).toString("hex")}`;
  const copying = createDb(template, { poolMax: 1 });
  try {
    await copySchema(copying, address.pathname.slice(1), name);
  } finally {
    await copying.destroy();
  }
  address.pathname = name;
  const pools: Knex[] = [];
  const open = (poolMax = 10) => {
    const pool = createDb(address.href, { poolMax });
    pools.push(pool);
    return pool;
  };
  const db = open();
  return {
    url: address.href,
    db,
    open,
    async drop() {
      await db.raw("DROP DATABASE ??", [name]);
      await Promise.all(pools.map((pool) => pool.destroy()));
    },
  };
}
