import type { Knex } from "knex";
import type { WoodStructure } from "#app/core/endgrain/confidence.ts";
import type { ClassLimits } from "#app/core/rings/ring-types.ts";
import { speciesByCode } from "#app/core/species/species.ts";
import type { Board } from "#app/domain/boards/board.ts";
import { mostPhotoBytes } from "#app/domain/photos/photo.ts";
import { photoKey } from "#app/domain/photos/photos.sql.server.ts";
import type { Actor } from "#app/domain/shop/actor.ts";
import type { RingAnswer, RingReader } from "#app/services/ring-reader.server.ts";
import type { Storage } from "#app/services/storage.server.ts";
import type { PicturePoint } from "./read-marks.ts";

/** What is known of a species' pores steers the reader: rays of ring-porous wood must not pass for rings. */
function structureOf(species: string): WoodStructure | undefined {
  const porosity = speciesByCode(species)?.porosity;
  if (porosity === "none") return "softwood";
  return porosity === "ring-porous" || porosity === "diffuse-porous" ? porosity : undefined;
}

/**
 * Lets the reader look at a board's end photo.
 *
 * @param corners where the end lies on it, if a person has said so.
 * @returns null when the photo is not in this shop.
 */
export async function readPhoto(
  services: { db: Knex; storage: Storage; reader: RingReader },
  actor: Pick<Actor, "shopId">,
  board: Pick<Board, "species" | "widthMm" | "thicknessMm">,
  photoId: string,
  limits: ClassLimits,
  corners?: PicturePoint[],
): Promise<RingAnswer | null> {
  const key = await photoKey(services.db, actor, photoId, "original");
  const bytes = key && (await services.storage.read(key, mostPhotoBytes * 2));
  if (!bytes) return null;
  const { widthMm, thicknessMm, species } = board;
  return services.reader.ask({ bytes, corners, widthMm, thicknessMm, limits, structure: structureOf(species) });
}
