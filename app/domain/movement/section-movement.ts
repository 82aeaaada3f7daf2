import { type Cup, expectedCup, isCup, type NoCup } from "#app/core/movement/cup.ts";
import { type Growth, growthByBoth, growthOf, type MovementBasis } from "#app/core/movement/growth.ts";
import { type SectionMovement, sectionMovement } from "#app/core/movement/section-movement.ts";
import type { RingField } from "#app/core/rings/ring-types.ts";
import type { Species } from "#app/core/species/species.ts";
import { type DrawnMovement, drawMovement } from "./draw-movement.ts";

/** What going from one moisture to another does to a board's section, with its drawing and what it rests on. */
export interface MovedSection {
  fromPct: number;
  toPct: number;
  widthMm: number;
  thicknessMm: number;
  growth: Growth;
  section: SectionMovement;
  cup: Omit<Cup, "profile"> | NoCup;
  drawn: DrawnMovement;
  /** The other table's width change, where both have the species and they differ by more than a tenth; null elsewhere. */
  otherTable: { basis: MovementBasis; widthChangeMm: number } | null;
}

interface MoveQuestion {
  field: RingField;
  species: Species;
  fromPct: number;
  toPct: number;
  basis?: MovementBasis;
}

/** Moves a section. Null where no table has the species. RangeError for sizes and moistures that make no sense. */
export function moveSection({ field, species, fromPct, toPct, basis }: MoveQuestion): MovedSection | null {
  const step = { species, fromPct, toPct };
  const growth = growthOf(step, basis);
  if (!growth) return null;
  return {
    fromPct,
    toPct,
    widthMm: field.widthMm,
    thicknessMm: field.thicknessMm,
    growth,
    section: sectionMovement(field, growth),
    cup: withoutProfile(expectedCup(field, growth)),
    drawn: drawMovement(field, growth),
    otherTable: otherTable(step, field, growth),
  };
}

function withoutProfile(cup: Cup | NoCup): MovedSection["cup"] {
  if (!isCup(cup)) return cup;
  const { heightMm, hollowFace, hollowSide } = cup;
  return { heightMm, hollowFace, hollowSide };
}

function otherTable(
  step: { species: Species; fromPct: number; toPct: number },
  field: RingField,
  used: Growth,
): MovedSection["otherTable"] {
  const { coefficientTable, shrinkageTable, disagree } = growthByBoth(step);
  const other = used.basis === "coefficient-table" ? shrinkageTable : coefficientTable;
  if (!disagree || !other) return null;
  return { basis: other.basis, widthChangeMm: sectionMovement(field, other).widthChangeMm };
}

/** True where a cup could be told. */
export function hasCup(cup: MovedSection["cup"]): cup is Omit<Cup, "profile"> {
  return "heightMm" in cup;
}
