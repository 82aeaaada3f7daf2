import { sequence } from "../number-sequence.ts";
import { type BinPattern, BinProgram, type BinTask } from "./bin-program.ts";
import { fillLargestFirst, fillLeastSlack } from "./fill-bins.ts";

/** A packing, and the count of bins that none can go below. */
export interface Packing {
  bins: BinPattern[];
  bound: number;
}

export interface PackingLimits {
  /** Asked often; false ends the search with the best packing so far. */
  mayGoOn: () => boolean;
  onBetter?: (packing: Packing) => void;
}

/**
 * Packs into as few bins as can be found: greedy fills first, then the pattern program's bound, then dives that fix the
 * program's patterns one after another and turn back where its bound shows a bin too many.
 */
export function packBins(task: BinTask, { mayGoOn, onBetter }: PackingLimits): Packing {
  const search = new Search(task, mayGoOn, onBetter);
  search.run();
  return { bins: search.best, bound: search.bound };
}

/** How far dives may stray from the program's own choice: so many times, no deeper than so far. */
const STRAYS = [
  { times: 0, depth: 0 },
  { times: 1, depth: 6 },
  { times: 2, depth: 6 },
];
/** Then dives choose by the program's choice and chance mixed, each time otherwise. */
const MIXED = { times: 1, depth: 4, chance: 0.5, dives: 3000 };
/** With so few sizes left, the rest is packed as a task of its own, more thoroughly: dives so free, so many steps in all. */
const FINISH = {
  sizes: 45,
  strays: [
    { times: 0, depth: 0 },
    { times: 4, depth: 40 },
  ],
  steps: 100,
};

class Search {
  best: BinPattern[];
  bound = 0;
  private chance = 0;
  private readonly random = sequence(1);
  private steps = Number.POSITIVE_INFINITY;
  private readonly program: BinProgram;

  constructor(
    private readonly task: BinTask,
    private readonly mayGoOn: () => boolean,
    private readonly onBetter: PackingLimits["onBetter"],
  ) {
    this.program = new BinProgram(task);
    this.best = fillLargestFirst(task, task.demands);
    this.offer(fillLeastSlack(task, task.demands));
  }

  run(): void {
    this.bound = volumeBound(this.task);
    if (this.done()) return;
    for (const pattern of this.best) this.program.add(pattern);
    const root = this.program.relax(this.task.demands, Number.POSITIVE_INFINITY, this.mayGoOn);
    if (!root) return;
    this.bound = Math.max(this.bound, root.bound);
    const saved = this.program.save();
    for (const stray of STRAYS) {
      if (this.done() || !this.mayGoOn()) return;
      this.program.restore(saved);
      this.dive(this.task.demands, [], stray.times, stray.depth);
    }
    this.chance = MIXED.chance;
    for (let dive = 0; dive < MIXED.dives && !this.done() && this.mayGoOn(); dive++) {
      this.program.restore(saved);
      this.dive(this.task.demands, [], MIXED.times, MIXED.depth);
    }
  }

  /** Looks for a packing of no more bins than the goal; a part of another search. */
  finish(goal: number): BinPattern[] | null {
    this.bound = goal;
    this.steps = FINISH.steps;
    for (const pattern of this.best) this.program.add(pattern);
    for (const { times, depth } of FINISH.strays) {
      if (this.done() || !this.mayGoOn() || this.steps <= 0) break;
      this.dive(this.task.demands, [], times, depth);
    }
    return this.done() ? this.best : null;
  }

  private done(): boolean {
    return this.best.length <= this.bound;
  }

  private offer(bins: BinPattern[]): void {
    if (bins.length >= this.best.length) return;
    this.best = bins;
    this.onBetter?.({ bins, bound: this.bound });
  }

  private dive(left: number[], fixed: BinPattern[], strays: number, depthLeft: number): void {
    this.offer([...fixed, ...fillLeastSlack(this.task, left)]);
    if (this.done() || !this.mayGoOn()) return;
    if (this.steps-- <= 0) return;
    const target = this.best.length - 1 - fixed.length;
    const relaxed = this.program.relax(left, target, this.mayGoOn);
    if (!relaxed || relaxed.bound > target) return;
    const { rest, bins } = takeWhole(relaxed.used, left);
    if (rest.every((count) => count === 0)) {
      this.offer([...fixed, ...bins]);
      return;
    }
    const sizesLeft = rest.filter((count) => count > 0).length;
    if (this.steps === Number.POSITIVE_INFINITY && sizesLeft <= FINISH.sizes) {
      const last = finishBins(this.task, rest, target - bins.length, this.mayGoOn);
      if (last) this.offer([...fixed, ...bins, ...last]);
      return;
    }
    const choices = relaxed.used
      .filter(({ amount }) => amount - Math.floor(amount + 1e-6) > 1e-6)
      .map(({ pattern, amount }) => ({
        pattern,
        part: amount - Math.floor(amount + 1e-6) + this.chance * this.random(),
      }))
      .sort((a, b) => b.part - a.part || load(this.task, b.pattern) - load(this.task, a.pattern));
    const most = depthLeft > 0 ? strays : 0;
    const saved = most > 0 ? this.program.save() : null;
    for (let tried = 0; tried <= most && tried < choices.length; tried++) {
      const { pattern } = choices[tried]!;
      const next = take(rest, pattern);
      if (!next) continue;
      if (saved && tried > 0) this.program.restore(saved);
      this.dive(next, [...fixed, ...bins, pattern], most - tried, depthLeft - 1);
      if (this.done() || !this.mayGoOn()) return;
    }
  }
}

/** Packs what is left into no more bins than the goal, or gives up. */
function finishBins(task: BinTask, left: number[], goal: number, mayGoOn: () => boolean): BinPattern[] | null {
  const items = left.flatMap((count, item) => (count > 0 ? [item] : []));
  const sub: BinTask = {
    capacity: task.capacity,
    sizes: items.map((item) => task.sizes[item]!),
    demands: items.map((item) => left[item]!),
  };
  const bins = new Search(sub, mayGoOn, undefined).finish(goal);
  return bins?.map(({ items: own, counts }) => ({ items: own.map((item) => items[item]!), counts })) ?? null;
}

/** Takes each used pattern as often as its whole part says. */
function takeWhole(used: { pattern: BinPattern; amount: number }[], left: number[]) {
  let rest = left;
  const bins: BinPattern[] = [];
  for (const { pattern, amount } of used)
    for (let times = Math.floor(amount + 1e-6); times > 0; times--) {
      const next = take(rest, pattern);
      if (!next) break;
      rest = next;
      bins.push(pattern);
    }
  return { rest, bins };
}

function take(left: number[], pattern: BinPattern): number[] | null {
  const rest = left.slice();
  for (let i = 0; i < pattern.items.length; i++) {
    const item = pattern.items[i]!;
    rest[item]! -= pattern.counts[i]!;
    if (rest[item]! < 0) return null;
  }
  return rest;
}

function load(task: BinTask, pattern: BinPattern): number {
  return pattern.items.reduce((sum, item, i) => sum + task.sizes[item]! * pattern.counts[i]!, 0);
}

function volumeBound({ capacity, sizes, demands }: BinTask): number {
  return Math.ceil(sizes.reduce((sum, size, item) => sum + size * demands[item]!, 0) / capacity);
}
