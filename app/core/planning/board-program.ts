import type { Carver } from "./carve.ts";
import { MasterProgram } from "./master-program.ts";
import type { Pattern } from "./pattern.ts";
import { type BoardPricer, boundByPrices } from "./price-boards.ts";
import type { Stock, Task } from "./task.ts";

/** The pattern program over a choice of stocks: which patterns, how much of each, and what pieces are worth by it. */
export class BoardProgram {
  readonly patterns: Pattern[] = [];
  /** Worth of a piece of each kind, after a round. */
  values: number[];
  bound = 0;
  private readonly program: MasterProgram;
  private readonly rowOfStock = new Map<number, number>();
  private readonly known = new Set<string>();

  constructor(
    private readonly task: Task,
    private readonly stocks: Stock[],
    startValues: number[],
  ) {
    this.values = startValues;
    for (const stock of stocks) this.rowOfStock.set(stock.index, task.kinds.length + this.rowOfStock.size);
    this.program = new MasterProgram(
      task.kinds.map(({ demand }) => demand),
      stocks.map(({ ids }) => ids.length),
      startValues.map((value) => MISSING_COST * value),
    );
  }

  add(pattern: Pattern): boolean {
    const stockRow = this.rowOfStock.get(pattern.stock);
    if (stockRow === undefined) return false;
    const key = `${pattern.stock} ${pattern.counts.join(" ")} ${pattern.cost}`;
    if (this.known.has(key)) return false;
    this.known.add(key);
    this.patterns.push(pattern);
    const rows = [...pattern.counts.map(([kind]) => kind), stockRow];
    this.program.add({ rows, values: [...pattern.counts.map(([, count]) => count), 1], cost: pattern.cost });
    return true;
  }

  /**
   * Solves, then asks boards for patterns that would lower the cost.
   *
   * @returns whether any was found.
   */
  round(carver: Carver, pricer: BoardPricer, most: number, mayGoOn: () => boolean): boolean {
    const { task, program } = this;
    program.solve(mayGoOn);
    const demand = task.kinds.map((kind) => kind.demand);
    this.values = demand.map((_, kind) => Math.max(0, program.duals[kind]!));
    const prices = pricer.price(this.values, demand);
    this.bound = Math.max(this.bound, boundByPrices(task, this.values, prices));
    const hope = (stock: Stock) =>
      prices.most[stock.index]! - prices.cost[stock.index]! + program.duals[this.rowOfStock.get(stock.index)!]!;
    const hopeful = this.stocks
      .filter((stock) => hope(stock) > 1e-7 * Math.max(1, stock.cost))
      .sort((a, b) => hope(b) - hope(a) || a.index - b.index);
    let found = 0;
    for (const stock of hopeful) {
      if (found >= most || !mayGoOn()) break;
      const pattern = carver.carve(stock, this.values, demand);
      if (!pattern) continue;
      const gain =
        pattern.counts.reduce((sum, [kind, count]) => sum + count * this.values[kind]!, 0) -
        pattern.cost +
        program.duals[this.rowOfStock.get(stock.index)!]!;
      if (gain > 1e-7 * Math.max(1, stock.cost) && this.add(pattern)) found++;
    }
    return found > 0;
  }

  solve(mayGoOn: () => boolean): { value: number; used: { pattern: Pattern; amount: number }[] } {
    this.program.solve(mayGoOn);
    const used = this.program.solution().map(({ column, amount }) => ({ pattern: this.patterns[column]!, amount }));
    return { value: this.program.value, used };
  }
}

/** Leaving a piece out costs so many times its worth at the start. */
const MISSING_COST = 30;
