import type { PointPx } from "#app/core/endgrain/pith-fit.ts";

/**
 * A smooth height over the picture whose contour lines are the rings: the distance from a pith plus a correction made of
 * uniform cubic B-splines. `coefficients` has (columns + 3) × (rows + 3) numbers in pixels, rows from the top.
 */
export type RingLevels = {
  width: number;
  height: number;
  pith: PointPx;
  columns: number;
  rows: number;
  coefficients: Float64Array;
};

/** Concentric circles about a pith, ready for a correction with knots about `knotPx` apart. */
export function circularLevels(size: { width: number; height: number }, pith: PointPx, knotPx: number): RingLevels {
  const columns = Math.max(1, Math.min(14, Math.round(size.width / knotPx)));
  const rows = Math.max(1, Math.min(8, Math.round(size.height / knotPx)));
  return {
    width: size.width,
    height: size.height,
    pith,
    columns,
    rows,
    coefficients: new Float64Array((columns + 3) * (rows + 3)),
  };
}

/** The four cubic B-splines that are not zero at `t` (0..1 within a span), and their first and second derivatives. */
export function splineWeights(t: number): { value: number[]; slope: number[]; bend: number[] } {
  const u = 1 - t;
  return {
    value: [(u * u * u) / 6, (3 * t * t * t - 6 * t * t + 4) / 6, (3 * u * u * u - 6 * u * u + 4) / 6, (t * t * t) / 6],
    slope: [(-u * u) / 2, (3 * t * t - 4 * t) / 2, (-3 * u * u + 4 * u) / 2, (t * t) / 2],
    bend: [u, 3 * t - 2, 3 * u - 2, t],
  };
}

/** Where a coordinate falls among the spans of a row of splines: first span's index and place within it. */
export function spanOf(at: number, length: number, spans: number): { first: number; t: number } {
  const place = (at / length) * spans;
  const first = Math.max(0, Math.min(spans - 1, Math.floor(place)));
  return { first, t: place - first };
}

/** The slope of the levels at a point: square to the ring there, about 1 long, away from the pith. */
export function slopeAt(levels: RingLevels, x: number, y: number): { x: number; y: number } {
  const dx = x - levels.pith.x;
  const dy = y - levels.pith.y;
  const distance = Math.hypot(dx, dy) || 1e-9;
  const spanX = spanOf(x, levels.width, levels.columns);
  const spanY = spanOf(y, levels.height, levels.rows);
  const alongX = splineWeights(spanX.t);
  const alongY = splineWeights(spanY.t);
  let gx = 0;
  let gy = 0;
  for (let j = 0; j < 4; j++) {
    const row = (spanY.first + j) * (levels.columns + 3) + spanX.first;
    for (let i = 0; i < 4; i++) {
      const c = levels.coefficients[row + i]!;
      gx += c * alongX.slope[i]! * alongY.value[j]!;
      gy += c * alongX.value[i]! * alongY.slope[j]!;
    }
  }
  return {
    x: dx / distance + (gx * levels.columns) / levels.width,
    y: dy / distance + (gy * levels.rows) / levels.height,
  };
}

/** The height of the levels at a point, pixels: equal along a ring. */
export function levelAt(levels: RingLevels, x: number, y: number): number {
  const spanX = spanOf(x, levels.width, levels.columns);
  const spanY = spanOf(y, levels.height, levels.rows);
  const alongX = splineWeights(spanX.t).value;
  const alongY = splineWeights(spanY.t).value;
  let sum = Math.hypot(x - levels.pith.x, y - levels.pith.y);
  for (let j = 0; j < 4; j++) {
    const row = (spanY.first + j) * (levels.columns + 3) + spanX.first;
    for (let i = 0; i < 4; i++) sum += levels.coefficients[row + i]! * alongX[i]! * alongY[j]!;
  }
  return sum;
}
