import type { LengthUnit } from "#app/core/lengths/length-unit.ts";
import { isBlank, mostRows, type RowField, spread, type TallyRow } from "./tally.ts";
import { spellOut } from "./tally-size.ts";
import { readTallyText } from "./tally-text.ts";

type Carried = Pick<TallyRow, "quarters" | "species">;

/** A row on the screen; its key stays while rows come and go. */
export interface GridRow extends TallyRow {
  key: number;
}

/** The rows of a tally being typed. The last one is always blank: where the next board goes. */
export interface Grid {
  rows: GridRow[];
  nextKey: number;
  /** The row deleted last, and where it stood, so that it can come back. */
  removed: { row: GridRow; index: number } | null;
}

export type GridAction =
  | { do: "type"; key: number; field: RowField; value: string }
  /** Somebody left a box: a whole size in it goes to its boxes, and bare figures say how they are read. */
  | { do: "settle"; key: number; unit: LengthUnit }
  | { do: "remove"; key: number }
  | { do: "bring back" }
  | { do: "paste"; key: number; text: string }
  | { do: "replace"; rows: TallyRow[]; carried: Carried };

/** The rows of a kept tally, ready to go on. */
export function openGrid(rows: TallyRow[], carried: Carried, firstKey = 0): Grid {
  const typed = rows.filter((row) => !isBlank(row));
  const numbered = typed.map((row, index) => ({ ...row, key: firstKey + index }));
  return withBlankLast({ rows: numbered, nextKey: firstKey + numbered.length, removed: null }, carried);
}

/** A row as it is once its box is left. */
export function settled<Row extends TallyRow>(row: Row, unit: LengthUnit): Row {
  const spreadRow = { ...row, ...spread(row) };
  return isBlank(spreadRow) ? row : { ...spreadRow, ...spellOut(spreadRow.width, spreadRow.length, unit) };
}

/** What one thing done to the grid makes of it. Pure, as a reducer is. */
export function changeGrid(grid: Grid, action: GridAction): Grid {
  switch (action.do) {
    case "type":
      return withBlankLast(carryDown(grid, action));
    case "settle":
      return withBlankLast(mapRow(grid, action.key, (row) => settled(row, action.unit)));
    case "remove": {
      const index = grid.rows.findIndex(({ key }) => key === action.key);
      const row = grid.rows[index];
      if (!row || isBlank(row)) return grid;
      return withBlankLast({ ...grid, rows: grid.rows.toSpliced(index, 1), removed: { row, index } });
    }
    case "bring back": {
      if (!grid.removed) return grid;
      const { row, index } = grid.removed;
      return { ...grid, rows: grid.rows.toSpliced(index, 0, row), removed: null };
    }
    case "paste":
      return pasteLines(grid, action.key, action.text);
    case "replace":
      return openGrid(action.rows, action.carried, grid.nextKey);
  }
}

function mapRow(grid: Grid, key: number, change: (row: GridRow) => GridRow): Grid {
  return { ...grid, rows: grid.rows.map((row) => (row.key === key ? change(row) : row)) };
}

/** Quarters and species chosen on the last board hold for the next, which is still blank. */
function carryDown(grid: Grid, { key, field, value }: { key: number; field: RowField; value: string }): Grid {
  const typed = mapRow(grid, key, (row) => ({ ...row, [field]: value }));
  const index = typed.rows.findIndex((row) => row.key === key);
  const next = typed.rows[index + 1];
  if (!next || !isBlank(next) || (field !== "quarters" && field !== "species")) return typed;
  return mapRow(typed, next.key, (row) => ({ ...row, [field]: value }));
}

function withBlankLast(grid: Grid, carried?: Carried): Grid {
  const last = grid.rows.at(-1);
  if ((last && isBlank(last)) || grid.rows.length >= mostRows) return grid;
  const { quarters, species } = last ?? carried ?? { quarters: "", species: "" };
  const blank: GridRow = { count: "", width: "", length: "", quarters, species, key: grid.nextKey };
  return { ...grid, rows: [...grid.rows, blank], nextKey: grid.nextKey + 1 };
}

/** Pasted lines take the place of a blank row, or follow one with something in it. */
function pasteLines(grid: Grid, key: number, text: string): Grid {
  const index = grid.rows.findIndex((row) => row.key === key);
  const at = grid.rows[index];
  if (!at) return grid;
  const lines = readTallyText(text, at).slice(0, mostRows - grid.rows.length);
  const rows = lines.map(({ row }, offset) => ({ ...row, key: grid.nextKey + offset }));
  const blank = isBlank(at);
  return withBlankLast({
    ...grid,
    rows: grid.rows.toSpliced(blank ? index : index + 1, blank ? 1 : 0, ...rows),
    nextKey: grid.nextKey + rows.length,
  });
}
