import { type LengthUnit, mmPerInch } from "./parse-length.ts";

/** Writes a length in the shop's unit: to 1/64 in as a fraction, or to 0.1 mm. */
export function printLength(mm: number, unit: LengthUnit): string {
  if (unit === "mm") return String(Math.round(mm * 10) / 10);
  const parts = Math.round((mm / mmPerInch) * 64);
  const whole = Math.floor(parts / 64);
  let top = parts % 64;
  let bottom = 64;
  while (top > 0 && top % 2 === 0) {
    top /= 2;
    bottom /= 2;
  }
  if (top === 0) return String(whole);
  return whole === 0 ? `${top}/${bottom}` : `${whole} ${top}/${bottom}`;
}
