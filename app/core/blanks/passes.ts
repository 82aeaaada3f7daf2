import { requireSize, requireWithin } from "#app/core/moisture/accepted-range.ts";

/** Planer passes that take a thickness off, each at most so deep. A last pass may be shallower. */
export function planerPasses(takeOffMm: number, depthMm: number): number {
  requireWithin("What is taken off", takeOffMm, 0, 1_000, "mm");
  requireSize("Depth of a pass", depthMm);
  return Math.ceil(takeOffMm / depthMm - 1e-9);
}

export interface Resawing {
  /** Cuts that part the blank: one when the blade reaches through, two from both edges when it reaches half. */
  sawPasses: number;
  /** What is left for the planer. */
  leftForPlanerMm: number;
  /** The piece that comes off whole, instead of as shavings; null when it is only kerf. */
  savedMm: number | null;
}

/**
 * Taking a blank down with the saw instead of the planer alone: the saw's line is set so far outside the finished face.
 *
 * @param takeOffMm in all.
 * @param heightMm how tall the piece stands on the saw: its width.
 * @param bladeHeightMm how high the blade cuts.
 * @param kerfMm of the blade.
 * @param leaveMm left for the planer.
 * @returns null when even two passes do not meet, or there is not as much to take off as the kerf and what is left.
 */
export function resawing(
  takeOffMm: number,
  heightMm: number,
  bladeHeightMm: number,
  kerfMm: number,
  leaveMm: number,
): Resawing | null {
  requireWithin("What is taken off", takeOffMm, 0, 1_000, "mm");
  requireSize("Height on the saw", heightMm);
  requireSize("Blade height", bladeHeightMm);
  requireWithin("Kerf", kerfMm, 0, 20, "mm");
  requireWithin("What is left for the planer", leaveMm, 0, 50, "mm");
  const sawPasses = Math.ceil(heightMm / bladeHeightMm - 1e-9);
  if (sawPasses > 2 || takeOffMm < kerfMm + leaveMm - 1e-9) return null;
  const savedMm = takeOffMm - kerfMm - leaveMm;
  return { sawPasses, leftForPlanerMm: leaveMm, savedMm: savedMm > 0.01 ? savedMm : null };
}
