import type { BoardLayout } from "#app/core/planning/layout.ts";
import type { BoardSummary } from "#app/domain/boards/board.ts";
import type { StretchOfBoard } from "./plan-problem.ts";

/** A board of a plan: what is cut from which stretch of it, and what of it is to be held. Pieces carry their part's name. */
export interface PlannedBoard {
  board: BoardSummary;
  stretch: StretchOfBoard;
  layout: BoardLayout;
  holds: StretchOfBoard;
}

/** A plan as the page shows it; money in minor units. */
export interface MadePlan {
  cost: number;
  /** No plan of all that can be placed costs less. */
  bound: number;
  gap: number;
  boards: PlannedBoard[];
  unplaced: { part: string; quantity: number; why: string }[];
  /** Parts that no thickness on the rack makes. */
  unmade: string[];
}
