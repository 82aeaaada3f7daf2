import type { Problem, RingWindow } from "./problem.ts";

/** Lengths inside the planner are whole counts of this part of a millimetre, so that sums are exact. */
export const UNITS_PER_MM = 1e6;

export function toUnits(lengthMm: number): number {
  return Math.round(lengthMm * UNITS_PER_MM);
}

/** One way a kind of piece may lie: along the board, or turned if its part allows. */
export interface Pose {
  length: number;
  width: number;
}

/** All pieces that are alike, whichever part they belong to. */
export interface Kind {
  index: number;
  poses: Pose[];
  window: RingWindow | undefined;
  /** Pieces needed, plies counted; a multiple of `group`. */
  demand: number;
  /** So many pieces at a time must come from one board. */
  group: number;
  /** In square units. */
  area: number;
  parts: { id: string; pieces: number }[];
}

/** All boards that are alike. Lengths in units, from the near corner inside the trims. */
export interface Stock {
  index: number;
  ids: string[];
  length: number;
  width: number;
  /** Cost and charges of opening it. */
  cost: number;
  /** Money back per square unit of offcut. */
  credit: number;
  ringsDeg: number[] | undefined;
  /** Width across which the rings are given, and where the usable width begins in it. */
  fullWidth: number;
  edgeTrim: number;
  defects: { x: number; y: number; length: number; width: number }[];
  /** By kind: whether a piece of it may come from here at all. */
  eligible: boolean[];
}

/** The problem in the planner's own form. */
export interface Task {
  problem: Problem;
  kerf: number;
  minOffcut: Pose;
  stages: 2 | 3;
  kinds: Kind[];
  stocks: Stock[];
}
