import type { PointMm } from "./ring-types.ts";

const degPerRad = 180 / Math.PI;

/**
 * Direction of the ring through a point, for rings that are circles round the pith: -90 to 90 degrees to the wide face, positive where the ring
 * falls to the right (y points down). 0 is flat, ±90 quartered. At the pith itself no ring has a direction; 0 is given.
 */
export function signedRingDeg({ xMm, yMm }: PointMm, pith: PointMm): number {
  const across = xMm - pith.xMm;
  const down = yMm - pith.yMm;
  // The tangent is square to the radius. Adding 0 turns -0 into 0.
  return Math.atan2(down < 0 ? across : -across, Math.abs(down)) * degPerRad + 0;
}

/** Ring angle at a point: the acute angle between the ring and the wide face, 0 (flat) to 90 (quartered) degrees. */
export function ringAngleDeg(point: PointMm, pith: PointMm): number {
  return Math.abs(signedRingDeg(point, pith));
}

/** The same direction of a line brought into -90 (left out) to 90 degrees; a line has no front, so 180 more is the same line. */
export function foldDeg(deg: number): number {
  return deg - 180 * Math.ceil((deg - 90) / 180) + 0;
}

/** Mean direction of lines, -90 to 90 degrees, and how well they agree: strength 1 when all are parallel, 0 when they point everywhere alike. */
export function axialMean(signedDegs: Iterable<number>): { signedDeg: number; strength: number } {
  let cos = 0;
  let sin = 0;
  let count = 0;
  for (const deg of signedDegs) {
    cos += Math.cos((2 * deg) / degPerRad);
    sin += Math.sin((2 * deg) / degPerRad);
    count += 1;
  }
  return { signedDeg: (Math.atan2(sin, cos) / 2) * degPerRad, strength: count ? Math.hypot(cos, sin) / count : 0 };
}
