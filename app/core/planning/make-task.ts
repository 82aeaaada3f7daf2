import type { UnplacedPart, UnplacedReason } from "./layout.ts";
import type { Problem, ProblemBoard, ProblemPart } from "./problem.ts";
import { firstPlace, startsAcross } from "./starts.ts";
import { type Kind, type Stock, type Task, toUnits, UNITS_PER_MM } from "./task.ts";

/** Puts a problem in the planner's form: like pieces and like boards together, and parts no board can give named apart. */
export function makeTask(problem: Problem): { task: Task; barred: UnplacedPart[] } {
  const stocks = groupBoards(problem);
  const kinds: Kind[] = [];
  const byKey = new Map<string, Kind>();
  const barred: UnplacedPart[] = [];
  for (const part of problem.parts) {
    const key = kindKey(part);
    let kind = byKey.get(key);
    if (!kind) {
      const made = newKind(kinds.length, part);
      const reason = bar(made, part, stocks);
      if (reason) {
        barred.push(unplaced(part, part.quantity * part.plies, reason));
        continue;
      }
      kind = made;
      kinds.push(kind);
      byKey.set(key, kind);
    }
    const pieces = part.quantity * part.plies;
    kind.demand += pieces;
    kind.parts.push({ id: part.id, pieces });
  }
  for (const stock of stocks) stock.value.eligible = stock.value.eligible.slice(0, kinds.length);
  const task: Task = {
    problem,
    kerf: toUnits(problem.kerf),
    minOffcut: { length: toUnits(problem.minOffcut.length), width: toUnits(problem.minOffcut.width) },
    stages: problem.stages,
    kinds,
    stocks: stocks.map((stock) => stock.value),
  };
  return { task, barred };
}

const WHY: Record<UnplacedReason, string> = {
  length: "No board is long enough.",
  width: "No board is wide enough.",
  species: "No board is of its species.",
  quarters: "No board of its species has its thickness.",
  boards: "None of the boards it is fixed to is of its species and thickness.",
  grain: "No board large enough has its ring angles across so wide a strip.",
  defects: "Defects leave no clear place large enough.",
  "not-enough": "Not enough wood is left for it.",
};

/** An entry for the answer's list of what is not placed. */
export function unplaced(part: { id: string }, quantity: number, reason: UnplacedReason): UnplacedPart {
  return { part: part.id, quantity, reason, why: WHY[reason] };
}

interface BoardGroup {
  board: ProblemBoard;
  value: Stock;
}

function groupBoards(problem: Problem): BoardGroup[] {
  const fixed = new Set(problem.parts.flatMap((part) => part.boards ?? []));
  const groups = new Map<string, BoardGroup>();
  for (const board of problem.boards) {
    const { id, lot: _, ...alike } = board;
    const key = JSON.stringify([alike, fixed.has(id) ? id : ""]);
    const group = groups.get(key);
    if (group) group.value.ids.push(id);
    else groups.set(key, { board, value: newStock(groups.size, board, problem) });
  }
  return [...groups.values()];
}

function newStock(index: number, board: ProblemBoard, problem: Problem): Stock {
  const { endTrim, edgeTrim } = problem;
  return {
    index,
    ids: [board.id],
    length: toUnits(board.length) - 2 * toUnits(endTrim),
    width: toUnits(board.width) - 2 * toUnits(edgeTrim),
    cost: board.cost + board.charge + problem.boardCharge,
    credit: (problem.offcutCredit * board.cost) / (board.length * board.width * UNITS_PER_MM ** 2),
    ringsDeg: board.rings,
    fullWidth: toUnits(board.width),
    edgeTrim: toUnits(edgeTrim),
    defects: board.defects.map(({ x, y, length, width }) => ({
      x: toUnits(x) - toUnits(endTrim),
      y: toUnits(y) - toUnits(edgeTrim),
      length: toUnits(length),
      width: toUnits(width),
    })),
    eligible: [],
  };
}

function kindKey(part: ProblemPart): string {
  const group = part.sameBoard ? part.plies : 1;
  const species = part.species === undefined ? null : [part.species].flat().sort();
  return JSON.stringify([part.length, part.width, part.rotate, part.rings, group, species, part.quarters, part.boards]);
}

function newKind(index: number, part: ProblemPart): Kind {
  const [length, width] = [toUnits(part.length), toUnits(part.width)];
  const poses = [{ length, width }];
  if (part.rotate && length !== width) poses.push({ length: width, width: length });
  const group = part.sameBoard ? part.plies : 1;
  return { index, poses, window: part.rings, demand: 0, group, area: length * width, parts: [] };
}

/** Sets which boards may give the kind; when none may, says at which limit the last of them fell. */
function bar(kind: Kind, part: ProblemPart, groups: BoardGroup[]): UnplacedReason | null {
  const fits = ({ value }: BoardGroup, test: (pose: { length: number; width: number }) => boolean) =>
    kind.poses.some((pose) => test(pose) && pose.length <= value.length);
  const species = part.species === undefined ? null : [part.species].flat();
  const tests: [UnplacedReason, (group: BoardGroup) => boolean][] = [
    ["species", ({ board }) => species === null || species.includes(board.species ?? "")],
    [
      "quarters",
      ({ board }) => part.quarters === undefined || quartersOf(part.quarters) === quartersOf(board.quarters),
    ],
    ["boards", ({ value }) => !part.boards || value.ids.some((id) => part.boards!.includes(id))],
    ["length", (group) => fits(group, () => true)],
    ["width", (group) => fits(group, (pose) => pose.width <= group.value.width)],
    ["grain", (group) => fits(group, (pose) => startsAcross(group.value, kind, pose).length > 0)],
    ["defects", ({ value }) => value.defects.length === 0 || hasClearPlace(value, kind)],
  ];
  let left = groups;
  for (const [reason, test] of tests) {
    left = left.filter(test);
    if (left.length === 0) return reason;
  }
  for (const group of groups) group.value.eligible[kind.index] = false;
  for (const group of left) group.value.eligible[kind.index] = true;
  return null;
}

function quartersOf(quarters: string | number | undefined): number {
  return Number.parseFloat(String(quarters ?? "NaN"));
}

/** A piece that has a clear place has one that touches an edge or a defect along the board. */
function hasClearPlace(stock: Stock, kind: Kind): boolean {
  const xs = [0, ...stock.defects.map((defect) => Math.max(0, defect.x + defect.length))];
  return kind.poses.some((pose) => xs.some((x) => Number.isFinite(firstPlace(stock, kind, pose, x, 0, "y"))));
}
