import { nominalThicknessMm } from "#app/core/lengths/quarters.ts";
import { requireSize } from "#app/core/moisture/accepted-range.ts";
import type { MeasuredBoard } from "./measured-board.ts";
import { boardFeetPerM3 } from "./volume-units.ts";

/**
 * The wood that is there, m3, nothing rounded: thickness x mean width x length. The measured thickness where there is
 * one, else the nominal, which for stock under 4/4 is its own and not an inch. The mean of both ends' widths, which for
 * straight edges is the width at mid-length, as unedged boards are measured [practice]. So it adds up over crosscuts.
 *
 * @throws RangeError for a size that is none.
 */
export function volumeM3({ quarters, thicknessMm, widthMm, widthFarMm, lengthMm }: MeasuredBoard): number {
  const thickness = thicknessMm == null ? nominalThicknessMm(quarters) : requireSize("Thickness", thicknessMm);
  const near = requireSize("Width", widthMm);
  const far = widthFarMm == null ? near : requireSize("Width at the far end", widthFarMm);
  return (thickness * ((near + far) / 2) * requireSize("Length", lengthMm)) / 1e9;
}

/** The same in board feet of 144 in3. A kiln-dried 4/4 board measured at 15/16 in holds 6 % less than it is sold as. */
export function trueBoardFeet(board: MeasuredBoard): number {
  return volumeM3(board) * boardFeetPerM3;
}
