import type { Knex } from "knex";
import { writeEvent } from "#app/domain/boards/board-events.server.ts";
import { getBoard } from "#app/domain/boards/boards.sql.server.ts";
import { readUpload } from "#app/domain/files/read-upload.server.ts";
import type { Actor } from "#app/domain/shop/actor.ts";
import { withTransaction } from "#app/services/db.server.ts";
import { newId } from "#app/services/ids.server.ts";
import { newStorageKey, type PresignedPut, type Storage } from "#app/services/storage.server.ts";
import { inspectPicture } from "./inspect-picture.server.ts";
import { mostPhotoBytes, type PhotoKind, type PhotoRefusal } from "./photo.ts";
import {
  deletePhotoRow,
  deleteWaiting,
  getPhoto,
  getWaitingPhoto,
  insertWaitingPhoto,
  listStaleWaiting,
  markReady,
  type WaitingPhoto,
} from "./photos.sql.server.ts";

const staleAfterMs = 24 * 3_600_000;

/**
 * Announces a photo and hands out an address to send it to. Nothing shows until it is confirmed.
 *
 * @returns null when the board is not in this shop.
 */
export async function beginPhoto(
  db: Knex,
  storage: Storage,
  actor: Actor,
  photo: { boardId: string; kind: PhotoKind; bytes: number; contentType: string },
  now: Date,
): Promise<{ id: string; put: PresignedPut } | null> {
  if (!(await getBoard(db, actor, photo.boardId))) return null;
  await sweepStale(db, storage, actor, now);
  const waiting: WaitingPhoto = {
    id: newId(),
    boardId: photo.boardId,
    kind: photo.kind,
    uploadKey: newStorageKey("uploads"),
  };
  const put = await storage.presignPut(waiting.uploadKey, { bytes: photo.bytes, contentType: photo.contentType });
  await insertWaitingPhoto(db, actor, waiting);
  return { id: waiting.id, put };
}

export type PhotoConfirmed =
  | { ok: true; photoId: string; boardId: string }
  | { ok: false; why: PhotoRefusal | "missing" };

/**
 * Takes in a photo that was sent: reads what arrived, believes only its bytes, strips where it was taken, makes the sizes it is shown in.
 * A refused one leaves nothing behind. The address it was sent to stays open for a while, so nothing that is shown is kept there.
 * Said twice, it is taken in once, and both are told so.
 */
export async function confirmPhoto(db: Knex, storage: Storage, actor: Actor, photoId: string): Promise<PhotoConfirmed> {
  const waiting = await getWaitingPhoto(db, actor, photoId);
  if (!waiting) return takenAlready(db, actor, photoId);
  const arrived = await readUpload(storage, waiting.uploadKey, mostPhotoBytes);
  if (!arrived.ok) {
    if (arrived.why !== "not arrived") {
      await drop(db, storage, actor, waiting);
      return arrived;
    }
    // Either it was taken in meanwhile and its upload is gone, or it may still come: its row waits for another try.
    const taken = await takenAlready(db, actor, photoId);
    return taken.ok ? taken : arrived;
  }
  const picture = await inspectPicture(arrived.bytes);
  if (!picture.ok) {
    await drop(db, storage, actor, waiting);
    return picture;
  }
  const keys = {
    originalKey: newStorageKey("photos", picture.extension),
    screenKey: newStorageKey("photos", "webp"),
    smallKey: newStorageKey("photos", "webp"),
  };
  const puts = await Promise.allSettled([
    storage.put(keys.originalKey, picture.original, picture.contentType),
    storage.put(keys.screenKey, picture.screen, "image/webp"),
    storage.put(keys.smallKey, picture.small, "image/webp"),
  ]);
  const forget = () => Promise.allSettled(Object.values(keys).map((key) => storage.delete(key)));
  const failed = puts.find((put) => put.status === "rejected");
  if (failed) {
    await forget();
    throw failed.reason;
  }
  const { contentType, widthPx, heightPx } = picture;
  const isFirst = await withTransaction(db, async (trx) => {
    const ready = { ...keys, contentType, widthPx, heightPx, bytes: picture.original.byteLength };
    if (!(await markReady(trx, actor, photoId, ready))) return false;
    await writeEvent(trx, actor, waiting.boardId, "photographed", { kind: waiting.kind });
    return true;
  });
  // Pressed twice: the first press won, this one's files go.
  if (!isFirst) await forget();
  if (!isFirst) return takenAlready(db, actor, photoId);
  await storage.delete(waiting.uploadKey);
  return { ok: true, photoId, boardId: waiting.boardId };
}

async function takenAlready(db: Knex, actor: Actor, photoId: string): Promise<PhotoConfirmed> {
  const photo = await getPhoto(db, actor, photoId);
  return photo ? { ok: true, photoId, boardId: photo.boardId } : { ok: false, why: "missing" };
}

async function drop(db: Knex, storage: Storage, actor: Actor, waiting: WaitingPhoto): Promise<void> {
  await storage.delete(waiting.uploadKey);
  await deleteWaiting(db, actor, waiting.id);
}

async function sweepStale(db: Knex, storage: Storage, actor: Actor, now: Date): Promise<void> {
  const stale = await listStaleWaiting(db, actor, new Date(now.getTime() - staleAfterMs), 20);
  for (const waiting of stale) await drop(db, storage, actor, waiting);
}

/** Removes a board's photo and its files. Readings made from it stay. False when it is not that board's, or not in this shop. */
export async function removePhoto(
  db: Knex,
  storage: Storage,
  actor: Actor,
  boardId: string,
  photoId: string,
): Promise<boolean> {
  const removed = await withTransaction(db, async (trx) => {
    const row = await deletePhotoRow(trx, actor, boardId, photoId);
    if (row) await writeEvent(trx, actor, boardId, "photo removed", { kind: row.kind });
    return row;
  });
  if (!removed) return false;
  await Promise.all(removed.keys.map((key) => storage.delete(key)));
  return true;
}
