import type { Knex } from "knex";
import { readUpload } from "#app/domain/files/read-upload.server.ts";
import type { Actor } from "#app/domain/shop/actor.ts";
import { newId } from "#app/services/ids.server.ts";
import { newStorageKey, type PresignedPut, type Storage } from "#app/services/storage.server.ts";
import { getDelivery } from "./deliveries.sql.server.ts";
import { type DocumentRefusal, documentName, mostDocumentBytes } from "./document.ts";
import {
  deleteDocumentRow,
  getDocument,
  insertWaitingDocument,
  listStaleDocuments,
  markDocumentReady,
} from "./documents.sql.server.ts";
import { inspectDocument } from "./inspect-document.server.ts";

const staleAfterMs = 24 * 3_600_000;

/**
 * Announces a paper of a delivery and hands out an address to send it to. Nothing shows until it is confirmed.
 *
 * @returns null when the delivery is not in this shop.
 */
export async function beginDocument(
  db: Knex,
  storage: Storage,
  actor: Actor,
  file: { deliveryId: string; name: string; bytes: number; contentType: string },
  now: Date,
): Promise<{ id: string; put: PresignedPut } | null> {
  if (!(await getDelivery(db, actor, file.deliveryId))) return null;
  await sweepStale(db, storage, actor, now);
  const id = newId();
  const objectKey = newStorageKey("uploads");
  const put = await storage.presignPut(objectKey, { bytes: file.bytes, contentType: file.contentType });
  const name = documentName(file.name, file.contentType);
  await insertWaitingDocument(db, actor, { id, deliveryId: file.deliveryId, name, objectKey });
  return { id, put };
}

export type DocumentConfirmed = { ok: true } | { ok: false; why: DocumentRefusal | "missing" };

/**
 * Takes in a paper that was sent: reads what arrived and believes only its bytes. A refused one leaves nothing behind.
 * The address it was sent to stays open for a while, so what is handed out later is kept elsewhere.
 */
export async function confirmDocument(
  db: Knex,
  storage: Storage,
  actor: Actor,
  documentId: string,
): Promise<DocumentConfirmed> {
  const waiting = await getDocument(db, actor, documentId, "waiting");
  // Said twice, it is taken in once, and both are told so.
  if (!waiting)
    return (await getDocument(db, actor, documentId, "ready")) ? { ok: true } : { ok: false, why: "missing" };
  const arrived = await readUpload(storage, waiting.objectKey, mostDocumentBytes);
  // One that has not arrived may still: its row waits for another try.
  if (!arrived.ok && arrived.why === "not arrived") return arrived;
  const document = arrived.ok ? await inspectDocument(arrived.bytes) : arrived;
  if (!document.ok) {
    await dropWaiting(db, storage, actor, waiting);
    return document;
  }
  const { contentType, extension, bytes } = document;
  const objectKey = newStorageKey("documents", extension);
  await storage.put(objectKey, bytes, contentType);
  const ready = { name: documentName(waiting.name, contentType), objectKey, contentType, bytes: bytes.byteLength };
  // Pressed twice: the first press won, this one's file goes.
  if (!(await markDocumentReady(db, actor, documentId, ready))) await storage.delete(objectKey);
  await storage.delete(waiting.objectKey);
  return { ok: true };
}

/** Removes a paper and its file; null when it is not in this shop. */
export async function removeDocument(
  db: Knex,
  storage: Storage,
  actor: Actor,
  documentId: string,
): Promise<{ deliveryId: string } | null> {
  const document = await getDocument(db, actor, documentId, "ready");
  if (!document) return null;
  if (await deleteDocumentRow(db, actor, documentId, "ready")) await storage.delete(document.objectKey);
  return { deliveryId: document.deliveryId };
}

async function dropWaiting(
  db: Knex,
  storage: Storage,
  actor: Actor,
  waiting: { id: string; objectKey: string },
): Promise<void> {
  await storage.delete(waiting.objectKey);
  await deleteDocumentRow(db, actor, waiting.id, "waiting");
}

async function sweepStale(db: Knex, storage: Storage, actor: Actor, now: Date): Promise<void> {
  const stale = await listStaleDocuments(db, actor, new Date(now.getTime() - staleAfterMs), 20);
  for (const waiting of stale) await dropWaiting(db, storage, actor, waiting);
}
