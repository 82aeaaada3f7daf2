import { mmPerFoot, mmPerInch } from "#app/core/lengths/length-unit.ts";
import { requireSize } from "#app/core/moisture/accepted-range.ts";
import { countedThicknessIn, type MeasuredBoard, tallyWidthMm } from "./measured-board.ts";

/** Whether a length counts down to its whole feet, as the trade counts it, or as it is. */
export type LengthRule = "whole feet" | "as measured";

/** Keeps 9 ft from becoming 8 by the noise of arithmetic. */
const noiseFt = 0.0001;

/** A length in feet as it is counted: down to whole feet, always. AHEC, Measurement [confirmed]. Under a foot is none. */
export function wholeFeet(lengthMm: number): number {
  return Math.floor(requireSize("Length", lengthMm) / mmPerFoot + noiseFt);
}

/**
 * Surface measure of a board in ft2, before it is rounded: width (in) x length (ft) / 12; of a tapering board, the width a
 * third from the narrow end. AHEC; NHLA 2015 p. 7 para. 16 [confirmed]. Thickness has no part in it.
 *
 * @throws RangeError for a size that is none.
 */
export function surfaceMeasureFt2(board: Omit<MeasuredBoard, "quarters">, lengths: LengthRule = "whole feet"): number {
  const feet = lengths === "whole feet" ? wholeFeet(board.lengthMm) : requireSize("Length", board.lengthMm) / mmPerFoot;
  return ((tallyWidthMm(board) / mmPerInch) * feet) / 12;
}

/**
 * Board feet of a surface measure: x nominal thickness in inches, under 4/4 counting as 1 in. NHLA 2023 p. 9 para. 18
 * [confirmed]. Give a rounded measure for the trade's figure, the bare one for the figure beside it.
 */
export function boardFeet(surfaceFt2: number, quarters: number): number {
  return surfaceFt2 * countedThicknessIn(quarters);
}
