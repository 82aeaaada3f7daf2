import type { PointPx } from "#app/core/endgrain/pith-fit.ts";

/** Convex hull of points, clockwise with y down (Andrew's monotone chain, 1979). */
export function convexHull(points: readonly PointPx[]): PointPx[] {
  const sorted = [...points].sort((a, b) => a.x - b.x || a.y - b.y);
  const half = (list: readonly PointPx[]) => {
    const chain: PointPx[] = [];
    for (const p of list) {
      while (chain.length > 1 && turn(chain[chain.length - 2]!, chain[chain.length - 1]!, p) <= 0) chain.pop();
      chain.push(p);
    }
    return chain.slice(0, -1);
  };
  return [...half(sorted), ...half(sorted.reverse())];
}

/**
 * The four-sided shape round a convex one that adds least: sides are dropped one by one, their neighbours prolonged until they
 * meet, the cheapest (by area added) first. @returns null when fewer than four sides are left that meet.
 */
export function fourSided(hull: readonly PointPx[]): PointPx[] | null {
  let shape = [...hull];
  while (shape.length > 4) {
    let best: { at: number; corner: PointPx; area: number } | null = null;
    for (let i = 0; i < shape.length; i++) {
      const [before, a, b, after] = [-1, 0, 1, 2].map((k) => shape[(i + k + shape.length) % shape.length]!) as [
        PointPx,
        PointPx,
        PointPx,
        PointPx,
      ];
      const corner = meeting(before, a, after, b);
      if (!corner) continue;
      const area = Math.abs(turn(a, b, corner)) / 2;
      if (!best || area < best.area) best = { at: i, corner, area };
    }
    if (!best) return null;
    const next = (best.at + 1) % shape.length;
    shape[best.at] = best.corner;
    shape = shape.filter((_, i) => i !== next);
  }
  return shape.length === 4 ? shape : null;
}

/** Where the line from a through b, prolonged past b, meets the line from c through d, prolonged past d; null when they part. */
function meeting(a: PointPx, b: PointPx, c: PointPx, d: PointPx): PointPx | null {
  const ux = b.x - a.x;
  const uy = b.y - a.y;
  const vx = d.x - c.x;
  const vy = d.y - c.y;
  const det = ux * vy - uy * vx;
  if (Math.abs(det) < 1e-9) return null;
  const s = ((c.x - a.x) * vy - (c.y - a.y) * vx) / det;
  const t = ((c.x - a.x) * uy - (c.y - a.y) * ux) / det;
  return s >= 1 && t >= 1 ? { x: a.x + s * ux, y: a.y + s * uy } : null;
}

/** Pixels from the middle of the outermost inside pixel to the edge: half of itself and half of the mixed one. */
const EDGE_BEYOND = 1;

/** Straight lines through the outline's points beside each side, most of them weighing in, and the corners where they meet. */
export function straightSides(
  corners: readonly PointPx[],
  outline: readonly PointPx[],
  reach: number,
): { corners: PointPx[]; roughness: number } | null {
  const lines: { x: number; y: number; ux: number; uy: number }[] = [];
  let roughness = 0;
  for (let i = 0; i < 4; i++) {
    const a = corners[i]!;
    const b = corners[(i + 1) % 4]!;
    const length = Math.hypot(b.x - a.x, b.y - a.y);
    let near = outline.filter((p) => {
      const along = ((p.x - a.x) * (b.x - a.x) + (p.y - a.y) * (b.y - a.y)) / length;
      return along > 0.04 * length && along < 0.96 * length && Math.abs(turn(a, b, p)) / length < reach;
    });
    let line = { x: a.x, y: a.y, ux: (b.x - a.x) / length, uy: (b.y - a.y) / length };
    for (let round = 0; round < 3 && near.length > 7; round++) {
      line = fittedLine(near, line);
      const away = near.map((p) => Math.abs((p.x - line.x) * line.uy - (p.y - line.y) * line.ux)).sort((p, q) => p - q);
      const limit = Math.max(1, 2 * away[Math.floor(away.length * 0.7)]!);
      near = near.filter((p) => Math.abs((p.x - line.x) * line.uy - (p.y - line.y) * line.ux) <= limit);
      if (round === 2) roughness = Math.max(roughness, away[Math.floor(away.length * 0.7)]!);
    }
    // Outline points are the middles of pixels wholly inside; the edge lies beyond them, on average in the middle of a mixed pixel.
    lines.push({ ...line, x: line.x + EDGE_BEYOND * line.uy, y: line.y - EDGE_BEYOND * line.ux });
  }
  const met = lines.map((line, i) => {
    const before = lines[(i + 3) % 4]!;
    const det = before.ux * line.uy - before.uy * line.ux;
    if (Math.abs(det) < 0.2) return null;
    const s = ((line.x - before.x) * line.uy - (line.y - before.y) * line.ux) / det;
    return { x: before.x + s * before.ux, y: before.y + s * before.uy };
  });
  return met.every((p) => p !== null) ? { corners: met as PointPx[], roughness } : null;
}

function fittedLine(
  points: readonly PointPx[],
  like: { ux: number; uy: number },
): { x: number; y: number; ux: number; uy: number } {
  const x = points.reduce((sum, p) => sum + p.x, 0) / points.length;
  const y = points.reduce((sum, p) => sum + p.y, 0) / points.length;
  let xx = 0;
  let xy = 0;
  let yy = 0;
  for (const p of points) {
    xx += (p.x - x) ** 2;
    xy += (p.x - x) * (p.y - y);
    yy += (p.y - y) ** 2;
  }
  const angle = Math.atan2(2 * xy, xx - yy) / 2;
  const way = Math.cos(angle) * like.ux + Math.sin(angle) * like.uy < 0 ? -1 : 1;
  return { x, y, ux: way * Math.cos(angle), uy: way * Math.sin(angle) };
}

/** Twice the signed area of a triangle: above 0 when a → b → c turns clockwise (y down). */
export function turn(a: PointPx, b: PointPx, c: PointPx): number {
  return (b.x - a.x) * (c.y - a.y) - (b.y - a.y) * (c.x - a.x);
}
