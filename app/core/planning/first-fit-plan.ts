import { firstFit } from "./first-fit.ts";
import type { Plan } from "./layout.ts";
import { makePlan } from "./make-plan.ts";
import { makeTask } from "./make-task.ts";
import type { Problem } from "./problem.ts";

/** The first-fit-decreasing plan alone, with no bound: the mark that a real plan is shown beside. */
export function firstFitPlan(problem: Problem): Plan {
  const { task, barred } = makeTask(problem);
  return makePlan(task, firstFit(task), 0, barred);
}
