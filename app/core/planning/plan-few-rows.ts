import { rowPattern, rowWay } from "./plan-bins.ts";
import { costOf, type Solution } from "./solution.ts";
import type { Task } from "./task.ts";

/** Above so many pieces a search of all ways is not begun. */
const MOST_PIECES = 24;
const MOST_STEPS = 3_000_000;

/**
 * Searches all ways to lay a small number of pieces in rows, one row a board, on boards of any lengths and costs.
 *
 * @returns the cheapest plan below the start's cost or the start, and whether every way was looked at; null when the task is
 * of another sort or too large to begin.
 */
export function planFewRows(
  task: Task,
  start: Solution,
  mayGoOn: () => boolean,
): { solution: Solution; isBest: boolean } | null {
  const pieces = task.kinds.flatMap((kind) => Array.from({ length: kind.demand }, () => kind.index));
  if (pieces.length === 0 || pieces.length > MOST_PIECES || task.kinds.some((kind) => kind.group > 1)) return null;
  if (task.stocks.some(({ credit }) => credit > 0)) return null;
  const ways = task.stocks.map((stock) => rowWay(task, stock));
  if (ways.some((way) => way !== ways[0])) return null;
  const way = ways[0];
  if (!way) return null;
  const along = way === "x" ? "length" : "width";
  const size = task.kinds.map((kind) => kind.poses[0]![along] + task.kerf);
  pieces.sort((a, b) => size[b]! - size[a]! || a - b);
  const rest = pieces.map((_, i) => pieces.slice(i).reduce((sum, kind) => sum + size[kind]!, 0));
  const least = Math.min(...task.stocks.map((stock) => stock.cost / (stock[along] + task.kerf)));
  const stocks = [...task.stocks].sort((a, b) => a.cost - b.cost || a.index - b.index);
  const unopened = stocks.map(({ ids }) => ids.length);
  const opened: { stock: number; room: number; kinds: number[] }[] = [];
  let steps = MOST_STEPS;
  let bestCost = start.missing.some((count) => count > 0) ? Number.POSITIVE_INFINITY : costOf(start);
  let best: typeof opened | null = null;
  const visit = (next: number, cost: number, room: number): void => {
    if (steps-- < 0 || (steps % 4096 === 0 && !mayGoOn())) {
      steps = -1;
      return;
    }
    if (next === pieces.length) {
      bestCost = cost;
      best = opened.map((board) => ({ ...board, kinds: board.kinds.slice() }));
      return;
    }
    if (cost + least * Math.max(0, rest[next]! - room) >= bestCost - 1e-9) return;
    const kind = pieces[next]!;
    const tried = new Set<string>();
    for (const board of opened) {
      const key = `${board.room} ${board.stock}`;
      if (size[kind]! > board.room || !task.stocks[board.stock]!.eligible[kind] || tried.has(key)) continue;
      tried.add(key);
      board.room -= size[kind]!;
      board.kinds.push(kind);
      visit(next + 1, cost, room - size[kind]!);
      board.kinds.pop();
      board.room += size[kind]!;
    }
    for (const [i, stock] of stocks.entries()) {
      const whole = stock[along] + task.kerf;
      if (unopened[i] === 0 || !stock.eligible[kind] || size[kind]! > whole) continue;
      if (cost + stock.cost >= bestCost - 1e-9) break;
      unopened[i]!--;
      opened.push({ stock: stock.index, room: whole - size[kind]!, kinds: [kind] });
      visit(next + 1, cost + stock.cost, room + whole - size[kind]!);
      opened.pop();
      unopened[i]!++;
    }
  };
  visit(0, 0, 0);
  const found = best as typeof opened | null;
  const patterns = found?.map(({ stock, kinds }) => rowPattern(task, task.stocks[stock]!, way, kinds));
  const solution = patterns ? { patterns, missing: task.kinds.map(() => 0) } : start;
  return { solution, isBest: steps >= 0 };
}
