import { speciesByCode } from "#app/core/species/species.ts";
import { boardMassKg } from "#app/core/weight/mass.ts";
import type { BoardSummary } from "#app/domain/boards/board.ts";

/** What a board weighs by its measured sizes, or null where its species has no specific gravity. */
export interface BoardWeight {
  massKg: number;
  moisturePct: number;
  /** True where nobody has metered it and kiln-dried stock was assumed. */
  isMoistureAssumed: boolean;
}

/** Moisture taken for a board that has not been metered: kiln-dried stock in a heated shop. Common practice. */
const unmeteredPct = 8;

/** Weighs a board from its record. */
export function boardWeight(
  board: Pick<BoardSummary, "species" | "moisturePct" | "lengthMm" | "widthMm" | "widthFarMm" | "thicknessMm">,
): BoardWeight | null {
  const species = speciesByCode(board.species);
  if (!species) return null;
  const moisturePct = board.moisturePct ?? unmeteredPct;
  const massKg = weighed({ ...board, species, moisturePct });
  return massKg === null ? null : { massKg, moisturePct, isMoistureAssumed: board.moisturePct === null };
}

/** Null too for more water than the wood can hold: the meter's figure is then wrong, not the page. */
function weighed(piece: Parameters<typeof boardMassKg>[0]): number | null {
  try {
    return boardMassKg(piece);
  } catch (failure) {
    if (failure instanceof RangeError) return null;
    throw failure;
  }
}
