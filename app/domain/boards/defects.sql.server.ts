import type { Knex } from "knex";
import type { Actor } from "#app/domain/shop/actor.ts";
import { withTransaction } from "#app/services/db.server.ts";
import { newId } from "#app/services/ids.server.ts";
import { writeEvent } from "./board-events.server.ts";
import { lockBoard } from "./boards.sql.server.ts";
import type { Defect, DefectForm } from "./defect.ts";

const columns = {
  id: "id",
  kind: "kind",
  face: "face",
  alongMm: "along_mm",
  acrossMm: "across_mm",
  lengthMm: "length_mm",
  widthMm: "width_mm",
  note: "note",
} as const;

/** A board's defects, from the near end on. */
export async function listDefects(db: Knex, actor: Pick<Actor, "shopId">, boardId: string): Promise<Defect[]> {
  return db("board_defects").where({ shop_id: actor.shopId, board_id: boardId }).orderBy("along_mm").select(columns);
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

/** Defects of many boards at once, by board. */
export async function listDefectsOf(
  db: Knex,
  actor: Pick<Actor, "shopId">,
  boardIds: string[],
): Promise<Map<string, Defect[]>> {
  const found = new Map<string, Defect[]>();
  if (boardIds.length === 0) return found;
  const rows = await db("board_defects")
    .where({ shop_id: actor.shopId })
    .whereIn("board_id", boardIds)
    .select({ boardId: "board_id", ...columns });
  for (const { boardId, ...defect } of rows) found.set(boardId, [...(found.get(boardId) ?? []), defect]);
  return found;
}
