import { type Carver, isPlain } from "./carve.ts";
import { type Pattern, patternOf } from "./pattern.ts";
import type { BoardPricer } from "./price-boards.ts";
import type { Solution } from "./solution.ts";
import type { Stock, Task } from "./task.ts";

/** What is still to do: pieces by kind, and boards by stock. */
export interface Remaining {
  demand: number[];
  boards: number[];
}

export function everything(task: Task): Remaining {
  return { demand: task.kinds.map((kind) => kind.demand), boards: task.stocks.map((stock) => stock.ids.length) };
}

export interface GreedyTools {
  task: Task;
  carver: Carver;
  pricer: BoardPricer;
  stocks: Stock[];
}

/**
 * Opens one board after another, always one that gives most worth for its cost, until nothing is left or nothing fits.
 *
 * @param trials boards really carved at each step, the most promising first.
 * @param keepOn told the cost so far and the pieces left; false gives up, with null.
 */
export function greedyPlan(
  { task, carver, pricer, stocks }: GreedyTools,
  values: ArrayLike<number>,
  from: Remaining,
  trials: number,
  keepOn: (cost: number, demand: number[]) => boolean,
): Solution | null {
  const demand = from.demand.slice();
  const boards = from.boards.slice();
  const patterns: Pattern[] = [];
  let cost = 0;
  while (demand.some((count) => count > 0)) {
    if (!keepOn(cost, demand)) return null;
    const chosen = bestForCost({ task, carver, pricer, stocks }, values, demand, boards, trials, () =>
      keepOn(cost, demand),
    );
    if (!chosen) break;
    const pattern = onCheapest(task, chosen, boards);
    patterns.push(pattern);
    cost += pattern.cost;
    boards[pattern.stock]!--;
    for (const [kind, count] of pattern.counts) demand[kind]! -= count;
  }
  return { patterns, missing: demand };
}

/** The same layout on the cheapest board on which it fits as it is, where places are alike. */
function onCheapest(task: Task, pattern: Pattern, boards: number[]): Pattern {
  const own = task.stocks[pattern.stock]!;
  if (!isPlain(task, own)) return pattern;
  let best = pattern;
  for (const stock of task.stocks) {
    if (stock.cost >= best.cost + (own.credit > 0 ? own.cost : 0) || boards[stock.index]! <= 0) continue;
    if (stock.length < pattern.reach.length || stock.width < pattern.reach.width) continue;
    if (!pattern.counts.every(([kind]) => stock.eligible[kind]) || !isPlain(task, stock)) continue;
    const moved = patternOf(task, stock, pattern.block);
    if (moved.cost < best.cost - 1e-9) best = moved;
  }
  return best;
}

/** The pattern that gives most worth for its cost, of the boards that promise most. */
function bestForCost(
  { task, carver, pricer, stocks }: GreedyTools,
  values: ArrayLike<number>,
  demand: number[],
  boards: number[],
  trials: number,
  mayGoOn: () => boolean,
): Pattern | null {
  const prices = pricer.price(values, demand, mayGoOn);
  if (!prices) return null;
  const { most, cost } = prices;
  const total = demand.reduce((sum, count, kind) => sum + count * values[kind]!, 0);
  const ratio = (worth: number, price: number) => worth / Math.max(price, 1e-9);
  const promise = (stock: Stock) => ratio(Math.min(most[stock.index]!, total), Math.max(cost[stock.index]!, 1e-9));
  const promising = stocks
    .filter(({ index }) => boards[index]! > 0 && most[index]! > 0)
    .sort((a, b) => promise(b) - promise(a) || a.cost - b.cost || a.index - b.index);
  let best: Pattern | null = null;
  let bestRatio = 0;
  let tried = 0;
  for (const stock of promising) {
    if (promise(stock) <= bestRatio || (tried >= trials && best) || !mayGoOn()) break;
    tried++;
    const pattern = carver.carve(stock, values, demand);
    if (!pattern) continue;
    const worth = pattern.counts.reduce((sum, [kind, count]) => sum + count * values[kind]!, 0);
    if (task.kinds.length > 0 && ratio(worth, pattern.cost) > bestRatio + 1e-12) {
      bestRatio = ratio(worth, pattern.cost);
      best = pattern;
    }
  }
  return best;
}
