import type { RingWindow } from "./problem.ts";

/** Rounding in sums of slices must not bar a strip that lies on a slice's edge. */
const SLACK = 1e-9;

/**
 * Share of a strip's width that lies in a window of ring angles. Each angle holds over its slice of the board's width,
 * sides do not matter.
 *
 * @param ringsDeg one angle for each equal slice, from y = 0.
 * @param boardWidth full width of the board, in the unit of y.
 * @param y near edge of the strip.
 */
export function shareInWindow(ringsDeg: number[], boardWidth: number, y: number, width: number, window: RingWindow) {
  const slice = boardWidth / ringsDeg.length;
  let inside = 0;
  for (const [index, angle] of ringsDeg.entries()) {
    if (!inWindow(angle, window)) continue;
    inside += Math.max(0, Math.min(y + width, (index + 1) * slice) - Math.max(y, index * slice));
  }
  return inside / width;
}

/** Whether a strip keeps its window. A board without a reading keeps none. */
export function keepsWindow(
  ringsDeg: number[] | undefined,
  boardWidth: number,
  y: number,
  width: number,
  window: RingWindow,
): boolean {
  if (!ringsDeg?.length) return false;
  return shareInWindow(ringsDeg, boardWidth, y, width, window) >= window.share - SLACK;
}

/**
 * Where strips of one width may begin: closed intervals of y, in order. The share is linear between the places where an
 * edge of the strip meets an edge of a slice, so the ends are found there or between two of them.
 */
export function allowedStarts(
  ringsDeg: number[] | undefined,
  boardWidth: number,
  width: number,
  window: RingWindow,
  range: { from: number; to: number },
): { from: number; to: number }[] {
  if (!ringsDeg?.length || range.to < range.from) return [];
  const slice = boardWidth / ringsDeg.length;
  const knots = new Set([range.from, range.to]);
  for (let index = 0; index <= ringsDeg.length; index++)
    for (const y of [index * slice, index * slice - width]) if (y > range.from && y < range.to) knots.add(y);
  const ys = [...knots].sort((a, b) => a - b);
  const excess = ys.map((y) => shareInWindow(ringsDeg, boardWidth, y, width, window) - window.share + SLACK);
  const found: { from: number; to: number }[] = [];
  const add = (from: number, to: number) => {
    const last = found.at(-1);
    if (last && from <= last.to + 1e-12) last.to = Math.max(last.to, to);
    else found.push({ from, to });
  };
  if (ys.length === 1 && excess[0]! >= 0) add(ys[0]!, ys[0]!);
  for (let i = 0; i + 1 < ys.length; i++) {
    const [y0, y1, e0, e1] = [ys[i]!, ys[i + 1]!, excess[i]!, excess[i + 1]!];
    const crossing = y0 + ((y1 - y0) * e0) / (e0 - e1);
    if (e0 >= 0 && e1 >= 0) add(y0, y1);
    else if (e0 >= 0) add(y0, crossing);
    else if (e1 >= 0) add(crossing, y1);
  }
  return found;
}

function inWindow(angleDeg: number, { min, max }: RingWindow): boolean {
  const acute = Math.min(Math.abs(angleDeg), 180 - Math.abs(angleDeg));
  return acute >= min && acute <= max;
}
