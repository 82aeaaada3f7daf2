import type { Knex } from "knex";
import type { Role } from "#app/domain/shop/permissions.ts";

/** What a person is in a shop, or null when they have no business there. */
export async function membershipOf(
  db: Knex,
  personId: string,
  shopId: string,
): Promise<{ shopId: string; role: Role } | null> {
  const row = await db("memberships")
    .where({ person_id: personId, shop_id: shopId })
    .first({ shopId: "shop_id", role: "role" });
  return row ?? null;
}
