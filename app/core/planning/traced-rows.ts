import type { Entry } from "./axes.ts";

/** Rows of pieces by level and length as in a row table, with the pieces of each. Sizes are rounded to the nearest step. */
export class TracedRows {
  readonly levels: number[] = [];
  private readonly steps: number;
  private readonly layers: { kind: number; times: number; size: number }[] = [];
  private readonly layersTo: number[] = [];
  private readonly values: Float64Array;
  private readonly taken: Uint8Array;

  constructor(
    entries: Entry[],
    values: ArrayLike<number>,
    limits: ArrayLike<number>,
    longest: number,
    private readonly step: number,
  ) {
    this.steps = Math.floor(longest / step + 1e-9);
    const width = this.steps + 1;
    for (const { kind, cell, band } of entries) {
      if (!(values[kind]! > 0)) continue;
      const size = Math.max(1, Math.round(cell / step));
      if (this.levels.at(-1) !== band) this.levels.push(band);
      for (let left = Math.min(limits[kind]!, Math.floor(this.steps / size)), times = 1; left > 0; times *= 2) {
        this.layers.push({ kind, times: Math.min(times, left), size: size * Math.min(times, left) });
        left -= times;
      }
      this.layersTo[this.levels.length - 1] = this.layers.length;
    }
    this.values = new Float64Array(this.levels.length * width);
    this.taken = new Uint8Array(this.layers.length * width);
    const best = new Float64Array(width);
    let layer = 0;
    for (let level = 0; level < this.levels.length; level++) {
      for (; layer < this.layersTo[level]!; layer++) {
        const { kind, times, size } = this.layers[layer]!;
        const value = values[kind]! * times;
        const base = layer * width;
        for (let at = this.steps; at >= size; at--) {
          const other = best[at - size]! + value;
          if (other > best[at]!) {
            best[at] = other;
            this.taken[base + at] = 1;
          }
        }
      }
      this.values.set(best, level * width);
    }
  }

  valueAt(level: number, length: number): number {
    return this.values[level * (this.steps + 1) + this.place(length)]!;
  }

  /** Adds the pieces of a row to counts by kind. */
  addPieces(level: number, length: number, counts: Map<number, number>): void {
    let at = this.place(length);
    for (let layer = this.layersTo[level]! - 1; layer >= 0; layer--) {
      if (!this.taken[layer * (this.steps + 1) + at]) continue;
      const { kind, times, size } = this.layers[layer]!;
      counts.set(kind, (counts.get(kind) ?? 0) + times);
      at -= size;
    }
  }

  private place(length: number): number {
    return Math.min(this.steps, Math.max(0, Math.floor(length / this.step + 1e-9)));
  }
}
