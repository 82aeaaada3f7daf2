import type { BoardLayout, Cut, PlacedPiece } from "./layout.ts";
import type { Problem, ProblemBoard } from "./problem.ts";

/** Rounding allowed in a length, mm. */
const SLACK_MM = 1e-5;

type Rectangle = Pick<PlacedPiece, "x" | "y" | "length" | "width">;

/** Whether two rectangles lie at least so far apart, along or across. A negative distance allows so much overlap. */
export function separated(a: Rectangle, b: Rectangle, distance: number): boolean {
  return (
    a.x + a.length + distance <= b.x ||
    b.x + b.length + distance <= a.x ||
    a.y + a.width + distance <= b.y ||
    b.y + b.width + distance <= a.y
  );
}

/**
 * Whether cuts right through, first all one way, then all the other, come down to single pieces within the stages. Cutting a
 * single piece to its size afterwards is a trim and no stage.
 */
export function isThroughCut(pieces: Rectangle[], kerf: number, stages: number): boolean {
  return fallsApart(pieces, kerf, stages, "x") || fallsApart(pieces, kerf, stages, "y");
}

function fallsApart(pieces: Rectangle[], kerf: number, stages: number, way: "x" | "y"): boolean {
  if (pieces.length <= 1) return true;
  if (stages === 0) return false;
  const next = way === "x" ? "y" : "x";
  return groups(pieces, kerf, way).every((group) => fallsApart(group, kerf, stages - 1, next));
}

/** Pieces between which no saw fits, one way. */
function groups(pieces: Rectangle[], kerf: number, way: "x" | "y"): Rectangle[][] {
  const size = way === "x" ? "length" : "width";
  const found: Rectangle[][] = [];
  let end = Number.NEGATIVE_INFINITY;
  for (const piece of [...pieces].sort((a, b) => a[way] - b[way])) {
    if (piece[way] >= end + kerf - SLACK_MM) found.push([]);
    found.at(-1)!.push(piece);
    end = Math.max(end, piece[way] + piece[size]);
  }
  return found;
}

/** Saws the usable board by the layout's cuts in their order, and looks for each piece and offcut among what is left. */
export function checkSawing(problem: Problem, board: ProblemBoard, { cuts, pieces, offcuts }: BoardLayout): string[] {
  const { endTrim, edgeTrim, kerf } = problem;
  let blanks: Rectangle[] = [
    { x: endTrim, y: edgeTrim, length: board.length - 2 * endTrim, width: board.width - 2 * edgeTrim },
  ];
  const faults: string[] = [];
  for (const [index, cut] of cuts.entries()) {
    if (cut.stage > problem.stages + 1) faults.push(`saw line ${index + 1} is in stage ${cut.stage}.`);
    const sawn = blanks.find((blank) => runsThrough(cut, blank, kerf));
    if (!sawn) {
      faults.push(`saw line ${index + 1} runs through no blank.`);
      continue;
    }
    blanks = [...blanks.filter((blank) => blank !== sawn), ...halves(cut, sawn, kerf)];
  }
  for (const piece of pieces) {
    const at = blanks.findIndex((blank) => same(blank, piece));
    if (at < 0) faults.push(`the saw lines do not give ${piece.part} at ${piece.x}, ${piece.y}.`);
    else blanks.splice(at, 1);
  }
  for (const offcut of offcuts)
    if (!blanks.some((blank) => same(blank, offcut)))
      faults.push(`the saw lines leave no offcut at ${offcut.x}, ${offcut.y}.`);
  return faults;
}

/** A line may lie less than a kerf before a blank: the saw then takes only what is there. */
function runsThrough(cut: Cut, blank: Rectangle, kerf: number): boolean {
  const [start, size, from, to] =
    cut.kind === "crosscut"
      ? [blank.x, blank.length, blank.y, blank.y + blank.width]
      : [blank.y, blank.width, blank.x, blank.x + blank.length];
  return (
    cut.at + kerf > start + SLACK_MM &&
    cut.at < start + size - SLACK_MM &&
    Math.abs(cut.from - from) <= SLACK_MM &&
    Math.abs(cut.to - to) <= SLACK_MM
  );
}

function halves(cut: Cut, { x, y, length, width }: Rectangle, kerf: number): Rectangle[] {
  const after = cut.at + kerf;
  const both =
    cut.kind === "crosscut"
      ? [
          { x, y, length: cut.at - x, width },
          { x: after, y, length: x + length - after, width },
        ]
      : [
          { x, y, length, width: cut.at - y },
          { x, y: after, length, width: y + width - after },
        ];
  return both.filter((half) => half.length > SLACK_MM && half.width > SLACK_MM);
}

function same(a: Rectangle, b: Rectangle): boolean {
  return (["x", "y", "length", "width"] as const).every((key) => Math.abs(a[key] - b[key]) <= SLACK_MM);
}
