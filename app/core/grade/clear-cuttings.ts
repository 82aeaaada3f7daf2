/** A rectangle on a board's face: from the near end and the left edge. Millimetres. */
export interface FaceArea {
  alongMm: number;
  acrossMm: number;
  lengthMm: number;
  widthMm: number;
}

/** The least a cutting may measure; one of several such pairs is enough. */
export interface LeastCutting {
  widthMm: number;
  lengthMm: number;
}

export interface CuttingsFound {
  cuttings: FaceArea[];
  /** Clear area in all, mm². */
  areaMm2: number;
  /** True when no better choice exists; false when the search stopped at its limit, or several cuttings were chosen one upon another. */
  isBest: boolean;
}

const workLimit = 4_000;

/**
 * Chooses at most so many clear rectangles on a face, apart from each other and from every defect, each no smaller than allowed, with as much area as can
 * be found. One cutting is exact: the largest empty rectangle has its sides on defects or edges. Several are found by taking largest ones in every
 * order, best bound first, up to a limit of work: near the best, and said to be no proof.
 */
export function clearCuttings(
  face: { lengthMm: number; widthMm: number },
  defects: readonly FaceArea[],
  least: readonly LeastCutting[],
  most: number,
): CuttingsFound {
  const whole: FaceArea = { alongMm: 0, acrossMm: 0, ...face };
  let best: FaceArea[] = [];
  let bestArea = 0;
  let work = 0;

  function search(chosen: FaceArea[], area: number, blocked: readonly FaceArea[]): void {
    if (area > bestArea + 1e-6) {
      bestArea = area;
      best = chosen;
    }
    if (chosen.length === most || work > workLimit) return;
    const free = emptyRectangles(whole, blocked).filter((place) => isAllowed(place, least));
    free.sort((a, b) => areaOf(b) - areaOf(a));
    work += 1 + free.length;
    for (const place of free.slice(0, most - chosen.length === 1 ? 1 : 6)) {
      // Even if every cutting to come were as large as this one, could it still win?
      if (area + areaOf(place) * (most - chosen.length) <= bestArea + 1e-6) break;
      search([...chosen, place], area + areaOf(place), [...blocked, place]);
    }
  }
  search([], 0, defects);
  return {
    cuttings: best.sort((a, b) => a.alongMm - b.alongMm || a.acrossMm - b.acrossMm),
    areaMm2: bestArea,
    isBest: work <= workLimit && (most === 1 || best.length <= 1),
  };
}

function isAllowed(place: FaceArea, least: readonly LeastCutting[]): boolean {
  return least.some(({ widthMm, lengthMm }) => place.widthMm >= widthMm - 1e-6 && place.lengthMm >= lengthMm - 1e-6);
}

function areaOf({ lengthMm, widthMm }: FaceArea): number {
  return lengthMm * widthMm;
}

/**
 * Every empty rectangle that cannot grow: between each pair of lines across the board (edges of defects and the ends), the stretches of width that no
 * defect between them touches.
 */
function emptyRectangles(whole: FaceArea, blocked: readonly FaceArea[]): FaceArea[] {
  const lines = [
    ...new Set([0, whole.lengthMm, ...blocked.flatMap((area) => [area.alongMm, area.alongMm + area.lengthMm])]),
  ]
    .filter((line) => line >= 0 && line <= whole.lengthMm)
    .sort((a, b) => a - b);
  const found: FaceArea[] = [];
  for (let i = 0; i < lines.length; i++)
    for (let j = i + 1; j < lines.length; j++) {
      const [from, to] = [lines[i] as number, lines[j] as number];
      const between = blocked.filter((area) => area.alongMm < to - 1e-9 && area.alongMm + area.lengthMm > from + 1e-9);
      for (const [left, right] of gaps(between, whole.widthMm)) {
        const place = { alongMm: from, lengthMm: to - from, acrossMm: left, widthMm: right - left };
        if (!canGrow(place, whole, blocked)) found.push(place);
      }
    }
  return found;
}

/** Stretches of the width that none of the areas covers. */
function gaps(areas: readonly FaceArea[], widthMm: number): [number, number][] {
  const free: [number, number][] = [];
  let at = 0;
  for (const { acrossMm, widthMm: width } of [...areas].sort((a, b) => a.acrossMm - b.acrossMm)) {
    if (acrossMm - at > 1e-6) free.push([at, Math.min(acrossMm, widthMm)]);
    at = Math.max(at, acrossMm + width);
  }
  if (widthMm - at > 1e-6) free.push([at, widthMm]);
  return free.filter(([from, to]) => to > from);
}

/** Could the rectangle reach further along the board without meeting anything? Then a longer pair of lines gives it too. */
function canGrow(place: FaceArea, whole: FaceArea, blocked: readonly FaceArea[]): boolean {
  const meets = (from: number, to: number) =>
    blocked.some(
      (area) =>
        area.alongMm < to - 1e-9 &&
        area.alongMm + area.lengthMm > from + 1e-9 &&
        area.acrossMm < place.acrossMm + place.widthMm - 1e-9 &&
        area.acrossMm + area.widthMm > place.acrossMm + 1e-9,
    );
  const step = 0.01;
  const end = place.alongMm + place.lengthMm;
  return (
    (place.alongMm > step && !meets(place.alongMm - step, place.alongMm)) ||
    (end < whole.lengthMm - step && !meets(end, end + step))
  );
}
