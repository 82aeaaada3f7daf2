import { speciesByCode } from "#app/core/species/species.ts";
import { totalMassKg } from "#app/core/weight/mass.ts";
import type { BoardSummary } from "#app/domain/boards/board.ts";
import type { Bay } from "./rack.ts";

/** Moisture taken for a board that has not been metered: kiln-dried stock in a heated shop. Common practice. */
const unmeteredPct = 8;

/** Share of each arm's rated load, where the shop has entered a rating and every board's wood has a known weight: above 1 it is overloaded. */
export function armLoads(bays: Bay[], boardsByArm: ReadonlyMap<string, BoardSummary[]>): Map<string, number> {
  const loads = new Map<string, number>();
  for (const arm of bays.flatMap((bay) => bay.arms)) {
    if (arm.capacityKg === null) continue;
    const pieces = (boardsByArm.get(arm.id) ?? []).flatMap((board) => {
      const species = speciesByCode(board.species);
      return species ? [{ ...board, species, moisturePct: board.moisturePct ?? unmeteredPct }] : [];
    });
    loads.set(arm.id, totalMassKg(pieces).massKg / arm.capacityKg);
  }
  return loads;
}
