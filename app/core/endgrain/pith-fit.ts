import type { TensorCells } from "#app/core/endgrain/tensor-cells.ts";

/** A point of the picture in pixels. */
export type PointPx = { x: number; y: number };

/**
 * How well concentric rings about a pith agree with the directions seen: the mean over all cells of coherence × cos 2(difference),
 * 1 at best, negative when the lines run square to such rings. Each cell counts by the part of it that can be seen; what a
 * coarse scale cannot see along the edge counts as not agreeing. `size` is the picture's.
 */
export function agreement(cells: TensorCells, size: { width: number; height: number }, pith: PointPx): number {
  const { columns, rows, cos2, sin2, open } = cells;
  const stepX = size.width / columns;
  const stepY = size.height / rows;
  let sum = 0;
  for (let row = 0; row < rows; row++) {
    const dy = (row + 0.5) * stepY - pith.y;
    for (let column = 0; column < columns; column++) {
      const i = row * columns + column;
      const dx = (column + 0.5) * stepX - pith.x;
      const square = dx * dx + dy * dy + 1e-6;
      sum += (open[i]! * (cos2[i]! * (dx * dx - dy * dy) + sin2[i]! * 2 * dx * dy)) / square;
    }
  }
  return sum / (columns * rows);
}

/** Distances of the pith from the end's middle that the search starts from, in half diagonals: from inside to "as good as straight lines". */
const START_DISTANCES = [0, 0.15, 0.3, 0.45, 0.6, 0.75, 0.9, 1.1, 1.4, 1.8, 2.4, 3.4, 5, 9, 20];
const START_BEARINGS = 40;

/**
 * The pith whose rings agree best with the directions seen: a search of the plane in polar steps, then a pattern search from
 * the best few. The agreement is bounded for each cell, so a minority of wrong cells cannot pull the answer far.
 */
export function fitPith(
  cells: TensorCells,
  size: { width: number; height: number },
): { pith: PointPx; agreement: number } {
  const middle = { x: size.width / 2, y: size.height / 2 };
  const half = Math.hypot(middle.x, middle.y);
  const starts: { pith: PointPx; agreement: number }[] = [];
  for (const distance of START_DISTANCES) {
    for (let b = 0; b < (distance === 0 ? 1 : START_BEARINGS); b++) {
      const bearing = ((b + 0.5) * 2 * Math.PI) / START_BEARINGS;
      const pith = {
        x: middle.x + half * distance * Math.cos(bearing),
        y: middle.y + half * distance * Math.sin(bearing),
      };
      starts.push({ pith, agreement: agreement(cells, size, pith) });
    }
  }
  starts.sort((a, b) => b.agreement - a.agreement);
  let best = starts[0]!;
  for (const start of starts.slice(0, 4)) {
    const refined = climb(start, (pith) => agreement(cells, size, pith), middle, half);
    if (refined.agreement > best.agreement) best = refined;
  }
  return best;
}

function climb(
  start: { pith: PointPx; agreement: number },
  score: (pith: PointPx) => number,
  middle: PointPx,
  half: number,
): { pith: PointPx; agreement: number } {
  let best = start;
  for (let step = 0.15; step > 0.002; ) {
    let moved = false;
    const away = { x: best.pith.x - middle.x, y: best.pith.y - middle.y };
    const distance = Math.hypot(away.x, away.y) + 1e-6;
    // Far away only the bearing and the curvature matter, so steps grow with the square of the distance along the line of sight.
    const along = step * half * Math.max(0.3, (distance / half) ** 2);
    const across = step * half * Math.max(0.3, distance / half);
    const u = { x: away.x / distance, y: away.y / distance };
    for (const [a, c] of [
      [along, 0],
      [-along, 0],
      [0, across],
      [0, -across],
    ] as const) {
      const pith = { x: best.pith.x + a * u.x - c * u.y, y: best.pith.y + a * u.y + c * u.x };
      if (Math.hypot(pith.x - middle.x, pith.y - middle.y) > 60 * half) continue;
      const value = score(pith);
      if (value > best.agreement) {
        best = { pith, agreement: value };
        moved = true;
      }
    }
    if (!moved) step /= 2;
  }
  return best;
}
