interface Measured {
  quarters: number;
  widthMm: number;
  widthFarMm: number | null;
  lengthMm: number;
}

const mmPerInch = 25.4;

/**
 * Board feet of one board, not rounded: nominal thickness (under 4/4 counts as 1 in), width in inches, length in feet. A tapered board counts its
 * width one third of the length from the narrow end (NHLA, from memory). Tallies round as the trade rounds; one board's page does not.
 */
export function boardMeasure({ quarters, widthMm, widthFarMm, lengthMm }: Measured): number {
  const far = widthFarMm ?? widthMm;
  const narrow = Math.min(widthMm, far);
  const width = narrow + Math.abs(widthMm - far) / 3;
  return ((Math.max(4, quarters) / 4) * (width / mmPerInch) * (lengthMm / mmPerInch)) / 144;
}

/** "6.42 bf". */
export function printBoardFeet(boardFeet: number): string {
  return `${boardFeet.toFixed(boardFeet < 100 ? 2 : 0)} bf`;
}
