import { setTimeout as sleep } from "node:timers/promises";
import knex, { type Knex } from "knex";
import { castColumn } from "./db-columns.server.ts";
import { env } from "./env.server.ts";

export interface DbOptions {
  /** The most connections this process holds. */
  poolMax?: number;
  /** Insist on TLS with a certificate that this machine trusts. */
  verifyTls?: boolean;
}

/**
 * Opens a pool on a MariaDB. Connects on first use.
 *
 * Columns arrive as one expects: see castColumn. Moments go in and out as Date in UTC; DATE columns as "YYYY-MM-DD".
 */
export function createDb(url: string, options: DbOptions = {}): Knex {
  return knex(knexConfig(url, options));
}

/** What createDb opens, for the knex command line to add its folders to. */
export function knexConfig(url: string, { poolMax = 10, verifyTls = false }: DbOptions = {}): Knex.Config {
  return {
    client: "mysql2",
    connection: { ...connectionFromUrl(url), ssl: verifyTls ? { rejectUnauthorized: true } : undefined },
    pool: { min: 0, max: poolMax, afterCreate: prepareConnection },
    acquireConnectionTimeout: 15_000,
  };
}

let pool: Knex | undefined;

/** The pool of this process, opened on first use from the settings. */
export function appDb(): Knex {
  const { DATABASE_URL, DATABASE_POOL_MAX, DATABASE_TLS } = env();
  pool ??= createDb(DATABASE_URL, { poolMax: DATABASE_POOL_MAX, verifyTls: DATABASE_TLS === "verify" });
  return pool;
}

const attempts = 5;

/** MariaDB chose this transaction to break a deadlock, or it waited too long for a lock. Galera reports a lost certification as a deadlock too. */
const losingErrors = new Set([1213, 1205]);

/** Was this thrown because two transactions met? Trying again may well succeed. */
export function isLockConflict(error: unknown): boolean {
  return losingErrors.has((error as { errno?: number } | null)?.errno ?? 0);
}

/** Was this row refused because a unique key, named, has such a row already? */
export function isDuplicateKey(error: unknown, key: string): boolean {
  const { errno, message } = (error ?? {}) as { errno?: number; message?: string };
  return errno === 1062 && (message ?? "").includes(`'${key}'`);
}

/**
 * Runs work in one transaction, READ COMMITTED, and runs it again from the start when it lost to another: the one place that retries.
 * So work must have no effect outside the database. At READ COMMITTED a plain SELECT locks nothing and there are no gap locks:
 * whatever two people can meet at is read with `forUpdate()` on a row that exists, or decided by a unique key.
 *
 * Inside another transaction it is a savepoint and does not retry, as MariaDB has then rolled back the whole.
 *
 * @param db a pool, or a transaction to nest in.
 * @returns what work returned, after the commit.
 */
export async function withTransaction<T>(db: Knex, work: (trx: Knex.Transaction) => Promise<T>): Promise<T> {
  if (db.isTransaction) return db.transaction(work);
  for (let attempt = 1; ; attempt++) {
    try {
      return await db.transaction(work);
    } catch (error) {
      if (attempt === attempts || !isLockConflict(error)) throw error;
      // Those who met once would meet again if they all waited as long.
      await sleep(Math.random() * 20 * 2 ** attempt);
    }
  }
}

function connectionFromUrl(url: string): Knex.MySql2ConnectionConfig & { typeCast: typeof castColumn } {
  const address = new URL(url);
  return {
    host: address.hostname,
    port: Number(address.port || 3306),
    user: decodeURIComponent(address.username),
    password: decodeURIComponent(address.password),
    database: decodeURIComponent(address.pathname.slice(1)),
    charset: "utf8mb4",
    timezone: "Z",
    typeCast: castColumn,
  };
}

const sessionSettings = [
  "SET SESSION TRANSACTION ISOLATION LEVEL READ COMMITTED",
  // Strict: a value that does not fit is an error, never cut short.
  "SET SESSION time_zone = '+00:00', innodb_lock_wait_timeout = 10, sql_mode = 'STRICT_ALL_TABLES,NO_ZERO_DATE,NO_ZERO_IN_DATE,ERROR_FOR_DIVISION_BY_ZERO'",
];

interface RawConnection {
  query(sql: string, done: (error: Error | null) => void): void;
}

function prepareConnection(
  connection: RawConnection,
  done: (error: Error | null, connection: RawConnection) => void,
): void {
  const [isolation, rest] = sessionSettings as [string, string];
  connection.query(isolation, (error) => {
    if (error) return done(error, connection);
    connection.query(rest, (failed) => done(failed, connection));
  });
}
