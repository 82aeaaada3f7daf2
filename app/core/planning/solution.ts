import type { Pattern } from "./pattern.ts";
import type { Task } from "./task.ts";

/** Boards cut up, a pattern for each board opened, and pieces by kind that found no place. */
export interface Solution {
  patterns: Pattern[];
  missing: number[];
}

export function costOf({ patterns }: Solution): number {
  return patterns.reduce((sum, pattern) => sum + pattern.cost, 0);
}

/** Area of pieces that found no place. */
export function missingArea(task: Task, { missing }: Solution): number {
  return task.kinds.reduce((sum, kind) => sum + kind.area * missing[kind.index]!, 0);
}

/** Less is better: first what is missing, then cost. Differences within rounding count as none. */
export function isBetter(task: Task, a: Solution, b: Solution): boolean {
  const [missingA, missingB] = [missingArea(task, a), missingArea(task, b)];
  if (missingA !== missingB) return missingA < missingB;
  const [costA, costB] = [costOf(a), costOf(b)];
  return costA < costB - 1e-9 * Math.max(1, Math.abs(costB));
}

export function nothingPlaced(task: Task): Solution {
  return { patterns: [], missing: task.kinds.map((kind) => kind.demand) };
}
