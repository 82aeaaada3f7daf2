/** The two ways a shop writes sizes. Lengths are kept in millimetres whichever it is, so nothing is lost by switching. */
export type LengthUnit = "in" | "mm";

/** Exact by definition since 1959. */
export const mmPerInch = 25.4;
export const mmPerFoot = 304.8;

/**
 * Millimetres rounded to a millionth. A 64th of an inch is 0.396875 mm, so every length on that grid keeps its exact
 * decimal value while the noise of binary arithmetic goes: two lengths typed in different ways compare as equal.
 */
export function exactMm(mm: number): number {
  return Math.round(mm * 1e6) / 1e6;
}
