import type { LengthUnit } from "#app/core/lengths/length-unit.ts";
import type { ParsedLength } from "#app/core/lengths/parse-length.ts";
import { isSpeciesCode } from "#app/core/species/species.ts";
import { readSize, splitSize } from "./tally-size.ts";

/** One line of a tally, read: so many boards of one size. Lengths as measured, nothing rounded. */
export interface TallyLine {
  count: number;
  widthMm: number;
  /** Width at the far end, where the board tapers. */
  widthFarMm?: number;
  lengthMm: number;
  quarters: number;
  species: string;
}

/** One line of a tally as typed. An empty count is one. */
export interface TallyRow {
  count: string;
  width: string;
  length: string;
  /** "5" or "5/4". */
  quarters: string;
  /** A species' code. */
  species: string;
}

export type RowField = keyof TallyRow;

export type ReadRow =
  | { state: "blank" }
  | { state: "line"; line: TallyLine }
  | { state: "wrong"; wrong: Partial<Record<RowField, string>> };

/** More rows than a lorry holds: somebody pasted the wrong thing. */
export const mostRows = 1_000;
const mostBoardsPerRow = 500;
/** Boards that one tally makes at most: they are made in one transaction. */
export const mostBoardsAtOnce = 2_000;

const sizes = { leastWidthMm: 10, mostWidthMm: 1_500, leastLengthMm: 50, mostLengthMm: 12_000 };

/** A row nobody has typed a size into: quarters and species are carried down and say nothing. */
export function isBlank(row: TallyRow): boolean {
  return row.width.trim() === "" && row.length.trim() === "" && row.count.trim() === "";
}

/** A whole size typed into the width's box goes to the boxes it belongs to. */
export function spread(row: TallyRow): TallyRow {
  const split = splitSize(row.width);
  return split ? { ...row, ...split } : row;
}

/**
 * Reads a row as typed into a line, or says beside each box what is wrong and what would be right.
 *
 * @param unit the shop's.
 */
export function readRow(typed: TallyRow, unit: LengthUnit): ReadRow {
  if (isBlank(typed)) return { state: "blank" };
  const row = spread(typed);
  const size = readSize(row.width, row.length, unit);
  const count = row.count.trim() === "" ? 1 : wholeNumber(row.count);
  const quarters = wholeNumber(row.quarters.replace(/\s*\/\s*4\s*$/, ""));
  const wrong: Partial<Record<RowField, string>> = {};
  const note = (field: RowField, message: string | null) => {
    if (message && !wrong[field]) wrong[field] = message;
  };
  note("count", count >= 1 && count <= mostBoardsPerRow ? null : `How many alike: 1 to ${mostBoardsPerRow}.`);
  note("width", row.width.trim() === "" ? "Give the width." : widthFault(size.width));
  if (size.widthFar) note("width", widthFault(size.widthFar));
  note("length", row.length.trim() === "" ? "Give the length." : lengthFault(size.length));
  note("quarters", quarters >= 1 && quarters <= 40 ? null : "Choose the quarters.");
  note("species", isSpeciesCode(row.species) ? null : speciesFault(row.species));
  if (Object.keys(wrong).length > 0 || !size.width.ok || !size.length.ok) return { state: "wrong", wrong };
  const far = size.widthFar?.ok && size.widthFar.mm !== size.width.mm ? { widthFarMm: size.widthFar.mm } : {};
  return {
    state: "line",
    line: { count, widthMm: size.width.mm, ...far, lengthMm: size.length.mm, quarters, species: row.species },
  };
}

function wholeNumber(text: string): number {
  return /^\s*\d{1,6}\s*$/.test(text) ? Number(text) : Number.NaN;
}

function widthFault(width: ParsedLength): string | null {
  if (!width.ok) return width.why;
  if (width.mm < sizes.leastWidthMm) return "Too narrow for a board: check the width.";
  if (width.mm > sizes.mostWidthMm)
    return "Too wide for a board: the width comes first, then the length, as in 8 1/4 x 10'.";
  return null;
}

function lengthFault(length: ParsedLength): string | null {
  if (!length.ok) return length.why;
  if (length.mm < sizes.leastLengthMm) return "Too short for a board: check the length.";
  if (length.mm > sizes.mostLengthMm) return "Over 39 ft (12 m) long: check the length.";
  return null;
}

function speciesFault(typed: string): string {
  return typed.trim() === "" ? "Choose the species." : `No species is called “${typed.trim()}” here: choose it.`;
}
