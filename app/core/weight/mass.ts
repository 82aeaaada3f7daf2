import { requireSize } from "#app/core/moisture/accepted-range.ts";
import type { Species } from "#app/core/species/species.ts";
import { densityOf } from "./density.ts";

/** A piece of one wood. `widthFarMm` for a tapering board (null: same width at both ends). */
export interface Piece {
  species: Species;
  moisturePct: number;
  lengthMm: number;
  widthMm: number;
  widthFarMm?: number | null;
  thicknessMm: number;
}

/** The mass of several pieces, and how many could not be weighed because their species has no specific gravity. */
export interface TotalMass {
  massKg: number;
  weighed: number;
  unknown: number;
}

/** Volume of a board in m3 at its measured sizes; a tapering one by the mean of its end widths. RangeError for a size. */
export function volumeM3({
  lengthMm,
  widthMm,
  widthFarMm,
  thicknessMm,
}: Omit<Piece, "species" | "moisturePct">): number {
  const far = widthFarMm ?? widthMm;
  requireSize("Length", lengthMm);
  requireSize("Width", widthMm);
  requireSize("Width at the far end", far);
  requireSize("Thickness", thicknessMm);
  return (lengthMm * ((widthMm + far) / 2) * thicknessMm) / 1e9;
}

/** Mass of one board in kg at its measured sizes and moisture; null where the species has no specific gravity. */
export function boardMassKg(piece: Piece): number | null {
  const volume = volumeM3(piece);
  const density = densityOf(piece.species, piece.moisturePct);
  return density && volume * density.densityKgM3;
}

/** Mass of several pieces in kg: the plies of a blank, a stack, or what lies on one arm. */
export function totalMassKg(pieces: readonly Piece[]): TotalMass {
  const masses = pieces.map(boardMassKg);
  const known = masses.filter((mass) => mass !== null);
  return {
    massKg: known.reduce((sum, mass) => sum + mass, 0),
    weighed: known.length,
    unknown: masses.length - known.length,
  };
}
