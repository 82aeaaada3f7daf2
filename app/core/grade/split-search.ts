import { areaOf, emptyRectangles, type FaceArea, type LeastCutting, overlap } from "./empty-rectangles.ts";

export interface SplitFound {
  cuttings: FaceArea[];
  areaMm2: number;
  /** False when the limit of work was met before every split had been looked at. */
  isComplete: boolean;
}

/** Regions looked into before the search gives up its proof. */
const regionLimit = 4_000;

/**
 * The most clear area in so many cuttings, of those that can be parted from each other by straight lines right across the face, again and again. Up to
 * three rectangles can always be parted so, and then the answer is exact; four may lie round each other like a windmill's sails.
 *
 * Lines worth trying: where nothing can move without losing area, each side of a cutting stands on the face's edge, on a defect's, or a chain of least
 * sizes away from one; a line between cuttings has at most one cutting fewer than there are in its chain.
 */
export function searchSplits(
  face: FaceArea,
  blocked: readonly FaceArea[],
  least: readonly LeastCutting[],
  most: number,
): SplitFound {
  const largest = new Map<string, FaceArea | null>();
  let isComplete = true;

  function largestIn(region: FaceArea): FaceArea | null {
    const key = `${region.alongMm} ${region.lengthMm} ${region.acrossMm} ${region.widthMm}`;
    const known = largest.get(key);
    if (known !== undefined) return known;
    let best: FaceArea | null = null;
    for (const place of emptyRectangles(region, blocked, least))
      if (!best || areaOf(place) > areaOf(best)) best = place;
    largest.set(key, best);
    return best;
  }

  function search(region: FaceArea, count: number, atLeastMm2: number): FaceArea[] {
    const one = largestIn(region);
    if (!one) return [];
    let best = [one];
    if (count === 1 || bound(region, count) <= atLeastMm2) return best;
    let bestArea = areaOf(one);
    for (const [first, second] of splits(region, blocked, least, count)) {
      for (let inFirst = 1; inFirst < count; inFirst++) {
        const toBeat = Math.max(bestArea, atLeastMm2) + 1e-6;
        const [firstBound, secondBound] = [bound(first, inFirst), bound(second, count - inFirst)];
        if (firstBound + secondBound <= toBeat) continue;
        if (largest.size > regionLimit) {
          isComplete = false;
          return best;
        }
        const both = [
          ...search(first, inFirst, toBeat - secondBound),
          ...search(second, count - inFirst, toBeat - firstBound),
        ];
        const area = both.reduce((sum, place) => sum + areaOf(place), 0);
        if (area > bestArea + 1e-6) [best, bestArea] = [both, area];
      }
    }
    return best;
  }

  /** No more than this can be cut from a region: its area, or so many of its largest. */
  function bound(region: FaceArea, count: number): number {
    const one = largestIn(region);
    return one ? Math.min(areaOf(region), count * areaOf(one)) : 0;
  }

  const cuttings = search(face, most, 0);
  return { cuttings, areaMm2: cuttings.reduce((sum, place) => sum + areaOf(place), 0), isComplete };
}

/** The two parts of a region on either side of each line worth trying, along and across. */
function* splits(
  region: FaceArea,
  blocked: readonly FaceArea[],
  least: readonly LeastCutting[],
  count: number,
): Generator<[FaceArea, FaceArea]> {
  const inside = blocked.filter((area) => overlap(area, region));
  const { alongMm, lengthMm, acrossMm, widthMm } = region;
  const alongEdges = inside.flatMap((area) => [area.alongMm, area.alongMm + area.lengthMm]);
  const lengths = least.map((one) => one.lengthMm);
  for (const at of linesBetween(alongMm, alongMm + lengthMm, alongEdges, lengths, count))
    yield [
      { ...region, lengthMm: at - alongMm },
      { ...region, alongMm: at, lengthMm: alongMm + lengthMm - at },
    ];
  const acrossEdges = inside.flatMap((area) => [area.acrossMm, area.acrossMm + area.widthMm]);
  const widths = least.map((one) => one.widthMm);
  for (const at of linesBetween(acrossMm, acrossMm + widthMm, acrossEdges, widths, count))
    yield [
      { ...region, widthMm: at - acrossMm },
      { ...region, acrossMm: at, widthMm: acrossMm + widthMm - at },
    ];
}

/** Edges inside a stretch, and what lies up to count − 1 least sizes from one, where both sides still hold a least size. */
function linesBetween(from: number, to: number, edges: readonly number[], sizes: readonly number[], count: number) {
  const round = (at: number) => Math.round(at * 1e4) / 1e4;
  const lines = new Set([from, to, ...edges.filter((at) => at > from && at < to)].map(round));
  for (let chain = 1; chain < count; chain++)
    for (const at of [...lines])
      for (const size of sizes)
        for (const moved of [at - size, at + size]) if (moved > from && moved < to) lines.add(round(moved));
  const smallest = Math.min(...sizes);
  return [...lines].filter((at) => at >= from + smallest - 1e-3 && at <= to - smallest + 1e-3);
}
