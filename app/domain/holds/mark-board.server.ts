import type { Knex } from "knex";
import type { BoardState } from "#app/domain/boards/board.ts";
import { writeEvent } from "#app/domain/boards/board-events.server.ts";
import { lockBoard } from "#app/domain/boards/boards.sql.server.ts";
import type { Actor } from "#app/domain/shop/actor.ts";
import { withTransaction } from "#app/services/db.server.ts";
import { lapseHolds } from "./holds.server.ts";
import { endHolds, listHoldsOfBoard } from "./holds.sql.server.ts";

/** What can become of a board for good, and the way back when it was a slip or the board turned up again. */
export const markableStates = ["used", "sold", "lost", "racked"] as const;
export type MarkableState = (typeof markableStates)[number];

export type Marked =
  | { ok: true }
  | { ok: false; why: "missing" | "held" }
  | { ok: false; why: "state"; state: BoardState };

/**
 * Marks what became of a board. Used up, its holds are used with it; sold or lost, nobody may still count on it, so live holds must be let go first.
 * Marked racked again, it lies where it last lay, and old holds stay ended.
 */
export async function markBoard(
  db: Knex,
  actor: Actor,
  boardId: string,
  to: MarkableState,
  now: Date,
): Promise<Marked> {
  return withTransaction(db, async (trx) => {
    const board = await lockBoard(trx, actor, boardId);
    if (!board) return { ok: false, why: "missing" };
    const gone = board.state === "used" || board.state === "sold" || board.state === "lost";
    if (board.state === to || gone !== (to === "racked")) return { ok: false, why: "state", state: board.state };
    await lapseHolds(trx, actor, boardId, now);
    const live = (await listHoldsOfBoard(trx, actor, boardId, ["held", "out"])).map((hold) => hold.id);
    if (live.length > 0 && to !== "used") return { ok: false, why: "held" };
    await endHolds(trx, actor, boardId, live, "used");
    await trx("boards")
      .where({ id: boardId, shop_id: actor.shopId })
      .update({ state: to, version: trx.raw("version + 1") });
    await writeEvent(trx, actor, boardId, "marked", { state: [board.state, to] });
    return { ok: true };
  });
}
