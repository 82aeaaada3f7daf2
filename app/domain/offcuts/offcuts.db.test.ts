import { describe, expect, test } from "vitest";
import { fieldFromPith } from "#app/core/rings/stations.ts";
import { getBoard } from "#app/domain/boards/boards.sql.server.ts";
import { listDefects, noteDefect } from "#app/domain/boards/defects.sql.server.ts";
import { ringColumns } from "#app/domain/rings/rings.server.ts";
import { aBoard } from "#tests/factories/board.ts";
import { anActor } from "#tests/factories/shop.ts";
import { useTestDb } from "#tests/setup/test-db.ts";
import { listOffcuts, makeOffcut } from "./offcuts.server.ts";

const now = new Date("2027-03-01T09:00:00Z");
const limits = { flatBelowDeg: 30, quarteredAboveDeg: 60 };
const offcut = { alongMm: 1500, acrossMm: 100, lengthMm: 600, widthMm: 100 };

describe("offcuts that come back", () => {
  const db = useTestDb();

  async function scene(state = "out") {
    const maker = await anActor(db(), "maker");
    const field = fieldFromPith({ widthMm: 200, thicknessMm: 25.4 }, { xMm: -60, yMm: 150 }, 9);
    const board = await aBoard(db(), maker, {
      state,
      width_mm: 200,
      length_mm: 2400,
      cost_minor: 4800,
      moisture_pct: 7.9,
      log_name: "HH-3",
      ...ringColumns(field, limits),
    });
    await db()("shops").where({ id: maker.shopId }).update({ tag_next: 900 });
    return { maker, board, make: (piece = offcut, by = maker) => makeOffcut(db(), by, board.id, piece, limits, now) };
  }

  test("a piece gets its own tag and inherits what is its own: log, rings of its strip, moisture, and its share of the cost", async () => {
    const { maker, board, make } = await scene();
    const made = await make();
    if (!made.ok) throw new Error(made.why);
    expect(made.tag).toBe("WO-0900");
    const piece = await getBoard(db(), maker, made.boardId);
    // 600 x 100 of 2400 x 200 is an eighth.
    expect(piece).toMatchObject({
      species: "white-oak",
      lengthMm: 600,
      widthMm: 100,
      logName: "HH-3",
      moisturePct: 7.9,
      costMinor: 600,
      parent: { id: board.id },
    });
    expect(piece?.rings?.pith?.xMm).toBeCloseTo(-160, 3);
    expect(piece?.ringMeanDeg).toBeGreaterThan((await getBoard(db(), maker, board.id))?.ringMeanDeg ?? 90);
  });

  test("only the defects on it go with it, measured from its own corner", async () => {
    const { maker, board, make } = await scene();
    const knot = { kind: "knot" as const, face: "both" as const, lengthMm: 40, widthMm: 30, note: "" };
    await noteDefect(db(), maker, board.id, { ...knot, alongMm: 1600, acrossMm: 120 });
    await noteDefect(db(), maker, board.id, { ...knot, alongMm: 200, acrossMm: 120 });
    const made = await make();
    if (!made.ok) throw new Error(made.why);
    expect(await listDefects(db(), maker, made.boardId)).toMatchObject([{ kind: "knot", alongMm: 100, acrossMm: 20 }]);
  });

  test("the same place does not come back twice, and nothing from beyond the board", async () => {
    const { maker, board, make } = await scene();
    await make();
    expect(await make({ ...offcut, alongMm: 1400 })).toMatchObject({ ok: false, why: "place", field: "alongMm" });
    expect(await make({ ...offcut, alongMm: 2000 })).toMatchObject({ ok: false, why: "place", field: "lengthMm" });
    expect(await make({ ...offcut, acrossMm: 150 })).toMatchObject({ ok: false, why: "place", field: "widthMm" });
    expect((await make({ ...offcut, acrossMm: 0 })).ok).toBe(true);
    expect(await listOffcuts(db(), maker, board.id)).toHaveLength(2);
  });

  test("a board still on the rack has no offcuts, and a stranger's is not there", async () => {
    expect(await (await scene("racked")).make()).toEqual({ ok: false, why: "state" });
    const { make } = await scene();
    expect(await make(offcut, await anActor(db(), "owner"))).toEqual({ ok: false, why: "missing" });
  });
});
