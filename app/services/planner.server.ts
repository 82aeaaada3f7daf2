import type { Plan } from "#app/core/planning/layout.ts";
import type { ProblemInput } from "#app/core/planning/problem.ts";
import { createThread, type WorkerThread } from "./worker-thread.server.ts";

export type PlanAnswer = { ok: true; plan: Plan } | { ok: false; error: string };

/** Plans boards to cut in a thread of its own; each problem carries its own time limit. */
export type Planner = WorkerThread<ProblemInput, PlanAnswer>;

export function createPlanner(root?: string): Planner {
  return createThread({
    file: "planning.worker.ts",
    patienceMs: 60_000,
    standIn: { ok: false, error: "The planner gave no answer. Try again." },
    root,
  });
}

let planner: Planner | undefined;

/** The planner of this process. */
export function appPlanner(): Planner {
  planner ??= createPlanner();
  return planner;
}
