import { everything, type GreedyTools, greedyPlan, type Remaining } from "./greedy-plan.ts";
import { sequence } from "./number-sequence.ts";
import type { Pattern } from "./pattern.ts";
import { costOf, isBetter, type Solution } from "./solution.ts";

export interface ImproveLimits {
  mayGoOn: () => boolean;
  /** A cost at which nothing more is to be won. */
  goal: number;
  /** Tries in a row without gain after which the search ends. */
  patience: number;
  /** Tries in all. */
  most: number;
  onBetter: (solution: Solution) => void;
}

/**
 * Betters a plan by taking up a few of its boards at a time and planning their pieces anew, on any boards, with what pieces
 * are worth shaken a little. Boards that waste most are taken up most often.
 */
export function improvePlan(tools: GreedyTools, start: Solution, values: number[], limits: ImproveLimits): Solution {
  const random = sequence(1);
  let best = start;
  let idle = 0;
  for (let tries = 0; tries < limits.most && idle < limits.patience; tries++) {
    if (costOf(best) <= limits.goal || best.patterns.length === 0 || !limits.mayGoOn()) break;
    const lifted = choose(tools, best, values, random, 2 + Math.floor(random() * (2 + (tries % 3))));
    const kept = best.patterns.filter((pattern) => !lifted.has(pattern));
    const liftedCost = [...lifted].reduce((sum, pattern) => sum + pattern.cost, 0);
    const shaken = values.map((value) => value * (0.85 + 0.3 * random()));
    const missing = best.missing.some((count) => count > 0);
    const again = greedyPlan(tools, shaken, remainingOf(tools, kept), 3, (cost) => {
      return limits.mayGoOn() && (missing || cost < liftedCost);
    });
    idle++;
    if (!again) continue;
    const candidate = { patterns: [...kept, ...again.patterns], missing: again.missing };
    if (!isBetter(tools.task, candidate, best)) continue;
    best = candidate;
    idle = 0;
    limits.onBetter(best);
  }
  return best;
}

function choose(
  { task }: GreedyTools,
  { patterns }: Solution,
  values: number[],
  random: () => number,
  count: number,
): Set<Pattern> {
  const waste = (pattern: Pattern) =>
    Math.max(0, pattern.cost - pattern.counts.reduce((sum, [kind, n]) => sum + n * values[kind]!, 0)) /
    Math.max(1e-9, task.stocks[pattern.stock]!.cost);
  const drawn = patterns.map((pattern) => ({ pattern, rank: random() ** (1 / (0.02 + waste(pattern))) }));
  drawn.sort((a, b) => b.rank - a.rank);
  return new Set(drawn.slice(0, count).map(({ pattern }) => pattern));
}

function remainingOf({ task }: GreedyTools, kept: Pattern[]): Remaining {
  const left = everything(task);
  for (const { stock, counts } of kept) {
    left.boards[stock]!--;
    for (const [kind, count] of counts) left.demand[kind]! -= count;
  }
  return left;
}
