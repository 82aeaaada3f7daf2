import type { Knex } from "knex";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { type FreshDatabase, freshDatabase, useTestDb } from "#tests/setup/test-db.ts";
import { isLockConflict, withTransaction } from "./db.server.ts";

describe("what columns become", () => {
  const db = useTestDb();

  async function one(expression: string, bindings: Knex.RawBinding[] = []) {
    const [[row]] = await db().raw(`SELECT ${expression} AS value`, bindings);
    return row.value;
  }

  it("makes a DECIMAL a number", async () => expect(await one("CAST(12.50 AS DECIMAL(6,2))")).toBe(12.5));
  it("keeps NULL", async () => expect(await one("CAST(NULL AS DECIMAL(6,2))")).toBeNull());
  it("makes a BIGINT a number where that is exact", async () =>
    expect(await one("9007199254740991")).toBe(Number.MAX_SAFE_INTEGER));
  it("makes a larger BIGINT a bigint", async () => expect(await one("9007199254740993")).toBe(9007199254740993n));
  it("makes a DATE its text", async () => expect(await one("CAST('2026-03-29' AS DATE)")).toBe("2026-03-29"));
  it("makes a DATETIME a moment in UTC", async () =>
    expect(await one("CAST('2026-03-29 02:30:00.125' AS DATETIME(3))")).toEqual(new Date("2026-03-29T02:30:00.125Z")));
  it("sends a moment in UTC", async () =>
    expect(await one("CAST(? AS CHAR)", [new Date("2026-03-29T02:30:00.125Z")])).toBe("2026-03-29 02:30:00.125"));
  it("makes TINYINT(1) a boolean", async () => {
    await db().raw("CREATE TEMPORARY TABLE flags (is_on TINYINT(1), small TINYINT UNSIGNED)");
    await db().raw("INSERT INTO flags VALUES (1, 1), (0, 0), (NULL, 7)");
    const [rows] = await db().raw("SELECT is_on, small FROM flags");
    expect(rows).toEqual([
      { is_on: true, small: 1 },
      { is_on: false, small: 0 },
      { is_on: null, small: 7 },
    ]);
  });
  it("refuses what does not fit, and never cuts it short", async () => {
    await db().raw("CREATE TEMPORARY TABLE names (name VARCHAR(3))");
    await expect(db().raw("INSERT INTO names VALUES ('walnut')")).rejects.toThrow(/Data too long/);
  });
});

describe("a transaction", () => {
  let fresh: FreshDatabase;
  beforeAll(async () => {
    fresh = await freshDatabase();
    await fresh.db.raw("CREATE TABLE purses (id INT PRIMARY KEY, coins INT NOT NULL)");
    await fresh.db("purses").insert([
      { id: 1, coins: 100 },
      { id: 2, coins: 100 },
    ]);
  });
  afterAll(() => fresh.drop());

  /** Moves a coin, taking the two rows in the order given; waits in between until both have their first. */
  function moveCoin(db: Knex, from: number, to: number, meet: () => Promise<void>) {
    return withTransaction(db, async (trx) => {
      await trx("purses").where({ id: from }).decrement("coins", 1);
      await meet();
      await trx("purses").where({ id: to }).increment("coins", 1);
    });
  }

  it("is run again when two people deadlock, and both are done exactly once", async () => {
    const other = fresh.open();
    let arrivals = 0;
    let bothHere = () => {};
    const both = new Promise<void>((resolve) => {
      bothHere = resolve;
    });
    // Each holds its first row until the other does too: a certain deadlock. The third arrival is the loser's second try.
    const meet = async () => {
      arrivals++;
      if (arrivals === 2) bothHere();
      await both;
    };
    await Promise.all([moveCoin(fresh.db, 1, 2, meet), moveCoin(other, 2, 1, meet)]);
    expect(arrivals).toBe(3);
    expect(await fresh.db("purses").orderBy("id").pluck("coins")).toEqual([100, 100]);
  });

  it("gives up after five tries", async () => {
    let tries = 0;
    const always = withTransaction(fresh.db, async () => {
      tries++;
      throw Object.assign(new Error("deadlock"), { errno: 1213 });
    });
    await expect(always).rejects.toThrow("deadlock");
    expect(tries).toBe(5);
  });

  it("does not try again after any other error, and leaves nothing behind", async () => {
    let tries = 0;
    const failing = withTransaction(fresh.db, async (trx) => {
      tries++;
      await trx("purses").insert({ id: 3, coins: 5 });
      throw new Error("no");
    });
    await expect(failing).rejects.toThrow("no");
    expect(tries).toBe(1);
    expect(await fresh.db("purses").where({ id: 3 })).toEqual([]);
  });

  it("inside another is a savepoint: the inner is undone, the outer goes on", async () => {
    await withTransaction(fresh.db, async (outer) => {
      await outer("purses").insert({ id: 4, coins: 1 });
      const inner = withTransaction(outer, async (trx) => {
        await trx("purses").insert({ id: 5, coins: 1 });
        throw new Error("changed my mind");
      });
      await expect(inner).rejects.toThrow("changed my mind");
    });
    expect(await fresh.db("purses").where("id", ">", 3).pluck("id")).toEqual([4]);
  });

  it("tells a lock conflict from other errors", () => {
    expect(isLockConflict({ errno: 1205 })).toBe(true);
    expect(isLockConflict({ errno: 1062 })).toBe(false);
    expect(isLockConflict(null)).toBe(false);
  });

  it("is READ COMMITTED", async () => {
    const [[row]] = await fresh.db.raw("SELECT @@tx_isolation AS level");
    expect(row.level).toBe("READ-COMMITTED");
  });
});
