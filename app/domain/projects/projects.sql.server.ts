import type { Knex } from "knex";
import type { Actor } from "#app/domain/shop/actor.ts";

/** A project's name, or null when it is not in this shop. */
export async function projectName(db: Knex, actor: Pick<Actor, "shopId">, projectId: string): Promise<string | null> {
  const row = await db("projects").where({ id: projectId, shop_id: actor.shopId }).first("name");
  return row?.name ?? null;
}
