import { exactMm, mmPerInch } from "./length-unit.ts";

/**
 * Thinnest that kiln-dried rough stock of a nominal thickness may be, in millimetres: 1/16 in scant from 3/8 to 1-3/4 in,
 * 1/8 in scant from 2 in up. Between the two the rule says nothing and the smaller allowance is taken.
 * NHLA 2023 p. 56, Standard Kiln Dried Rule [confirmed; all rows but 5/4 derived].
 *
 * @param nominalMm nominal thickness, mm.
 * @returns null under 3/8 in, where the rule does not reach.
 */
export function kilnDriedMinimumMm(nominalMm: number): number | null {
  const inches = exactMm(nominalMm) / mmPerInch;
  if (!(inches >= 3 / 8)) return null;
  return exactMm(nominalMm - (inches < 2 ? 1 / 16 : 1 / 8) * mmPerInch);
}

/**
 * Narrowest that a board of a grade's least width may be after kiln drying, in millimetres: 1/4 in scant; for the 10 %
 * of pieces that may fall below, 1/2 in. NHLA 2023 p. 56 [confirmed].
 */
export function kilnDriedMinimumWidthMm(leastWidthMm: number): { mostPiecesMm: number; tenPercentMm: number } {
  return {
    mostPiecesMm: exactMm(leastWidthMm - mmPerInch / 4),
    tenPercentMm: exactMm(leastWidthMm - mmPerInch / 2),
  };
}
