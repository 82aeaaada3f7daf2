import type { Knex } from "knex";
import type { Actor } from "#app/domain/shop/actor.ts";
import type { TallyRow } from "./tally.ts";
import { type KeptDraft, keptDraft } from "./tally-draft.ts";

const inColumn = keptDraft.omit({ version: true });
const nothing = { rows: [], writer: "", byName: "", at: null };

export interface DraftState {
  /** When the delivery was tallied last; what was typed before is then gone. */
  talliedAt: Date | null;
  draft: KeptDraft;
}

/** A delivery's half-typed tally, or null when the delivery is not in this shop. */
export async function readTallyDraft(
  db: Knex,
  actor: Pick<Actor, "shopId">,
  deliveryId: string,
): Promise<DraftState | null> {
  const row = await db("deliveries")
    .where({ id: deliveryId, shop_id: actor.shopId, deleted_at: null })
    .first("tally_draft", "tally_draft_version", "tallied_at");
  if (!row) return null;
  // The driver parses a JSON column of some servers and not of others.
  const column = typeof row.tally_draft === "string" ? JSON.parse(row.tally_draft) : row.tally_draft;
  const kept = column === null ? null : inColumn.safeParse(column);
  return {
    talliedAt: row.tallied_at,
    draft: { ...(kept?.data ?? nothing), version: row.tally_draft_version },
  };
}

export type DraftKept =
  | { kept: true; version: number }
  | { kept: false; why: "newer"; draft: KeptDraft }
  | { kept: false; why: "tallied" };

/**
 * Keeps a half-typed tally, unless another page has kept a newer one meanwhile, which comes back, or the delivery was tallied meanwhile.
 *
 * @param draft.after when the delivery was tallied last as far as this page knows; null for its first tally.
 * @param draft.version the version it was typed over.
 * @returns null when the delivery is not in this shop.
 */
export async function keepTallyDraft(
  db: Knex,
  actor: Pick<Actor, "shopId" | "personName">,
  deliveryId: string,
  draft: { rows: TallyRow[]; version: number; writer: string; after: Date | null },
  now: Date,
): Promise<DraftKept | null> {
  const kept = { rows: draft.rows, writer: draft.writer, byName: actor.personName, at: now.toISOString() };
  const changed = await db("deliveries")
    .where({ id: deliveryId, shop_id: actor.shopId, tally_draft_version: draft.version, deleted_at: null })
    .whereRaw("tallied_at <=> ?", [draft.after])
    .update({ tally_draft: JSON.stringify(kept), tally_draft_version: draft.version + 1 });
  if (changed === 1) return { kept: true, version: draft.version + 1 };
  const current = await readTallyDraft(db, actor, deliveryId);
  if (!current) return null;
  const isTallied = current.talliedAt?.getTime() !== draft.after?.getTime();
  return isTallied ? { kept: false, why: "tallied" } : { kept: false, why: "newer", draft: current.draft };
}
