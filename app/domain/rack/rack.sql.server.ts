import type { Knex } from "knex";
import type { Actor } from "#app/domain/shop/actor.ts";
import { isDuplicateKey } from "#app/services/db.server.ts";
import { newId } from "#app/services/ids.server.ts";
import type { Bay } from "./rack.ts";

/** The shop's bays from left to right, each with its arms from the lowest up. */
export async function listBays(db: Knex, actor: Pick<Actor, "shopId">): Promise<Bay[]> {
  const rows = await db("bays as b")
    .leftJoin("arms as a", "a.bay_id", "b.id")
    .where("b.shop_id", actor.shopId)
    .orderBy(["b.sort", "b.name", "a.level"])
    .select({
      id: "b.id",
      name: "b.name",
      note: "b.note",
      armId: "a.id",
      level: "a.level",
      widthMm: "a.width_mm",
      capacityKg: "a.capacity_kg",
    });
  const bays = new Map<string, Bay>();
  for (const { id, name, note, armId, level, widthMm, capacityKg } of rows) {
    const bay: Bay = bays.get(id) ?? { id, name, note, arms: [] };
    if (armId) bay.arms.push({ id: armId, level, widthMm, capacityKg });
    bays.set(id, bay);
  }
  return [...bays.values()];
}

export interface NewBay {
  name: string;
  note: string;
  arms: number;
  armWidthMm: number;
  capacityKg: number | null;
}

/** Adds a bay with its arms, to the right of the others; false when the shop has a bay of that name. */
export async function addBay(db: Knex, actor: Pick<Actor, "shopId">, bay: NewBay): Promise<boolean> {
  try {
    await db.transaction(async (trx) => {
      const id = newId();
      const last = await trx("bays").where({ shop_id: actor.shopId }).max({ sort: "sort" }).first();
      await trx("bays").insert({
        id,
        shop_id: actor.shopId,
        name: bay.name,
        note: bay.note,
        sort: Number(last?.sort ?? -1) + 1,
      });
      await trx("arms").insert(
        Array.from({ length: bay.arms }, (_, i) => ({
          id: newId(),
          shop_id: actor.shopId,
          bay_id: id,
          level: i + 1,
          width_mm: bay.armWidthMm,
          capacity_kg: bay.capacityKg,
        })),
      );
    });
    return true;
  } catch (error) {
    if (isDuplicateKey(error, "bays_name")) return false;
    throw error;
  }
}
