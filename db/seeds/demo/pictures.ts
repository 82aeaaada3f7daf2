import type { Knex } from "knex";
import sharp from "sharp";
import { inspectPicture } from "#app/domain/photos/inspect-picture.server.ts";
import type { PhotoKind } from "#app/domain/photos/photo.ts";
import type { Actor } from "#app/domain/shop/actor.ts";
import { newId } from "#app/services/ids.server.ts";
import { newStorageKey, type Storage } from "#app/services/storage.server.ts";
import { type RgbPicture, renderEnd } from "#scripts/endgrain/render-end.ts";
import type { WoodKindName } from "#scripts/endgrain/wood-kinds.ts";
import { drawFace } from "./draw-face.ts";

export interface DrawnBoard {
  id: string;
  widthMm: number;
  thicknessMm: number;
  lengthMm: number;
  pith: { xMm: number; yMm: number };
  ringsPerInch: number;
  kind: WoodKindName;
  seed: number;
}

/** Draws the near end of a board and keeps it as its photo, marked as generated. @returns the photo's id and size in pixels. */
export async function addEndPicture(db: Knex, storage: Storage, actor: Actor, board: DrawnBoard, at: Date) {
  const picture = renderEnd({ ...board, pxPerMm: 5, roughness: 0.35 });
  return keep(db, storage, actor, board.id, "near end", await onBench(picture, 26), at);
}

/** Draws the upper face and keeps it likewise. */
export async function addFacePicture(db: Knex, storage: Storage, actor: Actor, board: DrawnBoard, at: Date) {
  const picture = drawFace({ ...board, lengthMm: Math.min(board.lengthMm, 1400), pxPerMm: 0.9 });
  return keep(db, storage, actor, board.id, "heart face", await onBench(picture, 18), at);
}

const bench = { r: 62, g: 66, b: 64 };

/** A margin of workbench round the wood, so that corners have something to be found against. */
function onBench({ width, height, data }: RgbPicture, margin: number): Promise<Buffer> {
  return sharp(data, { raw: { width, height, channels: 3 } })
    .extend({ top: margin * 2, bottom: margin * 2, left: margin, right: margin, background: bench })
    .jpeg({ quality: 84 })
    .toBuffer();
}

async function keep(
  db: Knex,
  storage: Storage,
  actor: Actor,
  boardId: string,
  kind: PhotoKind,
  jpeg: Buffer,
  at: Date,
) {
  const picture = await inspectPicture(jpeg);
  if (!picture.ok) throw new Error(`a demo picture was refused: ${picture.why}`);
  const keys = {
    original: newStorageKey("photos", "jpg"),
    screen: newStorageKey("photos", "webp"),
    small: newStorageKey("photos", "webp"),
  };
  await Promise.all([
    storage.put(keys.original, picture.original, picture.contentType),
    storage.put(keys.screen, picture.screen, "image/webp"),
    storage.put(keys.small, picture.small, "image/webp"),
  ]);
  const id = newId();
  await db("photos").insert({
    id,
    shop_id: actor.shopId,
    board_id: boardId,
    kind,
    state: "ready",
    original_key: keys.original,
    screen_key: keys.screen,
    small_key: keys.small,
    content_type: picture.contentType,
    bytes: picture.original.byteLength,
    width_px: picture.widthPx,
    height_px: picture.heightPx,
    generated: true,
    added_by: actor.personId,
    created_at: at,
  });
  return { id, widthPx: picture.widthPx, heightPx: picture.heightPx };
}
