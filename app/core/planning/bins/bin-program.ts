import { bestChoice, isQuick } from "../knapsack.ts";
import { type Column, MasterProgram, type SavedBasis } from "../master-program.ts";

/** Bins all alike, and what has to go in them. Sizes in whole numbers, each once, largest first. */
export interface BinTask {
  capacity: number;
  sizes: number[];
  demands: number[];
}

/** What goes in one bin: items by index, and how many of each. */
export interface BinPattern {
  items: number[];
  counts: number[];
}

/** A linear program solved for what is still to pack. */
export interface BinRelaxation {
  /** No packing of what is left takes fewer bins. */
  bound: number;
  used: { pattern: BinPattern; amount: number }[];
}

const ROUNDING = 1e-6;
/** Enough to find some pattern that helps, long before the best is proven. */
const QUICK_STEPS = 2000;

export function toPattern(counts: ArrayLike<number>): BinPattern {
  const pattern: BinPattern = { items: [], counts: [] };
  for (let item = 0; item < counts.length; item++)
    if (counts[item]! > 0) {
      pattern.items.push(item);
      pattern.counts.push(counts[item]!);
    }
  return pattern;
}

/** The program over bin patterns. It is solved again and again for what is left, each time from where it was. */
export class BinProgram {
  private readonly program: MasterProgram;
  private readonly known = new Set<string>();

  constructor(private readonly task: BinTask) {
    const { demands } = task;
    this.program = new MasterProgram(
      demands,
      [],
      demands.map(() => 1),
    );
  }

  add(pattern: BinPattern): void {
    const key = `${pattern.items} ${pattern.counts}`;
    if (this.known.has(key)) return;
    this.known.add(key);
    this.program.add({ rows: pattern.items, values: pattern.counts, cost: 1 });
  }

  save(): SavedBasis {
    return this.program.save();
  }

  restore(saved: SavedBasis): void {
    this.program.restore(saved);
  }

  /**
   * Solves for what is left by generating patterns.
   *
   * @param enough stops early once the bound shows that more bins than this are needed.
   * @returns nothing when work ran out.
   */
  relax(left: number[], enough: number, mayGoOn: () => boolean): BinRelaxation | null {
    const { program, task } = this;
    const tooMuch = ({ rows, values }: Column) => rows.some((item, i) => left[item]! < values[i]!);
    program.change(left, tooMuch);
    let bound = 0;
    for (;;) {
      program.solve(mayGoOn);
      if (!mayGoOn()) return null;
      const quick = isQuick(task.capacity)
        ? null
        : bestChoice(task.capacity, { sizes: task.sizes, values: program.duals, limits: left }, QUICK_STEPS);
      if (quick && !quick.isBest && quick.value > 1 + ROUNDING) {
        this.add(toPattern(quick.counts));
        continue;
      }
      const safe = safeBound(task.capacity, task.sizes, left, program.duals);
      bound = Math.max(bound, safe.bound);
      if (bound > enough || safe.value <= 1 + ROUNDING || bound >= Math.ceil(program.value - 1e-4)) break;
      this.add(toPattern(safe.counts));
    }
    const used = program.solution().map(({ column, amount }) => {
      const { rows, values } = program.columns[column]!;
      return { pattern: { items: rows, counts: values }, amount };
    });
    return { bound, used };
  }
}

const DUAL_PARTS = 2 ** 30;

/** Bound by duals rounded down to whole parts, for which both sums are exact: nothing is claimed by a rounding error. */
function safeBound(capacity: number, sizes: number[], limits: number[], duals: ArrayLike<number>) {
  const whole = sizes.map((_, item) => Math.max(0, Math.floor(duals[item]! * DUAL_PARTS)));
  const best = bestChoice(capacity, { sizes, values: whole, limits });
  let sum = 0;
  for (let item = 0; item < sizes.length; item++) sum += whole[item]! * limits[item]!;
  const most = Math.max(best.value, 1);
  // Whole-number division: the least count of bins that are worth at most `most` each and together at least `sum`.
  const bound = Math.floor(sum / most) + (sum % most > 0 ? 1 : 0);
  return { bound, value: best.value / DUAL_PARTS, counts: best.counts };
}
