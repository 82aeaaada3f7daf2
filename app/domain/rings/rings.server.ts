import type { Knex } from "knex";
import type { ClassLimits, RingField } from "#app/core/rings/ring-types.ts";
import { angleSummary, dominantClass } from "#app/core/rings/summary.ts";
import { writeEvent } from "#app/domain/boards/board-events.server.ts";
import { lockBoard } from "#app/domain/boards/boards.sql.server.ts";
import type { Actor } from "#app/domain/shop/actor.ts";
import { withTransaction } from "#app/services/db.server.ts";
import { currentReadings, insertReading, type NewReading } from "./rings.sql.server.ts";

/**
 * Keeps a reading and, in the same transaction, what lists and drawings say of the board: the near end speaks for it, the far end while the near
 * end has not been read.
 *
 * @returns false when the board is not in this shop.
 */
export async function keepReading(
  db: Knex,
  actor: Actor,
  boardId: string,
  reading: NewReading,
  limits: ClassLimits,
  now: Date,
): Promise<boolean> {
  return withTransaction(db, async (trx) => {
    if (!(await lockBoard(trx, actor, boardId))) return false;
    await insertReading(trx, actor, boardId, reading, now);
    const { near, far } = await currentReadings(trx, actor, boardId);
    const speaks = near ?? far;
    if (speaks)
      await trx("boards")
        .where({ id: boardId, shop_id: actor.shopId })
        .update({ ...ringColumns(speaks.field, limits), version: trx.raw("version + 1") });
    const { least, greatest } = angleSummary(reading.field);
    await writeEvent(
      trx,
      actor,
      boardId,
      "rings read",
      {
        end: reading.boardEnd,
        how: reading.source,
        "from (degrees)": Math.round(least),
        "to (degrees)": Math.round(greatest),
      },
      now,
    );
    return true;
  });
}

/** The columns by which a board is listed, filtered and drawn, from its reading and the shop's class limits. */
export function ringColumns(field: RingField, limits: ClassLimits) {
  const { least, greatest, mean } = angleSummary(field);
  return {
    ring_class: dominantClass(field, limits),
    ring_min_deg: least,
    ring_max_deg: greatest,
    ring_mean_deg: mean,
    ring_field: JSON.stringify(field),
  };
}
