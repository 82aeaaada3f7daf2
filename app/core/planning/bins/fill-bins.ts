import type { BinPattern, BinTask } from "./bin-program.ts";
import { toPattern } from "./bin-program.ts";

/** Fills bins one after another: the largest item left first, then always the largest that fits. Same as first fit decreasing. */
export function fillLargestFirst(task: BinTask, left: ArrayLike<number>): BinPattern[] {
  const rest = Array.from(left);
  const bins: BinPattern[] = [];
  for (;;) {
    const counts = new Int32Array(rest.length);
    let room = task.capacity;
    let any = false;
    for (let item = 0; item < rest.length; item++) {
      const times = Math.min(rest[item]!, Math.floor(room / task.sizes[item]!));
      if (times <= 0) continue;
      counts[item] = times;
      rest[item]! -= times;
      room -= times * task.sizes[item]!;
      any = true;
    }
    if (!any) return bins;
    bins.push(toPattern(counts));
  }
}

/**
 * Fills bins one after another, each with the largest item left and the set beside it that leaves least, found by search
 * with a limit on its steps.
 */
export function fillLeastSlack(task: BinTask, left: ArrayLike<number>): BinPattern[] {
  const rest = Array.from(left);
  const bins: BinPattern[] = [];
  for (;;) {
    const first = rest.findIndex((count) => count > 0);
    if (first < 0) return bins;
    rest[first]!--;
    const { counts } = leastSlack(task, rest, task.capacity - task.sizes[first]!);
    counts[first]!++;
    for (let item = 0; item < rest.length; item++) rest[item]! -= counts[item]!;
    rest[first]!++;
    bins.push(toPattern(counts));
  }
}

const STEPS_A_BIN = 4000;

function leastSlack(task: BinTask, rest: number[], room: number): { counts: Int32Array } {
  const { sizes } = task;
  const current = new Int32Array(rest.length);
  let best = current.slice();
  let least = room;
  let steps = STEPS_A_BIN;
  const smallest = rest.reduce((found, count, item) => (count > 0 ? sizes[item]! : found), Number.POSITIVE_INFINITY);
  const visit = (from: number, space: number): boolean => {
    if (space < least) {
      least = space;
      best = current.slice();
    }
    if (least === 0 || --steps < 0) return true;
    if (space < smallest) return false;
    for (let item = from; item < rest.length; item++) {
      if (current[item]! >= rest[item]! || sizes[item]! > space) continue;
      current[item]!++;
      const stop = visit(item, space - sizes[item]!);
      current[item]!--;
      if (stop) return true;
    }
    return false;
  };
  visit(0, room);
  return { counts: best };
}
