import { type Entry, entriesOf, type Grid, otherWay, room, type Way } from "./axes.ts";
import { type BandTable, compose, threeStageBands, twoStageBands } from "./band-table.ts";
import type { RowBlock } from "./block.ts";
import { type Band, fillPlacedBand, fillPlainBand } from "./fill-band.ts";
import { fillStackedBand } from "./fill-stacked.ts";
import { type Pattern, patternOf } from "./pattern.ts";
import { makeRowTable } from "./row-table.ts";
import { nextStart, startsAcross } from "./starts.ts";
import type { Stock, Task } from "./task.ts";

/** Cuts up boards for pieces of given worth. Holds what is the same for every call. */
export class Carver {
  private readonly entries = new Map<string, Record<Way, Entry[]>>();

  constructor(
    private readonly task: Task,
    private readonly grid: Grid,
  ) {}

  entriesFor(stock: Stock): Record<Way, Entry[]> {
    const key = stock.eligible.map((is) => (is ? 1 : 0)).join("");
    let found = this.entries.get(key);
    if (!found) {
      found = { x: entriesOf(this.task, stock.eligible, "x"), y: entriesOf(this.task, stock.eligible, "y") };
      this.entries.set(key, found);
    }
    return found;
  }

  /**
   * A pattern that takes as much worth out of a board as can be found, over its cost; null when it can take nothing.
   *
   * @param values worth of a piece of each kind.
   * @param limits pieces of each kind that may be taken.
   */
  carve(stock: Stock, values: ArrayLike<number>, limits: ArrayLike<number>): Pattern | null {
    let best: Pattern | null = null;
    let most = Number.NEGATIVE_INFINITY;
    const offer = (bands: Band[], way: Way) => {
      if (bands.length === 0) return;
      const pattern = patternOf(this.task, stock, { way, cells: bands.map(toCell(way)) });
      const gain = pattern.counts.reduce((sum, [kind, count]) => sum + count * values[kind]!, 0) - pattern.cost;
      if (gain > most + 1e-9) {
        most = gain;
        best = pattern;
      }
    };
    const plain = isPlain(this.task, stock);
    for (const way of ["y", "x"] as const) {
      offer(this.wholeBlanks(stock, way, values, limits, 2), way);
      if (plain && this.task.stages === 3) offer(this.wholeBlanks(stock, way, values, limits, 3), way);
    }
    return best;
  }

  /** Carves until no blank of several plies of one board is left in part. */
  private wholeBlanks(stock: Stock, way: Way, values: ArrayLike<number>, limits: ArrayLike<number>, stages: 2 | 3) {
    const { kinds } = this.task;
    const most = Array.from(limits);
    for (;;) {
      const bands = this.carveOneWay(stock, way, values, most, stages);
      const counts = countPieces(bands);
      const partial = [...counts].filter(([kind, count]) => count % kinds[kind]!.group !== 0);
      if (partial.length === 0) return bands;
      for (const [kind, count] of partial) most[kind] = count - (count % kinds[kind]!.group);
    }
  }

  private carveOneWay(stock: Stock, way: Way, values: ArrayLike<number>, limits: number[], stages: 2 | 3): Band[] {
    const { task } = this;
    const left = limits.slice();
    const { across, along } = room(task, stock, way);
    const all = this.entriesFor(stock)[way].filter(
      ({ kind, band, cell }) => left[kind]! > 0 && values[kind]! > 0 && band <= across && cell <= along,
    );
    const plain = isPlain(task, stock);
    const wanted = { values, limits: left };
    const bands: Band[] = [];
    for (let at = 0; ; ) {
      const entries = all.filter(({ kind, band }) => left[kind]! > 0 && at + band <= across);
      if (entries.length === 0) break;
      const made = plain
        ? this.nextPlainBands(stock, way, at, entries, wanted, stages)
        : this.nextPlacedBand(stock, way, at, entries, wanted);
      if (made.length === 0) break;
      bands.push(...made);
      const last = made.at(-1)!;
      at = last.at + last.size + task.kerf;
    }
    return bands;
  }

  /**
   * Plans all bands of the room that is left, and makes them as long as they turn out nearly as good as planned: pieces are
   * then fewer, and what is best has to be planned anew.
   */
  private nextPlainBands(
    stock: Stock,
    way: Way,
    from: number,
    entries: Entry[],
    wanted: Wanted,
    stages: 2 | 3,
  ): Band[] {
    const { task, grid } = this;
    const { across, along } = room(task, stock, way);
    const acrossStep = grid[way];
    const alongStep = { longest: along, step: grid[otherWay(way)] };
    const acrossLeft = { longest: across - from, step: acrossStep };
    const table =
      stages === 2
        ? twoStageBands(entries, wanted.values, wanted.limits, alongStep)
        : this.stackedTable(stock, way, wanted, acrossLeft, alongStep);
    const bands: Band[] = [];
    let at = from;
    for (const { size, value } of plannedBands(table, along, acrossLeft)) {
      if (at + size > across) continue;
      const slack = stages === 2 ? 0 : acrossStep * 0.999;
      const within = entries.filter(({ kind, band }) => band <= size + slack && wanted.limits[kind]! > 0);
      const band =
        stages === 2
          ? fillPlainBand(task, stock, way, at, within, wanted, alongStep.step / FILL_STEPS)
          : fillStackedBand(
              task,
              way,
              { at, across: Math.min(across - at, size + slack), along },
              within,
              wanted,
              grid,
            );
      if (!band || (bands.length > 0 && band.value < NEARLY * value)) break;
      bands.push(band);
      for (const [kind, count] of countPieces([band])) wanted.limits[kind]! -= count;
      at = band.at + band.size + task.kerf;
    }
    return bands;
  }

  private stackedTable(
    stock: Stock,
    way: Way,
    { values, limits }: Wanted,
    across: { longest: number; step: number },
    along: { longest: number; step: number },
  ): BandTable {
    const stacks = makeRowTable(this.entriesFor(stock)[otherWay(way)], values, limits, across.longest, across.step);
    return threeStageBands(stacks, across, along);
  }

  /** Where places differ: the band that is worth most together with all that could follow it, were places alike. */
  private nextPlacedBand(stock: Stock, way: Way, at: number, entries: Entry[], wanted: Wanted): Band[] {
    const { task, grid } = this;
    const { across, along } = room(task, stock, way);
    const acrossLeft = { longest: across - at, step: grid[way] };
    const alongStep = { longest: along, step: grid[otherWay(way)] };
    const rest = compose(twoStageBands(entries, wanted.values, wanted.limits, alongStep), along, acrossLeft).values;
    const restAt = (place: number) => rest[Math.max(0, Math.floor((across - place) / acrossLeft.step + 1e-9))] ?? 0;
    let best: Band | null = null;
    let most = 1e-12;
    for (const place of bandPlaces(task, stock, way, at, entries)) {
      const able = way === "x" ? entries : entries.filter(({ kind, pose }) => startsAt(task, stock, kind, pose, place));
      const table = twoStageBands(able, wanted.values, wanted.limits, alongStep);
      const promising = table.bands
        .map((size, band) => ({ size, promise: table.valueAt(band, along) + restAt(place + size) }))
        .filter(({ size }) => place + size <= across)
        .sort((a, b) => b.promise - a.promise || a.size - b.size)
        .slice(0, PLACED_TRIALS);
      for (const { size, promise } of promising) {
        if (promise <= most) break;
        const within = worthiest(able, size, wanted.values);
        const band = fillPlacedBand(
          task,
          stock,
          way,
          place,
          within,
          wanted,
          Math.max(alongStep.step, along / PLACED_STEPS),
        );
        if (!band) continue;
        const worth = band.value + restAt(place + band.size + task.kerf);
        if (worth > most) {
          most = worth;
          best = band;
        }
      }
    }
    if (!best) return [];
    for (const [kind, count] of countPieces([best])) wanted.limits[kind]! -= count;
    return [best];
  }
}

/** A band worth less than this part of what was planned calls for a new plan. */
const NEARLY = 0.97;
/** Lines are filled by finer steps than planned by. */
const FILL_STEPS = 2;

interface Wanted {
  values: ArrayLike<number>;
  limits: number[];
}

const PLACED_TRIALS = 2;
const PLACED_STEPS = 160;
const PLACED_ENTRIES = 50;
const PLACES = 6;

/** Whether every place on a board is as good as any other for all that it may give. */
export function isPlain(task: Task, stock: Stock): boolean {
  return stock.defects.length === 0 && !task.kinds.some((kind) => kind.window && stock.eligible[kind.index]);
}

/** The bands worth most together, the one worth most for its size first. */
function plannedBands(table: BandTable, along: number, across: { longest: number; step: number }) {
  const { first } = compose(table, along, across);
  const bands: { size: number; value: number }[] = [];
  for (let at = first.length - 1; at > 0 && first[at]! >= 0; ) {
    const band = first[at]!;
    const size = table.bands[band]!;
    bands.push({ size, value: table.valueAt(band, along) });
    at -= Math.max(1, Math.floor(size / across.step + 1e-9));
  }
  return bands.sort((a, b) => b.value / b.size - a.value / a.size || b.size - a.size);
}

/** The entries that fit a band and are worth most for the room they take in it. */
function worthiest(entries: Entry[], size: number, values: ArrayLike<number>): Entry[] {
  const fitting = entries.filter(({ band }) => band <= size);
  if (fitting.length <= PLACED_ENTRIES) return fitting;
  const worth = ({ kind, cell }: Entry) => values[kind]! / cell;
  return fitting.sort((a, b) => worth(b) - worth(a) || a.kind - b.kind).slice(0, PLACED_ENTRIES);
}

/** Places where the next band may begin: here, and where a window opens or a defect ends further on. */
function bandPlaces(task: Task, stock: Stock, way: Way, at: number, entries: Entry[]): number[] {
  const places = new Set([at]);
  if (way === "y")
    for (const { kind, pose } of entries) {
      const next = nextStart(startsAcross(stock, task.kinds[kind]!, pose), at);
      if (Number.isFinite(next)) places.add(next);
    }
  for (const defect of stock.defects) {
    const end = way === "y" ? defect.y + defect.width : defect.x + defect.length;
    if (end > at) places.add(end);
  }
  return [...places].sort((a, b) => a - b).slice(0, PLACES);
}

function startsAt(task: Task, stock: Stock, kind: number, pose: Entry["pose"], y: number): boolean {
  return nextStart(startsAcross(stock, task.kinds[kind]!, pose), y) === y;
}

function toCell(way: Way): (band: Band) => RowBlock["cells"][number] {
  return ({ at, size, cells }) => ({ at, size, block: { way: way === "y" ? "x" : "y", cells } });
}

function countPieces(bands: Band[]): Map<number, number> {
  const counts = new Map<number, number>();
  const visit = (cells: RowBlock["cells"]) => {
    for (const { block } of cells)
      if ("kind" in block) counts.set(block.kind, (counts.get(block.kind) ?? 0) + 1);
      else visit(block.cells);
  };
  for (const { cells } of bands) visit(cells);
  return counts;
}
