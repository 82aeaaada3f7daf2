import type { Knex } from "knex";
import type { Actor } from "#app/domain/shop/actor.ts";
import { newId } from "#app/services/ids.server.ts";

let serial = 0;

/** A racked 4/4 white oak board, 8 in by 96 in, unless told otherwise in the table's own columns. */
export async function aBoard(
  db: Knex,
  actor: Pick<Actor, "shopId">,
  given: Record<string, unknown> = {},
): Promise<{ id: string; tag: string; lengthMm: number }> {
  const number = ++serial;
  const row = {
    id: newId(),
    shop_id: actor.shopId,
    tag_number: number,
    tag: `WO-${String(number).padStart(4, "0")}`,
    species: "white-oak",
    quarters: 4,
    thickness_mm: 25.4,
    length_mm: 2438.4,
    width_mm: 203.2,
    search_text: `WO-${String(number).padStart(4, "0")} White oak`,
    ...given,
  };
  await db("boards").insert(row);
  return { id: row.id, tag: row.tag, lengthMm: Number(row.length_mm) };
}

/** A project that boards can be reserved for. */
export async function aProject(
  db: Knex,
  actor: Actor,
  given: { name?: string; crayon?: string } = {},
): Promise<{ id: string; name: string }> {
  const project = { id: newId(), name: given.name ?? `Project ${++serial}` };
  await db("projects").insert({
    ...project,
    shop_id: actor.shopId,
    crayon: given.crayon ?? "blue",
    created_by: actor.personId,
  });
  return project;
}
