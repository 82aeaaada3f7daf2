import { requireWithin } from "./accepted-range.ts";

/**
 * Moisture of a sample weighed wet and again ovendry, percent of the ovendry mass: (wet - dry) / dry x 100 (Wood
 * Handbook ch. 13; ASTM D4442 [memory]). Masses in grams. RangeError unless both are above zero and wet >= dry.
 */
export function ovenDryMoisturePct(wetG: number, ovendryG: number): number {
  requireWithin("Ovendry mass", ovendryG, 0.001, 1e6, "g");
  requireWithin("Wet mass", wetG, ovendryG, ovendryG * 7, "g (no less than the ovendry mass)");
  return ((wetG - ovendryG) / ovendryG) * 100;
}
