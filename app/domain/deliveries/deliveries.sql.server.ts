import type { Knex } from "knex";
import type { Actor } from "#app/domain/shop/actor.ts";
import { newId } from "#app/services/ids.server.ts";
import type { DeliveryForm } from "./delivery.schema.ts";
import type { Delivery, DeliverySummary } from "./delivery.ts";

type ByShop = Pick<Actor, "shopId">;

const columns = {
  id: "d.id",
  supplierId: "d.supplier_id",
  supplierName: "s.name",
  receivedOn: "d.received_on",
  reference: "d.reference",
  species: "d.species",
  quarters: "d.quarters",
  drying: "d.drying",
  grade: "d.grade",
  claimedVolume: "d.claimed_volume",
  claimedUnit: "d.claimed_unit",
  priceMinor: "d.price_minor",
  priceBasis: "d.price_basis",
  freightMinor: "d.freight_minor",
  origin: "d.origin",
  certificate: "d.certificate",
  notes: "d.notes",
  talliedAt: "d.tallied_at",
  version: "d.version",
} as const;

function deliveriesOf(db: Knex, actor: ByShop): Knex.QueryBuilder {
  return db("deliveries as d").join("suppliers as s", "s.id", "d.supplier_id").where("d.shop_id", actor.shopId);
}

/** One delivery, or null. */
export async function getDelivery(db: Knex, actor: ByShop, deliveryId: string): Promise<Delivery | null> {
  return (await deliveriesOf(db, actor).where("d.id", deliveryId).first(columns)) ?? null;
}

export const deliveriesPerPage = 30;

/** A page of deliveries, newest first; those still to be tallied stand on top. */
export async function listDeliveries(
  db: Knex,
  actor: ByShop,
  page: number,
): Promise<{ deliveries: DeliverySummary[]; pages: number }> {
  const { total } = (await deliveriesOf(db, actor).count({ total: "*" }).first()) as { total: number };
  const pages = Math.max(1, Math.ceil(total / deliveriesPerPage));
  const boards = db("boards").whereRaw("boards.delivery_id = d.id AND boards.deleted_at IS NULL").count("*");
  const deliveries = await deliveriesOf(db, actor)
    .orderByRaw("d.tallied_at IS NOT NULL, d.received_on DESC, d.id")
    .limit(deliveriesPerPage)
    .offset((Math.min(page, pages) - 1) * deliveriesPerPage)
    .select({ ...columns, boards });
  return { deliveries, pages };
}

function row(form: DeliveryForm, supplierId: string) {
  return {
    supplier_id: supplierId,
    received_on: form.receivedOn,
    reference: form.reference,
    species: form.species,
    quarters: form.quarters,
    drying: form.drying,
    grade: form.grade,
    claimed_volume: form.claimedVolume,
    claimed_unit: form.claimedUnit,
    price_minor: form.priceMinor,
    price_basis: form.priceBasis,
    freight_minor: form.freightMinor,
    origin: form.origin,
    certificate: form.certificate,
    notes: form.notes,
  };
}

export async function insertDelivery(db: Knex, actor: Actor, form: DeliveryForm, supplierId: string): Promise<string> {
  const id = newId();
  await db("deliveries").insert({ id, shop_id: actor.shopId, created_by: actor.personId, ...row(form, supplierId) });
  return id;
}

/** Saves a delivery made from the given version; false when it has changed since. */
export async function updateDelivery(
  db: Knex,
  actor: ByShop,
  deliveryId: string,
  version: number,
  form: DeliveryForm,
  supplierId: string,
): Promise<boolean> {
  const changed = await db("deliveries")
    .where({ id: deliveryId, shop_id: actor.shopId, version })
    .update({ ...row(form, supplierId), version: version + 1 });
  return changed === 1;
}
