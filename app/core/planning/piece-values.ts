import { type Grid, otherWay, type Way } from "./axes.ts";
import { compose } from "./band-table.ts";
import type { Carver } from "./carve.ts";
import type { Remaining } from "./greedy-plan.ts";
import { MasterProgram } from "./master-program.ts";
import type { Stock, Task } from "./task.ts";
import { TracedRows } from "./traced-rows.ts";

interface Group {
  stocks: Stock[];
  longest: { x: number; y: number };
}

interface Found {
  stock: Stock;
  counts: [number, number][];
  gain: number;
}

/** Leaving a piece out costs so many times its worth at the start. */
const MISSING_COST = 10;

/**
 * Finds what pieces are worth: the prices of the linear program over rough patterns of two stages, generated for all boards at
 * once. A rough pattern may take a kind again in each band, and sizes are rounded to steps, so it is no layout; its use is the
 * prices, from which bounds are reckoned exactly and by which boards are carved.
 */
export class PieceValues {
  values: number[];
  private readonly program: MasterProgram;
  private readonly kinds: number[];
  private readonly rowOfKind: Map<number, number>;
  private readonly rowOfStock = new Map<number, number>();
  private readonly groups: Group[];

  constructor(
    private readonly task: Task,
    private readonly grid: Grid,
    private readonly carver: Carver,
    stocks: Stock[],
    start: number[],
    private left: Remaining,
  ) {
    this.values = start;
    this.kinds = task.kinds.map(({ index }) => index).filter((kind) => left.demand[kind]! > 0);
    this.rowOfKind = new Map(this.kinds.map((kind, row) => [kind, row]));
    for (const stock of stocks) this.rowOfStock.set(stock.index, this.kinds.length + this.rowOfStock.size);
    this.program = new MasterProgram(
      this.kinds.map((kind) => left.demand[kind]!),
      stocks.map(({ index }) => left.boards[index]!),
      this.kinds.map((kind) => MISSING_COST * start[kind]!),
    );
    const groups = new Map<string, Group>();
    for (const stock of stocks) {
      const key = stock.eligible.map((is) => (is ? 1 : 0)).join("");
      const group = groups.get(key) ?? { stocks: [], longest: { x: 0, y: 0 } };
      groups.set(key, group);
      group.stocks.push(stock);
      group.longest.x = Math.max(group.longest.x, stock.length + task.kerf);
      group.longest.y = Math.max(group.longest.y, stock.width + task.kerf);
    }
    this.groups = [...groups.values()];
  }

  /** Goes on with what is left after some boards were settled. */
  goOnWith(left: Remaining): void {
    this.left = left;
    const stockOf = new Map([...this.rowOfStock].map(([stock, row]) => [row, stock]));
    this.program.change(
      this.kinds.map((kind) => left.demand[kind]!),
      ({ rows, values }) =>
        rows.some((row, i) =>
          row < this.kinds.length ? values[i]! > left.demand[this.kinds[row]!]! : left.boards[stockOf.get(row)!] === 0,
        ),
    );
  }

  /** Brings in the patterns that the present values call for and solves; false when none helps any more. */
  round(first: boolean, most: number, mayGoOn: () => boolean): boolean {
    const limitPrice = (stock: Stock) => (first ? 0 : this.program.duals[this.rowOfStock.get(stock.index)!]!);
    const found = this.groups
      .flatMap((group) => (["y", "x"] as const).flatMap((way) => this.findPatterns(group, way, limitPrice)))
      .filter(({ stock, gain }) => first || gain > 1e-4 * stock.cost)
      .sort((a, b) => b.gain / b.stock.cost - a.gain / a.stock.cost || a.stock.index - b.stock.index);
    for (const { stock, counts } of found.slice(0, most)) {
      const rows = [...counts.map(([kind]) => this.rowOfKind.get(kind)!), this.rowOfStock.get(stock.index)!];
      this.program.add({ rows, values: [...counts.map(([, count]) => count), 1], cost: stock.cost });
    }
    if (found.length === 0) return false;
    this.program.solve(mayGoOn);
    this.values = this.values.map((value, kind) => {
      const row = this.rowOfKind.get(kind);
      return row === undefined || this.left.demand[kind] === 0 ? value : Math.max(0, this.program.duals[row]!);
    });
    return true;
  }

  get value(): number {
    return this.program.value;
  }

  private findPatterns(group: Group, way: Way, limitPrice: (stock: Stock) => number): Found[] {
    const { task, grid } = this;
    const { kerf } = task;
    const entries = this.carver.entriesFor(group.stocks[0]!)[way];
    const { demand, boards } = this.left;
    const rows = new TracedRows(entries, this.values, demand, group.longest[otherWay(way)], grid[otherWay(way)]);
    const table = { bands: rows.levels, valueAt: (band: number, length: number) => rows.valueAt(band, length) };
    const across = { longest: group.longest[way], step: grid[way] };
    const composed = new Map<number, ReturnType<typeof compose>>();
    return group.stocks
      .filter(({ index }) => boards[index]! > 0)
      .map((stock) => {
        const [alongRoom, acrossRoom] =
          way === "y" ? [stock.length + kerf, stock.width + kerf] : [stock.width + kerf, stock.length + kerf];
        const key = Math.floor(alongRoom / grid[otherWay(way)] + 1e-9);
        const plan = composed.get(key) ?? compose(table, alongRoom, across);
        composed.set(key, plan);
        const counts = new Map<number, number>();
        const end = Math.floor(acrossRoom / across.step + 1e-9);
        for (let at = end; at > 0 && plan.first[at]! >= 0; ) {
          rows.addPieces(plan.first[at]!, alongRoom, counts);
          at -= Math.max(1, Math.floor(rows.levels[plan.first[at]!]! / across.step + 1e-9));
        }
        return { stock, counts: [...counts], gain: plan.values[end]! - stock.cost + limitPrice(stock) };
      });
  }
}
