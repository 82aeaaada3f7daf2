import { bandSize, cellSize, otherWay, type Way } from "./axes.ts";
import type { RowBlock } from "./block.ts";
import type { Pose, Stock, Task } from "./task.ts";

interface Placed {
  kind: number;
  pose: Pose;
}

interface OpenBand {
  size: number;
  used: number;
  pieces: Placed[];
}

/**
 * Lays just these pieces on a board without defects or windows in bands, in any way that two stages allow.
 *
 * @param kinds one entry for each piece.
 * @returns the block, or null when there is none.
 */
export function layInBands(task: Task, stock: Stock, kinds: number[]): RowBlock | null {
  for (const way of ["y", "x"] as const) {
    const bands = layOneWay(task, stock, kinds, way);
    if (bands) return toBlock(task, bands, way);
  }
  return null;
}

function layOneWay(task: Task, stock: Stock, kinds: number[], way: Way): OpenBand[] | null {
  const across = (way === "y" ? stock.width : stock.length) + task.kerf;
  const along = (way === "y" ? stock.length : stock.width) + task.kerf;
  const pieces = kinds
    .map((kind) => ({ kind, pose: task.kinds[kind]!.poses[0]! }))
    .sort((a, b) => bandSize(b.pose, way) - bandSize(a.pose, way) || cellSize(b.pose, way) - cellSize(a.pose, way));
  const bands: OpenBand[] = [];
  // Widest first, so a band is as wide as the piece that opens it and takes any later one.
  const place = (next: number, room: number): boolean => {
    if (next === pieces.length) return true;
    const piece = pieces[next]!;
    const cell = cellSize(piece.pose, way) + task.kerf;
    const tried = new Set<number>();
    for (const band of bands) {
      if (band.used + cell > along || tried.has(band.used)) continue;
      tried.add(band.used);
      band.used += cell;
      band.pieces.push(piece);
      if (place(next + 1, room)) return true;
      band.pieces.pop();
      band.used -= cell;
    }
    const size = bandSize(piece.pose, way) + task.kerf;
    if (size > room || cell > along) return false;
    bands.push({ size, used: cell, pieces: [piece] });
    if (place(next + 1, room - size)) return true;
    bands.pop();
    return false;
  };
  return place(0, across) ? bands : null;
}

function toBlock(task: Task, bands: OpenBand[], way: Way): RowBlock {
  let at = 0;
  const cells = bands.map(({ size, pieces }) => {
    let next = 0;
    const row: RowBlock = {
      way: otherWay(way),
      cells: pieces.map(({ kind, pose }) => {
        const cell = { at: next, size: cellSize(pose, way), block: { kind, pose } };
        next += cell.size + task.kerf;
        return cell;
      }),
    };
    const band = { at, size: size - task.kerf, block: row };
    at += size;
    return band;
  });
  return { way, cells };
}
