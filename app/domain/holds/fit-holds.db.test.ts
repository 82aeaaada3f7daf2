import { expect, test } from "vitest";
import { correctBoard } from "#app/domain/boards/boards.server.ts";
import { aBoard, aProject } from "#tests/factories/board.ts";
import { anActor } from "#tests/factories/shop.ts";
import { useTestDb } from "#tests/setup/test-db.ts";
import { placeHold } from "./holds.server.ts";

const db = useTestDb();
const now = new Date();

/** A board of 2438.4 mm with holds on it. */
async function held(...stretches: [fromMm: number, toMm: number][]) {
  const ana = await anActor(db());
  const board = await aBoard(db(), ana);
  const project = await aProject(db(), ana, { name: "Hall bench" });
  for (const [fromMm, toMm] of stretches) {
    const hold = { boardId: board.id, projectId: project.id, fromMm, toMm, note: "" };
    const placed = await placeHold(db(), ana, { ...hold, expiresAt: new Date(now.getTime() + 86_400_000) }, now);
    if (!placed.ok) throw new Error("not held");
  }
  const correct = (lengthMm: number) => correctBoard(db(), ana, board.id, 1, { lengthMm });
  /** The holds' ends, and the ends of their claims in seconds, which stand for millimetres. */
  const ends = async () => {
    const rows = await db()("holds as h")
      .join("hold_spans as s", "s.hold_id", "h.id")
      .where("h.board_id", board.id)
      .orderBy("h.from_mm")
      .select("h.to_mm", db().raw("TIMESTAMPDIFF(MICROSECOND, '2000-01-01', s.ends) AS claim"));
    for (const { to_mm, claim } of rows) expect(Number(claim) / 1e6).toBe(to_mm);
    return rows.map((row: { to_mm: number }) => row.to_mm);
  };
  return { correct, ends, board };
}

test("a whole board held is held whole after its length is corrected, either way", async () => {
  for (const lengthMm of [2400, 2500]) {
    const { correct, ends } = await held([0, 2438.4]);
    expect(await correct(lengthMm)).toEqual({ ok: true });
    expect(await ends()).toEqual([lengthMm]);
  }
});

test("a hold that would reach past the end ends there; others stay", async () => {
  const { correct, ends } = await held([0, 600], [600, 2400]);
  expect(await correct(2000)).toEqual({ ok: true });
  expect(await ends()).toEqual([600, 2000]);
});

test("a board is not made too short for what is held of it", async () => {
  const { correct, ends, board } = await held([0, 600], [2000, 2438.4]);
  expect(await correct(2000)).toEqual({ ok: false, why: "too short", projects: ["Hall bench"] });
  expect(await ends()).toEqual([600, 2438.4]);
  expect(await db()("boards").where({ id: board.id }).first("length_mm", "version")).toEqual({
    length_mm: 2438.4,
    version: 1,
  });
});

test("a free board becomes any length", async () => {
  const { correct } = await held();
  expect(await correct(300)).toEqual({ ok: true });
});
