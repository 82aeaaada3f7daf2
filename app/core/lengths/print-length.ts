import { type LengthUnit, mmPerInch } from "./length-unit.ts";

/** The parts of an inch that rules and saw scales are marked in. */
export type Denominator = 2 | 4 | 8 | 16 | 32 | 64;

/** A length taken apart for setting: sign, whole number, fraction in lowest terms. */
export interface LengthParts {
  sign: "" | "-";
  /** Whole inches; or millimetres with their tenth, the fraction then being nothing. */
  whole: number;
  /** 0 where there is no fraction. */
  numerator: number;
  /** 1 where there is no fraction. */
  denominator: number;
  unit: LengthUnit;
}

/**
 * Takes a length apart in the shop's unit: to the nearest 1/64 in (or a coarser part), or to 0.1 mm.
 *
 * @param mm any finite number; differences of lengths may be negative.
 * @throws RangeError when it is no finite number.
 */
export function lengthParts(mm: number, unit: LengthUnit, finest: Denominator = 64): LengthParts {
  if (!Number.isFinite(mm)) throw new RangeError(`A length must be a finite number of millimetres; got ${mm}.`);
  const size = Math.abs(mm);
  const steps = unit === "mm" ? Math.round(size * 10) : Math.round((size / mmPerInch) * finest);
  const sign = mm < 0 && steps > 0 ? "-" : "";
  if (unit === "mm") return { sign, whole: steps / 10, numerator: 0, denominator: 1, unit };
  let numerator = steps % finest;
  let denominator: number = finest;
  while (denominator > 1 && numerator % 2 === 0) {
    numerator /= 2;
    denominator /= 2;
  }
  return { sign, whole: Math.floor(steps / finest), numerator, denominator, unit };
}

/**
 * Writes a length in the shop's unit without the unit's name: `8 1/4`, `210`, `210.5`. What it writes parseLength reads
 * back as the same length, for every length on the 1/64 in grid or the 0.1 mm grid.
 *
 * @param options.denominator the finest part of an inch to round to, 64 unless told.
 * @param options.feet write inches from one foot up as feet and inches, with their marks: `7' 2 1/2"`. Inches only.
 */
export function printLength(
  mm: number,
  unit: LengthUnit,
  { denominator = 64, feet = false }: { denominator?: Denominator; feet?: boolean } = {},
): string {
  const parts = lengthParts(mm, unit, denominator);
  if (!feet || unit === "mm") return parts.sign + printParts(parts);
  const inches = printParts({ ...parts, whole: parts.whole % 12 });
  const wholeFeet = Math.floor(parts.whole / 12);
  if (wholeFeet === 0) return `${parts.sign}${inches}"`;
  return `${parts.sign}${wholeFeet}'${inches === "0" ? "" : ` ${inches}"`}`;
}

function printParts({ whole, numerator, denominator }: LengthParts): string {
  if (numerator === 0) return String(whole);
  return whole === 0 ? `${numerator}/${denominator}` : `${whole} ${numerator}/${denominator}`;
}
