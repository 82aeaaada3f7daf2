/** Things to choose from for one bin: sizes in whole numbers, values of any size, and how many there are of each. */
export interface Choice {
  sizes: number[];
  values: ArrayLike<number>;
  limits: number[];
}

/** The best choice: what it is worth and how many of each. */
export interface Chosen {
  value: number;
  counts: Int32Array;
  /** False when steps ran out and a better one may exist. */
  isBest: boolean;
}

/** A table of so many entries or fewer is quicker than a search. */
const TABLE_CAPACITY = 16_000;

/** Whether a bin of this capacity is done exactly in little time whatever the values. */
export function isQuick(capacity: number): boolean {
  return capacity <= TABLE_CAPACITY;
}

/**
 * The most valuable choice that fits. Where there are many of equal value the same one is always found.
 *
 * @param steps after so many a search gives what it has; a small bin is always done exactly.
 */
export function bestChoice(capacity: number, choice: Choice, steps = Number.POSITIVE_INFINITY): Chosen {
  return isQuick(capacity) ? byTable(capacity, choice) : bySearch(capacity, choice, steps);
}

function byTable(capacity: number, { sizes, values, limits }: Choice): Chosen {
  const layers: { item: number; times: number; size: number }[] = [];
  for (let item = 0; item < sizes.length; item++) {
    if (!(values[item]! > 0) || sizes[item]! > capacity) continue;
    let left = Math.min(limits[item]!, Math.floor(capacity / sizes[item]!));
    for (let times = 1; left > 0; times *= 2) {
      const taken = Math.min(times, left);
      layers.push({ item, times: taken, size: taken * sizes[item]! });
      left -= taken;
    }
  }
  const best = new Float64Array(capacity + 1);
  const taken = new Uint8Array(layers.length * (capacity + 1));
  for (let layer = 0; layer < layers.length; layer++) {
    const { item, times, size } = layers[layer]!;
    const value = times * values[item]!;
    const base = layer * (capacity + 1);
    for (let at = capacity; at >= size; at--) {
      const other = best[at - size]! + value;
      if (other > best[at]!) {
        best[at] = other;
        taken[base + at] = 1;
      }
    }
  }
  const counts = new Int32Array(sizes.length);
  let at = capacity;
  for (let layer = layers.length - 1; layer >= 0; layer--) {
    if (!taken[layer * (capacity + 1) + at]) continue;
    counts[layers[layer]!.item]! += layers[layer]!.times;
    at -= layers[layer]!.size;
  }
  return { value: best[capacity]!, counts, isBest: true };
}

/** Depth first by value for size, cut off where even the best of what follows could not catch up. */
function bySearch(capacity: number, { sizes, values, limits }: Choice, steps: number): Chosen {
  const order = sizes
    .map((_, item) => item)
    .filter((item) => values[item]! > 0 && sizes[item]! <= capacity && limits[item]! > 0)
    .sort((a, b) => values[b]! / sizes[b]! - values[a]! / sizes[a]! || sizes[b]! - sizes[a]!);
  const n = order.length;
  const size = Float64Array.from(order, (item) => sizes[item]!);
  const value = Float64Array.from(order, (item) => values[item]!);
  const leastAfter = new Float64Array(n + 1).fill(Number.POSITIVE_INFINITY);
  for (let i = n - 1; i >= 0; i--) leastAfter[i] = Math.min(leastAfter[i + 1]!, size[i]!);
  const least = leastAfter[0]!;
  const current = new Int32Array(n);
  let best = 0;
  let left = steps;
  let bestCounts = new Int32Array(n);
  const single = bestSingles(size, value);
  const offer = (worth: number) => {
    if (worth <= best + 1e-12) return;
    best = worth;
    bestCounts = current.slice();
  };
  /** With room for one more at most: the best that fits, if it is not used up. */
  const finish = (room: number, worth: number): boolean => {
    const j = single(room);
    if (j < 0) {
      offer(worth);
      return true;
    }
    if (current[j]! >= limits[order[j]!]!) return false;
    current[j]!++;
    offer(worth + value[j]!);
    current[j]!--;
    return true;
  };
  const visit = (i: number, room: number, worth: number) => {
    if (--left < 0) return;
    if (room < 2 * least && finish(room, worth)) return;
    offer(worth);
    for (let j = i; j < n; j++) {
      if (room < leastAfter[j]!) return;
      if (worth + (room * value[j]!) / size[j]! <= best + 1e-12) return;
      if (size[j]! > room) continue;
      const most = Math.min(limits[order[j]!]!, Math.floor(room / size[j]!));
      for (let times = most; times > 0; times--) {
        current[j] = times;
        visit(j + 1, room - times * size[j]!, worth + times * value[j]!);
      }
      current[j] = 0;
    }
  };
  visit(0, capacity, 0);
  const counts = new Int32Array(sizes.length);
  order.forEach((item, i) => {
    counts[item] = bestCounts[i]!;
  });
  return { value: best, counts, isBest: left >= 0 };
}

/** For a room: the most valuable item that fits in it, or −1. */
function bestSingles(size: Float64Array, value: Float64Array): (room: number) => number {
  const bySize = Array.from(size.keys()).sort((a, b) => size[a]! - size[b]!);
  const bestUpTo: number[] = [];
  for (const item of bySize) {
    const before = bestUpTo.at(-1);
    bestUpTo.push(before === undefined || value[item]! > value[before]! ? item : before);
  }
  return (room) => {
    let [low, high] = [0, bySize.length];
    while (low < high) {
      const middle = (low + high) >> 1;
      if (size[bySize[middle]!]! <= room) low = middle + 1;
      else high = middle;
    }
    return low > 0 ? bestUpTo[low - 1]! : -1;
  };
}
