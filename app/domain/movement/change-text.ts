import { mmPerInch } from "#app/core/lengths/length-unit.ts";
import type { LengthUnit } from "#app/core/lengths/parse-length.ts";

/** A small change of size with its sign, finer than a rule reads: "+0.067 in", "−1.70 mm". */
export function printChange(mm: number, units: LengthUnit): string {
  const [value, digits] = units === "in" ? [mm / mmPerInch, 3] : [mm, 2];
  const figure = Math.abs(value).toFixed(digits);
  const sign = Number(figure) === 0 ? "" : value < 0 ? "−" : "+";
  return `${sign}${figure} ${units}`;
}

/** A small size without a sign: "0.067 in". */
export function printSmall(mm: number, units: LengthUnit): string {
  return printChange(Math.abs(mm), units).replace("+", "");
}
