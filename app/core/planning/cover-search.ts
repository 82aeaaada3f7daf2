import { MasterProgram } from "./master-program.ts";

/** Sets to cover demands with, each costing one; a set may cover more than is left. */
export interface CoverTask {
  demands: number[];
  sets: number[][];
}

export interface CoverLimits {
  /** Only covers of fewer sets than this are of interest. */
  below: number;
  nodes: number;
  mayGoOn: () => boolean;
}

export interface Cover {
  /** The sets taken, or null when none below the limit was found. */
  taken: number[] | null;
  /** No cover takes fewer. */
  bound: number;
}

const ROUNDING = 1e-6;

/** Finds the least number of sets that cover all demands: branch and bound on the item hardest to cover. */
export function coverSearch({ demands, sets }: CoverTask, { below, nodes, mayGoOn }: CoverLimits): Cover {
  const program = new MasterProgram(
    demands,
    [],
    demands.map(() => 1),
  );
  const columns = sets.map((set) => {
    const rows = set.flatMap((count, row) => (count > 0 ? [row] : []));
    const column = { rows, values: rows.map((row) => set[row]!), cost: 1 };
    program.add(column);
    return column;
  });
  const covering = demands.map((_, row) => sets.flatMap((set, index) => (set[row]! > 0 ? [index] : [])));
  let best: number[] | null = null;
  let limit = below;
  let left = nodes;
  let isWhole = true;
  let root = 0;
  const taken: number[] = [];
  const visit = (rest: number[]): void => {
    if (left-- <= 0 || !mayGoOn()) {
      isWhole = false;
      return;
    }
    if (rest.every((count) => count === 0)) {
      best = taken.slice();
      limit = taken.length;
      return;
    }
    program.change(rest, () => false);
    program.solve(mayGoOn);
    // Prices of a program broken off prove nothing.
    if (!mayGoOn()) {
      isWhole = false;
      return;
    }
    const value = rest.reduce((sum, count, row) => sum + count * Math.max(0, program.duals[row]!), 0);
    const bound = taken.length + Math.ceil(value - 1e-4);
    if (taken.length === 0) root = bound;
    if (bound >= limit) return;
    const row = hardest(rest, covering);
    const amount = new Map(program.solution().map(({ column, amount }) => [column, amount]));
    const duals = program.duals.slice();
    const reduced = (index: number) =>
      columns[index]!.rows.reduce((cost, r, i) => cost - duals[r]! * columns[index]!.values[i]!, 1);
    const children = covering[row]!.map((index) => ({ index, reduced: reduced(index), amount: amount.get(index) ?? 0 }))
      .filter((child) => taken.length + Math.ceil(value + child.reduced - 1e-4) < limit)
      .sort((a, b) => b.amount - a.amount || a.reduced - b.reduced || a.index - b.index);
    for (const { index, reduced } of children) {
      if (taken.length + Math.ceil(value + reduced - 1e-4) >= limit) continue;
      taken.push(index);
      visit(rest.map((count, r) => Math.max(0, count - sets[index]![r]!)));
      taken.pop();
      if (left <= 0 || root >= limit) return;
    }
  };
  visit(demands);
  const bound = isWhole ? limit : Math.ceil(root - ROUNDING);
  return { taken: best, bound };
}

function hardest(rest: number[], covering: number[][]): number {
  let found = -1;
  for (let row = 0; row < rest.length; row++)
    if (rest[row]! > 0 && (found < 0 || covering[row]!.length < covering[found]!.length)) found = row;
  return found;
}
