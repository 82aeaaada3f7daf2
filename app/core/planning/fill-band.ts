import { type Entry, room, type Way } from "./axes.ts";
import type { RowBlock } from "./block.ts";
import { fillLine } from "./fill-line.ts";
import { firstPlace } from "./starts.ts";
import type { Stock, Task } from "./task.ts";

/** A band with its pieces in place. */
export interface Band {
  at: number;
  size: number;
  cells: RowBlock["cells"];
  value: number;
}

interface Wanted {
  values: ArrayLike<number>;
  limits: ArrayLike<number>;
}

/** Fills a band of a board that is alike everywhere: no defects, no ring windows. */
export function fillPlainBand(
  task: Task,
  stock: Stock,
  way: Way,
  at: number,
  entries: Entry[],
  wanted: Wanted,
  step: number,
): Band | null {
  const items = entries.map(({ kind, cell }) => ({
    size: cell,
    value: wanted.values[kind]!,
    limit: wanted.limits[kind]!,
  }));
  const counts = fillLine(items, room(task, stock, way).along, step);
  // A piece that may lie two ways stands twice among the items.
  const left = new Map<number, number>();
  const chosen: Entry[] = [];
  for (const [index, entry] of entries.entries())
    for (let n = counts[index]!; n > 0; n--) {
      const remaining = left.get(entry.kind) ?? wanted.limits[entry.kind]!;
      if (remaining <= 0) break;
      left.set(entry.kind, remaining - 1);
      chosen.push(entry);
    }
  if (chosen.length === 0) return null;
  chosen.sort((a, b) => b.band - a.band || b.cell - a.cell || a.kind - b.kind);
  let next = 0;
  const cells = chosen.map(({ kind, pose, cell }) => {
    const placed = { at: next, size: cell - task.kerf, block: { kind, pose } };
    next += cell;
    return placed;
  });
  const value = chosen.reduce((sum, { kind }) => sum + wanted.values[kind]!, 0);
  return { at, size: chosen[0]!.band - task.kerf, cells, value };
}

interface State {
  end: number;
  value: number;
  last: Entry | null;
  start: number;
  before: State | null;
}

/**
 * Fills a band where it matters where a piece lies: windows of ring angles, defects. The best line is sought for each place
 * to which a line may reach, told apart by steps.
 */
export function fillPlacedBand(
  task: Task,
  stock: Stock,
  way: Way,
  at: number,
  entries: Entry[],
  wanted: Wanted,
  step: number,
): Band | null {
  const along = room(task, stock, way).along;
  const states: (State | undefined)[] = [{ end: 0, value: 0, last: null, start: 0, before: null }];
  let best = states[0]!;
  const useful = entries.filter(({ kind }) => wanted.values[kind]! > 0 && wanted.limits[kind]! > 0);
  for (let index = 0; index * step < along; index++) {
    const state = states[index];
    if (!state) continue;
    if (state.value > best.value) best = state;
    for (const entry of useful) {
      if (usedBy(state, entry.kind) >= wanted.limits[entry.kind]!) continue;
      const kind = task.kinds[entry.kind]!;
      const start =
        way === "y"
          ? firstPlace(stock, kind, entry.pose, state.end, at, "x")
          : firstPlace(stock, kind, entry.pose, at, state.end, "y");
      if (!Number.isFinite(start)) continue;
      const end = start + entry.cell;
      const to = Math.floor(end / step + 1e-9);
      const value = state.value + wanted.values[entry.kind]!;
      const there = states[to];
      if (to > index && (!there || value > there.value || (value === there.value && end < there.end)))
        states[to] = { end, value, last: entry, start, before: state };
    }
  }
  for (const state of states) if (state && state.value > best.value) best = state;
  if (!best.last) return null;
  const cells: RowBlock["cells"] = [];
  let size = 0;
  for (let state: State | null = best; state?.last; state = state.before) {
    const { kind, pose, cell, band } = state.last;
    cells.unshift({ at: state.start, size: cell - task.kerf, block: { kind, pose } });
    size = Math.max(size, band - task.kerf);
  }
  return { at, size, cells, value: best.value };
}

function usedBy(state: State, kind: number): number {
  let count = 0;
  for (let at: State | null = state; at?.last; at = at.before) if (at.last.kind === kind) count++;
  return count;
}
