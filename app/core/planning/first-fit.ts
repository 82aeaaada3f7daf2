import { patternOf } from "./pattern.ts";
import { ShelfBoard } from "./shelf-board.ts";
import { isBetter, type Solution } from "./solution.ts";
import type { Kind, Stock, Task } from "./task.ts";

/**
 * First fit decreasing: pieces from the largest down, each into the first opened board that takes it, else a new one, the
 * cheapest by area first. Strips and sections are both tried and the cheaper plan taken. The mark to beat.
 */
export function firstFit(task: Task): Solution {
  const plans = (["y", "x"] as const).map((way) => firstFitOneWay(task, way));
  return isBetter(task, plans[1]!, plans[0]!) ? plans[1]! : plans[0]!;
}

function firstFitOneWay(task: Task, way: "x" | "y"): Solution {
  const [first, second] = way === "y" ? (["width", "length"] as const) : (["length", "width"] as const);
  const kinds = [...task.kinds].sort(
    (a, b) => b.poses[0]![first] - a.poses[0]![first] || b.poses[0]![second] - a.poses[0]![second] || a.index - b.index,
  );
  const unopened = new Map<Stock, number>(byCostForArea(task.stocks).map((stock) => [stock, stock.ids.length]));
  const opened: ShelfBoard[] = [];
  const missing = task.kinds.map(() => 0);
  for (const kind of kinds) {
    let from = 0;
    for (let left = kind.demand; left > 0; left -= kind.group) {
      // Boards that could not take one of this kind cannot take the next.
      while (from < opened.length && !opened[from]!.place(kind, kind.group)) from++;
      if (from < opened.length) continue;
      const board = openBoard(task, kind, way, unopened);
      if (board) opened.push(board);
      else {
        missing[kind.index] = left;
        break;
      }
    }
  }
  return { patterns: opened.map((board) => patternOf(task, board.stock, board.block())), missing };
}

function openBoard(task: Task, kind: Kind, way: "x" | "y", unopened: Map<Stock, number>): ShelfBoard | null {
  for (const [stock, count] of unopened) {
    if (count === 0 || !stock.eligible[kind.index]) continue;
    const board = new ShelfBoard(task, stock, way);
    if (!board.place(kind, kind.group)) continue;
    unopened.set(stock, count - 1);
    return board;
  }
  return null;
}

function byCostForArea(stocks: Stock[]): Stock[] {
  const price = (stock: Stock) => stock.cost / (stock.length * stock.width);
  return [...stocks].sort((a, b) => price(a) - price(b) || a.cost - b.cost || a.index - b.index);
}
