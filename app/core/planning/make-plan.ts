import { draw, type Rectangle } from "./block.ts";
import type { BoardLayout, Plan, UnplacedPart } from "./layout.ts";
import { unplaced } from "./make-task.ts";
import type { Pattern } from "./pattern.ts";
import { costOf, type Solution } from "./solution.ts";
import { type Task, UNITS_PER_MM } from "./task.ts";

/** Differences in money below this part of the cost are rounding. */
const MONEY_SLACK = 1e-7;

/** Turns a solution into the answer: boards and pieces by name, millimetres from each board's own corner. */
export function makePlan(task: Task, solution: Solution, bound: number, barred: UnplacedPart[]): Plan {
  const names = task.kinds.map((kind) => kind.parts.map((part) => ({ ...part })));
  const nextId = task.stocks.map(() => 0);
  const patterns = [...solution.patterns].sort((a, b) => a.stock - b.stock);
  const boards = patterns.map((pattern) => {
    const stock = task.stocks[pattern.stock]!;
    return drawBoard(task, pattern, stock.ids[nextId[stock.index]!++]!, names);
  });
  const left = names.flatMap((parts) =>
    parts.filter(({ pieces }) => pieces > 0).map(({ id, pieces }) => unplaced({ id }, pieces, "not-enough")),
  );
  const cost = costOf(solution);
  const missing = [...barred, ...left];
  const proven = cost - bound <= MONEY_SLACK * Math.max(1, cost);
  const sound = proven ? cost : bound;
  const status = missing.length > 0 ? "short" : proven ? "optimal" : "feasible";
  return { status, cost, bound: sound, gap: cost > 0 ? (cost - sound) / cost : 0, boards, unplaced: missing };
}

function drawBoard(task: Task, pattern: Pattern, id: string, names: { id: string; pieces: number }[][]): BoardLayout {
  const stock = task.stocks[pattern.stock]!;
  const { endTrim, edgeTrim } = task.problem;
  const drawn = draw(task, pattern.block, { x: 0, y: 0, length: stock.length, width: stock.width });
  const mm = (units: number) => units / UNITS_PER_MM;
  const placed = <T extends Rectangle>({ x, y, length, width }: T) => ({
    x: mm(x) + endTrim,
    y: mm(y) + edgeTrim,
    length: mm(length),
    width: mm(width),
  });
  return {
    id,
    cost: pattern.cost,
    pieces: drawn.pieces.map((piece) => ({ part: takeName(names[piece.kind]!), ...placed(piece) })),
    cuts: drawn.cuts.map((cut) => {
      const [shift, other] = cut.kind === "crosscut" ? [endTrim, edgeTrim] : [edgeTrim, endTrim];
      return { ...cut, at: mm(cut.at) + shift, from: mm(cut.from) + other, to: mm(cut.to) + other };
    }),
    offcuts: drawn.offcuts.map(placed),
  };
}

function takeName(parts: { id: string; pieces: number }[]): string {
  const part = parts.find(({ pieces }) => pieces > 0)!;
  part.pieces--;
  return part.id;
}
