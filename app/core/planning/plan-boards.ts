import { BOUND_GRID, type Grid, makeGrid, PLAN_GRID, PROMISE_GRID, VALUE_GRID } from "./axes.ts";
import { Carver, isPlain } from "./carve.ts";
import { areaBound, nextPossibleCost } from "./cost-bound.ts";
import { everything, type GreedyTools, greedyPlan } from "./greedy-plan.ts";
import { improvePlan } from "./improve-plan.ts";
import { sequence } from "./number-sequence.ts";
import { PieceValues } from "./piece-values.ts";
import { BoardPricer, boundByPrices } from "./price-boards.ts";
import { costOf, isBetter, type Solution } from "./solution.ts";
import type { Stock, Task } from "./task.ts";

export interface SearchWatch {
  mayGoOn: () => boolean;
  onProgress: (progress: { cost: number; bound: number }) => void;
}

/** Stocks that values and plans are made from: the most promising of all, and of each class of cost. Bounds look at all. */
const CANDIDATES = { best: 110, classes: 12, ofEachClass: 6 };
const GREEDY_PLANS = 10;
/** The pattern program is asked for tasks of so many kinds times boards, no larger. */
const MOST_VALUED = 3000;
const ROUNDS = 24;
const PATTERNS_A_ROUND = 100;
const TRIALS = 12;
/** Boards where places differ take long to carve. */
const PLACED_TRIALS = { fewKinds: 12, manyKinds: 2, many: 100 };
/** Tries in a row without gain before the search ends, for each piece of the task, and the least and most of them. */
const PATIENCE = { each: 4, least: 60, most: 2000 };

/** Greedy plans are made with large pieces, and wide ones, worth more than their area by these powers: then they are not left to the last. */
const LEANINGS = [
  { area: 0, width: 0 },
  { area: 0.02, width: 0.03 },
  { area: 0.04, width: 0.03 },
  { area: 0.04, width: 0 },
  { area: 0.09, width: 0 },
  { area: 0.16, width: 0.03 },
  { area: 0.06, width: 0.02 },
  { area: 0.12, width: 0 },
];

/**
 * Plans any rack: values of pieces from the pattern program, greedy plans by these values, and then repeated replanning of a
 * few boards at a time.
 */
export function planBoards(task: Task, start: Solution, watch: SearchWatch): { solution: Solution; bound: number } {
  // What two stages give, three give as well, and it is found sooner.
  const from = task.stages === 3 ? planBoards({ ...task, stages: 2 }, start, watch).solution : start;
  const search = new BoardSearch(task, from, watch);
  search.run();
  return { solution: search.best, bound: search.bound };
}

class BoardSearch {
  best: Solution;
  bound = 0;
  private readonly grid: Grid;
  private readonly carver: Carver;
  private readonly boundPricer: BoardPricer;
  private readonly demand: number[];

  constructor(
    private readonly task: Task,
    start: Solution,
    private readonly watch: SearchWatch,
  ) {
    this.grid = makeGrid(task, PLAN_GRID);
    this.best = start;
    this.carver = new Carver(task, this.grid);
    this.boundPricer = new BoardPricer(task, makeGrid(task, task.stages === 3 ? PLAN_GRID : BOUND_GRID), this.carver);
    this.demand = task.kinds.map((kind) => kind.demand);
  }

  run(): void {
    const { task, watch, grid, carver } = this;
    const area = areaBound(task);
    this.raise(area);
    const start = valuesByArea(task, area);
    const prices = new BoardPricer(task, grid, carver).price(start, this.demand, watch.mayGoOn);
    if (!prices) return;
    const { most, cost } = prices;
    const candidates = this.chooseCandidates((stock) => most[stock.index]! / Math.max(1e-9, cost[stock.index]!));
    const tools: GreedyTools = {
      task,
      carver,
      pricer: new BoardPricer(task, makeGrid(task, PROMISE_GRID), carver, candidates),
      stocks: candidates,
    };
    this.raiseBy(start);
    const random = sequence(2);
    for (let i = 0; i < GREEDY_PLANS; i++) {
      if (this.done() || !watch.mayGoOn()) break;
      const leaning = LEANINGS[i] ?? { area: 0.12 * random(), width: 0.05 * random() };
      this.tryGreedy(tools, lean(task, start, leaning));
    }
    let values = start;
    if (task.kinds.length * candidates.length <= MOST_VALUED && !this.done() && watch.mayGoOn())
      values = this.findValues(candidates, start, tools);
    if (this.done() || !watch.mayGoOn()) return;
    const pieces = this.demand.reduce((sum, count) => sum + count, 0);
    this.best = improvePlan(
      { task, carver, grid: makeGrid(task, PROMISE_GRID), stocks: candidates },
      this.best,
      values,
      {
        mayGoOn: watch.mayGoOn,
        goal: this.bound,
        patience: Math.min(PATIENCE.most, Math.max(PATIENCE.least, PATIENCE.each * pieces)),
        onBetter: (solution) => this.report(solution),
      },
    );
  }

  private findValues(candidates: Stock[], start: number[], tools: GreedyTools): number[] {
    const { task, watch, carver } = this;
    const pieceValues = new PieceValues(task, makeGrid(task, VALUE_GRID), carver, candidates, start, everything(task));
    for (let round = 0; round < ROUNDS && watch.mayGoOn(); round++)
      if (!pieceValues.round(round === 0, PATTERNS_A_ROUND, watch.mayGoOn)) break;
    const { values } = pieceValues;
    for (const part of [1, 0.5, 0.25]) {
      if (this.done() || !watch.mayGoOn()) return start;
      const blend = values.map((value, kind) => part * value + (1 - part) * start[kind]!);
      this.raiseBy(blend);
      this.tryGreedy(tools, blend);
    }
    return values;
  }

  private tryGreedy(tools: GreedyTools, values: number[]): void {
    const found = greedyPlan(tools, values, everything(this.task), this.trials(), this.watch.mayGoOn);
    if (!found || !isBetter(this.task, found, this.best)) return;
    this.best = found;
    this.report(found);
  }

  private trials(): number {
    if (this.task.stocks.every((stock) => isPlain(this.task, stock))) return TRIALS;
    return this.task.kinds.length > PLACED_TRIALS.many ? PLACED_TRIALS.manyKinds : PLACED_TRIALS.fewKinds;
  }

  private chooseCandidates(promise: (stock: Stock) => number): Stock[] {
    const { stocks } = this.task;
    const { best, classes, ofEachClass } = CANDIDATES;
    if (stocks.length <= best + classes * ofEachClass) return stocks;
    const ranked = [...stocks].sort((a, b) => promise(b) - promise(a) || a.index - b.index);
    const chosen = new Set(ranked.slice(0, best));
    for (const { stock } of this.best.patterns) chosen.add(stocks[stock]!);
    const byCost = [...stocks].sort((a, b) => a.cost - b.cost || a.index - b.index);
    const classOf = new Map(byCost.map((stock, rank) => [stock, Math.floor((rank * classes) / byCost.length)]));
    for (let costClass = 0; costClass < classes; costClass++)
      for (const stock of ranked.filter((stock) => classOf.get(stock) === costClass).slice(0, ofEachClass))
        chosen.add(stock);
    return [...chosen].sort((a, b) => a.index - b.index);
  }

  private raiseBy(values: number[]): void {
    const prices = this.boundPricer.price(values, this.demand, this.watch.mayGoOn);
    if (prices) this.raise(boundByPrices(this.task, values, prices));
  }

  private raise(bound: number): void {
    const next = nextPossibleCost(this.task, bound - 1e-9 * Math.abs(bound), costOf(this.best));
    this.bound = Math.max(this.bound, Math.min(next, costOf(this.best)));
  }

  private report(solution: Solution): void {
    this.watch.onProgress({ cost: costOf(solution), bound: this.bound });
  }

  private done(): boolean {
    return this.best.missing.every((count) => count === 0) && costOf(this.best) <= this.bound * (1 + 1e-9);
  }
}

/** Every piece worth its area and kerf, all together worth so much. */
function valuesByArea(task: Task, worth: number): number[] {
  const { kerf } = task;
  const gross = task.kinds.map(({ poses }) => (poses[0]!.length + kerf) * (poses[0]!.width + kerf));
  const needed = task.kinds.reduce((sum, kind) => sum + kind.demand * gross[kind.index]!, 0);
  return gross.map((size) => (size * Math.max(worth, 1e-9)) / needed);
}

/** Values with another leaning, all pieces together worth the same. */
function lean(task: Task, values: number[], { area, width }: { area: number; width: number }): number[] {
  const leaning = values.map((value, kind) => value ** (1 + area) * task.kinds[kind]!.poses[0]!.width ** width);
  const total = (of: number[]) => of.reduce((sum, value, kind) => sum + value * task.kinds[kind]!.demand, 0);
  const scale = total(values) / total(leaning);
  return leaning.map((value) => value * scale);
}
