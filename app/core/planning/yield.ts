import { makeGrid, PLAN_GRID } from "./axes.ts";
import { Carver } from "./carve.ts";
import { makeTask } from "./make-task.ts";
import type { Problem, ProblemPart } from "./problem.ts";
import { ShelfBoard } from "./shelf-board.ts";
import type { Kind, Stock, Task } from "./task.ts";

/** The shop's allowances, as in a problem. */
export type YieldRules = Pick<Problem, "kerf" | "endTrim" | "edgeTrim" | "stages">;

/** More pieces than any board of a rack gives. */
const PLENTY = 2000;

/**
 * "What would this board give?": how many pieces of one part each board yields, by the planner's own rules of size, kerf, trim,
 * grain, defects, species and thickness. Plies that must come from one board count in whole blanks' worth.
 *
 * @param part its quantity does not matter.
 * @returns pieces by board id, 0 for boards that give none.
 */
export function boardYields(rules: YieldRules, boards: Problem["boards"], part: ProblemPart): Map<string, number> {
  const quantity = Math.floor(PLENTY / part.plies);
  const problem: Problem = {
    ...rules,
    minOffcut: { length: 0, width: 0 },
    offcutCredit: 0,
    boardCharge: 0,
    timeLimit: 1,
    boards: boards.filter(({ length, width }) => length > 2 * rules.endTrim && width > 2 * rules.edgeTrim),
    parts: [{ ...part, quantity }],
  };
  const yields = new Map(boards.map(({ id }) => [id, 0]));
  if (problem.boards.length === 0) return yields;
  const { task } = makeTask(problem);
  const kind = task.kinds[0];
  if (!kind) return yields;
  const carver = new Carver(task, makeGrid(task, PLAN_GRID));
  for (const stock of task.stocks) {
    if (!stock.eligible[0]) continue;
    const count = yieldOf(task, carver, stock, kind);
    for (const id of stock.ids) yields.set(id, count);
  }
  return yields;
}

function yieldOf(task: Task, carver: Carver, stock: Stock, kind: Kind): number {
  const isBare = stock.defects.length === 0 && !kind.window && kind.poses.length === 1;
  if (isBare) {
    const [pose] = kind.poses;
    const along = Math.floor((stock.length + task.kerf) / (pose!.length + task.kerf));
    const across = Math.floor((stock.width + task.kerf) / (pose!.width + task.kerf));
    return wholeGroups(along * across, kind);
  }
  const filled = (["y", "x"] as const).map((way) => {
    const board = new ShelfBoard(task, stock, way);
    let pieces = 0;
    while (board.place(kind, kind.group)) pieces += kind.group;
    return pieces;
  });
  if (kind.poses.length === 1) return Math.max(...filled);
  const pattern = carver.carve(stock, [1], [kind.demand]);
  const carved = pattern?.counts.reduce((sum, [, count]) => sum + count, 0) ?? 0;
  return Math.max(...filled, carved);
}

function wholeGroups(pieces: number, kind: Kind): number {
  return pieces - (pieces % kind.group);
}
