import type { Knex } from "knex";
import type { Actor } from "#app/domain/shop/actor.ts";
import { newId } from "#app/services/ids.server.ts";
import type { SupplierForm } from "./supplier.schema.ts";

type ByShop = Pick<Actor, "shopId">;

export interface Supplier {
  id: string;
  name: string;
  email: string;
  phone: string;
  notes: string;
  version: number;
}

export interface SupplierSummary extends Supplier {
  deliveries: number;
  /** YYYY-MM-DD of the newest delivery, or null. */
  lastReceivedOn: string | null;
}

const columns = ["id", "name", "email", "phone", "notes", "version"] as const;

/** The shop's suppliers by name, each with how many deliveries came from it and when the last one did. */
export async function listSuppliers(db: Knex, actor: ByShop): Promise<SupplierSummary[]> {
  return db("suppliers as s")
    .leftJoin("deliveries as d", (join) => join.on("d.supplier_id", "s.id").andOnNull("d.deleted_at"))
    .where("s.shop_id", actor.shopId)
    .groupBy("s.id")
    .orderBy("s.name")
    .select(columns.map((column) => `s.${column}`))
    .count({ deliveries: "d.id" })
    .max({ lastReceivedOn: "d.received_on" }) as never;
}

/** One supplier, or null. */
export async function getSupplier(db: Knex, actor: ByShop, supplierId: string): Promise<Supplier | null> {
  return (await db("suppliers").where({ id: supplierId, shop_id: actor.shopId }).first(columns)) ?? null;
}

/** Adds a supplier. @throws duplicate key suppliers_name. */
export async function insertSupplier(db: Knex, actor: ByShop, form: SupplierForm): Promise<string> {
  const id = newId();
  await db("suppliers").insert({ id, shop_id: actor.shopId, ...form });
  return id;
}

/** The supplier of this name, added when the shop has none. Two people naming the same one at once get the same. */
export async function supplierNamed(db: Knex, actor: ByShop, name: string): Promise<string> {
  await db("suppliers").insert({ id: newId(), shop_id: actor.shopId, name }).onConflict().ignore();
  const row = await db("suppliers").where({ shop_id: actor.shopId, name }).first("id");
  return row.id;
}

/** Saves a supplier made from the given version; false when it has changed since. @throws duplicate key suppliers_name. */
export async function updateSupplier(
  db: Knex,
  actor: Pick<Actor, "shopId" | "personId">,
  supplierId: string,
  version: number,
  form: SupplierForm,
  now: Date,
): Promise<boolean> {
  const changed = await db("suppliers")
    .where({ id: supplierId, shop_id: actor.shopId, version })
    .update({ ...form, changed_by: actor.personId, changed_at: now, version: version + 1 });
  return changed === 1;
}

/** Who changed a supplier last, and when; nulls when nobody has since it was added. */
export async function lastSupplierChange(
  db: Knex,
  actor: ByShop,
  supplierId: string,
): Promise<{ byName: string | null; at: Date | null; version: number } | null> {
  const row = await db("suppliers as s")
    .leftJoin("people as p", "p.id", "s.changed_by")
    .where({ "s.id": supplierId, "s.shop_id": actor.shopId })
    .first({ byName: "p.name", at: "s.changed_at", version: "s.version" });
  return row ?? null;
}
