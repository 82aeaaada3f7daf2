import { requireSize, requireWithin } from "#app/core/moisture/accepted-range.ts";
import { areaOf, coveredArea, emptyRectangles, type FaceArea, type LeastCutting } from "./empty-rectangles.ts";
import { searchSplits } from "./split-search.ts";

export type { FaceArea, LeastCutting } from "./empty-rectangles.ts";

export interface CuttingsFound {
  cuttings: FaceArea[];
  /** Clear area in all, mm². */
  areaMm2: number;
  /** True when no better choice exists; false when it was found by search and there may be a better one. */
  isBest: boolean;
  /** No choice of cuttings can have more clear area than this, mm²; proven, and the area itself when that is the best. */
  atMostMm2: number;
}

const workLimit = 2_000;
const noiseMm2 = 1e-3;

/** More cuttings than these may lie so that no straight line parts them. */
const mostParted = 3;

/**
 * Chooses at most so many clear rectangles on a face, apart from each other and from every defect, each no smaller than allowed, with as much area as can
 * be found. Up to three are exact while the work stays within its limit; of more it is exact when they take all that any cutting could. Otherwise it is
 * near the best, and says that it is no proof.
 *
 * @throws RangeError for a face or a defect whose size is none.
 */
export function clearCuttings(
  { lengthMm, widthMm }: { lengthMm: number; widthMm: number },
  defects: readonly FaceArea[],
  least: readonly LeastCutting[],
  most: number,
): CuttingsFound {
  requireSize("Length", lengthMm);
  requireSize("Width", widthMm);
  requireWithin("Cuttings", most, 1, 100);
  for (const defect of defects) {
    requireSize("Length of a defect", defect.lengthMm);
    requireSize("Width of a defect", defect.widthMm);
    requireWithin("Place of a defect along the board", defect.alongMm, -100_000, 100_000, "mm");
    requireWithin("Place of a defect across the board", defect.acrossMm, -100_000, 100_000, "mm");
  }
  const face: FaceArea = { alongMm: 0, acrossMm: 0, lengthMm, widthMm };
  const places = emptyRectangles(face, defects, least);
  const largest = Math.max(0, ...places.map(areaOf));
  const atMostMm2 = Math.min(coveredArea(places), most * largest);
  const taken = takeLargest(face, defects, least, most);
  if (total(taken) >= atMostMm2 - noiseMm2) return found(taken, atMostMm2);
  const split = searchSplits(face, defects, least, Math.min(most, mostParted));
  const best = split.areaMm2 > total(taken) ? split.cuttings : taken;
  return found(best, most <= mostParted && split.isComplete ? total(best) : atMostMm2);
}

/** Takes largest empty rectangles one after another, in every order of the first few, as far as the limit of work reaches. */
function takeLargest(
  face: FaceArea,
  defects: readonly FaceArea[],
  least: readonly LeastCutting[],
  most: number,
): FaceArea[] {
  let best: FaceArea[] = [];
  let bestArea = 0;
  let work = 0;
  function search(chosen: FaceArea[], area: number, blocked: readonly FaceArea[]): void {
    if (area > bestArea + 1e-6) [best, bestArea] = [chosen, area];
    if (chosen.length === most || work > workLimit) return;
    const free = emptyRectangles(face, blocked, least).sort((a, b) => areaOf(b) - areaOf(a));
    work += 1 + free.length;
    for (const place of free.slice(0, most - chosen.length === 1 ? 1 : 6)) {
      // Even if every cutting to come were as large as this one, could it still win?
      if (area + areaOf(place) * (most - chosen.length) <= bestArea + 1e-6) break;
      search([...chosen, place], area + areaOf(place), [...blocked, place]);
    }
  }
  search([], 0, defects);
  return best;
}

function total(cuttings: readonly FaceArea[]): number {
  return cuttings.reduce((sum, place) => sum + areaOf(place), 0);
}

function found(cuttings: readonly FaceArea[], atMostMm2: number): CuttingsFound {
  const inOrder = [...cuttings].sort((a, b) => a.alongMm - b.alongMm || a.acrossMm - b.acrossMm);
  const areaMm2 = total(cuttings);
  return {
    cuttings: inOrder,
    areaMm2,
    isBest: areaMm2 >= atMostMm2 - noiseMm2,
    atMostMm2: Math.max(areaMm2, atMostMm2),
  };
}
