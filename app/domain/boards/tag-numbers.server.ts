import type { Knex } from "knex";
import { speciesByCode } from "#app/core/species/species.ts";
import type { Actor } from "#app/domain/shop/actor.ts";

/** The next numbers of the shop's one counter. The counter's row stays locked until the boards are in, so numbers have no gaps and no doubles. */
export async function takeTagNumbers(trx: Knex, actor: Pick<Actor, "shopId">, count: number): Promise<number> {
  const shop = await trx("shops").where({ id: actor.shopId }).forUpdate().first("tag_next");
  await trx("shops")
    .where({ id: actor.shopId })
    .update({ tag_next: shop.tag_next + count });
  return shop.tag_next;
}

/** A tag as it is printed and said: letters for the species, then the number. */
export function tagFor(species: string, tagNumber: number): string {
  return `${speciesByCode(species)?.tagPrefix ?? "B"}-${String(tagNumber).padStart(4, "0")}`;
}
