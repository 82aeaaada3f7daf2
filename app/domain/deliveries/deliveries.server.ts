import type { Knex } from "knex";
import { writeEvents } from "#app/domain/boards/board-events.server.ts";
import type { Actor } from "#app/domain/shop/actor.ts";
import { withTransaction } from "#app/services/db.server.ts";
import {
  getDelivery,
  insertDelivery,
  lastChange,
  listLot,
  markDeliveryDeleted,
  updateDelivery,
} from "./deliveries.sql.server.ts";
import type { DeliveryForm } from "./delivery.schema.ts";
import { boardCostsMinor } from "./delivery-cost.ts";
import { getSupplier, supplierNamed } from "./suppliers.sql.server.ts";

export type DeliveryReceived = { ok: true; deliveryId: string } | { ok: false; why: "no such supplier" };

/** Logs a delivery, with its supplier where that is a new name. */
export async function receiveDelivery(db: Knex, actor: Actor, form: DeliveryForm): Promise<DeliveryReceived> {
  return withTransaction(db, async (trx) => {
    const supplierId = await supplierOf(trx, actor, form);
    if (!supplierId) return { ok: false, why: "no such supplier" };
    return { ok: true, deliveryId: await insertDelivery(trx, actor, form, supplierId) };
  });
}

export type DeliveryChanged =
  | { ok: true }
  | { ok: false; why: "missing" | "no such supplier" }
  | { ok: false; why: "changed"; byName: string | null; at: Date | null; version: number };

/**
 * Changes a delivery, unless somebody else has since the form was opened.
 *
 * @param version of the record the form was made from.
 */
export async function changeDelivery(
  db: Knex,
  actor: Actor,
  deliveryId: string,
  version: number,
  form: DeliveryForm,
  now: Date,
): Promise<DeliveryChanged> {
  return withTransaction(db, async (trx) => {
    if (!(await getDelivery(trx, actor, deliveryId))) return { ok: false, why: "missing" };
    const supplierId = await supplierOf(trx, actor, form);
    if (!supplierId) return { ok: false, why: "no such supplier" };
    if (await updateDelivery(trx, actor, deliveryId, version, form, supplierId, now)) return { ok: true };
    const last = await lastChange(trx, actor, deliveryId);
    return last ? { ok: false, why: "changed", ...last } : { ok: false, why: "missing" };
  });
}

/** A name typed counts before the choice. A supplier of another shop is none. */
async function supplierOf(trx: Knex, actor: Actor, form: DeliveryForm): Promise<string | null> {
  if (form.newSupplier !== "") return supplierNamed(trx, actor, form.newSupplier);
  return (await getSupplier(trx, actor, form.supplierId))?.id ?? null;
}

/** Takes a delivery logged by mistake off every list. Once tallied it stays, as its boards say where they came from. */
export async function deleteDelivery(
  db: Knex,
  actor: Actor,
  deliveryId: string,
  now: Date,
): Promise<{ ok: true } | { ok: false; why: "missing" | "tallied" }> {
  if (await markDeliveryDeleted(db, actor, deliveryId, now)) return { ok: true };
  return { ok: false, why: (await getDelivery(db, actor, deliveryId)) ? "tallied" : "missing" };
}

/**
 * Shares what a delivery costs over its boards anew, by their measure: for a price or a freight that came, or was corrected, after the tally.
 * Costs that were written on single boards by hand are replaced; each board's history has a line.
 */
export async function shareCostAgain(
  db: Knex,
  actor: Actor,
  deliveryId: string,
): Promise<{ ok: true; boards: number } | { ok: false; why: "missing" | "no price" }> {
  return withTransaction(db, async (trx) => {
    const delivery = await getDelivery(trx, actor, deliveryId);
    if (!delivery) return { ok: false, why: "missing" };
    await trx("boards").where({ shop_id: actor.shopId, delivery_id: deliveryId }).forUpdate().select("id");
    const lot = await listLot(trx, actor, deliveryId);
    const shares = boardCostsMinor(delivery, lot);
    if (!shares) return { ok: false, why: "no price" };
    const changed = lot.flatMap((board, index) =>
      board.costMinor === shares[index] ? [] : [{ id: board.id, costMinor: shares[index] ?? 0 }],
    );
    for (const { id, costMinor } of changed)
      await trx("boards")
        .where({ id, shop_id: actor.shopId })
        .update({ cost_minor: costMinor, version: trx.raw("version + 1") });
    // Helpers read history too, so it never holds money.
    const events = changed.map(({ id }) => ({
      boardId: id,
      kind: "corrected" as const,
      detail: { cost: "shared out again" },
    }));
    await writeEvents(trx, actor, events);
    return { ok: true, boards: changed.length };
  });
}
