/** A piece as it lies on its board: x along the length, y across the width, from the board's own corner. Millimetres. */
export interface PlacedPiece {
  part: string;
  x: number;
  y: number;
  /** Along the board; a rotated piece has its part's width here. */
  length: number;
  width: number;
}

/** What is left over and large enough to keep. */
export interface Offcut {
  x: number;
  y: number;
  length: number;
  width: number;
}

/** A saw line, in the order of sawing. The saw takes from `at` to `at` + kerf, or what is left there if that is less. */
export interface Cut {
  kind: "crosscut" | "rip";
  /** 1 divides the board, 2 what the first left, and so on; trims to size come last. */
  stage: number;
  /** x of a crosscut, y of a rip. */
  at: number;
  /** Where across (crosscut) or along (rip) the board the line runs. */
  from: number;
  to: number;
}

export interface BoardLayout {
  id: string;
  /** The board's cost and charges less what its offcuts are worth. */
  cost: number;
  pieces: PlacedPiece[];
  cuts: Cut[];
  offcuts: Offcut[];
}

/** What bars a part from every board, or from those that are left. */
export type UnplacedReason =
  | "length"
  | "width"
  | "species"
  | "quarters"
  | "grain"
  | "defects"
  | "boards"
  | "not-enough";

export interface UnplacedPart {
  part: string;
  /** Pieces, plies counted. */
  quantity: number;
  reason: UnplacedReason;
  /** The same in a sentence. */
  why: string;
}

/**
 * optimal: everything is placed and no plan costs less. feasible: everything is placed; cost may be up to `gap` above the
 * best possible. short: some pieces are unplaced; the rest is planned.
 */
export type PlanStatus = "optimal" | "feasible" | "short";

export interface Plan {
  status: PlanStatus;
  cost: number;
  /** No plan of all that is placeable costs less than this. */
  bound: number;
  /** (cost − bound) / cost; 0 when optimal. */
  gap: number;
  boards: BoardLayout[];
  unplaced: UnplacedPart[];
}
