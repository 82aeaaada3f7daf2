import type { Knex } from "knex";
import type { Actor } from "#app/domain/shop/actor.ts";
import type { DeliveryDocument } from "./document.ts";

type ByShop = Pick<Actor, "shopId">;

/** A delivery's papers, oldest first. */
export async function listDocuments(db: Knex, actor: ByShop, deliveryId: string): Promise<DeliveryDocument[]> {
  return db("delivery_documents as f")
    .join("people as p", "p.id", "f.created_by")
    .where({ "f.shop_id": actor.shopId, "f.delivery_id": deliveryId, "f.state": "ready" })
    .orderBy(["f.created_at", "f.id"])
    .select({
      id: "f.id",
      name: "f.name",
      contentType: "f.content_type",
      bytes: "f.bytes",
      addedBy: "p.name",
      addedAt: "f.created_at",
    });
}

export interface KeptDocument {
  id: string;
  deliveryId: string;
  name: string;
  contentType: string;
  objectKey: string;
}

/** One paper that was announced, or that has been taken in, or null. */
export async function getDocument(
  db: Knex,
  actor: ByShop,
  documentId: string,
  state: "waiting" | "ready",
): Promise<KeptDocument | null> {
  const row = await db("delivery_documents as f")
    .join("deliveries as d", "d.id", "f.delivery_id")
    .where({ "f.id": documentId, "f.shop_id": actor.shopId, "f.state": state, "d.deleted_at": null })
    .first({
      id: "f.id",
      deliveryId: "f.delivery_id",
      name: "f.name",
      contentType: "f.content_type",
      objectKey: "f.object_key",
    });
  return row ?? null;
}

export async function insertWaitingDocument(
  db: Knex,
  actor: Actor,
  document: { id: string; deliveryId: string; name: string; objectKey: string },
): Promise<void> {
  await db("delivery_documents").insert({
    id: document.id,
    shop_id: actor.shopId,
    delivery_id: document.deliveryId,
    name: document.name,
    object_key: document.objectKey,
    created_by: actor.personId,
  });
}

/** Announced long ago and never confirmed: their files, if any, are to be swept. */
export async function listStaleDocuments(
  db: Knex,
  actor: ByShop,
  before: Date,
  limit: number,
): Promise<{ id: string; objectKey: string }[]> {
  return db("delivery_documents")
    .where({ shop_id: actor.shopId, state: "waiting" })
    .where("created_at", "<", before)
    .limit(limit)
    .select({ id: "id", objectKey: "object_key" });
}

/** Marks a waiting paper as taken in; false when somebody else already did. */
export async function markDocumentReady(
  db: Knex,
  actor: ByShop,
  documentId: string,
  ready: { name: string; objectKey: string; contentType: string; bytes: number },
): Promise<boolean> {
  const changed = await db("delivery_documents")
    .where({ id: documentId, shop_id: actor.shopId, state: "waiting" })
    .update({
      state: "ready",
      name: ready.name,
      object_key: ready.objectKey,
      content_type: ready.contentType,
      bytes: ready.bytes,
    });
  return changed === 1;
}

/** Takes a paper's row away; false when there was none in that state. */
export async function deleteDocumentRow(
  db: Knex,
  actor: ByShop,
  documentId: string,
  state: "waiting" | "ready",
): Promise<boolean> {
  return (await db("delivery_documents").where({ id: documentId, shop_id: actor.shopId, state }).delete()) === 1;
}
