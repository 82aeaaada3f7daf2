import { type Entry, type Grid, otherWay, type Way } from "./axes.ts";
import { type BandTable, compose, threeStageBands, twoStageBands } from "./band-table.ts";
import type { Carver } from "./carve.ts";
import { makeRowTable } from "./row-table.ts";
import type { Stock, Task } from "./task.ts";

/** For each stock: no pattern takes more worth out of it than `most`, reckoned against `cost`. */
export interface Prices {
  most: Float64Array;
  cost: Float64Array;
}

interface Group {
  stocks: Stock[];
  credit: number;
  entries: Record<Way, Entry[]>;
  longest: { x: number; y: number };
}

const CREDIT_CLASSES = 6;

/**
 * Bounds what boards can be worth, all boards at once: like boards share their tables. Kinds may repeat from band to band and
 * windows and defects do not bar a place, so a bound may be higher than any pattern, never lower. With a credit for offcuts,
 * all that no piece takes is reckoned to come back.
 */
export class BoardPricer {
  private readonly groups: Group[];

  constructor(
    private readonly task: Task,
    private readonly grid: Grid,
    carver: Carver,
    stocks: Stock[] = task.stocks,
  ) {
    const groups = new Map<string, Group>();
    const dearest = Math.max(...stocks.map(({ credit }) => credit));
    for (const stock of stocks) {
      const creditClass = dearest > 0 ? Math.floor((stock.credit / dearest) * CREDIT_CLASSES) : 0;
      const key = `${creditClass} ${stock.eligible.map((is) => (is ? 1 : 0)).join("")}`;
      const group = groups.get(key) ?? {
        stocks: [],
        credit: stock.credit,
        entries: carver.entriesFor(stock),
        longest: { x: 0, y: 0 },
      };
      groups.set(key, group);
      group.stocks.push(stock);
      group.credit = Math.min(group.credit, stock.credit);
      group.longest.x = Math.max(group.longest.x, stock.length + task.kerf);
      group.longest.y = Math.max(group.longest.y, stock.width + task.kerf);
    }
    this.groups = [...groups.values()];
  }

  /** @returns null when work ran out before all boards were looked at. */
  price(values: ArrayLike<number>, limits: ArrayLike<number>, mayGoOn: () => boolean = () => true): Prices | null {
    const { kinds, stocks } = this.task;
    const prices: Prices = { most: new Float64Array(stocks.length), cost: new Float64Array(stocks.length) };
    for (const group of this.groups) {
      const worth = kinds.map((kind) => values[kind.index]! - group.credit * kind.area);
      for (const way of ["y", "x"] as const)
        if (!this.priceOneWay(group, way, worth, limits, prices, mayGoOn)) return null;
      for (const stock of group.stocks)
        prices.cost[stock.index] = stock.cost - stock.credit * stock.length * stock.width;
    }
    return prices;
  }

  private priceOneWay(
    group: Group,
    way: Way,
    worth: number[],
    limits: ArrayLike<number>,
    { most }: Prices,
    mayGoOn: () => boolean,
  ): boolean {
    const { kerf } = this.task;
    const along = { longest: group.longest[otherWay(way)], step: this.grid[otherWay(way)] };
    const across = { longest: group.longest[way], step: this.grid[way] };
    const table = this.tableOf(group, way, worth, limits, across, along);
    const known = new Map<number, Float64Array>();
    for (const [index, stock] of group.stocks.entries()) {
      if (index % 32 === 0 && !mayGoOn()) return false;
      const [stockAlong, stockAcross] =
        way === "y" ? [stock.length + kerf, stock.width + kerf] : [stock.width + kerf, stock.length + kerf];
      const key = Math.floor(stockAlong / along.step + 1e-9);
      const values = known.get(key) ?? compose(table, stockAlong, across).values;
      known.set(key, values);
      const value = values[Math.floor(stockAcross / across.step + 1e-9)]!;
      if (value > most[stock.index]!) most[stock.index] = value;
    }
    return true;
  }

  private tableOf(
    { entries }: Group,
    way: Way,
    worth: number[],
    limits: ArrayLike<number>,
    across: { longest: number; step: number },
    along: { longest: number; step: number },
  ): BandTable {
    if (this.task.stages === 2) return twoStageBands(entries[way], worth, limits, along);
    const stacks = makeRowTable(entries[otherWay(way)], worth, limits, across.longest, across.step);
    return threeStageBands(stacks, across, along);
  }
}

/**
 * A bound on the cost of covering all demands, from values and what boards can be worth under them: the values are scaled as
 * is best for the bound.
 */
export function boundByPrices(task: Task, values: ArrayLike<number>, { most, cost }: Prices): number {
  const total = task.kinds.reduce((sum, kind) => sum + values[kind.index]! * kind.demand, 0);
  if (task.stocks.some(({ credit }) => credit > 0)) return boundAt(task, total, most, cost, 1);
  // Concave in the scale, with corners where a board breaks even.
  const scales = task.stocks.flatMap(({ index }) => (most[index]! > 0 ? [cost[index]! / most[index]!] : []));
  scales.sort((a, b) => a - b);
  let [low, high] = [0, scales.length - 1];
  while (low < high) {
    const middle = (low + high) >> 1;
    if (boundAt(task, total, most, cost, scales[middle]!) < boundAt(task, total, most, cost, scales[middle + 1]!))
      low = middle + 1;
    else high = middle;
  }
  return scales.length > 0 ? boundAt(task, total, most, cost, scales[low]!) : 0;
}

function boundAt(task: Task, total: number, most: Float64Array, cost: Float64Array, scale: number): number {
  let bound = scale * total;
  for (const { index, ids } of task.stocks) bound -= ids.length * Math.max(0, scale * most[index]! - cost[index]!);
  return bound;
}
