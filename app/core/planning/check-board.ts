import { checkSawing, isThroughCut, separated } from "./check-cuts.ts";
import type { BoardLayout, PlacedPiece } from "./layout.ts";
import type { Problem, ProblemBoard, ProblemPart } from "./problem.ts";

/** Rounding allowed in a length, mm. */
const SLACK_MM = 1e-5;

export type BoardFaults = string[];

type Rectangle = Pick<PlacedPiece, "x" | "y" | "length" | "width">;

/** Everything a layout of one board must keep: sizes, grain, defects, through cuts within the stages, plies, offcuts, cost. */
export function checkBoard(
  problem: Problem,
  board: ProblemBoard,
  layout: BoardLayout,
  parts: Map<string, ProblemPart>,
): BoardFaults {
  const faults: BoardFaults = [];
  if (layout.pieces.length === 0) faults.push("nothing is cut from it.");
  const counts = new Map<ProblemPart, number>();
  for (const piece of layout.pieces) {
    const part = parts.get(piece.part);
    if (!part) {
      faults.push(`there is no part ${piece.part}.`);
      continue;
    }
    counts.set(part, (counts.get(part) ?? 0) + 1);
    const wrong = pieceFault(problem, board, part, piece);
    if (wrong) faults.push(`${piece.part} at ${piece.x}, ${piece.y} ${wrong}.`);
  }
  for (const [part, count] of counts)
    if (part.sameBoard && count % part.plies !== 0)
      faults.push(`${count} plies of ${part.id} are not whole blanks of ${part.plies}.`);
  faults.push(...offcutFaults(problem, board, layout));
  faults.push(...closeFaults([...layout.pieces, ...layout.offcuts], problem.kerf));
  if (!isThroughCut(layout.pieces, problem.kerf, problem.stages))
    faults.push(`through cuts in ${problem.stages} stages do not give it.`);
  faults.push(...checkSawing(problem, board, layout));
  const cost = boardCost(problem, board, layout);
  if (!(Math.abs(cost - layout.cost) <= 1e-6 * Math.max(1, cost)))
    faults.push(`cost ${layout.cost} should be ${cost}.`);
  return faults;
}

function pieceFault(problem: Problem, board: ProblemBoard, part: ProblemPart, piece: PlacedPiece): string | null {
  const along = near(piece.length, part.length) && near(piece.width, part.width);
  const across = part.rotate && near(piece.length, part.width) && near(piece.width, part.length);
  if (!along && !across) return "has not its part's size";
  if (!inUsable(problem, board, piece)) return "leaves the usable board";
  if (part.boards && !part.boards.includes(board.id)) return "is fixed to other boards";
  if (part.species !== undefined && ![part.species].flat().includes(board.species ?? ""))
    return "is of another species";
  if (part.quarters !== undefined && thickness(part.quarters) !== thickness(board.quarters))
    return "is of another thickness";
  for (const defect of board.defects)
    if (!separated(piece, defect, -SLACK_MM)) return `has the defect at ${defect.x}, ${defect.y} in it`;
  if (part.rings) {
    const share = windowShare(board, piece, part.rings.min, part.rings.max);
    if (!(share >= part.rings.share - 1e-6)) return `has ${share.toFixed(4)} of its width in its ring window`;
  }
  return null;
}

/** Share of a piece's width in the window, by cutting its width at every slice's edge. */
function windowShare(board: ProblemBoard, piece: Rectangle, min: number, max: number): number {
  const angles = board.rings ?? [];
  const edges = [piece.y, piece.y + piece.width];
  for (let i = 1; i < angles.length; i++) edges.push((i * board.width) / angles.length);
  const inside = edges.filter((y) => y >= piece.y && y <= piece.y + piece.width).sort((a, b) => a - b);
  let share = 0;
  for (let i = 0; i + 1 < inside.length; i++) {
    const middle = (inside[i]! + inside[i + 1]!) / 2;
    const angle = Math.abs(angles[Math.floor((middle / board.width) * angles.length)] ?? Number.NaN);
    const acute = angle > 90 ? 180 - angle : angle;
    if (acute >= min && acute <= max) share += (inside[i + 1]! - inside[i]!) / piece.width;
  }
  return share;
}

function offcutFaults(problem: Problem, board: ProblemBoard, { offcuts }: BoardLayout): string[] {
  return offcuts.flatMap((offcut) => {
    const large =
      offcut.length >= problem.minOffcut.length - SLACK_MM && offcut.width >= problem.minOffcut.width - SLACK_MM;
    if (!large) return [`offcut at ${offcut.x}, ${offcut.y} is too small to keep.`];
    return inUsable(problem, board, offcut) ? [] : [`offcut at ${offcut.x}, ${offcut.y} leaves the usable board.`];
  });
}

function closeFaults(rectangles: Rectangle[], kerf: number): string[] {
  const faults: string[] = [];
  for (const [i, a] of rectangles.entries())
    for (const b of rectangles.slice(i + 1))
      if (!separated(a, b, kerf - SLACK_MM)) faults.push(`less than a kerf between ${a.x}, ${a.y} and ${b.x}, ${b.y}.`);
  return faults;
}

function boardCost(problem: Problem, board: ProblemBoard, { offcuts }: BoardLayout): number {
  const kept = offcuts.reduce((sum, offcut) => sum + offcut.length * offcut.width, 0) / (board.length * board.width);
  return board.cost * (1 - problem.offcutCredit * kept) + board.charge + problem.boardCharge;
}

function inUsable({ endTrim, edgeTrim }: Problem, board: ProblemBoard, piece: Rectangle): boolean {
  return (
    piece.x >= endTrim - SLACK_MM &&
    piece.y >= edgeTrim - SLACK_MM &&
    piece.x + piece.length <= board.length - endTrim + SLACK_MM &&
    piece.y + piece.width <= board.width - edgeTrim + SLACK_MM
  );
}

function thickness(quarters: string | number | undefined): string {
  return String(quarters ?? "").replace(/\/4$/, "");
}

function near(a: number, b: number): boolean {
  return Math.abs(a - b) <= SLACK_MM;
}
