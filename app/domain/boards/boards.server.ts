import type { Knex } from "knex";
import { fitHolds } from "#app/domain/holds/fit-holds.server.ts";
import type { Actor } from "#app/domain/shop/actor.ts";
import { withTransaction } from "#app/services/db.server.ts";
import type { BoardSummary } from "./board.ts";
import type { BoardCorrection } from "./board-correction.schema.ts";
import { writeEvent } from "./board-events.server.ts";
import type { EventDetail } from "./board-history.ts";
import { boardsOf, getBoard, listByIds, lockBoard } from "./boards.sql.server.ts";
import { searchText } from "./search-text.ts";

/** A second save on a record that changed meanwhile: who changed it and when. */
export interface StaleRefusal {
  ok: false;
  why: "changed";
  byName: string | null;
  at: Date | null;
}

/** A board that would be too short for what is held of it: for which projects. */
export interface TooShortRefusal {
  ok: false;
  why: "too short";
  projects: string[];
}

export type ChangeResult = { ok: true } | { ok: false; why: "missing" } | StaleRefusal;

/** Column of each field that can be corrected in place, with the name its history uses. */
const columns: Record<keyof BoardCorrection, { column: string; words: string }> = {
  species: { column: "species", words: "species" },
  quarters: { column: "quarters", words: "quarters" },
  thicknessMm: { column: "thickness_mm", words: "thickness (mm)" },
  lengthMm: { column: "length_mm", words: "length (mm)" },
  widthMm: { column: "width_mm", words: "width (mm)" },
  widthFarMm: { column: "width_far_mm", words: "far width (mm)" },
  edges: { column: "edges", words: "edges" },
  surface: { column: "surface", words: "surface" },
  grade: { column: "grade", words: "grade" },
  figureKind: { column: "figure_kind", words: "figure" },
  figureStrength: { column: "figure_strength", words: "figure strength" },
  figureWhere: { column: "figure_where", words: "figure where" },
  sapSharePct: { column: "sap_share_pct", words: "sapwood (%)" },
  colourNote: { column: "colour_note", words: "colour" },
  notes: { column: "notes", words: "notes" },
  logName: { column: "log_name", words: "log" },
  logSequence: { column: "log_sequence", words: "place in log" },
  costMinor: { column: "cost_minor", words: "cost" },
};

/**
 * Corrects fields of a board: one transaction with its history line. A form made from an older version of the record is refused, never merged
 * over what somebody else wrote. Live holds follow a corrected length; one that would have nothing left refuses it.
 *
 * @param version of the record the form was made from.
 */
export async function correctBoard(
  db: Knex,
  actor: Actor,
  boardId: string,
  version: number,
  correction: Partial<BoardCorrection>,
): Promise<ChangeResult | TooShortRefusal> {
  return withTransaction(db, async (trx) => {
    const locked = await lockBoard(trx, actor, boardId);
    if (!locked) return { ok: false, why: "missing" };
    if (locked.version !== version) return staleRefusal(trx, actor, boardId);
    const before = await getBoard(trx, actor, boardId);
    if (!before) return { ok: false, why: "missing" };
    const update: Record<string, unknown> = {};
    const detail: EventDetail = {};
    for (const field of Object.keys(correction) as (keyof BoardCorrection)[]) {
      const value = correction[field];
      if (value === undefined || value === before[field]) continue;
      update[columns[field].column] = value;
      // Helpers read history too, so it never holds money.
      if (field !== "costMinor") detail[columns[field].words] = [before[field], value];
      else detail.cost = "corrected";
    }
    if (Object.keys(update).length === 0) return { ok: true };
    const after = { ...before, ...correction };
    if (after.lengthMm !== before.lengthMm) {
      const length = { beforeMm: before.lengthMm, afterMm: after.lengthMm };
      const projects = await fitHolds(trx, actor, boardId, length);
      if (projects.length > 0) return { ok: false, why: "too short", projects };
    }
    await trx("boards")
      .where({ id: boardId, shop_id: actor.shopId })
      .update({ ...update, search_text: searchText(after), version: trx.raw("version + 1") });
    await writeEvent(trx, actor, boardId, "corrected", detail);
    return { ok: true };
  });
}

/** Who changed a board last, and when: what a refused second save says. */
export async function staleRefusal(db: Knex, actor: Actor, boardId: string): Promise<StaleRefusal> {
  const last = await db("board_events as e")
    .leftJoin("people as p", "p.id", "e.by_person_id")
    .where({ "e.shop_id": actor.shopId, "e.board_id": boardId })
    .orderBy("e.at", "desc")
    .first("p.name", "e.at");
  return { ok: false, why: "changed", byName: last?.name ?? null, at: last?.at ?? null };
}

/**
 * Moves a board to an arm of the rack, on top of what lies there, or off the rack's record when the arm is null.
 *
 * @returns missing when the board or the arm is not in this shop.
 */
export async function moveBoard(db: Knex, actor: Actor, boardId: string, armId: string | null): Promise<ChangeResult> {
  return withTransaction(db, async (trx) => {
    const locked = await lockBoard(trx, actor, boardId);
    const arm = armId === null ? null : await armName(trx, actor, armId);
    if (!locked || (armId !== null && !arm)) return { ok: false, why: "missing" };
    const before = await getBoard(trx, actor, boardId);
    const top =
      armId === null
        ? null
        : await boardsOf(trx, actor).where("b.arm_id", armId).max({ top: "b.arm_position" }).first();
    await trx("boards")
      .where({ id: boardId, shop_id: actor.shopId })
      .update({
        arm_id: armId,
        arm_position: Math.min(65_000, Number(top?.top ?? -1) + 1),
        version: trx.raw("version + 1"),
      });
    await writeEvent(trx, actor, boardId, "moved", { place: [before?.place ?? null, arm] });
    return { ok: true };
  });
}

async function armName(db: Knex, actor: Actor, armId: string): Promise<string | null> {
  const row = await db("arms as a")
    .join("bays as b", "b.id", "a.bay_id")
    .where({ "a.id": armId, "a.shop_id": actor.shopId })
    .first("b.name", "a.level");
  return row ? `Bay ${row.name}, arm ${row.level}` : null;
}

/**
 * Takes a board off every list. The row and its history stay. A board with live holds is refused: let them go first.
 */
export async function deleteBoard(
  db: Knex,
  actor: Actor,
  boardId: string,
): Promise<{ ok: true } | { ok: false; why: "missing" } | { ok: false; why: "held"; projects: string[] }> {
  return withTransaction(db, async (trx) => {
    const locked = await lockBoard(trx, actor, boardId);
    if (!locked) return { ok: false, why: "missing" };
    const board = (await listByIds(trx, actor, [boardId]))[0] as BoardSummary;
    if (board.holds.length > 0)
      return { ok: false, why: "held", projects: [...new Set(board.holds.map((hold) => hold.projectName))] };
    await trx("boards")
      .where({ id: boardId, shop_id: actor.shopId })
      .update({ deleted_at: trx.fn.now(3), arm_id: null, version: trx.raw("version + 1") });
    await writeEvent(trx, actor, boardId, "deleted", { tag: locked.tag });
    return { ok: true };
  });
}
