import { makeGrid, PLAN_GRID } from "./axes.ts";
import { Carver, isPlain } from "./carve.ts";
import { coverSearch } from "./cover-search.ts";
import { layInBands } from "./lay-bands.ts";
import { listFullSets } from "./list-sets.ts";
import { MasterProgram } from "./master-program.ts";
import { sequence } from "./number-sequence.ts";
import { patternOf } from "./pattern.ts";
import { costOf, type Solution } from "./solution.ts";
import type { Task } from "./task.ts";

const MOST_PIECES = 80;
const LIST_STEPS = 150_000;
const NODES = 1500;
const ROUNDS = 40;
const SHAKES = 4;

/**
 * Plans few pieces on boards that are all alike, in two stages: from all sets that a board takes, where they can be listed, else
 * from sets carved by the pattern program's prices; then the fewest sets that cover the demand.
 *
 * @returns null when the task is of another sort or too large.
 */
export function planAlikeBoards(
  task: Task,
  start: Solution,
  mayGoOn: () => boolean,
): { solution: Solution; bound: number } | null {
  const [stock] = task.stocks;
  if (!stock || task.stocks.length > 1 || !isPlain(task, stock) || stock.credit > 0 || stock.cost <= 0) return null;
  const demands = task.kinds.map((kind) => kind.demand);
  if (demands.reduce((sum, count) => sum + count, 0) > MOST_PIECES) return null;
  if (task.kinds.some(({ group, poses }) => group > 1 || poses.length > 1)) return null;
  const all = listFullSets(task, stock, LIST_STEPS);
  const sets = all ?? carveSets(task, start, mayGoOn);
  const below = start.missing.some((count) => count > 0) ? Number.POSITIVE_INFINITY : start.patterns.length;
  const { taken, bound } = coverSearch({ demands, sets }, { below, nodes: NODES, mayGoOn });
  const proven = all && task.stages === 2 ? bound * stock.cost : 0;
  if (!taken || taken.length > stock.ids.length) return { solution: start, bound: proven };
  const rest = demands.slice();
  const patterns = taken.flatMap((index) => {
    const kinds = sets[index]!.flatMap((count, kind) => {
      const used = Math.min(count, rest[kind]!);
      rest[kind]! -= used;
      return Array.from({ length: used }, () => kind);
    });
    const block = kinds.length > 0 ? layInBands(task, stock, kinds) : null;
    return block ? [patternOf(task, stock, block)] : [];
  });
  const solution = { patterns, missing: rest };
  const better = rest.every((count) => count === 0) && costOf(solution) < costOf(start);
  return { solution: better || below === Number.POSITIVE_INFINITY ? solution : start, bound: proven };
}

/** Sets that the pattern program asks for, with its prices as they are and shaken. */
function carveSets(task: Task, start: Solution, mayGoOn: () => boolean): number[][] {
  const two: Task = { ...task, stages: 2 };
  const [stock] = two.stocks;
  const demands = two.kinds.map((kind) => kind.demand);
  const program = new MasterProgram(
    demands,
    [],
    demands.map(() => 1),
  );
  const carver = new Carver(two, makeGrid(two, PLAN_GRID));
  const random = sequence(1);
  const known = new Map<string, number[]>();
  const add = (counts: [number, number][]): boolean => {
    const set = demands.map(() => 0);
    for (const [kind, count] of counts) set[kind] = count;
    if (known.has(set.join(" "))) return false;
    known.set(set.join(" "), set);
    program.add({ rows: counts.map(([kind]) => kind), values: counts.map(([, count]) => count), cost: 1 });
    return true;
  };
  if (task.stages === 2) for (const { counts } of start.patterns) add(counts);
  for (let round = 0; round < ROUNDS && mayGoOn(); round++) {
    program.solve(mayGoOn);
    let added = false;
    for (let shake = 0; shake < SHAKES; shake++) {
      const values = demands.map((_, kind) =>
        Math.max(1e-6, program.duals[kind]! * (1 + shake * 0.1 * (random() - 0.5))),
      );
      const pattern = carver.carve(stock!, values, demands);
      if (pattern && add(pattern.counts)) added = true;
    }
    if (!added) break;
  }
  return [...known.values()];
}
