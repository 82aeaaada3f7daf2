import type { Plane } from "#app/core/endgrain/pixels.ts";
import { levelAt, type RingLevels } from "#app/core/endgrain/ring-levels.ts";

/**
 * The picture as it would lie unrolled along its rings: for each pixel its level and its sector, both from 0.
 * A sector is a fixed length along the ring at the end's middle; `closed` when the rings close within the picture.
 */
export type Unrolled = { level: Float32Array; sector: Float32Array; levels: number; sectors: number; closed: boolean };

/** Levels bend slowly: the correction is exact at every so many pixels, straight lines between. */
const BEND_STEP = 4;

/**
 * Unrolls the places of a picture along the contour lines of `levels`. `picture` may be the levels' own picture or the same
 * halved `stepPx` = 2, 4… times. One level is `stepPx` pixels, so that a level holds about a row of pixels.
 */
export function unroll(
  levels: RingLevels,
  picture: { width: number; height: number },
  stepPx: number,
  sectorPx: number,
): Unrolled {
  const { width, height } = picture;
  const { pith } = levels;
  const closed = pith.x > 0 && pith.x < levels.width && pith.y > 0 && pith.y < levels.height;
  const away = { x: levels.width / 2 - pith.x, y: levels.height / 2 - pith.y };
  const facing = closed ? 0 : Math.atan2(away.y, away.x);
  const perRadian = (closed ? Math.hypot(levels.width, levels.height) / 4 : Math.hypot(away.x, away.y)) / sectorPx;
  const { bends, across } = coarseBends(levels, picture, stepPx);
  const level = new Float32Array(width * height);
  const sector = new Float32Array(width * height);
  let at = 0;
  for (let y = 0; y < height; y++) {
    const j = Math.floor(y / BEND_STEP);
    const fy = y / BEND_STEP - j;
    const dy = (y + 0.5) * stepPx - pith.y;
    for (let x = 0; x < width; x++) {
      const i = Math.floor(x / BEND_STEP);
      const fx = x / BEND_STEP - i;
      const c = j * across + i;
      const upper = bends[c]! * (1 - fx) + bends[c + 1]! * fx;
      const lower = bends[c + across]! * (1 - fx) + bends[c + across + 1]! * fx;
      const dx = (x + 0.5) * stepPx - pith.x;
      level[at] = (Math.sqrt(dx * dx + dy * dy) + upper * (1 - fy) + lower * fy) / stepPx;
      let bearing = Math.atan2(dy, dx) - facing;
      if (bearing > Math.PI) bearing -= 2 * Math.PI;
      if (bearing < -Math.PI) bearing += 2 * Math.PI;
      sector[at++] = bearing * perRadian;
    }
  }
  return { level, sector, levels: shiftToZero(level) + 2, sectors: shiftToZero(sector), closed };
}

function coarseBends(
  levels: RingLevels,
  picture: { width: number; height: number },
  stepPx: number,
): { bends: Float32Array; across: number } {
  const across = Math.ceil(picture.width / BEND_STEP) + 2;
  const down = Math.ceil(picture.height / BEND_STEP) + 2;
  const bends = new Float32Array(across * down);
  for (let j = 0; j < down; j++) {
    for (let i = 0; i < across; i++) {
      const x = (i * BEND_STEP + 0.5) * stepPx;
      const y = (j * BEND_STEP + 0.5) * stepPx;
      bends[j * across + i] = levelAt(levels, x, y) - Math.hypot(x - levels.pith.x, y - levels.pith.y);
    }
  }
  return { bends, across };
}

/** Moves the numbers so that the smallest is 0; @returns how many whole steps they then span. */
function shiftToZero(values: Float32Array): number {
  let low = Number.POSITIVE_INFINITY;
  let high = Number.NEGATIVE_INFINITY;
  for (const value of values) {
    if (value < low) low = value;
    if (value > high) high = value;
  }
  for (let i = 0; i < values.length; i++) values[i] = Math.max(0, values[i]! - low);
  return Math.floor(high - low) + 1;
}

/**
 * The mean brightness of each level, sector by sector, smoothed over `levelSigma` levels and `sectorSigma` sectors: what the
 * picture would be if every ring ran exactly along its level. `mean[sector * levels + level]`.
 */
export function ringProfile(
  picture: Plane,
  mask: Plane | null,
  u: Unrolled,
  levelSigma: number,
  sectorSigma: number,
): { mean: Float32Array; weight: Float32Array } {
  const sum = new Float32Array(u.levels * u.sectors);
  const weight = new Float32Array(u.levels * u.sectors);
  for (let i = 0; i < picture.data.length; i++) {
    const open = mask ? mask.data[i]! : 1;
    const bin = Math.floor(u.level[i]!);
    const part = u.level[i]! - bin;
    const at = Math.min(u.sectors - 1, Math.floor(u.sector[i]!)) * u.levels + bin;
    sum[at]! += open * picture.data[i]! * (1 - part);
    sum[at + 1]! += open * picture.data[i]! * part;
    weight[at]! += open * (1 - part);
    weight[at + 1]! += open * part;
  }
  for (const grid of [sum, weight]) {
    smoothLines(grid, { count: u.levels, step: 1, lines: u.sectors, lineStep: u.levels }, levelSigma, false);
    smoothLines(grid, { count: u.sectors, step: u.levels, lines: u.levels, lineStep: 1 }, sectorSigma, u.closed);
  }
  for (let i = 0; i < sum.length; i++) sum[i] = weight[i]! > 0.05 ? sum[i]! / weight[i]! : 0;
  return { mean: sum, weight };
}

type Lines = { count: number; step: number; lines: number; lineStep: number };

/** Gaussian sums in place along lines of numbers; nothing lies beyond the ends of an open line, a closed one goes round. */
function smoothLines(
  grid: Float32Array,
  { count, step, lines, lineStep }: Lines,
  sigma: number,
  closed: boolean,
): void {
  const radius = Math.min(count - 1, Math.ceil(2.5 * sigma));
  const kernel = Float32Array.from({ length: 2 * radius + 1 }, (_, k) =>
    Math.exp(-((k - radius) ** 2) / (2 * sigma * sigma)),
  );
  const padded = new Float32Array(count + 2 * radius);
  for (let l = 0; l < lines; l++) {
    const base = l * lineStep;
    for (let i = 0; i < count; i++) padded[i + radius] = grid[base + i * step]!;
    if (closed) {
      for (let k = 0; k < radius; k++) {
        padded[k] = padded[k + count]!;
        padded[count + radius + k] = padded[radius + k]!;
      }
    }
    for (let i = 0; i < count; i++) {
      let sum = 0;
      for (let k = 0; k < kernel.length; k++) sum += kernel[k]! * padded[i + k]!;
      grid[base + i * step] = sum;
    }
  }
}
