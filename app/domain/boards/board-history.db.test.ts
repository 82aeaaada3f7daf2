import type { Knex } from "knex";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { fieldFromAngle } from "#app/core/rings/field-from-angle.ts";
import { saveTally } from "#app/domain/deliveries/tally.server.ts";
import { extendHold, letGo, placeHold, putBack, takeDown } from "#app/domain/holds/holds.server.ts";
import { markBoard } from "#app/domain/holds/mark-board.server.ts";
import { keepMoistureReading } from "#app/domain/moisture/moisture.sql.server.ts";
import { makeOffcut } from "#app/domain/offcuts/offcuts.server.ts";
import { confirmPhoto, removePhoto } from "#app/domain/photos/photos.server.ts";
import { keepReading } from "#app/domain/rings/rings.server.ts";
import { useTwoShops } from "#tests/factories/two-shops.ts";
import type { BoardEventKind } from "./board-history.ts";
import { correctBoard, deleteBoard, moveBoard } from "./boards.server.ts";
import { noteDefect, removeDefect } from "./defects.sql.server.ts";

const scene = useTwoShops();
const now = new Date();
const limits = { flatBelowDeg: 30, quarteredAboveDeg: 60 };

const versionOf = async (db: Knex, boardId: string): Promise<number> =>
  (await db("boards").where({ id: boardId }).first("version")).version;

const far = () => ({
  boardId: scene.shop.boardId,
  projectId: scene.shop.projectId,
  fromMm: 2000,
  toMm: 2400,
  note: "",
  expiresAt: new Date(now.getTime() + 86_400_000),
});

/** A change that writes each kind of line, and the lines that it writes where it is more than that one. Nobody marks a hold used by itself. */
const changes: Record<
  Exclude<BoardEventKind, "used">,
  { run: (db: Knex) => Promise<unknown>; writes?: BoardEventKind[] }
> = {
  received: {
    run: (db) => {
      const line = { count: 1, quarters: 4, species: "white-oak", lengthMm: 2438.4, widthMm: 203.2 };
      return saveTally(db, scene.shop.people.maker, scene.shop.deliveryId, [line as never], now);
    },
  },
  corrected: {
    run: async (db) => {
      const { boardId, people } = scene.shop;
      return correctBoard(db, people.maker, boardId, await versionOf(db, boardId), { notes: "wind" });
    },
  },
  moved: { run: (db) => moveBoard(db, scene.shop.people.helper, scene.shop.spareBoardId, scene.shop.armId) },
  photographed: {
    run: (db) => confirmPhoto(db, scene.storage(), scene.shop.people.helper, scene.shop.waitingPhotoId),
  },
  "photo removed": {
    run: (db) => removePhoto(db, scene.storage(), scene.shop.people.maker, scene.shop.boardId, scene.shop.photoId),
  },
  "rings read": {
    run: (db) => {
      const field = fieldFromAngle({ widthMm: 203.2, thicknessMm: 25.4 }, 70, "left");
      const how = { source: "angle", methodVersion: "test", photoId: null, inputs: {}, confidence: 0.5 } as const;
      return keepReading(
        db,
        scene.shop.people.helper,
        scene.shop.boardId,
        { boardEnd: "far", ...how, field },
        limits,
        now,
      );
    },
  },
  metered: {
    run: (db) => {
      const reading = { meterPct: 9, moisturePct: 9, meter: "pin", woodTemperatureC: null, place: "" } as const;
      return keepMoistureReading(db, scene.shop.people.helper, scene.shop.boardId, reading, now);
    },
  },
  "defect noted": {
    run: (db) => {
      const place = { alongMm: 10, acrossMm: 10, lengthMm: 10, widthMm: 10 };
      return noteDefect(db, scene.shop.people.maker, scene.shop.boardId, {
        kind: "check",
        face: "both",
        note: "",
        ...place,
      });
    },
  },
  "defect removed": {
    run: (db) => removeDefect(db, scene.shop.people.maker, scene.shop.boardId, scene.shop.defectId),
  },
  reserved: { run: (db) => placeHold(db, scene.shop.people.maker, far(), now) },
  "hold extended": { run: (db) => extendHold(db, scene.shop.people.maker, scene.shop.holdId, 7, now) },
  "let go": { run: (db) => letGo(db, scene.shop.people.maker, scene.shop.holdId) },
  lapsed: {
    run: (db) => placeHold(db, scene.shop.people.maker, { ...far(), expiresAt: inTwoDays }, afterExpiry),
    writes: ["lapsed", "reserved"],
  },
  "taken down": { run: (db) => takeDown(db, scene.shop.people.helper, scene.shop.boardId, now) },
  "put back": { run: (db) => putBack(db, scene.shop.people.helper, scene.shop.benchBoardId, 14, now) },
  marked: { run: (db) => markBoard(db, scene.shop.people.maker, scene.shop.spareBoardId, "lost", now) },
  deleted: { run: (db) => deleteBoard(db, scene.shop.people.owner, scene.shop.spareBoardId) },
  "offcut made": {
    run: (db) => {
      const offcut = { alongMm: 0, acrossMm: 0, lengthMm: 500, widthMm: 100 };
      return makeOffcut(db, scene.shop.people.maker, scene.shop.benchBoardId, offcut, limits, now);
    },
    writes: ["received", "offcut made"],
  },
};
const afterExpiry = new Date(now.getTime() + 90_000_000);
const inTwoDays = new Date(now.getTime() + 2 * 86_400_000);

const all = Object.entries(changes).map(([kind, change]) => ({ kind: kind as BoardEventKind, ...change }));

async function lines(): Promise<Map<string, { kind: string; by: string; shop: string }>> {
  const rows = await scene.db()("board_events").select("id", "kind", "by_person_id", "shop_id");
  return new Map(rows.map((row) => [row.id, { kind: row.kind, by: row.by_person_id, shop: row.shop_id }]));
}

function expectDone(result: unknown): void {
  expect(result === true || (result as { ok?: boolean } | null)?.ok === true).toBe(true);
}

describe("every change of a board writes its line of history", () => {
  test.each(all)("$kind: once, with who and where", async ({ kind, run, writes = [kind] }) => {
    const before = await lines();
    expectDone(await run(scene.db()));
    const written = [...(await lines())].filter(([id]) => !before.has(id)).map(([, line]) => line);
    expect(written.map((line) => line.kind).sort()).toEqual([...writes].sort());
    const people = Object.values(scene.shop.people).map(({ personId }) => personId);
    for (const { by, shop } of written) {
      expect(people).toContain(by);
      expect(shop).toBe(scene.shop.shopId);
    }
  });

  test.each(all)("$kind: taken back with the transaction it is in", async ({ run }) => {
    const before = await scene.written();
    const undone = await scene.db().transaction();
    expectDone(await run(undone));
    await undone.rollback();
    expect(await scene.written()).toBe(before);
  });

  test("a refused one writes none", async () => {
    const { shop, db } = scene;
    const { owner, maker } = shop.people;
    const before = await scene.written();
    await correctBoard(db(), maker, shop.boardId, 999, { notes: "x" });
    await correctBoard(db(), maker, shop.spareBoardId, await versionOf(db(), shop.spareBoardId), { notes: "" });
    await moveBoard(db(), maker, shop.boardId, scene.other.armId);
    await deleteBoard(db(), owner, shop.boardId);
    await placeHold(db(), maker, { ...far(), fromMm: 0, toMm: 100 }, now);
    await letGo(db(), shop.people.helper, shop.holdId);
    await takeDown(db(), maker, shop.benchBoardId, now);
    await putBack(db(), maker, shop.boardId, 14, now);
    await removeDefect(db(), maker, shop.spareBoardId, shop.defectId);
    await removePhoto(db(), scene.storage(), maker, shop.spareBoardId, shop.photoId);
    expect(await scene.written()).toBe(before);
  });
});

describe("history", () => {
  test("is never edited, by no means that rows are edited by", async () => {
    const db = scene.db();
    const before = await scene.written();
    const [event] = await db("board_events").limit(1);
    const refused = (sql: string) => expect(db.raw(sql, { id: event.id })).rejects.toThrow(/history is never edited/);
    await refused("UPDATE board_events SET kind = 'moved' WHERE id = :id");
    await refused("UPDATE board_events SET detail = detail");
    await refused("DELETE FROM board_events WHERE id = :id");
    await refused("DELETE e FROM board_events e JOIN boards b ON b.id = e.board_id");
    await refused("REPLACE INTO board_events SELECT * FROM board_events WHERE id = :id");
    await refused(
      "INSERT INTO board_events SELECT * FROM board_events e WHERE e.id = :id ON DUPLICATE KEY UPDATE kind = 'moved'",
    );
    expect(await scene.written()).toBe(before);
  });

  test("keeps its board: a row with history cannot be deleted", async () => {
    const deleting = scene.db()("boards").where({ id: scene.shop.spareBoardId }).delete();
    await expect(changes.moved.run(scene.db()).then(() => deleting)).rejects.toThrow(/foreign key constraint fails/);
  });
});

describe("when a line of history cannot be written", () => {
  beforeAll(async () => {
    await scene
      .pool()
      .raw(
        "CREATE TRIGGER no_history BEFORE INSERT ON board_events FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'no room'",
      );
  });
  afterAll(() => scene.pool().raw("DROP TRIGGER no_history"));

  test.each(all)("$kind: nothing has changed", async ({ run }) => {
    const before = await scene.written();
    await expect(run(scene.db())).rejects.toThrow("no room");
    expect(await scene.written()).toBe(before);
  });
});
