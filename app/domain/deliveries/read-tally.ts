import type { LengthUnit } from "#app/core/lengths/length-unit.ts";
import { type RowField, readRow, type TallyLine } from "./tally.ts";
import type { NumberedRow } from "./tally-text.ts";

/** What is wrong with a line of a tally, and what would be right. */
export interface TallyProblem {
  lineNumber: number;
  field: RowField;
  message: string;
}

/** Reads a whole tally before it is saved: every line, or what is wrong with those that cannot be read. Blank rows say nothing. */
export function readTally(
  rows: NumberedRow[],
  unit: LengthUnit,
): { ok: true; lines: TallyLine[] } | { ok: false; problems: TallyProblem[] } {
  const lines: TallyLine[] = [];
  const problems: TallyProblem[] = [];
  for (const { lineNumber, row } of rows) {
    const read = readRow(row, unit);
    if (read.state === "line") lines.push(read.line);
    if (read.state === "wrong")
      for (const [field, message] of Object.entries(read.wrong))
        problems.push({ lineNumber, field: field as RowField, message });
  }
  return problems.length > 0 ? { ok: false, problems } : { ok: true, lines };
}
