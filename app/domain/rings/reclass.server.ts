import type { Knex } from "knex";
import type { ClassLimits, RingClass, RingField } from "#app/core/rings/ring-types.ts";
import { dominantClass } from "#app/core/rings/summary.ts";
import type { Actor } from "#app/domain/shop/actor.ts";

const block = 2_000;

/** Classes every read board of a shop anew under other limits, a block at a time. The readings themselves do not change. */
export async function reclassBoards(trx: Knex, actor: Pick<Actor, "shopId">, limits: ClassLimits): Promise<void> {
  let after = "";
  for (;;) {
    const rows: { id: string; ring_class: RingClass; ring_field: RingField | string }[] = await trx("boards")
      .where({ shop_id: actor.shopId })
      .whereNotNull("ring_field")
      .where("id", ">", after)
      .orderBy("id")
      .limit(block)
      .select("id", "ring_class", "ring_field");
    if (rows.length === 0) return;
    after = rows.at(-1)?.id ?? "";
    const moved = new Map<RingClass, string[]>();
    for (const row of rows) {
      const ringClass = dominantClass(fieldOf(row.ring_field), limits);
      if (ringClass !== row.ring_class) moved.set(ringClass, [...(moved.get(ringClass) ?? []), row.id]);
    }
    for (const [ringClass, ids] of moved)
      await trx("boards").where({ shop_id: actor.shopId }).whereIn("id", ids).update({ ring_class: ringClass });
  }
}

/** Parsed by the driver where the server says which columns are JSON; an older server sends text. */
function fieldOf(column: RingField | string): RingField {
  return typeof column === "string" ? JSON.parse(column) : column;
}
