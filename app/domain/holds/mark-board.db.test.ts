import { describe, expect, test } from "vitest";
import { aBoard, aProject } from "#tests/factories/board.ts";
import { anActor } from "#tests/factories/shop.ts";
import { useTestDb } from "#tests/setup/test-db.ts";
import { placeHold } from "./holds.server.ts";
import { markBoard } from "./mark-board.server.ts";

const now = new Date("2027-03-01T09:00:00Z");

describe("marking what became of a board", () => {
  const db = useTestDb();

  async function scene(held = false) {
    const maker = await anActor(db(), "maker");
    const board = await aBoard(db(), maker);
    const project = await aProject(db(), maker);
    const ask = {
      boardId: board.id,
      projectId: project.id,
      fromMm: 0,
      toMm: 500,
      note: "",
      expiresAt: new Date(now.getTime() + 1e9),
    };
    if (held) await placeHold(db(), maker, ask, now);
    return { maker, board };
  }
  const stateOf = async (id: string) => (await db()("boards").where({ id }).first("state")).state;

  test("used up, its holds are used with it, and history says so", async () => {
    const { maker, board } = await scene(true);
    expect(await markBoard(db(), maker, board.id, "used", now)).toEqual({ ok: true });
    expect(await stateOf(board.id)).toBe("used");
    expect(await db()("holds").where({ board_id: board.id }).pluck("state")).toEqual(["used"]);
    expect(await db()("hold_spans").where({ board_id: board.id })).toEqual([]);
    expect(await db()("board_events").where({ board_id: board.id, kind: "marked" })).toHaveLength(1);
  });

  test.each(["sold", "lost"] as const)("spoken for, it is not %s: somebody counts on it", async (to) => {
    const { maker, board } = await scene(true);
    expect(await markBoard(db(), maker, board.id, to, now)).toEqual({ ok: false, why: "held" });
    expect(await stateOf(board.id)).toBe("racked");
  });

  test("a hold whose time has passed holds nothing up: it lapses", async () => {
    const { maker, board } = await scene(true);
    const later = new Date(now.getTime() + 2e9);
    expect(await markBoard(db(), maker, board.id, "sold", later)).toEqual({ ok: true });
    expect(await db()("holds").where({ board_id: board.id }).pluck("state")).toEqual(["lapsed"]);
    expect(await db()("board_events").where({ board_id: board.id }).pluck("kind")).toContain("lapsed");
  });

  test("lost and found again, it is racked; twice over is refused", async () => {
    const { maker, board } = await scene();
    expect(await markBoard(db(), maker, board.id, "lost", now)).toEqual({ ok: true });
    expect(await markBoard(db(), maker, board.id, "sold", now)).toEqual({ ok: false, why: "state", state: "lost" });
    expect(await markBoard(db(), maker, board.id, "racked", now)).toEqual({ ok: true });
    expect(await markBoard(db(), maker, board.id, "racked", now)).toEqual({ ok: false, why: "state", state: "racked" });
  });

  test("a stranger's board is not there", async () => {
    const { board } = await scene();
    expect(await markBoard(db(), await anActor(db(), "owner"), board.id, "lost", now)).toEqual({
      ok: false,
      why: "missing",
    });
  });
});
