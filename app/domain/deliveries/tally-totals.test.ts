import { describe, expect, it } from "vitest";
import { totalRows } from "./tally-totals.ts";

const row = (width: string, length: string, more: object = {}) => ({
  count: "",
  width,
  length,
  quarters: "4",
  species: "white-oak",
  ...more,
});

describe("what a tally comes to so far", () => {
  // NHLA 2023 p. 9 para. 18: surface measure × nominal thickness. 8 1/4 in × 10 ft is 6.9, so 7.
  it("counts every board of a repeat, and leaves out what cannot be read yet", () => {
    const rows = [row("8 1/4", "10'6", { quarters: "8" }), row("8", ""), row("", ""), row("6", "8", { count: "3" })];
    const totals = totalRows(rows, "in");
    expect(totals).toMatchObject({ count: 4, unread: 1, boardFeet: 14 + 3 * 4 });
    expect(totals.rows.map((measure) => measure?.boardFeet ?? null)).toEqual([14, null, null, 12]);
    expect(totals.unroundedBoardFeet).toBeCloseTo(14.4375 + 12, 6);
  });

  it("of nothing is nothing", () => {
    expect(totalRows([row("", "")], "in")).toMatchObject({ count: 0, boardFeet: 0, unread: 0, rows: [null] });
  });
});
