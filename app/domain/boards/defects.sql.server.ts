import type { Knex } from "knex";
import type { Actor } from "#app/domain/shop/actor.ts";
import { withTransaction } from "#app/services/db.server.ts";
import { newId } from "#app/services/ids.server.ts";
import { writeEvent } from "./board-events.server.ts";
import { lockBoard } from "./boards.sql.server.ts";
import type { Defect, DefectForm } from "./defect.ts";

/** A board's defects, from the near end on. */
export async function listDefects(db: Knex, actor: Pick<Actor, "shopId">, boardId: string): Promise<Defect[]> {
  return db("board_defects").where({ shop_id: actor.shopId, board_id: boardId }).orderBy("along_mm").select({
    id: "id",
    kind: "kind",
    face: "face",
    alongMm: "along_mm",
    acrossMm: "across_mm",
    lengthMm: "length_mm",
    widthMm: "width_mm",
    note: "note",
  });
}

/** Notes a defect, with its line of history; false when the board is not in this shop. */
export async function noteDefect(db: Knex, actor: Actor, boardId: string, defect: DefectForm): Promise<boolean> {
  return withTransaction(db, async (trx) => {
    if (!(await lockBoard(trx, actor, boardId))) return false;
    await trx("board_defects").insert({
      id: newId(),
      shop_id: actor.shopId,
      board_id: boardId,
      kind: defect.kind,
      face: defect.face,
      along_mm: defect.alongMm,
      across_mm: defect.acrossMm,
      length_mm: defect.lengthMm,
      width_mm: defect.widthMm,
      note: defect.note,
    });
    await writeEvent(trx, actor, boardId, "defect noted", { kind: defect.kind, "at (mm)": defect.alongMm });
    return true;
  });
}

/** Takes a defect off the record: it was cut away, or never there. History keeps both. */
export async function removeDefect(db: Knex, actor: Actor, boardId: string, defectId: string): Promise<boolean> {
  return withTransaction(db, async (trx) => {
    if (!(await lockBoard(trx, actor, boardId))) return false;
    const at = { id: defectId, board_id: boardId, shop_id: actor.shopId };
    const defect = await trx("board_defects").where(at).first("kind", "along_mm");
    if (!defect) return false;
    await trx("board_defects").where(at).delete();
    await writeEvent(trx, actor, boardId, "defect removed", { kind: defect.kind, "at (mm)": defect.along_mm });
    return true;
  });
}
