import type { BinPattern } from "./bins/bin-program.ts";
import { packBins } from "./bins/pack-bins.ts";
import type { RowBlock } from "./block.ts";
import { greatestDivisor } from "./greatest-divisor.ts";
import { type Pattern, patternOf } from "./pattern.ts";
import { costOf, type Solution } from "./solution.ts";
import type { Pose, Stock, Task } from "./task.ts";

/**
 * Whether a board takes one row of pieces and no more: no two pieces that it may give lie side by side across it (way "x")
 * or one behind the other along it (way "y"), and every place in the row is as good as any other.
 */
export function rowWay(task: Task, stock: Stock): "x" | "y" | null {
  if (stock.defects.length > 0) return null;
  const kinds = task.kinds.filter((kind) => stock.eligible[kind.index]);
  if (kinds.some((kind) => kind.window || kind.poses.length > 1)) return null;
  const single = (size: keyof Pose) =>
    2 * Math.min(...kinds.map((kind) => kind.poses[0]![size])) + task.kerf > stock[size];
  if (single("width")) return "x";
  return single("length") ? "y" : null;
}

/** Whether the task is plain bin packing: boards all alike, a row of pieces in each, nothing back for offcuts. */
export function isBinTask(task: Task): boolean {
  const [stock] = task.stocks;
  if (!stock || task.stocks.length !== 1 || task.kinds.length === 0 || stock.cost <= 0) return false;
  const credited = stock.credit > 0 && task.minOffcut.length <= stock.length && task.minOffcut.width <= stock.width;
  return !credited && task.kinds.every((kind) => kind.group === 1) && rowWay(task, stock) !== null;
}

/** Plans a bin packing task; the start is kept when nothing better is found. */
export function planBins(task: Task, start: Solution, mayGoOn: () => boolean): { solution: Solution; bound: number } {
  const stock = task.stocks[0]!;
  const way = rowWay(task, stock)!;
  const size = way === "x" ? "length" : "width";
  const room = stock[size] + task.kerf;
  const bySize = new Map<number, { kind: number; left: number }[]>();
  for (const kind of task.kinds) {
    const pieceSize = kind.poses[0]![size] + task.kerf;
    if (!bySize.has(pieceSize)) bySize.set(pieceSize, []);
    bySize.get(pieceSize)!.push({ kind: kind.index, left: kind.demand });
  }
  const sizes = [...bySize.keys()].sort((a, b) => b - a);
  const divisor = sizes.reduce(greatestDivisor, 0);
  const demands = sizes.map((pieceSize) => bySize.get(pieceSize)!.reduce((sum, { left }) => sum + left, 0));
  const packing = packBins(
    { capacity: Math.floor(room / divisor), sizes: sizes.map((pieceSize) => pieceSize / divisor), demands },
    { mayGoOn },
  );
  const bound = packing.bound * stock.cost;
  if (packing.bins.length > stock.ids.length) return { solution: start, bound };
  const take = (item: number) => {
    const entry = bySize.get(sizes[item]!)!.find(({ left }) => left > 0)!;
    entry.left--;
    return entry.kind;
  };
  const patterns = packing.bins.map((bin) => rowPattern(task, stock, way, kindsOf(bin, take)));
  const solution: Solution = { patterns, missing: task.kinds.map(() => 0) };
  const better = start.missing.some((count) => count > 0) || costOf(solution) <= costOf(start);
  return { solution: better ? solution : start, bound };
}

/** A pattern of pieces in one row from the near corner on. */
export function rowPattern(task: Task, stock: Stock, way: "x" | "y", kinds: number[]): Pattern {
  const size = way === "x" ? "length" : "width";
  let at = 0;
  const cells: RowBlock["cells"] = kinds.map((kind) => {
    const pose = task.kinds[kind]!.poses[0]!;
    const cell = { at, size: pose[size], block: { kind, pose } };
    at += pose[size] + task.kerf;
    return cell;
  });
  return patternOf(task, stock, { way, cells });
}

function kindsOf(bin: BinPattern, take: (item: number) => number): number[] {
  return bin.items.flatMap((item, i) => Array.from({ length: bin.counts[i]! }, () => take(item)));
}
