import type { Entry } from "./axes.ts";

/**
 * Most that one row of pieces can be worth, for each width of the row (a level: the band size of some entry) and each length.
 * Sizes are rounded down to the table's steps, so that a value is never too low for the exact sizes.
 */
export interface RowTable {
  /** Band sizes, ascending, each the widest piece that the level admits. */
  levels: number[];
  /** Levels × (steps + 1). */
  values: Float64Array;
  steps: number;
  step: number;
}

/**
 * @param values worth of a piece of each kind; kinds worth nothing are left out.
 * @param limits how many of each kind one row may hold.
 */
export function makeRowTable(
  entries: Entry[],
  values: ArrayLike<number>,
  limits: ArrayLike<number>,
  longest: number,
  step: number,
): RowTable {
  const steps = Math.floor(longest / step + 1e-9);
  const levels = [
    ...new Set(entries.filter(({ kind }) => values[kind]! > 0 && limits[kind]! > 0).map(({ band }) => band)),
  ];
  const table = new Float64Array(levels.length * (steps + 1));
  const best = new Float64Array(steps + 1);
  let from = 0;
  for (const [level, band] of levels.entries()) {
    for (; from < entries.length && entries[from]!.band <= band; from++) {
      const { kind, cell } = entries[from]!;
      addItem(best, Math.floor(cell / step + 1e-9), values[kind]!, limits[kind]!);
    }
    table.set(best, level * (steps + 1));
  }
  return { levels, values: table, steps, step };
}

export function rowValue({ values, steps, step }: RowTable, level: number, length: number): number {
  return values[level * (steps + 1) + Math.min(steps, Math.max(0, Math.floor(length / step + 1e-9)))]!;
}

/** Adds an item to a table of best values by room, exactly: by copies in powers of two, or without limit where that is the same. */
export function addItem(best: Float64Array, size: number, value: number, limit: number): void {
  const steps = best.length - 1;
  if (!(value > 0) || limit <= 0 || size > steps) return;
  const whole = Math.max(1, size);
  const most = Math.floor(steps / whole);
  if (limit >= most) {
    for (let at = whole; at <= steps; at++) {
      const other = best[at - whole]! + value;
      if (other > best[at]!) best[at] = other;
    }
    return;
  }
  for (let left = limit, times = 1; left > 0; times *= 2) {
    const taken = Math.min(times, left);
    left -= taken;
    const [takenSize, takenValue] = [taken * whole, taken * value];
    for (let at = steps; at >= takenSize; at--) {
      const other = best[at - takenSize]! + takenValue;
      if (other > best[at]!) best[at] = other;
    }
  }
}
