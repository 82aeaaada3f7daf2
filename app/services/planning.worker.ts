import { parentPort } from "node:worker_threads";
import { readProblem } from "#app/core/planning/problem.ts";
import { solvePlan } from "#app/core/planning/solve-plan.ts";
import type { PlanAnswer } from "./planner.server.ts";

/** Solves planning problems beside the web process, each to its own time limit. */
parentPort?.on("message", ({ id, question }: { id: number; question: unknown }) => {
  parentPort?.postMessage({ id, answer: solve(question) });
});

function solve(question: unknown): PlanAnswer {
  const read = readProblem(question);
  if (!read.ok) return read;
  const ends = performance.now() + read.problem.timeLimit * 1000;
  return { ok: true, plan: solvePlan(read.problem, { shouldStop: () => performance.now() >= ends }) };
}
