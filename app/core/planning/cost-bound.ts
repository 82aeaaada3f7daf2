import { greatestDivisor } from "./greatest-divisor.ts";
import type { Task } from "./task.ts";

/** Costs are compared in parts this small of the unit of money. */
const PARTS = 1e4;
const MOST_STEPS = 5e6;

/**
 * Bound by area alone: each piece takes its size and a kerf along two sides out of the board's size and a kerf. The boards
 * cheapest by area are taken first, the last in part.
 */
export function areaBound(task: Task): number {
  const { kerf } = task;
  const grossArea = (length: number, width: number) => (length + kerf) * (width + kerf);
  let needed = 0;
  for (const { poses, demand } of task.kinds) needed += demand * grossArea(poses[0]!.length, poses[0]!.width);
  const boards = task.stocks
    .filter(({ eligible }) => eligible.some((is) => is))
    .map(({ length, width, cost, credit, ids }) => {
      const area = grossArea(length, width);
      // At the most, all that no piece takes comes back.
      return { area, count: ids.length, cost: cost - credit * length * width };
    })
    .sort((a, b) => a.cost / a.area - b.cost / b.area);
  const leastCredit = Math.min(...task.stocks.map(({ credit }) => credit), Number.POSITIVE_INFINITY);
  let bound = 0;
  let left = needed;
  for (const { area, count, cost } of boards) {
    const used = Math.min(left, area * count);
    bound += (Math.max(0, cost) / area) * used;
    left -= used;
    if (left <= 0) break;
  }
  return (
    bound +
    (Number.isFinite(leastCredit)
      ? leastCredit * task.kinds.reduce((sum, kind) => sum + kind.area * kind.demand, 0)
      : 0)
  );
}

/**
 * The least sum of boards' costs that is no less than a bound: with offcuts worth nothing, a plan can cost no other sum.
 *
 * @param most no sum above this matters.
 */
export function nextPossibleCost(task: Task, bound: number, most: number): number {
  if (task.stocks.some(({ credit }) => credit > 0)) return bound;
  const costs = task.stocks.map(({ cost }) => Math.round(cost * PARTS));
  if (task.stocks.some(({ cost }, i) => Math.abs(cost * PARTS - costs[i]!) > 1e-6)) return bound;
  const unit = costs.reduce((a, b) => greatestDivisor(a, b), 0);
  if (unit === 0) return bound;
  const steps = Math.floor((most * PARTS) / unit + 1e-6) + 1;
  const from = Math.ceil((bound * PARTS) / unit - 1e-3);
  if (steps * costs.length > MOST_STEPS) return Math.max(bound, (from * unit) / PARTS);
  const reachable = new Uint8Array(steps + 1);
  reachable[0] = 1;
  for (const [index, cost] of costs.entries()) {
    const size = cost / unit;
    if (size === 0) continue;
    const used = new Int32Array(steps + 1);
    for (let sum = size; sum <= steps; sum++)
      if (!reachable[sum] && reachable[sum - size] && used[sum - size]! < task.stocks[index]!.ids.length) {
        reachable[sum] = 1;
        used[sum] = used[sum - size]! + 1;
      }
  }
  for (let sum = Math.max(0, from); sum < steps; sum++)
    if (reachable[sum]) return Math.max(bound, (sum * unit) / PARTS);
  return bound;
}
