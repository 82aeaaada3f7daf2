import type { Carver } from "./carve.ts";
import { everything, type GreedyTools, greedyPlan, type Remaining } from "./greedy-plan.ts";
import { sequence } from "./number-sequence.ts";
import type { Pattern } from "./pattern.ts";
import { BoardPricer } from "./price-boards.ts";
import { costOf, isBetter, type Solution } from "./solution.ts";
import type { Stock, Task } from "./task.ts";

export interface ImproveTools {
  task: Task;
  carver: Carver;
  grid: { x: number; y: number };
  stocks: Stock[];
}

export interface ImproveLimits {
  mayGoOn: () => boolean;
  /** A cost at which nothing more is to be won. */
  goal: number;
  /** Tries in a row without gain after which the search ends. */
  patience: number;
  onBetter: (solution: Solution) => void;
}

/** How a try goes about it: a few boards shuffled well, or the most wasteful ones planned anew with little change. */
interface Manner {
  boards: { least: number; more: number };
  /** Chance of a board without waste to be taken up, beside one that is all waste. */
  evenness: number;
  shake: { least: number; more: number };
  /** Boards really carved at each step. */
  trials: number;
  /** Boards that may be chosen besides those taken up. */
  others: number;
  /** A try is given up once what is left would have to cost less than this part of its worth for the try to pay. */
  hope: number;
}

const SHUFFLE: Manner = {
  boards: { least: 2, more: 4 },
  evenness: 0.03,
  shake: { least: 0.1, more: 0.4 },
  trials: 3,
  others: 36,
  hope: 0.97,
};
const TAIL: Manner = {
  boards: { least: 4, more: 7 },
  evenness: 0.003,
  shake: { least: 0.02, more: 0.15 },
  trials: 6,
  others: 60,
  hope: 0.95,
};
const TAIL_EVERY = 4;
/** The search may go on from plans dearer than the best by this part. */
const STRAY = 0.003;

/**
 * Betters a plan by taking up a few of its boards at a time and planning their pieces anew, on any boards, with what pieces
 * are worth shaken a little. Boards that waste most are taken up most often.
 */
export function improvePlan(tools: ImproveTools, start: Solution, values: number[], limits: ImproveLimits): Solution {
  const random = sequence(1);
  let best = start;
  let current = start;
  let idle = 0;
  let tries = 0;
  while (idle < limits.patience && limits.mayGoOn()) {
    if (costOf(best) <= limits.goal || best.patterns.length === 0) break;
    idle++;
    const manner = tries++ % TAIL_EVERY === 0 ? TAIL : SHUFFLE;
    const candidate = tryOnce(tools, current, best, values, random, manner, limits.mayGoOn);
    if (!candidate) continue;
    current = candidate;
    if (!isBetter(tools.task, candidate, best)) continue;
    best = candidate;
    idle = 0;
    limits.onBetter(best);
  }
  return best;
}

function tryOnce(
  { task, carver, grid, stocks }: ImproveTools,
  current: Solution,
  best: Solution,
  values: number[],
  random: () => number,
  manner: Manner,
  mayGoOn: () => boolean,
): Solution | null {
  const lifted = choose(task, current, values, random, manner);
  const kept = current.patterns.filter((pattern) => !lifted.has(pattern));
  const left = remainingOf(task, kept);
  const short = best.missing.some((count) => count > 0);
  const allowed = costOf(best) * (1 + STRAY) - kept.reduce((sum, pattern) => sum + pattern.cost, 0);
  const chosen = new Set([...lifted].map(({ stock }) => task.stocks[stock]!));
  const able = stocks.filter(({ index }) => left.boards[index]! > 0);
  while (chosen.size < Math.min(able.length, manner.others + lifted.size))
    chosen.add(able[Math.floor(random() * able.length)]!);
  const some = [...chosen].filter(({ index }) => left.boards[index]! > 0).sort((a, b) => a.index - b.index);
  const tools: GreedyTools = { task, carver, pricer: new BoardPricer(task, grid, carver, some), stocks: some };
  const shake = manner.shake.least + manner.shake.more * random();
  const shaken = values.map((value) => value * (1 - shake / 2 + shake * random()));
  const again = greedyPlan(tools, shaken, left, manner.trials, (cost, demand) => {
    const worth = demand.reduce((sum, count, kind) => sum + count * values[kind]!, 0);
    return mayGoOn() && (short || cost + manner.hope * worth < allowed);
  });
  if (!again) return null;
  const candidate = { patterns: [...kept, ...again.patterns], missing: again.missing };
  if (isBetter(task, candidate, best)) return candidate;
  const asMuch = candidate.missing.every((count, kind) => count === current.missing[kind]!);
  if (!asMuch || costOf(candidate) > costOf(best) * (1 + STRAY)) return null;
  // Among plans of one cost, fuller and emptier boards are nearer to one board less than boards all alike.
  const even = Math.abs(costOf(candidate) - costOf(current)) <= 1e-9 * costOf(current);
  return even && unevenness(candidate, values) < unevenness(current, values) - 1e-9 ? null : candidate;
}

function choose(
  task: Task,
  { patterns }: Solution,
  values: number[],
  random: () => number,
  { boards, evenness }: Manner,
): Set<Pattern> {
  const waste = (pattern: Pattern) =>
    Math.max(0, pattern.cost - pattern.counts.reduce((sum, [kind, n]) => sum + n * values[kind]!, 0)) /
    Math.max(1e-9, task.stocks[pattern.stock]!.cost);
  const drawn = patterns.map((pattern) => ({ pattern, rank: random() ** (1 / (evenness + waste(pattern))) }));
  drawn.sort((a, b) => b.rank - a.rank);
  return new Set(drawn.slice(0, boards.least + Math.floor(random() * boards.more)).map(({ pattern }) => pattern));
}

function remainingOf(task: Task, kept: Pattern[]): Remaining {
  const left = everything(task);
  for (const { stock, counts } of kept) {
    left.boards[stock]!--;
    for (const [kind, count] of counts) left.demand[kind]! -= count;
  }
  return left;
}

function unevenness({ patterns }: Solution, values: number[]): number {
  return patterns.reduce(
    (sum, { counts }) => sum + counts.reduce((worth, [kind, n]) => worth + n * values[kind]!, 0) ** 2,
    0,
  );
}
