import type { Knex } from "knex";
import { writeEvent } from "#app/domain/boards/board-events.server.ts";
import { lockBoard } from "#app/domain/boards/boards.sql.server.ts";
import type { Actor } from "#app/domain/shop/actor.ts";
import { withTransaction } from "#app/services/db.server.ts";
import { newId } from "#app/services/ids.server.ts";
import type { MoistureForm } from "./moisture.schema.ts";

/** One reading of a board, as shown and plotted. */
export interface MoistureReading {
  id: string;
  moisturePct: number;
  meterPct: number;
  meter: string;
  woodTemperatureC: number | null;
  place: string;
  readBy: string;
  readAt: Date;
}

/** A board's readings, oldest first. */
export async function listMoistureReadings(
  db: Knex,
  actor: Pick<Actor, "shopId">,
  boardId: string,
): Promise<MoistureReading[]> {
  return db("moisture_readings as r")
    .join("people as p", "p.id", "r.read_by")
    .where({ "r.shop_id": actor.shopId, "r.board_id": boardId })
    .orderBy("r.read_at")
    .select({
      id: "r.id",
      moisturePct: "r.moisture_pct",
      meterPct: "r.meter_pct",
      meter: "r.meter",
      woodTemperatureC: "r.wood_temperature_c",
      place: "r.place",
      readBy: "p.name",
      readAt: "r.read_at",
    });
}

/**
 * Keeps a reading and makes it the board's moisture, in one transaction.
 *
 * @param moisturePct what the meter said, corrected; the raw figure stays beside it.
 * @returns false when the board is not in this shop.
 */
export async function keepMoistureReading(
  db: Knex,
  actor: Actor,
  boardId: string,
  reading: MoistureForm & { moisturePct: number },
  now: Date,
): Promise<boolean> {
  return withTransaction(db, async (trx) => {
    if (!(await lockBoard(trx, actor, boardId))) return false;
    await trx("moisture_readings").insert({
      id: newId(),
      shop_id: actor.shopId,
      board_id: boardId,
      moisture_pct: reading.moisturePct,
      meter_pct: reading.meterPct,
      meter: reading.meter,
      wood_temperature_c: reading.woodTemperatureC,
      place: reading.place,
      read_by: actor.personId,
      read_at: now,
    });
    await trx("boards")
      .where({ id: boardId, shop_id: actor.shopId })
      .update({ moisture_pct: reading.moisturePct, moisture_at: now });
    await writeEvent(
      trx,
      actor,
      boardId,
      "metered",
      { "moisture (%)": reading.moisturePct, place: reading.place },
      now,
    );
    return true;
  });
}
