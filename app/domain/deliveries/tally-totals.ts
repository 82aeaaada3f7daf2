import type { LengthUnit } from "#app/core/lengths/length-unit.ts";
import { type Measure, type Tally, tally } from "#app/core/measure/tally.ts";
import { readRow, type TallyRow } from "./tally.ts";

/** What a tally comes to so far. */
export interface TallyTotals extends Omit<Tally, "lines"> {
  /** Each row's own measure, in order; null where the row is blank or cannot be read yet and so is in no figure. */
  rows: (Measure | null)[];
  /** Rows with something typed that cannot be read yet. */
  unread: number;
}

/** Adds up the rows that can be read, as the trade rounds. */
export function totalRows(rows: TallyRow[], unit: LengthUnit): TallyTotals {
  const read = rows.map((row) => readRow(row, unit));
  const { lines, ...totals } = tally(read.flatMap((row) => (row.state === "line" ? [row.line] : [])));
  const measures = lines[Symbol.iterator]();
  return {
    ...totals,
    rows: read.map((row) => (row.state === "line" ? (measures.next().value ?? null) : null)),
    unread: read.filter((row) => row.state === "wrong").length,
  };
}
