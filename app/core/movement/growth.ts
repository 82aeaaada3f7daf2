import { requireMoisture } from "#app/core/moisture/accepted-range.ts";
import { type Confidence, type Species, sourceName } from "#app/core/species/species.ts";
import { coefficientRangePct, growthByCoefficient, growthByShrinkage } from "./size-change.ts";

/**
 * Which published figures to use. They disagree for imports, and for species that the coefficient table lumps into a
 * group ("red oak, commercial"). "coefficient-table": Table 13-5 with Eq. 13-2 from 6 to 14 %, and the species' own
 * shrinkage with Eq. 13-3 outside that, as the handbook directs. "shrinkage-table": Table 4-3 or 4-4 with Eq. 13-3
 * throughout.
 */
export type MovementBasis = "coefficient-table" | "shrinkage-table";

/** Table 13-5 is made for wood in use. */
export const defaultBasis: MovementBasis = "coefficient-table";

/** Single pieces commonly stray this share from a species' mean, either way [memory, Wood Handbook ch. 4]. */
export const pieceSpread = 0.25;

/** Growth along and across the rings as fractions of the size before; negative for shrinking. */
export interface Growth {
  radial: number;
  tangential: number;
  /** The table that the figures came from, which may not be the one asked for; `note` then says why. */
  basis: MovementBasis;
  formula: "Eq. 13-2" | "Eq. 13-3";
  source: string;
  confidence: Confidence;
  note: string | null;
  outsideRange: string | null;
}

/** The question: a species going from one moisture to another, percent. */
export interface MoistureStep {
  species: Species;
  fromPct: number;
  toPct: number;
}

/**
 * How a species grows or shrinks going from one moisture to another, by the table asked for or, where that one has no
 * row, by the other. Null where neither has one. Average clear wood; see `pieceSpread`. RangeError for bad moistures.
 */
export function growthOf(step: MoistureStep, basis: MovementBasis = defaultBasis): Growth | null {
  requireMoisture("Moisture before", step.fromPct);
  requireMoisture("Moisture after", step.toPct);
  if (basis === "shrinkage-table") {
    return byShrinkage(step, null) ?? byCoefficient(step, "No shrinkage is published for this species.");
  }
  if (isInCoefficientRange(step)) {
    return byCoefficient(step, null) ?? byShrinkage(step, "No coefficients are published for this species.");
  }
  return byShrinkage(step, "Outside 6-14 % the handbook works from shrinkage.") ?? byCoefficient(step, null);
}

/** Both tables' answers side by side, null where a table has no row of its own for the species. */
export interface BothGrowths {
  coefficientTable: Growth | null;
  shrinkageTable: Growth | null;
  /** True where they differ by more than a tenth of the larger in either direction. */
  disagree: boolean;
}

/** What each table says on its own, so that a shop can see the difference and choose. */
export function growthByBoth(step: MoistureStep): BothGrowths {
  const coefficientTable = byCoefficient(step, null);
  const shrinkageTable = byShrinkage(step, null);
  const apart = (a: number, b: number) => Math.abs(a - b) > 0.1 * Math.max(Math.abs(a), Math.abs(b));
  const disagree =
    coefficientTable !== null &&
    shrinkageTable !== null &&
    (apart(coefficientTable.radial, shrinkageTable.radial) ||
      apart(coefficientTable.tangential, shrinkageTable.tangential));
  return { coefficientTable, shrinkageTable, disagree };
}

function isInCoefficientRange({ fromPct, toPct }: MoistureStep): boolean {
  const { low, high } = coefficientRangePct;
  return Math.min(fromPct, toPct) >= low && Math.max(fromPct, toPct) <= high;
}

function byCoefficient(step: MoistureStep, reason: string | null): Growth | null {
  const { coefficients } = step.species;
  if (!coefficients || coefficients.radial === null || coefficients.tangential === null) return null;
  const group =
    coefficients.covers === "group" ? "Table 13-5 prints one pair of coefficients for the whole group." : null;
  return {
    radial: growthByCoefficient(coefficients.radial, step.fromPct, step.toPct),
    tangential: growthByCoefficient(coefficients.tangential, step.fromPct, step.toPct),
    basis: "coefficient-table",
    formula: "Eq. 13-2",
    source: sourceName(coefficients.source),
    confidence: coefficients.confidence,
    note: [reason, group].filter(Boolean).join(" ") || null,
    outsideRange: isInCoefficientRange(step) ? null : "The coefficients are published for 6 to 14 % moisture.",
  };
}

function byShrinkage(step: MoistureStep, reason: string | null): Growth | null {
  const { shrinkage } = step.species;
  if (!shrinkage) return null;
  const { radialPct, tangentialPct, startsAtPct } = shrinkage;
  const isWet = Math.max(step.fromPct, step.toPct) > 30;
  return {
    radial: growthByShrinkage(radialPct, step.fromPct, step.toPct, startsAtPct),
    tangential: growthByShrinkage(tangentialPct, step.fromPct, step.toPct, startsAtPct),
    basis: "shrinkage-table",
    formula: "Eq. 13-3",
    source: sourceName(shrinkage.source),
    confidence: shrinkage.confidence,
    note: reason,
    outsideRange: isWet ? `Wood does not move above ${startsAtPct} %: counted from there.` : null,
  };
}
