import type { PointPx } from "#app/core/endgrain/pith-fit.ts";

/** The end's corners in the photograph, pixels: top left, top right, bottom right, bottom left as the board is looked at. */
export type EndCorners = [PointPx, PointPx, PointPx, PointPx];

/** Why corners cannot be used. */
export type CornerProblem = "corners-not-numbers" | "corners-outside" | "corners-crossed" | "corners-too-close";

/** A corner may be dragged this far past the picture's edge (pixels) before it counts as outside. */
const EDGE_SLACK_PX = 2;
/** Shortest side an end can be read on, pixels. */
export const LEAST_SIDE_PX = 24;

/** Checks that four corners lie in the picture, run round it once without crossing, and span something. @returns null when they do. */
export function cornerProblem(
  corners: readonly PointPx[],
  picture: { width: number; height: number },
): CornerProblem | null {
  if (corners.length !== 4 || corners.some((p) => !Number.isFinite(p.x) || !Number.isFinite(p.y)))
    return "corners-not-numbers";
  const { width, height } = picture;
  if (
    corners.some(
      (p) =>
        p.x < -EDGE_SLACK_PX || p.y < -EDGE_SLACK_PX || p.x > width + EDGE_SLACK_PX || p.y > height + EDGE_SLACK_PX,
    )
  ) {
    return "corners-outside";
  }
  const sides = corners.map((p, i) => Math.hypot(p.x - corners[(i + 1) % 4]!.x, p.y - corners[(i + 1) % 4]!.y));
  if (sides.some((side) => side < 1)) return "corners-too-close";
  const turns = corners.map((p, i) => {
    const q = corners[(i + 1) % 4]!;
    const r = corners[(i + 2) % 4]!;
    return (q.x - p.x) * (r.y - q.y) - (q.y - p.y) * (r.x - q.x);
  });
  // All turns clockwise (y down) is a convex end looked at from the front; anything else is crossed, dented or seen in a mirror.
  if (turns.some((turn) => turn <= 0)) return "corners-crossed";
  return sides.some((side) => side < LEAST_SIDE_PX) ? "corners-too-close" : null;
}

/** The whole picture as the end. */
export function wholePicture(picture: { width: number; height: number }): EndCorners {
  return [
    { x: 0, y: 0 },
    { x: picture.width, y: 0 },
    { x: picture.width, y: picture.height },
    { x: 0, y: picture.height },
  ];
}
