import type { Knex } from "knex";
import { nominalThicknessMm } from "#app/core/lengths/quarters.ts";
import { writeEvents } from "#app/domain/boards/board-events.server.ts";
import { searchText } from "#app/domain/boards/search-text.ts";
import { tagFor, takeTagNumbers } from "#app/domain/boards/tag-numbers.server.ts";
import type { Actor } from "#app/domain/shop/actor.ts";
import { withTransaction } from "#app/services/db.server.ts";
import { newId } from "#app/services/ids.server.ts";
import { shareCostAgain } from "./deliveries.server.ts";
import { getDelivery } from "./deliveries.sql.server.ts";
import type { Delivery } from "./delivery.ts";
import { boardCostsMinor } from "./delivery-cost.ts";
import { mostBoardsAtOnce, type TallyLine } from "./tally.ts";

export type TallySaved =
  | { ok: true; boardIds: string[]; firstTag: string; lastTag: string }
  | { ok: false; why: "missing" | "empty" | "too many" }
  | { ok: false; why: "tallied"; at: Date };

/**
 * Makes the boards of a delivery from its tally, with consecutive tag numbers, in one transaction: all of them or none. The second of two people
 * saving at once is told so. Boards that were missed are added the same way, and the cost is then shared out anew over all of them.
 *
 * @param after when the delivery was tallied last as far as this person knows; null for its first tally.
 */
export async function saveTally(
  db: Knex,
  actor: Actor,
  deliveryId: string,
  lines: TallyLine[],
  now: Date,
  after: Date | null = null,
): Promise<TallySaved> {
  const singles = lines.flatMap((line) => Array.from({ length: line.count }, () => line));
  if (singles.length === 0) return { ok: false, why: "empty" };
  if (singles.length > mostBoardsAtOnce) return { ok: false, why: "too many" };
  return withTransaction(db, async (trx) => {
    const locked = await trx("deliveries")
      .where({ id: deliveryId, shop_id: actor.shopId })
      .forUpdate()
      .first("tallied_at");
    const delivery = locked ? await getDelivery(trx, actor, deliveryId) : null;
    if (!locked || !delivery) return { ok: false, why: "missing" };
    const talliedAt: Date | null = locked.tallied_at;
    if (talliedAt && talliedAt.getTime() !== after?.getTime()) return { ok: false, why: "tallied", at: talliedAt };
    const first = await takeTagNumbers(trx, actor, singles.length);
    const costs = talliedAt ? null : boardCostsMinor(delivery, singles);
    const rows = singles.map((line, index) => boardRow(actor, delivery, line, first + index, costs?.[index] ?? null));
    await trx.batchInsert("boards", rows, 500);
    await writeEvents(
      trx,
      actor,
      rows.map((row) => ({
        boardId: row.id,
        kind: "received",
        detail: { from: delivery.supplierName, reference: delivery.reference },
      })),
      now,
    );
    await trx("deliveries")
      .where({ id: deliveryId, shop_id: actor.shopId })
      .update({
        tallied_at: now,
        tally_draft: null,
        changed_by: actor.personId,
        changed_at: now,
        version: trx.raw("version + 1"),
      });
    if (talliedAt) await shareCostAgain(trx, actor, deliveryId);
    return {
      ok: true,
      boardIds: rows.map((row) => row.id),
      firstTag: rows[0]?.tag ?? "",
      lastTag: rows.at(-1)?.tag ?? "",
    };
  });
}

function boardRow(actor: Actor, delivery: Delivery, line: TallyLine, tagNumber: number, costMinor: number | null) {
  const tag = tagFor(line.species, tagNumber);
  const words = {
    tag,
    species: line.species,
    grade: delivery.grade,
    figureKind: "",
    figureWhere: "",
    colourNote: "",
    notes: "",
    logName: "",
  };
  return {
    id: newId(),
    shop_id: actor.shopId,
    tag_number: tagNumber,
    tag,
    delivery_id: delivery.id,
    species: line.species,
    quarters: line.quarters,
    thickness_mm: nominalThicknessMm(line.quarters),
    length_mm: line.lengthMm,
    width_mm: line.widthMm,
    width_far_mm: line.widthFarMm ?? null,
    grade: delivery.grade,
    cost_minor: costMinor,
    search_text: searchText(words),
  };
}
