import { type Entry, type Grid, otherWay, type Way } from "./axes.ts";
import { compose } from "./band-table.ts";
import type { RowBlock } from "./block.ts";
import type { Band } from "./fill-band.ts";
import { fillLine } from "./fill-line.ts";
import { makeRowTable, rowValue } from "./row-table.ts";
import type { Task } from "./task.ts";

/** Fills a band cell by cell along it, each cell a stack of pieces across the band: the third cut. */
export function fillStackedBand(
  task: Task,
  way: Way,
  space: { at: number; across: number; along: number },
  entries: Entry[],
  wanted: { values: ArrayLike<number>; limits: number[] },
  grid: Grid,
): Band | null {
  const left = wanted.limits.slice();
  const steps = { across: grid[way], along: grid[otherWay(way)] };
  // Seen from a cell, the band's directions change places.
  const turned = entries
    .map((entry) => ({ ...entry, band: entry.cell, cell: entry.band }))
    .sort((a, b) => a.band - b.band || a.cell - b.cell || a.kind - b.kind);
  const cells: RowBlock["cells"] = [];
  let size = 0;
  let value = 0;
  for (let next = 0; ; ) {
    const room = space.along - next;
    const fitting = turned.filter(({ kind, band, cell }) => left[kind]! > 0 && band <= room && cell <= space.across);
    if (fitting.length === 0) break;
    const stacks = makeRowTable(fitting, wanted.values, left, space.across, steps.across);
    const table = { bands: stacks.levels, valueAt: (level: number) => rowValue(stacks, level, space.across) };
    const { first } = compose(table, 0, { longest: room, step: steps.along });
    let chosen: number | null = null;
    for (let at = first.length - 1; at > 0 && first[at]! >= 0; ) {
      const level = first[at]!;
      const worth = table.valueAt(level) / table.bands[level]!;
      if (table.bands[level]! <= room && (chosen === null || worth > table.valueAt(chosen) / table.bands[chosen]!))
        chosen = level;
      at -= Math.max(1, Math.floor(table.bands[level]! / steps.along + 1e-9));
    }
    if (chosen === null) break;
    const stack = makeStack(
      task,
      way,
      space,
      fitting.filter(({ band }) => band <= table.bands[chosen]!),
      wanted.values,
      left,
      steps.across,
    );
    if (!stack) break;
    for (const kind of stack.kinds) {
      left[kind]!--;
      value += wanted.values[kind]!;
    }
    cells.push({ at: next, size: stack.along, block: stack.block });
    size = Math.max(size, stack.across);
    next += stack.along + task.kerf;
  }
  return cells.length > 0 ? { at: space.at, size, cells, value } : null;
}

function makeStack(
  task: Task,
  way: Way,
  space: { at: number; across: number },
  entries: Entry[],
  values: ArrayLike<number>,
  limits: number[],
  step: number,
) {
  const items = entries.map(({ kind, cell }) => ({ size: cell, value: values[kind]!, limit: limits[kind]! }));
  const counts = fillLine(items, space.across, step);
  const left = new Map<number, number>();
  const cells: RowBlock["cells"] = [];
  const kinds: number[] = [];
  let next = space.at;
  let along = 0;
  for (const [index, { kind, pose, band, cell }] of entries.entries())
    for (let n = counts[index]!; n > 0; n--) {
      const remaining = left.get(kind) ?? limits[kind]!;
      if (remaining <= 0) break;
      left.set(kind, remaining - 1);
      cells.push({ at: next, size: cell - task.kerf, block: { kind, pose } });
      kinds.push(kind);
      next += cell;
      along = Math.max(along, band - task.kerf);
    }
  if (cells.length === 0) return null;
  const block: RowBlock = { way, cells };
  return { block, kinds, along, across: next - task.kerf - space.at };
}
