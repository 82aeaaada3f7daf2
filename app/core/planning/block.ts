import type { Cut, Offcut } from "./layout.ts";
import type { Pose, Task } from "./task.ts";

/** What becomes of a rectangle of wood: one piece at its near corner, or a row of blocks along x or across y. */
export type Block = PieceBlock | RowBlock;

export interface PieceBlock {
  kind: number;
  pose: Pose;
}

export interface RowBlock {
  way: "x" | "y";
  /** In order; `at` from the board's usable corner, gaps of a kerf or more between them. Units. */
  cells: { at: number; size: number; block: Block }[];
}

export interface Rectangle {
  x: number;
  y: number;
  length: number;
  width: number;
}

/** A block drawn out, in units. */
export interface Drawn {
  pieces: (Rectangle & { kind: number })[];
  cuts: Cut[];
  offcuts: Offcut[];
}

/** Draws a block into a rectangle: pieces, saw lines in order, and what is left that is worth keeping. */
export function draw(task: Pick<Task, "kerf" | "minOffcut">, block: Block, rectangle: Rectangle): Drawn {
  const drawn: Drawn = { pieces: [], cuts: [], offcuts: [] };
  drawInto(drawn, task, block, rectangle, 1);
  return drawn;
}

type Saw = Pick<Task, "kerf" | "minOffcut">;

function drawInto(drawn: Drawn, saw: Saw, block: Block, rectangle: Rectangle, stage: number): void {
  if ("kind" in block) {
    const { length, width } = block.pose;
    const cut = trim(drawn, saw, rectangle, "x", length, stage);
    trim(drawn, saw, cut, "y", width, stage);
    drawn.pieces.push({ kind: block.kind, x: rectangle.x, y: rectangle.y, length, width });
    return;
  }
  const { way, cells } = block;
  const size = way === "x" ? "length" : "width";
  let rest = rectangle;
  const end = rectangle[way] + rectangle[size];
  const sawn: { cell: RowBlock["cells"][number]; piece: Rectangle }[] = [];
  for (const cell of cells) {
    if (cell.at > rest[way]) {
      cutAcross(drawn, way, cell.at - saw.kerf, rest, stage);
      keep(drawn, saw, { ...rest, [size]: cell.at - saw.kerf - rest[way] });
      rest = { ...rest, [way]: cell.at, [size]: end - cell.at };
    }
    const cellEnd = cell.at + cell.size;
    if (cellEnd < end) cutAcross(drawn, way, cellEnd, rest, stage);
    sawn.push({ cell, piece: { ...rest, [size]: cell.size } });
    const next = Math.min(end, cellEnd + saw.kerf);
    rest = { ...rest, [way]: next, [size]: end - next };
  }
  keep(drawn, saw, rest);
  for (const { cell, piece } of sawn) drawInto(drawn, saw, cell.block, piece, stage + 1);
}

function trim(drawn: Drawn, saw: Saw, rectangle: Rectangle, way: "x" | "y", to: number, stage: number): Rectangle {
  const size = way === "x" ? "length" : "width";
  if (rectangle[size] <= to) return rectangle;
  const at = rectangle[way] + to;
  cutAcross(drawn, way, at, rectangle, stage);
  keep(drawn, saw, { ...rectangle, [way]: at + saw.kerf, [size]: rectangle[size] - to - saw.kerf });
  return { ...rectangle, [size]: to };
}

function cutAcross(drawn: Drawn, way: "x" | "y", at: number, { x, y, length, width }: Rectangle, stage: number): void {
  if (way === "x") drawn.cuts.push({ kind: "crosscut", stage, at, from: y, to: y + width });
  else drawn.cuts.push({ kind: "rip", stage, at, from: x, to: x + length });
}

function keep(drawn: Drawn, { minOffcut }: Saw, { x, y, length, width }: Rectangle): void {
  if (length <= 0 || width <= 0 || length < minOffcut.length || width < minOffcut.width) return;
  drawn.offcuts.push({ x, y, length, width });
}
