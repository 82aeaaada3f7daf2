import type { Knex } from "knex";
import type { Actor } from "#app/domain/shop/actor.ts";
import { isDuplicateKey } from "#app/services/db.server.ts";
import type { SupplierForm } from "./supplier.schema.ts";
import { insertSupplier, lastSupplierChange, updateSupplier } from "./suppliers.sql.server.ts";

export type SupplierSaved =
  | { ok: true }
  | { ok: false; why: "name taken" | "missing" }
  | { ok: false; why: "changed"; byName: string | null; at: Date | null; version: number };

/** Adds a supplier. Two of one shop cannot share a name. */
export async function addSupplier(db: Knex, actor: Actor, form: SupplierForm): Promise<SupplierSaved> {
  return orNameTaken(async () => {
    await insertSupplier(db, actor, form);
    return { ok: true };
  });
}

/** Changes a supplier, unless somebody else has since the form was opened. */
export async function changeSupplier(
  db: Knex,
  actor: Actor,
  supplierId: string,
  version: number,
  form: SupplierForm,
  now: Date,
): Promise<SupplierSaved> {
  return orNameTaken(async () => {
    if (await updateSupplier(db, actor, supplierId, version, form, now)) return { ok: true };
    const last = await lastSupplierChange(db, actor, supplierId);
    return last ? { ok: false, why: "changed", ...last } : { ok: false, why: "missing" };
  });
}

async function orNameTaken(save: () => Promise<SupplierSaved>): Promise<SupplierSaved> {
  try {
    return await save();
  } catch (error) {
    if (isDuplicateKey(error, "suppliers_name")) return { ok: false, why: "name taken" };
    throw error;
  }
}
