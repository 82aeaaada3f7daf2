import type { Knex } from "knex";
import type { Actor } from "#app/domain/shop/actor.ts";
import type { Photo, PhotoKind, PhotoSize } from "./photo.ts";

type ByShop = Pick<Actor, "shopId">;

export interface WaitingPhoto {
  id: string;
  boardId: string;
  kind: PhotoKind;
  uploadKey: string;
}

/** Photos of boards that are in this shop now. Every query on single photos starts here: what shows a deleted board is gone with it. */
function photosOf(db: Knex, actor: ByShop): Knex.QueryBuilder {
  return db("photos as f")
    .join("boards as b", "b.id", "f.board_id")
    .where("f.shop_id", actor.shopId)
    .whereNull("b.deleted_at");
}

/** A board's photos, ends first, newest first within a kind. */
export async function listPhotos(db: Knex, actor: ByShop, boardId: string): Promise<Photo[]> {
  return db("photos as f")
    .join("people as p", "p.id", "f.added_by")
    .where({ "f.shop_id": actor.shopId, "f.board_id": boardId, "f.state": "ready" })
    .orderByRaw("FIELD(f.kind, 'near end', 'far end', 'heart face', 'bark face', 'edge'), f.created_at DESC")
    .select({
      id: "f.id",
      kind: "f.kind",
      widthPx: "f.width_px",
      heightPx: "f.height_px",
      generated: "f.generated",
      addedBy: "p.name",
      addedAt: "f.created_at",
    });
}

/** One photo that has been taken in, with its board, or null. */
export async function getPhoto(
  db: Knex,
  actor: ByShop,
  photoId: string,
): Promise<(Photo & { boardId: string }) | null> {
  const row = await photosOf(db, actor)
    .join("people as p", "p.id", "f.added_by")
    .where({ "f.id": photoId, "f.state": "ready" })
    .first({
      id: "f.id",
      boardId: "f.board_id",
      kind: "f.kind",
      widthPx: "f.width_px",
      heightPx: "f.height_px",
      generated: "f.generated",
      addedBy: "p.name",
      addedAt: "f.created_at",
    });
  return row ?? null;
}

/** Where one size of a photo is kept, or null. */
export async function photoKey(db: Knex, actor: ByShop, photoId: string, size: PhotoSize): Promise<string | null> {
  const row = await photosOf(db, actor)
    .where({ "f.id": photoId, "f.state": "ready" })
    .first("f.original_key", "f.screen_key", "f.small_key");
  if (!row) return null;
  return size === "original" ? row.original_key : size === "screen" ? row.screen_key : row.small_key;
}

export async function insertWaitingPhoto(db: Knex, actor: Actor, photo: WaitingPhoto): Promise<void> {
  await db("photos").insert({
    id: photo.id,
    shop_id: actor.shopId,
    board_id: photo.boardId,
    kind: photo.kind,
    original_key: photo.uploadKey,
    added_by: actor.personId,
  });
}

/** A photo announced and not yet confirmed, or null. */
export async function getWaitingPhoto(db: Knex, actor: ByShop, photoId: string): Promise<WaitingPhoto | null> {
  const row = await photosOf(db, actor)
    .where({ "f.id": photoId, "f.state": "waiting" })
    .first({ id: "f.id", boardId: "f.board_id", kind: "f.kind", uploadKey: "f.original_key" });
  return row ?? null;
}

/** Announced long ago and never confirmed: their files, if any, are to be swept. */
export async function listStaleWaiting(db: Knex, actor: ByShop, before: Date, limit: number): Promise<WaitingPhoto[]> {
  return db("photos")
    .where({ shop_id: actor.shopId, state: "waiting" })
    .where("created_at", "<", before)
    .limit(limit)
    .select({ id: "id", boardId: "board_id", kind: "kind", uploadKey: "original_key" });
}

export interface ReadyPhoto {
  originalKey: string;
  screenKey: string;
  smallKey: string;
  contentType: string;
  bytes: number;
  widthPx: number;
  heightPx: number;
}

/** Marks a waiting photo as taken in; false when somebody else already did. */
export async function markReady(db: Knex, actor: ByShop, photoId: string, ready: ReadyPhoto): Promise<boolean> {
  const changed = await db("photos").where({ id: photoId, shop_id: actor.shopId, state: "waiting" }).update({
    state: "ready",
    original_key: ready.originalKey,
    screen_key: ready.screenKey,
    small_key: ready.smallKey,
    content_type: ready.contentType,
    bytes: ready.bytes,
    width_px: ready.widthPx,
    height_px: ready.heightPx,
  });
  return changed === 1;
}

export async function deleteWaiting(db: Knex, actor: ByShop, photoId: string): Promise<void> {
  await db("photos").where({ id: photoId, shop_id: actor.shopId, state: "waiting" }).delete();
}

/** Takes a photo's row away and says which files it had; null when it is not that board's. Readings made from it keep what they read. */
export async function deletePhotoRow(
  trx: Knex,
  actor: ByShop,
  boardId: string,
  photoId: string,
): Promise<{ kind: PhotoKind; keys: string[] } | null> {
  // Locked, so that of two people removing it one finds it gone.
  const row = await photosOf(trx, actor)
    .where({ "f.id": photoId, "f.board_id": boardId, "f.state": "ready" })
    .forUpdate()
    .first("f.kind", "f.original_key", "f.screen_key", "f.small_key");
  if (!row) return null;
  await trx("ring_readings").where({ photo_id: photoId, shop_id: actor.shopId }).update({ photo_id: null });
  await trx("photos").where({ id: photoId, shop_id: actor.shopId }).delete();
  return { kind: row.kind, keys: [row.original_key, row.screen_key, row.small_key] };
}
