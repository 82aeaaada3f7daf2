import { makeGrid } from "./axes.ts";
import { BoardProgram } from "./board-program.ts";
import { Carver } from "./carve.ts";
import { areaBound, nextPossibleCost } from "./cost-bound.ts";
import { everything, type GreedyTools, greedyPlan } from "./greedy-plan.ts";
import { improvePlan } from "./improve-plan.ts";
import { BoardPricer, boundByPrices } from "./price-boards.ts";
import { costOf, isBetter, type Solution } from "./solution.ts";
import type { Stock, Task } from "./task.ts";

export interface SearchWatch {
  mayGoOn: () => boolean;
  onProgress: (progress: { cost: number; bound: number }) => void;
}

/** Stocks that the pattern program and the greedy plans choose from; the bound always looks at all. */
const MOST_CANDIDATES = 120;

/**
 * Plans any rack: values of pieces from the pattern program, greedy plans by these values, and then repeated replanning of a
 * few boards at a time.
 */
export function planBoards(task: Task, start: Solution, watch: SearchWatch): { solution: Solution; bound: number } {
  const search = new BoardSearch(task, start, watch);
  search.run();
  return { solution: search.best, bound: search.bound };
}

class BoardSearch {
  best: Solution;
  bound = 0;
  private readonly carver: Carver;
  private readonly pricer: BoardPricer;
  private readonly startValues: number[];

  constructor(
    private readonly task: Task,
    start: Solution,
    private readonly watch: SearchWatch,
  ) {
    const grid = makeGrid(task);
    this.best = start;
    this.carver = new Carver(task, grid);
    this.pricer = new BoardPricer(task, grid, this.carver);
    const area = areaBound(task);
    const { kerf } = task;
    const gross = task.kinds.map(({ poses }) => (poses[0]!.length + kerf) * (poses[0]!.width + kerf));
    const needed = task.kinds.reduce((sum, kind) => sum + kind.demand * gross[kind.index]!, 0);
    this.startValues = gross.map((size) => (size * Math.max(area, 1e-9)) / needed);
    this.raise(area);
  }

  run(): void {
    const { task, watch, startValues } = this;
    const demand = task.kinds.map((kind) => kind.demand);
    const prices = this.pricer.price(startValues, demand);
    this.raise(boundByPrices(task, startValues, prices));
    const candidates = this.chooseCandidates(
      (stock) => prices.most[stock.index]! / Math.max(1e-9, prices.cost[stock.index]!),
    );
    const grid = makeGrid(task);
    const tools: GreedyTools = {
      task,
      carver: this.carver,
      pricer:
        candidates.length < task.stocks.length ? new BoardPricer(task, grid, this.carver, candidates) : this.pricer,
      stocks: candidates,
    };
    const program = new BoardProgram(task, candidates, startValues);
    for (const { patterns } of [this.best]) for (const pattern of patterns) program.add(pattern);
    this.tryGreedy(tools, startValues, program);
    for (let round = 0; round < ROUNDS && !this.done() && watch.mayGoOn(); round++) {
      const found = program.round(this.carver, this.pricer, PATTERNS_A_ROUND, watch.mayGoOn);
      this.raise(program.bound);
      if (round % 4 === 3 || !found) this.tryGreedy(tools, program.values, program);
      if (!found) break;
    }
    if (this.done() || !watch.mayGoOn()) return;
    this.best = improvePlan(tools, this.best, program.values, {
      mayGoOn: watch.mayGoOn,
      goal: this.bound,
      patience: 150,
      most: 2000,
      onBetter: (solution) => this.report(solution),
    });
  }

  private tryGreedy(tools: GreedyTools, values: number[], program: BoardProgram): void {
    const found = greedyPlan(tools, values, everything(this.task), 5, this.watch.mayGoOn);
    if (!found) return;
    for (const pattern of found.patterns) program.add(pattern);
    if (!isBetter(this.task, found, this.best)) return;
    this.best = found;
    this.report(found);
  }

  private chooseCandidates(promise: (stock: Stock) => number): Stock[] {
    const { stocks } = this.task;
    if (stocks.length <= MOST_CANDIDATES) return stocks;
    const inBest = new Set(this.best.patterns.map((pattern) => pattern.stock));
    return [...stocks]
      .sort((a, b) => promise(b) - promise(a) || a.index - b.index)
      .filter((stock, rank) => rank < MOST_CANDIDATES || inBest.has(stock.index));
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

const ROUNDS = 60;
const PATTERNS_A_ROUND = 25;
