import type { Knex } from "knex";
import type { Actor } from "#app/domain/shop/actor.ts";
import { boardsOf } from "./boards.sql.server.ts";

/** Codes of the species the shop has boards of, for the list's filter. Read off an index, so it is quick on a full rack. */
export async function speciesInShop(db: Knex, actor: Pick<Actor, "shopId">): Promise<string[]> {
  const rows: { species: string }[] = await boardsOf(db, actor).distinct("b.species").orderBy("b.species");
  return rows.map((row) => row.species);
}
