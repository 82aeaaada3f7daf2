import { greatestDivisor } from "./greatest-divisor.ts";
import type { Pose, Stock, Task } from "./task.ts";

/** The first cuts of a board: "y" rips it into strips, "x" crosscuts it into sections. */
export type Way = "x" | "y";

export function otherWay(way: Way): Way {
  return way === "x" ? "y" : "x";
}

/** Size of a pose across a band (its strip's width, or its section's length). */
export function bandSize(pose: Pose, way: Way): number {
  return way === "y" ? pose.width : pose.length;
}

/** Size of a pose along a band. */
export function cellSize(pose: Pose, way: Way): number {
  return way === "y" ? pose.length : pose.width;
}

/** A pose of a kind as a band sees it. Sizes have a kerf added, so that they simply sum up; so have rooms. */
export interface Entry {
  kind: number;
  pose: Pose;
  band: number;
  cell: number;
}

/** All poses of the kinds a stock may give that fit on it, the narrowest across a band first. */
export function entriesOf(task: Task, eligible: boolean[], way: Way): Entry[] {
  const entries: Entry[] = [];
  for (const kind of task.kinds) {
    if (!eligible[kind.index]) continue;
    for (const pose of kind.poses)
      entries.push({
        kind: kind.index,
        pose,
        band: bandSize(pose, way) + task.kerf,
        cell: cellSize(pose, way) + task.kerf,
      });
  }
  return entries.sort((a, b) => a.band - b.band || a.cell - b.cell || a.kind - b.kind);
}

/** Room across (all bands together) or along (one band) on a stock, with a kerf added. */
export function room(task: Task, stock: Stock, way: Way): { across: number; along: number } {
  const [length, width] = [stock.length + task.kerf, stock.width + task.kerf];
  return way === "y" ? { across: width, along: length } : { across: length, along: width };
}

/** Tables over lengths and over widths go by steps of these sizes. */
export interface Grid {
  x: number;
  y: number;
}

/** How many steps tables may have along and across: few for the many tables of planning, many for a bound worth claiming. */
export interface GridSize {
  x: number;
  y: number;
}

export const PLAN_GRID: GridSize = { x: 400, y: 160 };
export const PROMISE_GRID: GridSize = { x: 160, y: 90 };
export const VALUE_GRID: GridSize = { x: 900, y: 250 };
export const BOUND_GRID: GridSize = { x: 6000, y: 1500 };

/** Steps on which every size lies, where up to three times so many suffice; else even ones. */
export function makeGrid(task: Task, most: GridSize): Grid {
  const step = (size: keyof Pose, count: number) => {
    const sizes = task.stocks.map((stock) => stock[size] + task.kerf);
    for (const { poses } of task.kinds) for (const pose of poses) sizes.push(pose[size] + task.kerf);
    const longest = Math.max(...task.stocks.map((stock) => stock[size] + task.kerf));
    const common = sizes.reduce(greatestDivisor, 0);
    return longest / common <= 3 * count ? common : longest / count;
  };
  return { x: step("length", most.x), y: step("width", most.y) };
}
