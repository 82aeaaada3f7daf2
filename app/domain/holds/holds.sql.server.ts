import type { Knex } from "knex";
import type { Actor } from "#app/domain/shop/actor.ts";
import { newId } from "#app/services/ids.server.ts";
import type { Stretch } from "./hold.ts";

/** A hold's own row, for changing it. */
export interface HoldRow {
  id: string;
  boardId: string;
  projectId: string;
  fromMm: number;
  toMm: number;
  state: "held" | "out" | "used" | "let go" | "lapsed";
  placedBy: string;
  expiresAt: Date;
}

const rowColumns = {
  id: "h.id",
  boardId: "h.board_id",
  projectId: "h.project_id",
  fromMm: "h.from_mm",
  toMm: "h.to_mm",
  state: "h.state",
  placedBy: "h.placed_by",
  expiresAt: "h.expires_at",
} as const;

/** One hold of this shop, or null. */
export async function getHold(db: Knex, actor: Pick<Actor, "shopId">, holdId: string): Promise<HoldRow | null> {
  return (await db("holds as h").where({ "h.id": holdId, "h.shop_id": actor.shopId }).first(rowColumns)) ?? null;
}

/** The hold again, under the lock of its board. */
export async function listHoldsOfBoard(
  trx: Knex,
  actor: Pick<Actor, "shopId">,
  boardId: string,
  states: HoldRow["state"][],
): Promise<HoldRow[]> {
  return trx("holds as h")
    .where({ "h.board_id": boardId, "h.shop_id": actor.shopId })
    .whereIn("h.state", states)
    .select(rowColumns);
}

/** A millimetre along the board as a moment, the only kind of period that MariaDB keeps apart (see the migration). */
function moment(db: Knex, mm: number): Knex.Raw {
  return db.raw("TIMESTAMPADD(MICROSECOND, ?, TIMESTAMP'2000-01-01 00:00:00')", [Math.round(mm * 1e6)]);
}

/**
 * Writes a hold and its claim on the board's length.
 *
 * @throws the database's duplicate-key error when the stretch is claimed already: the last judge, after the row lock.
 */
export async function insertHold(
  trx: Knex,
  actor: Pick<Actor, "shopId" | "personId">,
  hold: Stretch & { boardId: string; projectId: string; note: string; expiresAt: Date },
): Promise<string> {
  const id = newId();
  await trx("holds").insert({
    id,
    shop_id: actor.shopId,
    board_id: hold.boardId,
    project_id: hold.projectId,
    from_mm: hold.fromMm,
    to_mm: hold.toMm,
    note: hold.note,
    placed_by: actor.personId,
    expires_at: hold.expiresAt,
  });
  await trx("hold_spans").insert({
    hold_id: id,
    board_id: hold.boardId,
    starts: moment(trx, hold.fromMm),
    ends: moment(trx, hold.toMm),
  });
  await touchClaims(trx, actor, hold.boardId);
  return id;
}

/** Ends holds: their claim on the board goes, the row stays. */
export async function endHolds(
  trx: Knex,
  actor: Pick<Actor, "shopId">,
  boardId: string,
  holdIds: string[],
  state: "used" | "let go" | "lapsed",
): Promise<void> {
  if (holdIds.length === 0) return;
  await trx("holds")
    .where({ shop_id: actor.shopId, board_id: boardId })
    .whereIn("id", holdIds)
    .update({ state, ended_at: trx.fn.now(3) });
  await trx("hold_spans").where({ board_id: boardId }).whereIn("hold_id", holdIds).delete();
  await touchClaims(trx, actor, boardId);
}

/** Changes a hold's end date or its going out and coming back. */
export async function updateHold(
  trx: Knex,
  actor: Pick<Actor, "shopId">,
  holdId: string,
  change: { state?: "held" | "out"; expires_at?: Date },
): Promise<void> {
  await trx("holds").where({ id: holdId, shop_id: actor.shopId }).update(change);
}

/** Moves the far end of a live hold, and of its claim. @throws the database's duplicate-key error where another claim begins before that. */
export async function moveEnd(
  trx: Knex,
  actor: Pick<Actor, "shopId">,
  hold: Pick<HoldRow, "id" | "boardId">,
  toMm: number,
): Promise<void> {
  await trx("holds").where({ id: hold.id, shop_id: actor.shopId }).update({ to_mm: toMm });
  await trx("hold_spans")
    .where({ hold_id: hold.id, board_id: hold.boardId })
    .update({ ends: moment(trx, toMm) });
  await touchClaims(trx, actor, hold.boardId);
}

async function touchClaims(trx: Knex, actor: Pick<Actor, "shopId">, boardId: string): Promise<void> {
  await trx("boards")
    .where({ id: boardId, shop_id: actor.shopId })
    .update({ claim_serial: trx.raw("claim_serial + 1") });
}
