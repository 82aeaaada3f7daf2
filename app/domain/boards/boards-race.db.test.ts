import { setTimeout as sleep } from "node:timers/promises";
import type { Knex } from "knex";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { letGo, placeHold, takeDown } from "#app/domain/holds/holds.server.ts";
import type { Actor } from "#app/domain/shop/actor.ts";
import { newId } from "#app/services/ids.server.ts";
import { aBoard, aProject } from "#tests/factories/board.ts";
import { anActor } from "#tests/factories/shop.ts";
import { type FreshDatabase, freshDatabase } from "#tests/setup/test-db.ts";
import { correctBoard, deleteBoard, moveBoard } from "./boards.server.ts";

let fresh: FreshDatabase;
/** As another process would have. */
let other: Knex;
let ana: Actor;
let ben: Actor;
let project: { id: string };

beforeAll(async () => {
  fresh = await freshDatabase();
  other = fresh.open();
  ana = await anActor(fresh.db, "owner", { name: "Ana" });
  ben = await anActor(fresh.db, "owner", { shopId: ana.shopId, name: "Ben" });
  project = await aProject(fresh.db, ana);
});
afterAll(() => fresh.drop());

const kindsOf = async (boardId: string): Promise<string[]> =>
  fresh.db("board_events").where({ board_id: boardId }).orderBy(["at", "id"]).pluck("kind");

const reserve = (db: Knex, by: Actor, boardId: string, fromMm = 0, toMm = 500) =>
  placeHold(
    db,
    by,
    { boardId, projectId: project.id, fromMm, toMm, note: "", expiresAt: new Date(Date.now() + 86_400_000) },
    new Date(),
  );

async function anArm(): Promise<string> {
  const [bay, arm] = [newId(), newId()];
  await fresh.db("bays").insert({ id: bay, shop_id: ana.shopId, name: bay });
  await fresh.db("arms").insert({ id: arm, shop_id: ana.shopId, bay_id: bay, level: 1 });
  return arm;
}

describe("two people with the same version of a board", () => {
  test("one correction wins, the other is told who and when, and one line of history is written", async () => {
    for (let round = 0; round < 10; round++) {
      const board = await aBoard(fresh.db, ana);
      const [first, second] = await Promise.all([
        correctBoard(fresh.db, ana, board.id, 1, { notes: "wind at the near end" }),
        correctBoard(other, ben, board.id, 1, { grade: "FAS" }),
      ]);
      const [lost, winner] = first.ok ? [second, "Ana"] : [first, "Ben"];
      expect([first.ok, second.ok].filter(Boolean)).toHaveLength(1);
      expect(lost).toEqual({ ok: false, why: "changed", byName: winner, at: expect.any(Date) });
      const row = await fresh.db("boards").where({ id: board.id }).first("notes", "grade", "version");
      expect(row).toEqual(
        winner === "Ana"
          ? { notes: "wind at the near end", grade: "", version: 2 }
          : { notes: "", grade: "FAS", version: 2 },
      );
      expect(await kindsOf(board.id)).toEqual(["corrected"]);
    }
  });

  test("a correction made from a version that never was, or is none, is refused", async () => {
    const board = await aBoard(fresh.db, ana);
    for (const version of [0, 2, Number.NaN, -1])
      expect(await correctBoard(fresh.db, ana, board.id, version, { notes: "x" })).toMatchObject({ why: "changed" });
    expect(await kindsOf(board.id)).toEqual([]);
  });
});

describe("moving while somebody deletes", () => {
  test("what is deleted stays deleted, and nothing is written after that", async () => {
    for (let round = 0; round < 5; round++) {
      const board = await aBoard(fresh.db, ana);
      const arm = await anArm();
      const answers = await Promise.all([
        ...Array.from({ length: 4 }, () => moveBoard(fresh.db, ana, board.id, arm)),
        deleteBoard(other, ben, board.id),
        ...Array.from({ length: 4 }, () => moveBoard(other, ben, board.id, arm)),
        deleteBoard(fresh.db, ana, board.id),
      ]);
      const row = await fresh.db("boards").where({ id: board.id }).first("deleted_at", "arm_id");
      expect(row).toEqual({ deleted_at: expect.any(Date), arm_id: null });
      const kinds = await kindsOf(board.id);
      expect(kinds.filter((kind) => kind === "deleted")).toHaveLength(1);
      expect(kinds).toHaveLength(answers.filter(({ ok }) => ok).length);
      for (const answer of answers) if (!answer.ok) expect(answer).toEqual({ ok: false, why: "missing" });
    }
  });
});

describe("reserving while somebody", () => {
  test("deletes: either it is reserved and stays, or it is gone and was not reserved", async () => {
    for (let round = 0; round < 8; round++) {
      const board = await aBoard(fresh.db, ana);
      const [held, deleted] = await Promise.all([reserve(fresh.db, ana, board.id), deleteBoard(other, ben, board.id)]);
      expect(held.ok).toBe(!deleted.ok);
      expect(held.ok ? deleted : held).toMatchObject({ ok: false, why: held.ok ? "held" : "missing" });
    }
  });

  test("takes it down: either it goes out with the hold, or the hold is refused", async () => {
    for (let round = 0; round < 8; round++) {
      const board = await aBoard(fresh.db, ana);
      const [held, down] = await Promise.all([
        reserve(fresh.db, ana, board.id),
        takeDown(other, ben, board.id, new Date()),
      ]);
      expect(down).toEqual({ ok: true });
      expect(await fresh.db("holds").where({ board_id: board.id }).pluck("state")).toEqual(held.ok ? ["out"] : []);
    }
  });

  test("reserves what has lapsed: it lapses once", async () => {
    const board = await aBoard(fresh.db, ana);
    const old = await reserve(fresh.db, ana, board.id);
    if (!old.ok) throw new Error("refused");
    await fresh
      .db("holds")
      .where({ id: old.holdId })
      .update({ expires_at: new Date(0) });
    const answers = await Promise.all([fresh.db, other, fresh.db, other].map((db) => reserve(db, ana, board.id)));
    expect(answers.filter(({ ok }) => ok)).toHaveLength(1);
    expect((await kindsOf(board.id)).sort()).toEqual(["lapsed", "reserved", "reserved"]);
  });

  test("lets go of it: letting go twice lets go once", async () => {
    const board = await aBoard(fresh.db, ana);
    const held = await reserve(fresh.db, ana, board.id);
    if (!held.ok) throw new Error("refused");
    const answers = await Promise.all([letGo(fresh.db, ana, held.holdId), letGo(other, ben, held.holdId)]);
    expect(answers.map(({ ok }) => ok).sort()).toEqual([false, true]);
    expect((await kindsOf(board.id)).filter((kind) => kind === "let go")).toHaveLength(1);
  });
});

describe("a deadlock", () => {
  test("is tried again, and writes one hold and one line of history", async () => {
    const board = await aBoard(fresh.db, ana);
    const busy = await aBoard(fresh.db, ana);
    const conflicts: number[] = [];
    fresh.db.on("query-error", (error: { errno?: number }) => conflicts.push(error.errno ?? 0));
    // Somebody has the project and wants the board, which the hold has; the hold wants the project. They have written more, so the hold gives way.
    const heavy = await other.transaction();
    await heavy("projects").where({ id: project.id }).update({ notes: "busy" });
    for (let i = 0; i < 40; i++)
      await heavy("boards")
        .where({ id: busy.id })
        .update({ notes: `${i}` });
    const held = reserve(fresh.db, ana, board.id);
    await holdWaits();
    await heavy("boards").where({ id: board.id }).update({ grade: "FAS" });
    await heavy.commit();
    expect(await held).toMatchObject({ ok: true });
    expect(conflicts).toEqual([1213]);
    expect(await fresh.db("holds").where({ board_id: board.id })).toHaveLength(1);
    expect(await fresh.db("hold_spans").where({ board_id: board.id })).toHaveLength(1);
    expect(await kindsOf(board.id)).toEqual(["reserved"]);
  });

  /** Waits until the hold waits for a lock. The table shows what was a moment ago, and no news to whom asks again within a tenth of a second. */
  async function holdWaits(): Promise<void> {
    for (let i = 0; i < 30; i++) {
      await sleep(150);
      const [rows] = await other.raw(
        "SELECT 1 FROM information_schema.innodb_trx WHERE trx_state = 'LOCK WAIT' AND trx_query LIKE '%into `holds`%'",
      );
      if (rows.length > 0) return;
    }
    throw new Error("nobody waits");
  }
});
