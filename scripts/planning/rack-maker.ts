import { sequence } from "#app/core/planning/number-sequence.ts";
import type { ProblemInput } from "#app/core/planning/problem.ts";

export interface RackSize {
  seed: number;
  boards: number;
  /** Kinds of parts. */
  parts: number;
  /** Pieces in all, at least one of each part. */
  pieces: number;
  timeLimit: number;
  /** Rings on each board and windows on every third part, defects on every fifth board. */
  grain?: boolean;
}

const LOTS = 8;

const round = (value: number, step: number) => Math.round(value / step) * step;

/** A rack such as a furniture shop has, and a project's parts to be cut from it: the same for the same seed. */
export function makeRack({ seed, boards, parts, pieces, timeLimit, grain = false }: RackSize): ProblemInput {
  const random = sequence(seed);
  const between = (low: number, high: number) => low + (high - low) * random();
  // A shop buys by the lot, at one price for its area.
  const prices = Array.from({ length: LOTS }, () => between(0.9, 1.15));
  const rack: ProblemInput["boards"] = Array.from({ length: boards }, (_, i) => {
    const length = round(between(1800, 3700), 5);
    const width = round(between(110, 300), 2);
    const lot = Math.floor(between(0, LOTS));
    const cost = round((length * width * prices[lot]!) / 12_000, 0.01);
    const tilt = between(-60, 60);
    const middle = between(10, 80);
    return {
      id: `b${i + 1}`,
      lot: `lot ${lot + 1}`,
      length,
      width,
      cost: Number(cost.toFixed(2)),
      ...(grain && {
        rings: Array.from({ length: 9 }, (_, s) => Math.min(90, Math.max(0, middle + tilt * (s / 8 - 0.5)))),
        defects:
          i % 5 === 0 ? [{ x: between(0, length - 60), y: between(0, width - 30), length: 60, width: 30 }] : undefined,
      }),
    };
  });
  const wanted: ProblemInput["parts"] = Array.from({ length: parts }, (_, i) => ({
    id: `p${i + 1}`,
    quantity: Math.max(1, Math.round(pieces / parts)),
    length: round(between(180, 1100), 1),
    width: round(between(28, 105), 1),
    ...(grain && i % 3 === 0 && { rings: { min: 25, max: 65, share: 0.8 } }),
    ...(grain && i % 7 === 0 && { plies: 2, sameBoard: true }),
  }));
  return {
    kerf: 3.2,
    endTrim: 20,
    edgeTrim: 4,
    minOffcut: { length: 300, width: 50 },
    offcutCredit: 0,
    boardCharge: 0,
    stages: 2,
    timeLimit,
    boards: rack,
    parts: wanted,
  };
}
