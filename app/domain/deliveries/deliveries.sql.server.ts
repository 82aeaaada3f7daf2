import type { Knex } from "knex";
import type { Actor } from "#app/domain/shop/actor.ts";
import { newId } from "#app/services/ids.server.ts";
import type { DeliveryForm } from "./delivery.schema.ts";
import type { Delivery, DeliverySummary } from "./delivery.ts";
import { type DeliveryFilter, deliveriesPerPage } from "./delivery-filter.ts";

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

/** Deliveries of the actor's shop that are not deleted. Every query on deliveries starts here. */
function deliveriesOf(db: Knex, actor: ByShop): Knex.QueryBuilder {
  return db("deliveries as d")
    .join("suppliers as s", "s.id", "d.supplier_id")
    .where("d.shop_id", actor.shopId)
    .whereNull("d.deleted_at");
}

/** One delivery, or null. */
export async function getDelivery(db: Knex, actor: ByShop, deliveryId: string): Promise<Delivery | null> {
  return (await deliveriesOf(db, actor).where("d.id", deliveryId).first(columns)) ?? null;
}

function filtered(db: Knex, actor: ByShop, filter: DeliveryFilter): Knex.QueryBuilder {
  const query = deliveriesOf(db, actor);
  if (filter.supplier) query.where("d.supplier_id", filter.supplier);
  if (filter.species) query.where("d.species", filter.species);
  if (filter.tally === "waiting") query.whereNull("d.tallied_at");
  if (filter.tally === "done") query.whereNotNull("d.tallied_at");
  for (const word of filter.q.split(/\s+/).filter(Boolean)) {
    const like = `%${word.replace(/[\\%_]/g, "\\$&")}%`;
    query.where((any) => {
      for (const column of ["s.name", "d.reference", "d.grade", "d.origin", "d.certificate", "d.notes"])
        any.orWhere(column, "like", like);
    });
  }
  return query;
}

const orders: Record<DeliveryFilter["sort"], string> = {
  newest: "d.tallied_at IS NOT NULL, d.received_on DESC, d.id",
  oldest: "d.received_on, d.id",
  supplier: "s.name, d.received_on DESC, d.id",
};

/** A page of deliveries. Newest first; those still to be tallied stand on top unless another order is asked for. */
export async function listDeliveries(
  db: Knex,
  actor: ByShop,
  filter: DeliveryFilter,
): Promise<{ deliveries: DeliverySummary[]; total: number; pages: number }> {
  const { total } = (await filtered(db, actor, filter).count({ total: "*" }).first()) as { total: number };
  const pages = Math.max(1, Math.ceil(total / deliveriesPerPage));
  const offset = (Math.min(filter.page, pages) - 1) * deliveriesPerPage;
  return { deliveries: await summaries(db, actor, filter, deliveriesPerPage, offset), total, pages };
}

/** All that match, a block at a time, for a download. */
export async function summaries(
  db: Knex,
  actor: ByShop,
  filter: DeliveryFilter,
  limit: number,
  offset: number,
): Promise<DeliverySummary[]> {
  const boards = db("boards").whereRaw("boards.delivery_id = d.id AND boards.deleted_at IS NULL").count("*");
  return filtered(db, actor, filter)
    .orderByRaw(orders[filter.sort])
    .limit(limit)
    .offset(offset)
    .select({ ...columns, boards });
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
  actor: Pick<Actor, "shopId" | "personId">,
  deliveryId: string,
  version: number,
  form: DeliveryForm,
  supplierId: string,
  now: Date,
): Promise<boolean> {
  const changed = await db("deliveries")
    .where({ id: deliveryId, shop_id: actor.shopId, version, deleted_at: null })
    .update({ ...row(form, supplierId), changed_by: actor.personId, changed_at: now, version: version + 1 });
  return changed === 1;
}

/** Who changed a delivery last, and when; nulls when nobody has since it was logged. */
export async function lastChange(
  db: Knex,
  actor: ByShop,
  deliveryId: string,
): Promise<{ byName: string | null; at: Date | null; version: number } | null> {
  const row = await db("deliveries as d")
    .leftJoin("people as p", "p.id", "d.changed_by")
    .where({ "d.id": deliveryId, "d.shop_id": actor.shopId })
    .first({ byName: "p.name", at: "d.changed_at", version: "d.version" });
  return row ?? null;
}

/** Takes a delivery that has not been tallied off every list; false when it has been, or is not there. */
export async function markDeliveryDeleted(db: Knex, actor: Actor, deliveryId: string, now: Date): Promise<boolean> {
  const changed = await db("deliveries")
    .where({ id: deliveryId, shop_id: actor.shopId, deleted_at: null, tallied_at: null })
    .update({ deleted_at: now, changed_by: actor.personId, changed_at: now, version: db.raw("version + 1") });
  return changed === 1;
}

/** A board of a delivery as it is measured now, corrections included, and what it was charged with. */
export interface LotBoard {
  id: string;
  tag: string;
  species: string;
  quarters: number;
  widthMm: number;
  widthFarMm: number | null;
  lengthMm: number;
  costMinor: number | null;
}

/** The boards of a delivery in tag order, for measuring the lot. Offcuts are left out: their wood is counted in the board they came from. */
export async function listLot(db: Knex, actor: ByShop, deliveryId: string): Promise<LotBoard[]> {
  return db("boards")
    .where({ shop_id: actor.shopId, delivery_id: deliveryId, deleted_at: null, parent_board_id: null })
    .orderBy("tag_number")
    .select({
      id: "id",
      tag: "tag",
      species: "species",
      quarters: "quarters",
      widthMm: "width_mm",
      widthFarMm: "width_far_mm",
      lengthMm: "length_mm",
      costMinor: "cost_minor",
    });
}
