/** What may go in a line, each with a kerf added to its size. */
export interface LineItem {
  size: number;
  value: number;
  limit: number;
}

/**
 * The most valuable line of items within a room. Rooms are told apart by steps but sums are exact, so what is found always
 * fits; with every size on a step it is also the best.
 *
 * @returns how many of each item.
 */
export function fillLine(items: LineItem[], room: number, step: number): Int32Array {
  const steps = Math.floor(room / step + 1e-9);
  const layers: { item: number; times: number }[] = [];
  for (const [item, { size, value, limit }] of items.entries()) {
    if (!(value > 0)) continue;
    for (let left = Math.min(limit, Math.floor(room / size)), times = 1; left > 0; times *= 2) {
      layers.push({ item, times: Math.min(times, left) });
      left -= times;
    }
  }
  const values = new Float64Array(steps + 1).fill(-1);
  const used = new Float64Array(steps + 1);
  values[0] = 0;
  const before = new Int32Array(layers.length * (steps + 1)).fill(-1);
  for (const [layer, { item, times }] of layers.entries()) {
    const size = items[item]!.size * times;
    const value = items[item]!.value * times;
    const base = layer * (steps + 1);
    for (let from = Math.floor((room - size) / step + 1e-9); from >= 0; from--) {
      if (values[from]! < 0) continue;
      const end = used[from]! + size;
      if (end > room) continue;
      const at = Math.floor(end / step + 1e-9);
      if (at <= from) continue;
      const worth = values[from]! + value;
      if (worth > values[at]! || (worth === values[at]! && end < used[at]!)) {
        values[at] = worth;
        used[at] = end;
        before[base + at] = from;
      }
    }
  }
  let at = 0;
  for (let i = 1; i <= steps; i++) if (values[i]! > values[at]!) at = i;
  const counts = new Int32Array(items.length);
  for (let layer = layers.length - 1; layer >= 0; layer--) {
    const from = before[layer * (steps + 1) + at]!;
    if (from < 0) continue;
    counts[layers[layer]!.item]! += layers[layer]!.times;
    at = from;
  }
  return counts;
}
