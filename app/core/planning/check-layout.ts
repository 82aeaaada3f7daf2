import { type BoardFaults, checkBoard } from "./check-board.ts";
import type { Plan } from "./layout.ts";
import type { Problem } from "./problem.ts";

/** Rounding allowed in money, as a part of the amount. */
const MONEY_SLACK = 1e-6;

/**
 * Checks a plan against its problem from nothing but the two: every board as `checkBoard` does, quantities, cost, bound,
 * gap and status. Shares no code with the planner, and is meant for plans from any source.
 *
 * @returns what is wrong, a line each; none when the plan holds.
 */
export function checkPlan(problem: Problem, plan: Plan): string[] {
  const faults: string[] = [];
  const boards = new Map(problem.boards.map((board) => [board.id, board]));
  const parts = new Map(problem.parts.map((part) => [part.id, part]));
  const placed = new Map<string, number>();
  const used = new Set<string>();
  let cost = 0;
  for (const layout of plan.boards) {
    const board = boards.get(layout.id);
    if (!board) {
      faults.push(`There is no board ${layout.id}.`);
      continue;
    }
    if (used.has(layout.id)) faults.push(`Board ${layout.id} is used twice.`);
    used.add(layout.id);
    const found: BoardFaults = checkBoard(problem, board, layout, parts);
    faults.push(...found.map((fault) => `Board ${layout.id}: ${fault}`));
    for (const piece of layout.pieces) placed.set(piece.part, (placed.get(piece.part) ?? 0) + 1);
    cost += layout.cost;
  }
  return [...faults, ...checkQuantities(problem, plan, placed), ...checkMoney(plan, cost)];
}

function checkQuantities(problem: Problem, plan: Plan, placed: Map<string, number>): string[] {
  const faults: string[] = [];
  const missing = new Map<string, number>();
  for (const { part, quantity } of plan.unplaced) {
    if (!(quantity > 0)) faults.push(`Unplaced ${part}: quantity ${quantity}.`);
    missing.set(part, (missing.get(part) ?? 0) + quantity);
  }
  for (const { id, quantity, plies } of problem.parts) {
    const [there, not] = [placed.get(id) ?? 0, missing.get(id) ?? 0];
    if (there + not !== quantity * plies)
      faults.push(`Part ${id}: ${there} placed and ${not} unplaced of ${quantity * plies}.`);
    missing.delete(id);
  }
  for (const id of missing.keys()) faults.push(`There is no part ${id} to be unplaced.`);
  return faults;
}

function checkMoney(plan: Plan, cost: number): string[] {
  const faults: string[] = [];
  const slack = MONEY_SLACK * Math.max(1, Math.abs(cost));
  if (!(Math.abs(plan.cost - cost) <= slack)) faults.push(`Cost ${plan.cost} is not the boards' ${cost}.`);
  if (plan.status === "short") {
    if (plan.unplaced.length === 0) faults.push("The plan is called short but places everything.");
    return faults;
  }
  if (plan.unplaced.length > 0) faults.push(`Pieces are unplaced but the plan is called ${plan.status}.`);
  if (!(plan.bound <= plan.cost + slack)) faults.push(`Bound ${plan.bound} is above the cost ${plan.cost}.`);
  const gap = plan.cost > 0 ? (plan.cost - plan.bound) / plan.cost : 0;
  if (!(Math.abs(plan.gap - gap) <= 1e-6)) faults.push(`Gap ${plan.gap} should be ${gap}.`);
  if (plan.status === "optimal" && plan.cost - plan.bound > slack) faults.push("Called optimal above its bound.");
  return faults;
}
