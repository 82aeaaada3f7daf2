import { areaBound, nextPossibleCost } from "./cost-bound.ts";
import { firstFit } from "./first-fit.ts";
import type { Plan } from "./layout.ts";
import { makePlan } from "./make-plan.ts";
import { makeTask } from "./make-task.ts";
import { isBinTask, planBins } from "./plan-bins.ts";
import { planBoards } from "./plan-boards.ts";
import type { Problem } from "./problem.ts";
import { costOf } from "./solution.ts";

/** How a search is watched and ended. The clock belongs to the caller: a plan depends on time only through shouldStop. */
export interface PlanWatch {
  onProgress?: (progress: { cost: number; bound: number }) => void;
  /** Asked every few milliseconds; true ends the search with the best plan so far. */
  shouldStop?: () => boolean;
}

/**
 * Plans which boards are cut, and how, at the least cost that can be found, with a bound below which no plan can go.
 *
 * The same problem gives the same plan unless shouldStop ends the search early. It runs to its end in the calling thread.
 */
export function solvePlan(
  problem: Problem,
  { shouldStop = () => false, onProgress = () => undefined }: PlanWatch = {},
): Plan {
  const { task, barred } = makeTask(problem);
  const start = firstFit(task);
  const mayGoOn = () => !shouldStop();
  const { solution, bound } = isBinTask(task)
    ? planBins(task, start, mayGoOn)
    : planBoards(task, start, { mayGoOn, onProgress });
  const best = Math.max(bound, nextPossibleCost(task, areaBound(task), costOf(solution)));
  return makePlan(task, solution, best, barred);
}
