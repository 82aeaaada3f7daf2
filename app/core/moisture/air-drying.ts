import { requireSize, requireWithin } from "./accepted-range.ts";

/**
 * Days for 1 in lumber to air-dry to 20 % in the United States, by species code: from good weather and siting to poor.
 * USDA air-drying handbooks, Air Drying of Lumber FPL-GTR-117 [memory].
 */
const airDryingDaysForOneInch: Readonly<Record<string, readonly [number, number]>> = {
  "red-maple": [30, 120],
  "silver-maple": [30, 120],
  "yellow-poplar": [40, 150],
  "sugar-maple": [50, 200],
  "white-ash": [60, 200],
  "black-cherry": [70, 200],
  "black-walnut": [70, 200],
  "american-beech": [70, 200],
  "northern-red-oak": [70, 200],
  "white-oak": [80, 250],
};

/**
 * Days for green stock of this thickness to air-dry to 20 %, shortest and longest, or null for a species not in the
 * table. Time grows with thickness to the power 1.5, a common estimate [memory]. Air drying then stops near the outdoor
 * equilibrium, 12-15 % in the humid states: furniture wood still needs a kiln or a heated room.
 */
export function airDryingDays(
  speciesCode: string,
  thicknessMm: number,
): { shortestDays: number; longestDays: number; outsideRange: string | null } | null {
  requireSize("Thickness", thicknessMm);
  const oneInch = airDryingDaysForOneInch[speciesCode];
  if (!oneInch) return null;
  const factor = (thicknessMm / 25.4) ** 1.5;
  const beyond = thicknessMm < 19 || thicknessMm > 80;
  return {
    shortestDays: oneInch[0] * factor,
    longestDays: oneInch[1] * factor,
    outsideRange: beyond ? "The published times are for 1 in lumber; this is far from it." : null,
  };
}

/** The old rule "a year per inch" (common practice, no source), in years; real times run from weeks to most of a year. */
export function yearPerInchRule(thicknessMm: number): number {
  return requireWithin("Thickness", thicknessMm, 0.001, 1000, "mm") / 25.4;
}
