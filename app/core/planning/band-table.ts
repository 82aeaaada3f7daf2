import type { Entry } from "./axes.ts";
import { addItem, makeRowTable, type RowTable, rowValue } from "./row-table.ts";

/** Sizes a band may have, ascending, with the most that a band of each can be worth on boards of each length along it. */
export interface BandTable {
  /** Band sizes with a kerf added. */
  bands: number[];
  valueAt(band: number, along: number): number;
}

/** Bands of single pieces, each cut to its size from the band: two stages. */
export function twoStageBands(
  entries: Entry[],
  values: ArrayLike<number>,
  limits: ArrayLike<number>,
  along: { longest: number; step: number },
): BandTable {
  const table = makeRowTable(entries, values, limits, along.longest, along.step);
  return { bands: table.levels, valueAt: (band, length) => rowValue(table, band, length) };
}

/**
 * Bands of cells that are cut once more into a stack of pieces: three stages.
 *
 * @param stacks table of the other way: levels by size along the band, rooms across it.
 */
export function threeStageBands(
  stacks: RowTable,
  across: { longest: number; step: number },
  along: { longest: number; step: number },
): BandTable {
  const steps = Math.floor(along.longest / along.step + 1e-9);
  const smallest = 1;
  const count = Math.floor(across.longest / across.step + 1e-9);
  const bands: number[] = [];
  const rows: Float64Array[] = [];
  let before: number[] = [];
  for (let index = smallest; index <= count; index++) {
    const stackValues = stacks.levels.map((_, level) => rowValue(stacks, level, index * across.step));
    // A band no stack of which gains by the width is no better than the one before.
    if (stackValues.every((value, level) => value <= (before[level] ?? 0))) continue;
    before = stackValues;
    const best = new Float64Array(steps + 1);
    let worth = 0;
    for (const [level, cell] of stacks.levels.entries()) {
      if (stackValues[level]! <= worth) continue;
      worth = stackValues[level]!;
      addItem(best, Math.floor(cell / along.step + 1e-9), worth, Number.POSITIVE_INFINITY);
    }
    bands.push(index * across.step);
    rows.push(best);
  }
  const at = (length: number) => Math.min(steps, Math.max(0, Math.floor(length / along.step + 1e-9)));
  return { bands, valueAt: (band, length) => rows[band]![at(length)]! };
}

/** Bands side by side that are worth most together, by room across: a value for each step, and the band to begin with. */
export interface Composition {
  values: Float64Array;
  first: Int32Array;
}

export function compose(table: BandTable, along: number, across: { longest: number; step: number }): Composition {
  const steps = Math.floor(across.longest / across.step + 1e-9);
  const values = new Float64Array(steps + 1);
  const first = new Int32Array(steps + 1).fill(-1);
  let worth = 0;
  for (let band = 0; band < table.bands.length; band++) {
    const value = table.valueAt(band, along);
    // A wider band must be worth more than a narrower one to be of use.
    if (value <= worth) continue;
    worth = value;
    const size = Math.max(1, Math.floor(table.bands[band]! / across.step + 1e-9));
    for (let at = size; at <= steps; at++) {
      const other = values[at - size]! + value;
      if (other > values[at]!) {
        values[at] = other;
        first[at] = band;
      }
    }
  }
  return { values, first };
}
