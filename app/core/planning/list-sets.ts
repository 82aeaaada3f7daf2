import { layInBands } from "./lay-bands.ts";
import type { Stock, Task } from "./task.ts";

/**
 * Lists all sets of pieces that one board takes and to which none can be added, as counts by kind.
 *
 * @returns null when looking through them would take more than so many steps.
 */
export function listFullSets(task: Task, stock: Stock, steps: number): number[][] | null {
  const room = (stock.length + task.kerf) * (stock.width + task.kerf);
  const gross = task.kinds.map(({ poses }) => (poses[0]!.length + task.kerf) * (poses[0]!.width + task.kerf));
  const counts = task.kinds.map(() => 0);
  const pieces: number[] = [];
  const full: number[][] = [];
  let left = steps;
  const takes = (kind: number, area: number): boolean => {
    if (counts[kind]! >= task.kinds[kind]!.demand || area + gross[kind]! > room) return false;
    left--;
    return layInBands(task, stock, [...pieces, kind]) !== null;
  };
  const visit = (from: number, area: number): void => {
    if (left < 0) return;
    let extended = false;
    for (let kind = from; kind < counts.length; kind++) {
      if (!takes(kind, area)) continue;
      extended = true;
      counts[kind]!++;
      pieces.push(kind);
      visit(kind, area + gross[kind]!);
      pieces.pop();
      counts[kind]!--;
    }
    if (extended || pieces.length === 0) return;
    // No later kind fits; were an earlier one to fit, the set is found there as part of a fuller one.
    for (let kind = 0; kind < from; kind++) if (takes(kind, area)) return;
    full.push(counts.slice());
  };
  visit(0, 0);
  return left < 0 ? null : full;
}
