import { type Tally, tally } from "#app/core/measure/tally.ts";

interface Lot {
  species: string;
  quarters: number;
  widthMm: number;
  widthFarMm: number | null;
  lengthMm: number;
}

/** Boards of one species and thickness within a delivery. */
export interface LotGroup {
  species: string;
  quarters: number;
  measured: Omit<Tally, "lines">;
}

/**
 * Measures the boards of a delivery by their nominal thickness, as it was sold: all of them, and each species and thickness by itself.
 */
export function measureLot(boards: Lot[]): { measured: Omit<Tally, "lines">; groups: LotGroup[] } {
  const size = ({ quarters, widthMm, widthFarMm, lengthMm }: Lot) => ({ quarters, widthMm, widthFarMm, lengthMm });
  const { lines: _, ...measured } = tally(boards.map(size));
  const kinds = new Map<string, Lot[]>();
  for (const board of boards) {
    const kind = `${board.species} ${board.quarters}`;
    kinds.set(kind, [...(kinds.get(kind) ?? []), board]);
  }
  const groups = [...kinds.values()].flatMap((alike) => {
    const { lines: _each, ...group } = tally(alike.map(size));
    const [first] = alike;
    return first ? [{ species: first.species, quarters: first.quarters, measured: group }] : [];
  });
  return { measured, groups };
}
