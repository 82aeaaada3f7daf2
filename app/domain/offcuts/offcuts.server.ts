import type { Knex } from "knex";
import type { ClassLimits } from "#app/core/rings/ring-types.ts";
import { stripField } from "#app/core/rings/strip-field.ts";
import { writeEvent } from "#app/domain/boards/board-events.server.ts";
import { getBoard, lockBoard } from "#app/domain/boards/boards.sql.server.ts";
import { listDefects } from "#app/domain/boards/defects.sql.server.ts";
import { searchText } from "#app/domain/boards/search-text.ts";
import { tagFor, takeTagNumbers } from "#app/domain/boards/tag-numbers.server.ts";
import { ringColumns } from "#app/domain/rings/rings.server.ts";
import { insertReading } from "#app/domain/rings/rings.sql.server.ts";
import type { Actor } from "#app/domain/shop/actor.ts";
import { withTransaction } from "#app/services/db.server.ts";
import { newId } from "#app/services/ids.server.ts";
import { type Offcut, offcutProblem } from "./offcut.ts";

export type OffcutMade =
  | { ok: true; boardId: string; tag: string }
  | { ok: false; why: "missing" | "state" }
  | { ok: false; why: "place"; field: keyof Offcut; words: string };

/** Offcuts already taken from a board, as they lay on it. */
export async function listOffcuts(
  db: Knex,
  actor: Pick<Actor, "shopId">,
  boardId: string,
): Promise<(Offcut & { id: string; tag: string })[]> {
  return db("offcuts as o")
    .join("boards as b", "b.id", "o.board_id")
    .where({ "o.shop_id": actor.shopId, "o.parent_board_id": boardId })
    .whereNull("b.deleted_at")
    .orderBy("b.tag_number")
    .select({
      id: "b.id",
      tag: "b.tag",
      alongMm: "o.along_mm",
      acrossMm: "o.across_mm",
      lengthMm: "b.length_mm",
      widthMm: "b.width_mm",
    });
}

/**
 * Gives a piece that came back its own tag and record: species, thickness, lot, log, figure, the strip of the ring reading that is its own, moisture, the
 * defects that remain on it, and its share of the cost by area. The board it came from is at the bench or used up by then.
 */
export async function makeOffcut(
  db: Knex,
  actor: Actor,
  parentId: string,
  offcut: Offcut,
  limits: ClassLimits,
  now: Date,
): Promise<OffcutMade> {
  return withTransaction(db, async (trx) => {
    const locked = await lockBoard(trx, actor, parentId);
    const parent = locked && (await getBoard(trx, { ...actor, role: "owner" }, parentId));
    if (!parent) return { ok: false, why: "missing" };
    if (parent.state !== "out" && parent.state !== "used") return { ok: false, why: "state" };
    const problem = offcutProblem(offcut, parent, await listOffcuts(trx, actor, parentId));
    if (problem) return { ok: false, why: "place", field: problem.field, words: problem.why };

    const tagNumber = await takeTagNumbers(trx, actor, 1);
    const tag = tagFor(parent.species, tagNumber);
    const id = newId();
    const share = (offcut.lengthMm * offcut.widthMm) / (parent.lengthMm * parent.widthMm);
    const rings =
      parent.rings &&
      stripField(
        parent.rings,
        Math.min(offcut.acrossMm, parent.rings.widthMm - offcut.widthMm),
        Math.min(parent.rings.widthMm, offcut.acrossMm + offcut.widthMm),
      );
    await trx("boards").insert({
      id,
      shop_id: actor.shopId,
      tag_number: tagNumber,
      tag,
      parent_board_id: parentId,
      delivery_id: parent.deliveryId,
      species: parent.species,
      quarters: parent.quarters,
      thickness_mm: parent.thicknessMm,
      length_mm: offcut.lengthMm,
      width_mm: offcut.widthMm,
      edges: "sawn",
      surface: parent.surface,
      grade: parent.grade,
      figure_kind: parent.figureKind,
      figure_strength: parent.figureStrength,
      figure_where: parent.figureWhere,
      colour_note: parent.colourNote,
      log_name: parent.logName,
      log_sequence: parent.logSequence,
      arm_id: parent.armId,
      moisture_pct: parent.moisturePct,
      moisture_at: parent.moistureAt,
      cost_minor: parent.costMinor === null ? null : Math.round(parent.costMinor * Math.min(1, share)),
      ...(rings ? ringColumns(rings, limits) : {}),
      search_text: searchText({ ...parent, tag, notes: "" }),
    });
    await trx("offcuts").insert({
      board_id: id,
      shop_id: actor.shopId,
      parent_board_id: parentId,
      along_mm: offcut.alongMm,
      across_mm: offcut.acrossMm,
    });
    if (rings) {
      const reading = {
        boardEnd: "near",
        source: "parent",
        methodVersion: "parent-1",
        photoId: null,
        inputs: { parentId, ...offcut },
        field: rings,
        confidence: 0.8,
      } as const;
      await insertReading(trx, actor, id, reading, now);
    }
    await copyDefects(trx, actor, parentId, id, offcut);
    await writeEvent(trx, actor, id, "received", { from: parent.tag }, now);
    await writeEvent(
      trx,
      actor,
      parentId,
      "offcut made",
      { tag, "length (mm)": offcut.lengthMm, "width (mm)": offcut.widthMm },
      now,
    );
    return { ok: true, boardId: id, tag };
  });
}

/** Defects that lie on the offcut, cut to it and measured from its own corner. */
async function copyDefects(trx: Knex, actor: Actor, parentId: string, id: string, offcut: Offcut): Promise<void> {
  const rows = (await listDefects(trx, actor, parentId)).flatMap((defect) => {
    const along = Math.max(defect.alongMm, offcut.alongMm);
    const across = Math.max(defect.acrossMm, offcut.acrossMm);
    const length = Math.min(defect.alongMm + defect.lengthMm, offcut.alongMm + offcut.lengthMm) - along;
    const width = Math.min(defect.acrossMm + defect.widthMm, offcut.acrossMm + offcut.widthMm) - across;
    if (length <= 0 || width <= 0) return [];
    const place = {
      along_mm: along - offcut.alongMm,
      across_mm: across - offcut.acrossMm,
      length_mm: length,
      width_mm: width,
    };
    return [
      {
        id: newId(),
        shop_id: actor.shopId,
        board_id: id,
        kind: defect.kind,
        face: defect.face,
        note: defect.note,
        ...place,
      },
    ];
  });
  if (rows.length > 0) await trx("board_defects").insert(rows);
}
