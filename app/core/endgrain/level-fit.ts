import { solveSymmetric } from "#app/core/endgrain/normal-equations.ts";
import { type RingLevels, slopeAt, spanOf, splineWeights } from "#app/core/endgrain/ring-levels.ts";
import type { TensorCells } from "#app/core/endgrain/tensor-cells.ts";

/** A direction seen at a place: unit normal to the line there, and how far to trust it. */
export type SeenNormal = { x: number; y: number; nx: number; ny: number; weight: number };

/** How stiff the correction is (a length in pixels: bends over shorter distances are smoothed away) and when a direction counts as wrong. */
export type LevelFitOptions = { stiffnessPx: number; rejectDeg: number; rounds: number };

/** Share of the weight by which the spacing of the levels is held near 1, so that the levels cannot flatten out. */
const SPACING_HOLD = 1;

/**
 * Bends circular levels until their contour lines follow the directions seen, by weighted least squares on the part of the
 * slope that runs along the seen line, plus the bending energy of the correction. Directions further off than about
 * `rejectDeg` lose their weight (Geman and McClure's function), starting twice as lenient.
 */
export function fitLevels(start: RingLevels, seen: readonly SeenNormal[], options: LevelFitOptions): RingLevels {
  let levels = start;
  for (let round = 0; round < options.rounds; round++) {
    const lenience = round === 0 ? 2 : 1;
    const next = solveRound(
      levels,
      seen,
      options.stiffnessPx,
      Math.sin((options.rejectDeg * lenience * Math.PI) / 180),
    );
    if (!next) return levels;
    levels = next;
  }
  return levels;
}

function solveRound(
  levels: RingLevels,
  seen: readonly SeenNormal[],
  stiffnessPx: number,
  reject: number,
): RingLevels | null {
  const across = levels.columns + 3;
  const n = levels.coefficients.length;
  const a = new Float64Array(n * n);
  const b = new Float64Array(n);
  let totalWeight = 0;
  const index = new Int32Array(16);
  const tangent = new Float64Array(16);
  const normal = new Float64Array(16);
  const scaleX = levels.columns / levels.width;
  const scaleY = levels.rows / levels.height;
  for (const spot of seen) {
    const slope = slopeAt(levels, spot.x, spot.y);
    const length = Math.hypot(slope.x, slope.y) || 1e-9;
    const miss = (slope.y * spot.nx - slope.x * spot.ny) / length;
    const keep = 1 / (1 + (miss / reject) ** 2) ** 2;
    const weight = spot.weight * keep;
    if (weight <= 0) continue;
    totalWeight += weight;
    const ux = slope.x / length;
    const uy = slope.y / length;
    const dx = spot.x - levels.pith.x;
    const dy = spot.y - levels.pith.y;
    const distance = Math.hypot(dx, dy) || 1e-9;
    const spanX = spanOf(spot.x, levels.width, levels.columns);
    const spanY = spanOf(spot.y, levels.height, levels.rows);
    const alongX = splineWeights(spanX.t);
    const alongY = splineWeights(spanY.t);
    for (let j = 0; j < 4; j++) {
      for (let i = 0; i < 4; i++) {
        const gx = alongX.slope[i]! * alongY.value[j]! * scaleX;
        const gy = alongX.value[i]! * alongY.slope[j]! * scaleY;
        const k = j * 4 + i;
        index[k] = (spanY.first + j) * across + spanX.first + i;
        tangent[k] = (gy * spot.nx - gx * spot.ny) / length;
        normal[k] = (gx * ux + gy * uy) * SPACING_HOLD;
      }
    }
    const baseTangent = ((dy / distance) * spot.nx - (dx / distance) * spot.ny) / length;
    const baseNormal = ((dx * ux + dy * uy) / distance - 1) * SPACING_HOLD;
    for (let p = 0; p < 16; p++) {
      const row = index[p]! * n;
      const tp = tangent[p]! * weight;
      const np = normal[p]! * weight;
      b[index[p]!]! -= tp * baseTangent + np * baseNormal;
      for (let q = 0; q < 16; q++) a[row + index[q]!]! += tp * tangent[q]! + np * normal[q]!;
    }
  }
  if (totalWeight === 0) return null;
  addBending(a, levels, (totalWeight * stiffnessPx * stiffnessPx) / (levels.columns * levels.rows));
  for (let i = 0; i < n; i++) a[i * n + i]! += 1e-9 * totalWeight;
  const coefficients = solveSymmetric(a, b);
  return coefficients && { ...levels, coefficients };
}

/** Adds the bending energy (mean over the picture of c_xx² + 2 c_xy² + c_yy²), sampled at the four Gauss points of each span. */
export function addBending(a: Float64Array, levels: RingLevels, factor: number): void {
  const across = levels.columns + 3;
  const n = levels.coefficients.length;
  const scaleX = levels.columns / levels.width;
  const scaleY = levels.rows / levels.height;
  const points = [0.5 - 0.5 / Math.sqrt(3), 0.5 + 0.5 / Math.sqrt(3)].map(splineWeights);
  for (const alongX of points) {
    for (const alongY of points) {
      const bends = new Float64Array(48);
      for (let k = 0; k < 16; k++) {
        const i = k & 3;
        const j = k >> 2;
        bends[k] = alongX.bend[i]! * alongY.value[j]! * scaleX * scaleX;
        bends[16 + k] = Math.SQRT2 * alongX.slope[i]! * alongY.slope[j]! * scaleX * scaleY;
        bends[32 + k] = alongX.value[i]! * alongY.bend[j]! * scaleY * scaleY;
      }
      for (let row = 0; row < levels.rows; row++) {
        for (let column = 0; column < levels.columns; column++) {
          for (let p = 0; p < 16; p++) {
            const ip = ((row + (p >> 2)) * across + column + (p & 3)) * n;
            for (let q = 0; q < 16; q++) {
              const iq = (row + (q >> 2)) * across + column + (q & 3);
              const sum = bends[p]! * bends[q]! + bends[16 + p]! * bends[16 + q]! + bends[32 + p]! * bends[32 + q]!;
              a[ip + iq]! += (factor / 4) * sum;
            }
          }
        }
      }
    }
  }
}

/** How well the lines seen at one scale agree with the contour lines of the levels: mean of coherence × cos 2(difference), −1..1. */
export function agreementWithLevels(cells: TensorCells, levels: RingLevels): number {
  let sum = 0;
  let total = 0;
  for (let i = 0; i < cells.open.length; i++) {
    const x = (((i % cells.columns) + 0.5) * levels.width) / cells.columns;
    const y = ((Math.floor(i / cells.columns) + 0.5) * levels.height) / cells.rows;
    const slope = slopeAt(levels, x, y);
    const square = slope.x * slope.x + slope.y * slope.y + 1e-9;
    const cosine =
      (cells.cos2[i]! * (slope.x * slope.x - slope.y * slope.y) + cells.sin2[i]! * 2 * slope.x * slope.y) / square;
    sum += cells.open[i]! * cosine;
    total += cells.open[i]!;
  }
  return total > 0 ? sum / total : 0;
}
