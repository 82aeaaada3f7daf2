import { requireMoisture, requireSize, requireWithin } from "#app/core/moisture/accepted-range.ts";

/** Moisture between which the linear coefficients hold (Wood Handbook ch. 13). */
export const coefficientRangePct = { low: 6, high: 14 };

/** Moisture at which shrinkage begins for all but a few woods, percent. */
export const shrinkageStartPct = 30;

/**
 * Change of a size in mm by Wood Handbook Eq. 13-2: size x C x (to - from). `coefficient` is the change per 1 % of
 * moisture. Meant for 6-14 %; the caller says so outside it. The size is the one at `fromPct`, so going there and back
 * leaves size x (C x change)^2, under 0.15 % of the size at the very most and a hundredth of that in a room.
 */
export function changeByCoefficient(sizeMm: number, coefficient: number, fromPct: number, toPct: number): number {
  requireSize("Size", sizeMm);
  return sizeMm * growthByCoefficient(coefficient, fromPct, toPct);
}

/**
 * Change of a size in mm by Wood Handbook Eq. 13-3: size x (to - from) / (3000/S - 30 + from), with S the shrinkage
 * from green to ovendry in percent. For woods that begin to shrink at another moisture, that one takes the place of 30.
 * Moisture above it counts as that moisture. There and back is zero.
 */
export function changeByShrinkage(
  sizeMm: number,
  shrinkagePct: number,
  fromPct: number,
  toPct: number,
  startsAtPct = shrinkageStartPct,
): number {
  requireSize("Size", sizeMm);
  return sizeMm * growthByShrinkage(shrinkagePct, fromPct, toPct, startsAtPct);
}

/** Eq. 13-2 as a fraction of the size at `fromPct`. */
export function growthByCoefficient(coefficient: number, fromPct: number, toPct: number): number {
  requireWithin("Coefficient", coefficient, 0, 0.02, "per 1 % of moisture");
  return coefficient * (requireMoisture("Moisture after", toPct) - requireMoisture("Moisture before", fromPct));
}

/** Eq. 13-3 as a fraction of the size at `fromPct`. */
export function growthByShrinkage(
  shrinkagePct: number,
  fromPct: number,
  toPct: number,
  startsAtPct = shrinkageStartPct,
): number {
  requireWithin("Shrinkage", shrinkagePct, 0.01, 30, "%");
  requireWithin("Moisture where shrinkage begins", startsAtPct, 15, 40, "%");
  const before = Math.min(requireMoisture("Moisture before", fromPct), startsAtPct);
  const after = Math.min(requireMoisture("Moisture after", toPct), startsAtPct);
  return (after - before) / ((100 * startsAtPct) / shrinkagePct - startsAtPct + before);
}

/** Shrinkage from green to `moisturePct`, percent of the green size: Wood Handbook (2021) Eq. 4-9. */
export function shrinkageToPct(shrinkagePct: number, moisturePct: number, startsAtPct = shrinkageStartPct): number {
  requireWithin("Shrinkage", shrinkagePct, 0, 30, "%");
  return shrinkagePct * (1 - Math.min(requireMoisture("Moisture", moisturePct), startsAtPct) / startsAtPct);
}

/**
 * The coefficient of Eq. 13-2 that follows from a shrinkage, with the size at 10 % as its base, which is the base of
 * Table 13-5: it returns 71 of the table's rows within 0.00002 [derived, trade reference section 4].
 */
export function coefficientFromShrinkage(shrinkagePct: number, startsAtPct = shrinkageStartPct): number {
  requireWithin("Shrinkage", shrinkagePct, 0, 30, "%");
  const perPoint = shrinkagePct / 100 / startsAtPct;
  return perPoint / (1 - (startsAtPct - 10) * perPoint);
}
