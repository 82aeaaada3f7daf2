import type { Knex } from "knex";
import type { Actor } from "#app/domain/shop/actor.ts";
import { newId } from "#app/services/ids.server.ts";
import type { BoardEvent, BoardEventKind, EventDetail } from "./board-history.ts";

/**
 * Writes one line of a board's history, in the transaction of the change itself. Nothing ever edits it: triggers refuse.
 *
 * @param detail plain values, kept as JSON.
 * @param at when it happened; the database's own clock unless the use case was given a time.
 */
export async function writeEvent(
  trx: Knex,
  actor: Pick<Actor, "shopId" | "personId">,
  boardId: string,
  kind: BoardEventKind,
  detail: EventDetail = {},
  at?: Date,
): Promise<void> {
  await writeEvents(trx, actor, [{ boardId, kind, detail }], at);
}

/** The same for many boards at once: a delivery of two hundred is one statement. */
export async function writeEvents(
  trx: Knex,
  actor: Pick<Actor, "shopId" | "personId">,
  events: { boardId: string; kind: BoardEventKind; detail: EventDetail }[],
  at?: Date,
): Promise<void> {
  if (events.length === 0) return;
  await trx.batchInsert(
    "board_events",
    events.map(({ boardId, kind, detail }) => ({
      id: newId(),
      shop_id: actor.shopId,
      board_id: boardId,
      kind,
      detail: JSON.stringify(detail),
      by_person_id: actor.personId,
      ...(at ? { at } : {}),
    })),
    500,
  );
}

/** A board's history, newest first. */
export async function listEvents(
  db: Knex,
  actor: Pick<Actor, "shopId">,
  boardId: string,
  limit = 100,
): Promise<BoardEvent[]> {
  const rows = await db("board_events as e")
    .leftJoin("people as p", "p.id", "e.by_person_id")
    .where({ "e.shop_id": actor.shopId, "e.board_id": boardId })
    .orderBy([
      { column: "e.at", order: "desc" },
      { column: "e.id", order: "desc" },
    ])
    .limit(limit)
    .select("e.id", "e.kind", "e.detail", "e.at", "p.name");
  return rows.map((row) => ({
    id: row.id,
    kind: row.kind,
    detail: typeof row.detail === "string" ? JSON.parse(row.detail) : row.detail,
    byName: row.name,
    at: row.at,
  }));
}
