import { describe, expect, test } from "vitest";
import { aBoard, aProject } from "#tests/factories/board.ts";
import { anActor } from "#tests/factories/shop.ts";
import { useTestDb } from "#tests/setup/test-db.ts";
import { stretchOf } from "./hold.schema.ts";
import { extendHold, letGo, placeHold, putBack, takeDown } from "./holds.server.ts";
import { getHold } from "./holds.sql.server.ts";

const now = new Date("2027-03-01T09:00:00Z");
const inDays = (days: number) => new Date(now.getTime() + days * 86_400_000);

describe("reserving", () => {
  const db = useTestDb();

  async function scene() {
    const ana = await anActor(db(), "maker", { name: "Ana" });
    const board = await aBoard(db(), ana);
    const project = await aProject(db(), ana, { name: "Hall bench" });
    const ask = (fromMm: number, toMm: number, by = ana, at = now) =>
      placeHold(
        db(),
        by,
        { boardId: board.id, projectId: project.id, fromMm, toMm, note: "", expiresAt: inDays(14) },
        at,
      );
    return { ana, board, project, ask };
  }

  test("a length is held; the same length again is refused, with who has it, until when, and what is free", async () => {
    const { ask, board } = await scene();
    expect(await ask(0, 1000)).toMatchObject({ ok: true });
    const second = await ask(900, 1500);
    expect(second).toMatchObject({ ok: false, why: "held", free: [{ fromMm: 1000, toMm: board.lengthMm }] });
    if (second.ok || second.why !== "held") throw new Error("not refused");
    expect(second.by).toMatchObject([
      { placedBy: "Ana", projectName: "Hall bench", fromMm: 0, toMm: 1000, expiresAt: inDays(14) },
    ]);
  });

  test("two holds may touch: one from each end, saw line between", async () => {
    const { ask, board } = await scene();
    expect((await ask(0, 1219.2)).ok).toBe(true);
    expect((await ask(1219.2, board.lengthMm)).ok).toBe(true);
  });

  // 10 1/64 in from one end and the rest, 85 63/64 in, from the other: binary arithmetic makes them overlap by a hair.
  test("what is left of a board can be reserved from its far end", async () => {
    const { ask, board } = await scene();
    const nearMm = 254.396875;
    const far = stretchOf({ part: "far", lengthMm: 2184.003125 }, board.lengthMm);
    expect(far.fromMm).toBeLessThan(nearMm);
    expect((await ask(0, nearMm)).ok).toBe(true);
    expect((await ask(far.fromMm, far.toMm)).ok).toBe(true);
    expect(await ask(nearMm - 0.000001, nearMm)).toMatchObject({ ok: false, why: "held" });
  });

  test("a refusal names other boards that would do as well, and none that is held", async () => {
    const { ana, ask, project } = await scene();
    const free = await aBoard(db(), ana);
    const held = await aBoard(db(), ana);
    await aBoard(db(), ana, { species: "black-walnut" });
    await placeHold(
      db(),
      ana,
      { boardId: held.id, projectId: project.id, fromMm: 0, toMm: 500, note: "", expiresAt: inDays(3) },
      now,
    );
    await ask(0, 2000);
    const refused = await ask(0, 2000);
    if (refused.ok || refused.why !== "held") throw new Error("not refused");
    expect(refused.others.map((board) => board.id)).toEqual([free.id]);
  });

  test("the database itself refuses an overlap, whatever the program does", async () => {
    const { ask, board } = await scene();
    const held = await ask(0, 1000);
    if (!held.ok) throw new Error("refused");
    await db().raw("SET foreign_key_checks = 0");
    const overlapping = db().raw(
      "INSERT INTO hold_spans VALUES ('xxxxxxxxxxxxx', ?, TIMESTAMPADD(SECOND, 999, '2000-01-01'), TIMESTAMPADD(SECOND, 1200, '2000-01-01'))",
      [board.id],
    );
    await expect(overlapping).rejects.toThrow(/hold_spans_one_claim/);
    await db().raw("SET foreign_key_checks = 1");
  });

  test("a hold past its day has lapsed: the length is free, and history says so", async () => {
    const { ask } = await scene();
    const old = await ask(0, 1000);
    if (!old.ok) throw new Error("refused");
    await db()("holds")
      .where({ id: old.holdId })
      .update({ expires_at: inDays(-1) });
    expect((await ask(0, 1000)).ok).toBe(true);
    expect(await db()("holds").where({ id: old.holdId }).first("state")).toMatchObject({ state: "lapsed" });
    expect(await db()("board_events").where({ kind: "lapsed" })).toHaveLength(1);
  });

  test("more than there is, nothing at all, and a stranger's board are refused", async () => {
    const { ask, board, project } = await scene();
    expect(await ask(0, board.lengthMm + 10)).toMatchObject({ ok: false, why: "length" });
    expect(await ask(500, 500)).toMatchObject({ ok: false, why: "length" });
    expect(await ask(-1, 500)).toMatchObject({ ok: false, why: "length" });
    expect(await ask(board.lengthMm + 0.01, board.lengthMm + 0.02)).toMatchObject({ ok: false, why: "length" });
    const stranger = await anActor(db(), "owner");
    const asked = { boardId: board.id, projectId: project.id, fromMm: 0, toMm: 100, note: "", expiresAt: inDays(1) };
    expect(await placeHold(db(), stranger, asked, now)).toEqual({ ok: false, why: "missing" });
  });

  test("makers change their own holds, owners any, a stranger none", async () => {
    const { ana, ask } = await scene();
    const held = await ask(0, 1000);
    if (!held.ok) throw new Error("refused");
    const ben = await anActor(db(), "maker", { shopId: ana.shopId });
    const owner = await anActor(db(), "owner", { shopId: ana.shopId });
    const stranger = await anActor(db(), "owner");
    expect(await letGo(db(), ben, held.holdId)).toEqual({ ok: false, why: "not yours" });
    expect(await letGo(db(), stranger, held.holdId)).toEqual({ ok: false, why: "missing" });
    expect(await extendHold(db(), ana, held.holdId, 14, now)).toEqual({ ok: true });
    expect((await getHold(db(), ana, held.holdId))?.expiresAt).toEqual(inDays(28));
    expect(await letGo(db(), owner, held.holdId)).toEqual({ ok: true });
    expect(await letGo(db(), owner, held.holdId)).toEqual({ ok: false, why: "ended" });
  });

  test("taken down, a board's holds go out with it; put back, they are held again for the usual time at least", async () => {
    const { ana, ask, board } = await scene();
    const held = await ask(0, 1000);
    if (!held.ok) throw new Error("refused");
    const helper = await anActor(db(), "helper", { shopId: ana.shopId });
    expect(await takeDown(db(), helper, board.id, now)).toEqual({ ok: true });
    expect(await takeDown(db(), helper, board.id, now)).toEqual({ ok: false, why: "state", state: "out" });
    expect((await getHold(db(), ana, held.holdId))?.state).toBe("out");
    expect(await ask(1200, 1500)).toMatchObject({ ok: false, why: "not racked" });
    expect(await putBack(db(), helper, board.id, 14, inDays(10))).toEqual({ ok: true });
    expect(await getHold(db(), ana, held.holdId)).toMatchObject({ state: "held", expiresAt: inDays(24) });
  });
});
