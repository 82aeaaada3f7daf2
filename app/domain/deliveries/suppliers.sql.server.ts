import type { Knex } from "knex";
import { z } from "zod";
import type { Actor } from "#app/domain/shop/actor.ts";
import { newId } from "#app/services/ids.server.ts";

type ByShop = Pick<Actor, "shopId">;

export interface Supplier {
  id: string;
  name: string;
  email: string;
  phone: string;
  notes: string;
  version: number;
}

/** A supplier as typed. */
export const supplierForm = z.object({
  name: z
    .string({ error: "Name the supplier." })
    .trim()
    .min(1, "Name the supplier.")
    .max(120, "At most 120 characters."),
  email: z.union([z.literal(""), z.email("That is not an e-mail address.")]).default(""),
  phone: z.string().trim().max(40, "At most 40 characters.").default(""),
  notes: z.string().trim().max(4000, "At most 4,000 characters.").default(""),
});

export type SupplierForm = z.infer<typeof supplierForm>;

const columns = ["id", "name", "email", "phone", "notes", "version"] as const;

/** The shop's suppliers by name, each with how many deliveries came from it. */
export async function listSuppliers(db: Knex, actor: ByShop): Promise<(Supplier & { deliveries: number })[]> {
  return db("suppliers as s")
    .leftJoin("deliveries as d", "d.supplier_id", "s.id")
    .where("s.shop_id", actor.shopId)
    .groupBy("s.id")
    .orderBy("s.name")
    .select(columns.map((column) => `s.${column}`))
    .count({ deliveries: "d.id" }) as never;
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
  actor: ByShop,
  supplierId: string,
  version: number,
  form: SupplierForm,
): Promise<boolean> {
  const changed = await db("suppliers")
    .where({ id: supplierId, shop_id: actor.shopId, version })
    .update({ ...form, version: version + 1 });
  return changed === 1;
}
