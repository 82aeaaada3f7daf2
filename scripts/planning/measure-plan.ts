import { checkPlan } from "#app/core/planning/check-layout.ts";
import { firstFitPlan } from "#app/core/planning/first-fit-plan.ts";
import type { Plan } from "#app/core/planning/layout.ts";
import { type ProblemInput, readProblem } from "#app/core/planning/problem.ts";
import { solvePlan } from "#app/core/planning/solve-plan.ts";

export interface Measured {
  plan: Plan;
  ms: number;
  /** Cost of the first-fit-decreasing plan, and how many pieces it leaves out. */
  firstFit: { cost: number; unplaced: number };
  faults: string[];
}

/** Solves within the problem's time limit, with the clock around it, and checks the plan. */
export function measurePlan(input: ProblemInput): Measured {
  const read = readProblem(input);
  if (!read.ok) throw new Error(read.error);
  const started = performance.now();
  const endMs = started + read.problem.timeLimit * 1000 * 0.97;
  const plan = solvePlan(read.problem, { shouldStop: () => performance.now() >= endMs });
  const ms = performance.now() - started;
  const baseline = firstFitPlan(read.problem);
  const firstFit = {
    cost: baseline.cost,
    unplaced: baseline.unplaced.reduce((sum, { quantity }) => sum + quantity, 0),
  };
  const faults = [...checkPlan(read.problem, plan), ...checkPlan(read.problem, baseline)];
  const left = plan.unplaced.reduce((sum, { quantity }) => sum + quantity, 0);
  if (left > firstFit.unplaced || (left === firstFit.unplaced && plan.cost > firstFit.cost * (1 + 1e-9)))
    faults.push(`First fit decreasing is better: ${firstFit.cost}.`);
  return { plan, ms, firstFit, faults };
}
