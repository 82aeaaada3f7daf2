import type { Knex } from "knex";
import { nominalThicknessMm } from "#app/core/lengths/quarters.ts";
import { speciesByCode } from "#app/core/species/species.ts";
import { writeEvents } from "#app/domain/boards/board-events.server.ts";
import { boardMeasure } from "#app/domain/boards/board-measure.ts";
import { searchText } from "#app/domain/boards/search-text.ts";
import type { Actor } from "#app/domain/shop/actor.ts";
import { withTransaction } from "#app/services/db.server.ts";
import { newId } from "#app/services/ids.server.ts";
import { getDelivery } from "./deliveries.sql.server.ts";
import type { Delivery } from "./delivery.ts";
import { deliveryTotalMinor } from "./delivery-cost.ts";
import { shareOut } from "./share-cost.ts";
import type { TallyLine } from "./tally.ts";

export const mostBoardsAtOnce = 2_000;

export type TallySaved =
  | { ok: true; boardIds: string[]; firstTag: string; lastTag: string }
  | { ok: false; why: "missing" | "empty" | "too many" }
  | { ok: false; why: "tallied"; at: Date };

/**
 * Makes the boards of a delivery from its tally, with consecutive tag numbers, in one transaction: all of them or none. A delivery is tallied once;
 * the second of two people saving at once is told so.
 */
export async function saveTally(
  db: Knex,
  actor: Actor,
  deliveryId: string,
  lines: TallyLine[],
  now: Date,
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
    if (locked.tallied_at) return { ok: false, why: "tallied", at: locked.tallied_at };
    const first = await takeTagNumbers(trx, actor, singles.length);
    const costs = shareOutCost(delivery, singles);
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
    );
    await trx("deliveries")
      .where({ id: deliveryId, shop_id: actor.shopId })
      .update({ tallied_at: now, tally_draft: null, version: trx.raw("version + 1") });
    return {
      ok: true,
      boardIds: rows.map((row) => row.id),
      firstTag: rows[0]?.tag ?? "",
      lastTag: rows.at(-1)?.tag ?? "",
    };
  });
}

/** The next numbers of the shop's one counter. The counter's row stays locked until the boards are in, so numbers have no gaps and no doubles. */
async function takeTagNumbers(trx: Knex, actor: Actor, count: number): Promise<number> {
  const shop = await trx("shops").where({ id: actor.shopId }).forUpdate().first("tag_next");
  await trx("shops")
    .where({ id: actor.shopId })
    .update({ tag_next: shop.tag_next + count });
  return shop.tag_next;
}

/** Each board's share of what the delivery costs, freight included, by its measure; null when no price was given. */
function shareOutCost(delivery: Delivery, lines: TallyLine[]): number[] | null {
  const measures = lines.map((line) => boardMeasure({ ...line, widthFarMm: line.widthFarMm ?? null }));
  const total = deliveryTotalMinor(
    delivery,
    measures.reduce((a, b) => a + b, 0),
  );
  return total === null ? null : shareOut(total, measures);
}

function boardRow(actor: Actor, delivery: Delivery, line: TallyLine, tagNumber: number, costMinor: number | null) {
  const prefix = speciesByCode(line.species)?.tagPrefix ?? "B";
  const tag = `${prefix}-${String(tagNumber).padStart(4, "0")}`;
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

/** A tally being typed, as kept on the server between reloads and devices. */
export interface TallyDraft {
  rows: unknown;
  version: number;
}

export async function readTallyDraft(
  db: Knex,
  actor: Pick<Actor, "shopId">,
  deliveryId: string,
): Promise<TallyDraft | null> {
  const row = await db("deliveries")
    .where({ id: deliveryId, shop_id: actor.shopId })
    .first("tally_draft", "tally_draft_version");
  if (!row) return null;
  return { rows: row.tally_draft === null ? null : JSON.parse(row.tally_draft), version: row.tally_draft_version };
}

/** Keeps a half-typed tally, unless a newer one was kept meanwhile or the delivery is tallied. */
export async function keepTallyDraft(
  db: Knex,
  actor: Pick<Actor, "shopId">,
  deliveryId: string,
  draft: TallyDraft,
): Promise<{ kept: boolean; version: number }> {
  const changed = await db("deliveries")
    .where({ id: deliveryId, shop_id: actor.shopId, tally_draft_version: draft.version })
    .whereNull("tallied_at")
    .update({ tally_draft: JSON.stringify(draft.rows), tally_draft_version: draft.version + 1 });
  return { kept: changed === 1, version: changed === 1 ? draft.version + 1 : draft.version };
}
