import type { Knex } from "knex";
import { reclassBoards } from "#app/domain/rings/reclass.server.ts";
import { withTransaction } from "#app/services/db.server.ts";
import type { Actor } from "./actor.ts";
import type { ShopForm } from "./shop.schema.ts";
import { getShop, updateShop } from "./shops.sql.server.ts";

/**
 * Saves a shop's settings made from the given version; false when somebody saved before. When the limits of the ring classes move, every board is
 * classed anew in the same transaction, so that lists and pages never disagree.
 */
export async function changeShop(db: Knex, actor: Actor, version: number, form: ShopForm): Promise<boolean> {
  return withTransaction(db, async (trx) => {
    const before = await getShop(trx, actor.shopId);
    if (!before || !(await updateShop(trx, actor.shopId, version, form))) return false;
    const { flatBelowDeg, quarteredAboveDeg } = form;
    const moved =
      before.classLimits.flatBelowDeg !== flatBelowDeg || before.classLimits.quarteredAboveDeg !== quarteredAboveDeg;
    if (moved) await reclassBoards(trx, actor, { flatBelowDeg, quarteredAboveDeg });
    return true;
  });
}
