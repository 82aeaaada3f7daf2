import { allowedStarts } from "./ring-window.ts";
import type { Kind, Pose, Stock } from "./task.ts";

export interface Interval {
  from: number;
  to: number;
}

const known = new WeakMap<Stock, Map<string, Interval[]>>();

/** Where across a board a piece may begin, by its ring window alone: closed intervals of y in whole units. */
export function startsAcross(stock: Stock, kind: Kind, pose: Pose): Interval[] {
  const { window } = kind;
  if (!window) return pose.width <= stock.width ? [{ from: 0, to: stock.width - pose.width }] : [];
  const cache = known.get(stock) ?? new Map<string, Interval[]>();
  known.set(stock, cache);
  const key = `${pose.width} ${window.min} ${window.max} ${window.share}`;
  let found = cache.get(key);
  if (!found) {
    const range = { from: stock.edgeTrim, to: stock.edgeTrim + stock.width - pose.width };
    found = allowedStarts(stock.ringsDeg, stock.fullWidth, pose.width, window, range)
      .map(({ from, to }) => ({ from: Math.ceil(from - stock.edgeTrim), to: Math.floor(to - stock.edgeTrim) }))
      .filter(({ from, to }) => from <= to);
    cache.set(key, found);
  }
  return found;
}

/** The first allowed start at or after a place; Infinity when there is none. */
export function nextStart(intervals: Interval[], from: number): number {
  for (const interval of intervals) if (interval.to >= from) return Math.max(interval.from, from);
  return Number.POSITIVE_INFINITY;
}

/**
 * The first place at or after (x, y), moving one way only, where a piece keeps its ring window and clear of defects.
 *
 * @returns the coordinate that moves, or Infinity when there is none on the board.
 */
export function firstPlace(stock: Stock, kind: Kind, pose: Pose, x: number, y: number, moving: "x" | "y"): number {
  const intervals = startsAcross(stock, kind, pose);
  let at = moving === "x" ? x : y;
  if (moving === "x" && nextStart(intervals, y) !== y) return Number.POSITIVE_INFINITY;
  for (;;) {
    if (moving === "y") at = nextStart(intervals, at);
    const [left, near] = moving === "x" ? [at, y] : [x, at];
    if (left + pose.length > stock.length || near + pose.width > stock.width) return Number.POSITIVE_INFINITY;
    const hit = stock.defects.find(
      (defect) =>
        defect.x < left + pose.length &&
        left < defect.x + defect.length &&
        defect.y < near + pose.width &&
        near < defect.y + defect.width,
    );
    if (!hit) return at;
    at = moving === "x" ? hit.x + hit.length : hit.y + hit.width;
  }
}
