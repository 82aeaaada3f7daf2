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
  /** Where the area counts too: no smaller than this. */
  areaMm2?: number;
}

const noiseMm = 1e-6;

/** Whether a rectangle is large enough by one of the least sizes. */
function isAllowed(place: FaceArea, least: readonly LeastCutting[]): boolean {
  return least.some(
    ({ widthMm, lengthMm, areaMm2 = 0 }) =>
      place.widthMm >= widthMm - noiseMm && place.lengthMm >= lengthMm - noiseMm && areaOf(place) >= areaMm2 - noiseMm,
  );
}

/** Area in mm². */
export function areaOf({ lengthMm, widthMm }: FaceArea): number {
  return lengthMm * widthMm;
}

/** Whether two rectangles share more than an edge. */
export function overlap(a: FaceArea, b: FaceArea): boolean {
  return (
    a.alongMm < b.alongMm + b.lengthMm - noiseMm &&
    b.alongMm < a.alongMm + a.lengthMm - noiseMm &&
    a.acrossMm < b.acrossMm + b.widthMm - noiseMm &&
    b.acrossMm < a.acrossMm + a.widthMm - noiseMm
  );
}

/**
 * Empty rectangles of a region that are large enough and cannot reach further along or grow across: from the region's end and from the far end of each
 * thing blocked, every free stretch of the width, as far as it goes. The largest that fit are among them.
 */
export function emptyRectangles(
  region: FaceArea,
  blocked: readonly FaceArea[],
  least: readonly LeastCutting[],
): FaceArea[] {
  const end = region.alongMm + region.lengthMm;
  const inside = blocked.filter((area) => overlap(area, region)).sort((a, b) => a.alongMm - b.alongMm);
  const starts = new Set([region.alongMm, ...inside.map((area) => area.alongMm + area.lengthMm)]);
  const shortest = Math.min(...least.map(({ lengthMm }) => lengthMm));
  const narrowest = Math.min(...least.map(({ widthMm }) => widthMm));
  const found: FaceArea[] = [];
  for (const from of starts) {
    if (from + shortest > end + noiseMm) continue;
    let free: Stretch[] = [[region.acrossMm, region.acrossMm + region.widthMm]];
    for (const area of inside) {
      if (area.alongMm + area.lengthMm <= from + noiseMm || !free.some((stretch) => meets(stretch, area))) continue;
      const still: Stretch[] = [];
      for (const stretch of free) {
        if (!meets(stretch, area)) still.push(stretch);
        else {
          keep(stretch, from, area.alongMm);
          for (const rest of beside(stretch, area)) if (rest[1] - rest[0] >= narrowest - noiseMm) still.push(rest);
        }
      }
      free = still;
    }
    for (const stretch of free) keep(stretch, from, end);
  }
  return found;

  function keep([left, right]: Stretch, from: number, to: number): void {
    const place = { alongMm: from, lengthMm: to - from, acrossMm: left, widthMm: right - left };
    if (isAllowed(place, least)) found.push(place);
  }
}

/** Part of the width, from and to. */
type Stretch = readonly [number, number];

function meets([left, right]: Stretch, { acrossMm, widthMm }: FaceArea): boolean {
  return acrossMm < right - noiseMm && acrossMm + widthMm > left + noiseMm;
}

function beside([left, right]: Stretch, { acrossMm, widthMm }: FaceArea): Stretch[] {
  return [
    [left, acrossMm],
    [acrossMm + widthMm, right],
  ];
}

/** Area that several rectangles cover together, mm², each place once. */
export function coveredArea(areas: readonly FaceArea[]): number {
  const lines = [...new Set(areas.flatMap((area) => [area.alongMm, area.alongMm + area.lengthMm]))].sort(
    (a, b) => a - b,
  );
  let total = 0;
  for (const [i, from] of lines.entries()) {
    const to = lines[i + 1] ?? from;
    let reached = Number.NEGATIVE_INFINITY;
    for (const { acrossMm, widthMm } of areas
      .filter((area) => area.alongMm < to && area.alongMm + area.lengthMm > from)
      .sort((a, b) => a.acrossMm - b.acrossMm)) {
      const end = acrossMm + widthMm;
      total += Math.max(0, end - Math.max(reached, acrossMm)) * (to - from);
      reached = Math.max(reached, end);
    }
  }
  return total;
}
