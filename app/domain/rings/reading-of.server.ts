import type { ClassLimits } from "#app/core/rings/ring-types.ts";
import type { Board } from "#app/domain/boards/board.ts";
import type { Photo } from "#app/domain/photos/photo.ts";
import type { Actor } from "#app/domain/shop/actor.ts";
import { pithMethod, strokesMethod } from "./methods.ts";
import { readPhoto } from "./photo-reading.server.ts";
import { type RingMarks, readMarks } from "./read-marks.ts";
import type { NewReading } from "./rings.sql.server.ts";

/**
 * The reading to keep of a photo with a person's marks on it: strokes count before a moved pith, that before the reader's own word. Everything is read
 * again here from the marks; nothing the page computed is believed.
 */
export async function readingOf(
  services: Parameters<typeof readPhoto>[0],
  actor: Actor,
  board: Board,
  photo: Pick<Photo, "id" | "kind">,
  marks: RingMarks,
  limits: ClassLimits,
): Promise<{ ok: true; reading: NewReading } | { ok: false; why: string }> {
  const common = {
    boardEnd: photo.kind === "far end" ? ("far" as const) : ("near" as const),
    photoId: photo.id,
    inputs: marks,
  };
  const answer = await readPhoto(services, actor, board, photo.id, limits, marks.corners);
  if (!answer) return { ok: false, why: "The photo is not there any more." };
  // However the rings run, the reader has counted them.
  const byHand = readMarks(marks, board, answer.ok ? answer.field.ringsPerInch : null);
  if (byHand && !byHand.ok) return byHand;
  if (byHand) {
    const { field, confidence, from } = byHand;
    const methodVersion = from === "strokes" ? strokesMethod : pithMethod;
    return { ok: true, reading: { ...common, source: "strokes", methodVersion, field, confidence } };
  }
  if (!answer.ok) return { ok: false, why: answer.message };
  const { field, confidence, methodVersion } = answer;
  return { ok: true, reading: { ...common, source: "photo", methodVersion, field, confidence } };
}
