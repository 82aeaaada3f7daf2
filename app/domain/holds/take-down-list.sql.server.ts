import type { Knex } from "knex";
import type { BoardSummary } from "#app/domain/boards/board.ts";
import { listHeldFor } from "#app/domain/boards/boards.sql.server.ts";
import type { Actor } from "#app/domain/shop/actor.ts";

/** A project's boards in the order one meets them at the rack: bay by bay from the left, the top arm first, and on an arm the board that lies on top first. */
export async function takeDownList(db: Knex, actor: Pick<Actor, "shopId">, projectId: string): Promise<BoardSummary[]> {
  const boards = await listHeldFor(db, actor, projectId);
  const places: { id: string }[] = await db("boards as b")
    .leftJoin("arms as a", "a.id", "b.arm_id")
    .leftJoin("bays as bay", "bay.id", "a.bay_id")
    .where("b.shop_id", actor.shopId)
    .whereIn(
      "b.id",
      boards.map((board) => board.id),
    )
    .orderByRaw("b.arm_id IS NULL, bay.sort, bay.name, a.level DESC, b.arm_position DESC, b.tag_number")
    .select("b.id");
  const order = new Map(places.map(({ id }, index) => [id, index]));
  return boards.sort((a, b) => (order.get(a.id) ?? 0) - (order.get(b.id) ?? 0));
}
