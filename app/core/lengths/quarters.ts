import { exactMm, mmPerInch } from "./length-unit.ts";

/** 4 is written 4/4: an inch, rough. */
export function printQuarters(quarters: number): string {
  return `${quarters}/4`;
}

/**
 * Rough nominal thickness in millimetres of stock sold in quarters: 4 is 25.4, 5 is 31.75. The measured thickness is
 * another matter and is kept apart: kiln-dried 4/4 may be 15/16 in and still be 4/4.
 *
 * @throws RangeError unless above 0 and at most 40 quarters (10 in).
 */
export function nominalThicknessMm(quarters: number): number {
  return exactMm((requireQuarters(quarters) / 4) * mmPerInch);
}

/** Quarters above 0 and at most 40, refused with a RangeError otherwise. */
export function requireQuarters(quarters: number): number {
  if (quarters > 0 && quarters <= 40) return quarters;
  throw new RangeError(`Quarters must be a number above 0 and at most 40; got ${quarters}.`);
}

/**
 * Standard thickness surfaced on two sides, in inches, by quarters: the size a grader assumes, not what every yard ships
 * (4/4 often comes at 13/16 to 15/16 in, sometimes 3/4). Agreeing trade tables [secondary]; the 10/4 row and Wood
 * Handbook ch. 6 [memory].
 */
const surfacedIn: Readonly<Record<number, number>> = {
  2: 5 / 16,
  3: 9 / 16,
  4: 13 / 16,
  5: 1 + 1 / 16,
  6: 1 + 5 / 16,
  7: 1 + 1 / 2,
  8: 1 + 3 / 4,
  10: 2 + 1 / 4,
  12: 2 + 3 / 4,
  14: 3 + 1 / 4,
  16: 3 + 3 / 4,
};

/** Standard S2S thickness in millimetres, or null for quarters that the tables do not list. */
export function surfacedThicknessMm(quarters: number): number | null {
  const inches = surfacedIn[quarters];
  return inches === undefined ? null : exactMm(inches * mmPerInch);
}
