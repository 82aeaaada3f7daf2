import type { Knex } from "knex";
import type { RingField } from "#app/core/rings/ring-types.ts";
import type { Actor } from "#app/domain/shop/actor.ts";
import { newId } from "#app/services/ids.server.ts";
import type { BoardEndName, RingReading } from "./reading.ts";

type ByShop = Pick<Actor, "shopId">;

function parsed<T>(value: unknown): T {
  return (typeof value === "string" ? JSON.parse(value) : value) as T;
}

/** The newest reading of each end of a board. */
export async function currentReadings(
  db: Knex,
  actor: ByShop,
  boardId: string,
): Promise<Partial<Record<BoardEndName, RingReading>>> {
  const rows = await db("ring_readings as r")
    .join("people as p", "p.id", "r.read_by")
    .where({ "r.shop_id": actor.shopId, "r.board_id": boardId })
    .orderBy([
      { column: "r.read_at", order: "desc" },
      { column: "r.id", order: "desc" },
    ])
    .select({
      id: "r.id",
      boardEnd: "r.board_end",
      source: "r.source",
      methodVersion: "r.method_version",
      photoId: "r.photo_id",
      inputs: "r.inputs",
      field: "r.field",
      confidence: "r.confidence",
      readBy: "p.name",
      readAt: "r.read_at",
    });
  const readings: Partial<Record<BoardEndName, RingReading>> = {};
  for (const row of rows) {
    const end = row.boardEnd as BoardEndName;
    readings[end] ??= { ...row, inputs: parsed(row.inputs), field: parsed<RingField>(row.field) };
  }
  return readings;
}

export interface NewReading {
  boardEnd: BoardEndName;
  source: RingReading["source"];
  methodVersion: string;
  photoId: string | null;
  inputs: unknown;
  field: RingField;
  confidence: number;
}

/** Adds a reading's row. Nothing is ever overwritten. */
export async function insertReading(
  trx: Knex,
  actor: Actor,
  boardId: string,
  reading: NewReading,
  now: Date,
): Promise<void> {
  await trx("ring_readings").insert({
    id: newId(),
    shop_id: actor.shopId,
    board_id: boardId,
    board_end: reading.boardEnd,
    source: reading.source,
    method_version: reading.methodVersion,
    photo_id: reading.photoId,
    inputs: JSON.stringify(reading.inputs),
    width_mm: reading.field.widthMm,
    thickness_mm: reading.field.thicknessMm,
    field: JSON.stringify(reading.field),
    confidence: reading.confidence,
    read_by: actor.personId,
    read_at: now,
  });
}
