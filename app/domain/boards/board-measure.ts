import type { MeasuredBoard } from "#app/core/measure/measured-board.ts";
import { boardFeet, surfaceMeasureFt2 } from "#app/core/measure/surface-measure.ts";

/** Board feet of one board, not rounded: a tally rounds as the trade does, one board's page does not. */
export function boardMeasure(board: MeasuredBoard): number {
  return boardFeet(surfaceMeasureFt2(board, "as measured"), board.quarters);
}

/** "6.42 bf". */
export function printBoardFeet(boardFeet: number): string {
  return `${boardFeet.toFixed(boardFeet < 100 ? 2 : 0)} bf`;
}
