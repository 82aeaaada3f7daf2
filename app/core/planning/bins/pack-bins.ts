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
  { times: 3, depth: 8 },
  { times: 4, depth: 12 },
  { times: 6, depth: 20 },
  { times: 10, depth: 40 },
];

class Search {
  best: BinPattern[];
  bound = 0;
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
    for (const stray of STRAYS) {
      if (this.done() || !this.mayGoOn()) return;
      this.dive(this.task.demands, [], stray.times, stray.depth, 0);
    }
  }

  private done(): boolean {
    return this.best.length <= this.bound;
  }

  private offer(bins: BinPattern[]): void {
    if (bins.length >= this.best.length) return;
    this.best = bins;
    this.onBetter?.({ bins, bound: this.bound });
  }

  private dive(left: number[], fixed: BinPattern[], strays: number, depthLeft: number, depth: number): void {
    this.offer([...fixed, ...fillLeastSlack(this.task, left)]);
    if (this.done() || !this.mayGoOn()) return;
    const target = this.best.length - 1 - fixed.length;
    const relaxed = this.program.relax(left, target, this.mayGoOn);
    if (!relaxed || relaxed.bound > target) return;
    const { rest, bins } = takeWhole(relaxed.used, left);
    if (rest.every((count) => count === 0)) {
      this.offer([...fixed, ...bins]);
      return;
    }
    const choices = relaxed.used
      .filter(({ amount }) => amount - Math.floor(amount + 1e-6) > 1e-6)
      .map(({ pattern, amount }) => ({ pattern, part: amount - Math.floor(amount + 1e-6) }))
      .sort((a, b) => b.part - a.part || load(this.task, b.pattern) - load(this.task, a.pattern));
    const most = depthLeft > 0 ? strays : 0;
    for (let tried = 0; tried <= most && tried < choices.length; tried++) {
      const { pattern } = choices[tried]!;
      const next = take(rest, pattern);
      if (!next) continue;
      this.dive(next, [...fixed, ...bins, pattern], most - tried, depthLeft - 1, depth + 1);
      if (this.done() || !this.mayGoOn()) return;
    }
  }
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
