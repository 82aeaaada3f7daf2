import { requireWithin } from "#app/core/moisture/accepted-range.ts";
import { alternatingRounder } from "./alternating-rounder.ts";
import type { MeasuredBoard } from "./measured-board.ts";
import { boardFeet, type LengthRule, surfaceMeasureFt2 } from "./surface-measure.ts";
import { volumeM3 } from "./true-volume.ts";

/** Boards alike, as one line of a tally. */
export interface TallyLine extends MeasuredBoard {
  /** How many; 1 unless told. */
  count?: number;
}

/** What a tally or one of its lines comes to. */
export interface Measure {
  count: number;
  /** Surface measure, each board rounded to whole ft2. The trade's figure, which wins a dispute (NHLA Rules Corner). */
  surfaceMeasureFt2: number;
  /** Surface measure x nominal thickness. */
  boardFeet: number;
  /** Board feet of the sizes as measured, neither lengths nor surface measures rounded. */
  unroundedBoardFeet: number;
  /** True volume: by measured thickness where there is one, else the nominal. */
  volumeM3: number;
}

export interface Tally extends Measure {
  /** Each line's own measure, in the order given. */
  lines: Measure[];
}

export interface TallyOptions {
  /** Whether lengths count down to whole feet before the surface measure; they do unless told. */
  lengths?: LengthRule;
}

const nothing: Measure = { count: 0, surfaceMeasureFt2: 0, boardFeet: 0, unroundedBoardFeet: 0, volumeM3: 0 };

/**
 * Tallies a lot by surface measure, board by board. Exact half feet go alternately up and down among the boards of one
 * thickness, which are tallied together; so the total does not depend on the order of the lines.
 *
 * @throws RangeError for a size, quarters or count that is none.
 */
export function tally(lines: readonly TallyLine[], { lengths = "whole feet" }: TallyOptions = {}): Tally {
  const rounders = new Map<number, (value: number) => number>();
  const measures = lines.map((line) => {
    const round = rounders.get(line.quarters) ?? alternatingRounder();
    rounders.set(line.quarters, round);
    return measureLine(line, lengths, round);
  });
  return { ...measures.reduce(add, nothing), lines: measures };
}

function measureLine(line: TallyLine, lengths: LengthRule, round: (value: number) => number): Measure {
  const count = requireCount(line.count ?? 1);
  const each = surfaceMeasureFt2(line, lengths);
  let surface = 0;
  for (let board = 0; board < count; board++) surface += round(each);
  return {
    count,
    surfaceMeasureFt2: surface,
    boardFeet: boardFeet(surface, line.quarters),
    unroundedBoardFeet: boardFeet(count * surfaceMeasureFt2(line, "as measured"), line.quarters),
    volumeM3: count * volumeM3(line),
  };
}

function add(a: Measure, b: Measure): Measure {
  return {
    count: a.count + b.count,
    surfaceMeasureFt2: a.surfaceMeasureFt2 + b.surfaceMeasureFt2,
    boardFeet: a.boardFeet + b.boardFeet,
    unroundedBoardFeet: a.unroundedBoardFeet + b.unroundedBoardFeet,
    volumeM3: a.volumeM3 + b.volumeM3,
  };
}

/** A whole number of boards from 0 to 100,000, refused with a RangeError otherwise. */
export function requireCount(count: number): number {
  if (!Number.isInteger(count)) throw new RangeError(`A count of boards must be a whole number; got ${count}.`);
  return requireWithin("A count of boards", count, 0, 100_000);
}
