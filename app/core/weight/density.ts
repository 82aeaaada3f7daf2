import { requireMoisture, requireWithin } from "#app/core/moisture/accepted-range.ts";
import type { Species } from "#app/core/species/species.ts";

/** Moisture at which wood begins to shrink, unless a species says otherwise (Wood Handbook ch. 4). */
const fibreSaturationPct = 30;

/** Specific gravity of the wood substance that Eq. 4-3 uses. */
const substance = 1.54;

// Above this Eq. 4-12 gives more than 24 % and a density that falls as water is added, which no wood's does (seen with
// lignumvitae): our own limit.
const densestEstimated = 0.9;
const tooDense = "The shrinkage of so dense a wood is a poor estimate; expect a tenth either way.";

/** Volume shrinkage from green to `moisturePct`, percent of green: Wood Handbook (2021) Eq. 4-9. Zero from 30 % up. */
export function volumeShrinkagePct(greenToOvendryPct: number, moisturePct: number): number {
  requireWithin("Volumetric shrinkage", greenToOvendryPct, 0, 40, "%");
  requireMoisture("Moisture", moisturePct);
  return greenToOvendryPct * Math.max(0, 1 - moisturePct / fibreSaturationPct);
}

/** Volumetric shrinkage green to ovendry where none is published: 26.5 x basic specific gravity, Eq. 4-12 (Stamm 1964). */
export function estimatedVolumetricShrinkagePct(basicGravity: number): number {
  return 26.5 * requireGravity(basicGravity);
}

/** Specific gravity on the volume at `moisturePct`, from the basic one: Eq. 4-11. */
export function gravityAt(basicGravity: number, greenToOvendryPct: number, moisturePct: number): number {
  return requireGravity(basicGravity) / (1 - volumeShrinkagePct(greenToOvendryPct, moisturePct) / 100);
}

/** The most water wood can hold, percent of its ovendry mass: Eq. 4-3. */
export function greatestMoisturePct(basicGravity: number): number {
  requireGravity(basicGravity);
  return (100 * (substance - basicGravity)) / (substance * basicGravity);
}

/** The moisture at which a board sinks in water, percent: Eq. 4-4. Zero for wood that sinks dry. */
export function sinkingMoisturePct(basicGravity: number): number {
  return Math.max(0, (100 * (1 - requireGravity(basicGravity))) / basicGravity);
}

/** Density of a species at a moisture, and what it rests on. */
export interface Density {
  densityKgM3: number;
  /** True where the volumetric shrinkage is not published and was estimated (Eq. 4-12). */
  isShrinkageEstimated: boolean;
  outsideRange: string | null;
}

/**
 * Density in kg/m3, water included: 1000 G(1 + M/100) with G on the volume at that moisture, Wood Handbook (2021)
 * Eq. 4-11 and 4-14. Starts from the basic specific gravity (trap: not the 12 % column). Null where the species has
 * none. RangeError for a moisture that this wood cannot hold. Single boards commonly stray 10 % and more from the mean.
 */
export function densityOf(species: Species, moisturePct: number): Density | null {
  const basic = species.specificGravity?.basic ?? null;
  if (basic === null) return null;
  requireWithin("Moisture", moisturePct, 0, Math.floor(greatestMoisturePct(basic)), `% (${species.commonName})`);
  const published = species.volumetricShrinkage?.pct ?? null;
  const shrinkagePct = published ?? estimatedVolumetricShrinkagePct(basic);
  return {
    densityKgM3: 1000 * gravityAt(basic, shrinkagePct, moisturePct) * (1 + moisturePct / 100),
    isShrinkageEstimated: published === null,
    outsideRange: published === null && basic > densestEstimated ? tooDense : null,
  };
}

/** Pounds per board foot of actual volume, from kg/m3 (1 kg/m3 = 0.062428 lb/ft3; 12 board feet to the cubic foot). */
export function poundsPerBoardFoot(densityKgM3: number): number {
  return (requireWithin("Density", densityKgM3, 1, 2500, "kg/m3") * 0.0624279606) / 12;
}

function requireGravity(gravity: number): number {
  return requireWithin("Basic specific gravity", gravity, 0.05, 1.4);
}
