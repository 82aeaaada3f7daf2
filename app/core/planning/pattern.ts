import { type Block, draw } from "./block.ts";
import type { Stock, Task } from "./task.ts";

/** One way to cut up one board. */
export interface Pattern {
  stock: number;
  block: Block;
  /** Pieces by kind: pairs of kind and count. */
  counts: [kind: number, count: number][];
  /** Cost of the board less what its offcuts are worth. */
  cost: number;
  /** How far the pieces reach along and across the board. */
  reach: { length: number; width: number };
}

/** Works out what a block costs and gives on a board. */
export function patternOf(task: Task, stock: Stock, block: Block): Pattern {
  const { length, width } = stock;
  const { pieces, offcuts } = draw(task, block, { x: 0, y: 0, length, width });
  const counts = new Map<number, number>();
  for (const { kind } of pieces) counts.set(kind, (counts.get(kind) ?? 0) + 1);
  const back = stock.credit * offcuts.reduce((sum, offcut) => sum + offcut.length * offcut.width, 0);
  const reach = {
    length: pieces.reduce((most, piece) => Math.max(most, piece.x + piece.length), 0),
    width: pieces.reduce((most, piece) => Math.max(most, piece.y + piece.width), 0),
  };
  return { stock: stock.index, block, counts: [...counts].sort((a, b) => a[0] - b[0]), cost: stock.cost - back, reach };
}
