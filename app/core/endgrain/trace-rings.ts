import type { EndCorners } from "#app/core/endgrain/corner-check.ts";
import { type RingLevels, slopeAt } from "#app/core/endgrain/ring-levels.ts";
import { placeInPhoto } from "#app/core/endgrain/straighten.ts";

/** Rings to draw: about so many across the end, whatever the true number. */
const LINES = 14;

/**
 * Some of the rings as lines of places in the photograph's pixels: seeds at even distances along a walk across the rings through
 * the middle of the end, each followed both ways until it leaves the end.
 */
export function traceRings(levels: RingLevels, corners: EndCorners): { x: number; y: number }[][] {
  const apart = (levels.width + levels.height) / 2 / LINES;
  const lines: { x: number; y: number }[][] = [];
  for (let s = 0; s <= LINES; s++) {
    for (const v of [0.08, 0.5, 0.92]) {
      const seed = { x: (levels.width * (s + 0.5)) / (LINES + 1), y: levels.height * v };
      // A seed beside a line already drawn would only double it.
      if (lines.some((line) => line.some((p) => Math.hypot(p.x - seed.x, p.y - seed.y) < apart * 0.6))) continue;
      lines.push([...follow(levels, seed, -1).reverse(), seed, ...follow(levels, seed, 1)]);
    }
  }
  return lines
    .filter((line) => line.length > 2)
    .map((line) => line.map((p) => placeInPhoto(corners, p.x / levels.width, p.y / levels.height)));
}

function follow(levels: RingLevels, seed: { x: number; y: number }, way: 1 | -1): { x: number; y: number }[] {
  const step = Math.max(2, levels.height / 16);
  const most = Math.ceil((3 * (levels.width + levels.height)) / step);
  const line: { x: number; y: number }[] = [];
  let at = seed;
  for (let i = 0; i < most; i++) {
    // Midpoint rule: the direction half a step ahead keeps a circle closed.
    const here = slopeAt(levels, at.x, at.y);
    const half = along(at, here, (way * step) / 2);
    const ahead = slopeAt(levels, half.x, half.y);
    at = along(at, ahead, way * step);
    if (at.x < 0 || at.y < 0 || at.x > levels.width || at.y > levels.height) break;
    line.push(at);
    if (i > 3 && Math.hypot(at.x - seed.x, at.y - seed.y) < step * 0.75) break;
  }
  return line;
}

function along(
  from: { x: number; y: number },
  slope: { x: number; y: number },
  step: number,
): { x: number; y: number } {
  const length = Math.hypot(slope.x, slope.y) || 1e-9;
  return { x: from.x - (slope.y / length) * step, y: from.y + (slope.x / length) * step };
}
