import { mmPerFoot } from "#app/core/lengths/length-unit.ts";

/** A board foot is 144 in3, a twelfth of a cubic foot (AHEC, Measurement [confirmed]). */
export const boardFeetPerFt3 = 12;

/** 423.776 to three decimals, from the definition of the foot [derived]. */
export const boardFeetPerM3 = boardFeetPerFt3 / (mmPerFoot / 1000) ** 3;

/** How volumes of lumber are bought. */
export type VolumeUnit = "bf" | "m3";

/** A volume said in another unit. The definition only: rounding of a tally is not undone. */
export function convertVolume(volume: number, from: VolumeUnit, to: VolumeUnit): number {
  if (from === to) return volume;
  return from === "bf" ? volume / boardFeetPerM3 : volume * boardFeetPerM3;
}
