import type { PointPx } from "#app/core/endgrain/pith-fit.ts";

/** Longest side, pixels, that a whole photograph is decoded to: enough for an end that fills half of it. */
const LONGEST_PHOTO_PX = 1600;
/** Longest side of the end itself that is worth decoding. */
const LONGEST_END_PX = 1100;

/**
 * Width and height to decode a photograph to before reading it (never larger than it is): a JPEG decoder that skips detail is
 * several times faster than one that decodes twelve megapixels. With corners (in the photograph's own pixels) the end itself
 * decides.
 */
export function decodeSize(
  photo: { width: number; height: number },
  corners?: readonly PointPx[],
): { width: number; height: number; scale: number } {
  let scale = LONGEST_PHOTO_PX / Math.max(photo.width, photo.height);
  if (corners && corners.length === 4) {
    const longest = Math.max(
      ...corners.map((p, i) => Math.hypot(p.x - corners[(i + 1) % 4]!.x, p.y - corners[(i + 1) % 4]!.y)),
    );
    if (longest > 1) scale = LONGEST_END_PX / longest;
  }
  scale = Math.min(1, scale);
  return {
    width: Math.max(1, Math.round(photo.width * scale)),
    height: Math.max(1, Math.round(photo.height * scale)),
    scale,
  };
}
