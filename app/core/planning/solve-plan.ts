import { areaBound, nextPossibleCost } from "./cost-bound.ts";
import { firstFit } from "./first-fit.ts";
import type { Plan } from "./layout.ts";
import { makePlan } from "./make-plan.ts";
import { makeTask } from "./make-task.ts";
import { planAlikeBoards } from "./plan-alike-boards.ts";
import { isBinTask, planBins } from "./plan-bins.ts";
import { planBoards, type SearchWatch } from "./plan-boards.ts";
import { planFewRows } from "./plan-few-rows.ts";
import type { Problem } from "./problem.ts";
import { costOf, type Solution } from "./solution.ts";
import type { Task } from "./task.ts";

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
  const { solution, bound } = search(task, start, { mayGoOn: () => !shouldStop(), onProgress });
  const least = nextPossibleCost(task, areaBound(task), costOf(solution));
  return makePlan(task, solution, Math.max(bound, least), barred);
}

function search(task: Task, start: Solution, watch: SearchWatch): { solution: Solution; bound: number } {
  if (task.kinds.length === 0) return { solution: start, bound: 0 };
  if (isBinTask(task)) return planBins(task, start, watch.mayGoOn);
  const few = planFewRows(task, start, watch.mayGoOn);
  if (few?.isBest) return { solution: few.solution, bound: costOf(few.solution) };
  const alike = planAlikeBoards(task, start, watch.mayGoOn);
  if (alike && alike.bound >= costOf(alike.solution)) return alike;
  const { solution, bound } = planBoards(task, alike?.solution ?? few?.solution ?? start, watch);
  return { solution, bound: Math.max(bound, alike?.bound ?? 0) };
}
