import { nominalThicknessMm } from "#app/core/lengths/quarters.ts";
import type { ShopSettings } from "#app/domain/shop/shop.ts";

export interface PlyChoice {
  quarters: number;
  plies: number;
}

const mostPlies = 6;

/**
 * How a finished thickness is made of the stock there is: the thickness that wastes least wood, and of equals the fewest plies. One ply gives its
 * thickness less the shop's allowance; glued ones lose the jointing of each glue face besides.
 *
 * @param stock thicknesses in quarters on the rack.
 * @returns null when none will do.
 */
export function pliesFor(
  finishedMm: number,
  stock: number[],
  shop: Pick<ShopSettings, "allowanceThicknessMm" | "jointPerFaceMm">,
): PlyChoice | null {
  let best: PlyChoice | null = null;
  let leastMm = Number.POSITIVE_INFINITY;
  for (const quarters of [...stock].sort((a, b) => b - a)) {
    const rough = nominalThicknessMm(quarters);
    for (let plies = 1; plies <= mostPlies; plies++) {
      const left = plies * rough - 2 * (plies - 1) * shop.jointPerFaceMm - shop.allowanceThicknessMm;
      if (left < finishedMm - 1e-6) continue;
      if (plies * rough < leastMm - 1e-6) {
        leastMm = plies * rough;
        best = { quarters, plies };
      }
      break;
    }
  }
  return best;
}
