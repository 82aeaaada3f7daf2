import { addBending } from "#app/core/endgrain/level-fit.ts";
import { solveSymmetric } from "#app/core/endgrain/normal-equations.ts";
import type { Plane } from "#app/core/endgrain/pixels.ts";
import { type RingLevels, spanOf, splineWeights } from "#app/core/endgrain/ring-levels.ts";
import { ringProfile, type Unrolled, unroll } from "#app/core/endgrain/unroll.ts";

/** Lengths in pixels of the levels' own picture. `stepPx`: how often the picture given was halved (1, 2, 4). */
export type LevelShiftOptions = {
  stepPx: number;
  sectorPx: number;
  sectorSigma: number;
  cellPx: number;
  stiffnessPx: number;
};

/**
 * How much of the picture the rings explain, cell by cell: shares of the variance, 0..1 (below 0 = worse than nothing; NaN where no
 * wood is clear). `typical` is the median cell's, so that one strong edge, a shadow's or a coat's, cannot speak for the whole end.
 */
export type Explained = { columns: number; rows: number; explained: Float32Array; typical: number };

/** A shift of more steps than this is more likely the next ring than the same one. */
const MOST_SHIFT = 3;

/**
 * One round of levelling. The picture is unrolled along the levels and compared, cell by cell, with its own profile: how far
 * along the level must the cell move to fit best (least squares, first order)? The levels then take up those shifts, each
 * weighted by how well it is known, against the bending energy of the whole correction. Rings drawn too steep on one side
 * show as shifts that grow along the ring, which is what makes this finer than reading directions from slopes.
 */
export function shiftLevels(
  picture: Plane,
  mask: Plane | null,
  levels: RingLevels,
  options: LevelShiftOptions,
): { levels: RingLevels; explained: Explained } {
  const u = unroll(levels, picture, options.stepPx, options.sectorPx);
  const { mean } = ringProfile(picture, mask, u, 0.7, options.sectorSigma);
  const cells = compareWithProfile(picture, mask, u, mean, {
    columns: Math.max(1, Math.round(levels.width / options.cellPx)),
    rows: Math.max(1, Math.round(levels.height / options.cellPx)),
  });
  return { levels: takeUpShifts(levels, cells, options), explained: cells };
}

type ComparedCells = Explained & { shift: Float64Array; weight: Float64Array };

function compareWithProfile(
  picture: Plane,
  mask: Plane | null,
  u: Unrolled,
  mean: Float32Array,
  grid: { columns: number; rows: number },
): ComparedCells {
  const { columns, rows } = grid;
  const { width, height, data } = picture;
  const count = new Float64Array(columns * rows);
  const slope2 = new Float64Array(columns * rows);
  const slopeMiss = new Float64Array(columns * rows);
  const miss2 = new Float64Array(columns * rows);
  const value2 = new Float64Array(columns * rows);
  for (let y = 0; y < height; y++) {
    const row = Math.floor(((y + 0.5) * rows) / height) * columns;
    for (let x = 0; x < width; x++) {
      const i = y * width + x;
      const open = mask ? mask.data[i]! : 1;
      const bin = Math.max(1, Math.min(u.levels - 3, Math.floor(u.level[i]!)));
      const part = u.level[i]! - bin;
      const at = Math.min(u.sectors - 1, Math.floor(u.sector[i]!)) * u.levels + bin;
      const slope = ((mean[at + 1]! - mean[at - 1]!) * (1 - part) + (mean[at + 2]! - mean[at]!) * part) / 2;
      const miss = data[i]! - (mean[at]! * (1 - part) + mean[at + 1]! * part);
      const cell = row + Math.floor(((x + 0.5) * columns) / width);
      count[cell]! += open;
      slope2[cell]! += open * slope * slope;
      slopeMiss[cell]! += open * slope * miss;
      miss2[cell]! += open * miss * miss;
      value2[cell]! += open * data[i]! * data[i]!;
    }
  }
  const shift = new Float64Array(columns * rows);
  const weight = new Float64Array(columns * rows);
  const explained = new Float32Array(columns * rows);
  for (let i = 0; i < columns * rows; i++) {
    const fullCell = (width * height) / (columns * rows);
    explained[i] = value2[i]! > 0 && count[i]! > fullCell / 2 ? 1 - miss2[i]! / value2[i]! : Number.NaN;
    if (slope2[i]! < 1e-6) continue;
    shift[i] = Math.max(-MOST_SHIFT, Math.min(MOST_SHIFT, slopeMiss[i]! / slope2[i]!));
    weight[i] = (slope2[i]! * count[i]!) / (miss2[i]! + 1e-6);
  }
  const sorted = explained.filter((value) => !Number.isNaN(value)).sort();
  return { columns, rows, shift, weight, explained, typical: sorted[sorted.length >> 1] ?? 0 };
}

function takeUpShifts(levels: RingLevels, cells: ComparedCells, options: LevelShiftOptions): RingLevels {
  const n = levels.coefficients.length;
  const a = new Float64Array(n * n);
  const b = new Float64Array(n);
  const values = new Float64Array(16);
  const index = new Int32Array(16);
  let totalWeight = 0;
  for (let cell = 0; cell < cells.columns * cells.rows; cell++) {
    const weight = cells.weight[cell]!;
    if (weight === 0) continue;
    totalWeight += weight;
    const x = (((cell % cells.columns) + 0.5) * levels.width) / cells.columns;
    const y = ((Math.floor(cell / cells.columns) + 0.5) * levels.height) / cells.rows;
    const spanX = spanOf(x, levels.width, levels.columns);
    const spanY = spanOf(y, levels.height, levels.rows);
    const alongX = splineWeights(spanX.t).value;
    const alongY = splineWeights(spanY.t).value;
    let wanted = cells.shift[cell]! * options.stepPx;
    for (let k = 0; k < 16; k++) {
      values[k] = alongX[k & 3]! * alongY[k >> 2]!;
      index[k] = (spanY.first + (k >> 2)) * (levels.columns + 3) + spanX.first + (k & 3);
      wanted += values[k]! * levels.coefficients[index[k]!]!;
    }
    for (let p = 0; p < 16; p++) {
      const row = index[p]! * n;
      b[index[p]!]! += weight * values[p]! * wanted;
      for (let q = 0; q < 16; q++) a[row + index[q]!]! += weight * values[p]! * values[q]!;
    }
  }
  addBending(a, levels, (totalWeight * options.stiffnessPx ** 4) / (levels.columns * levels.rows));
  for (let i = 0; i < n; i++) a[i * n + i]! += (1e-6 * totalWeight) / n;
  const coefficients = totalWeight > 0 ? solveSymmetric(a, b) : null;
  return coefficients ? { ...levels, coefficients } : levels;
}
