import { describe, expect, it } from "vitest";
import { changeGrid, type Grid, type GridAction, openGrid, settled } from "./tally-rows.ts";

const carried = { quarters: "4", species: "white-oak" };
const empty = () => openGrid([], carried);
const run = (grid: Grid, ...actions: GridAction[]) => actions.reduce(changeGrid, grid);
const sizes = (grid: Grid) => grid.rows.map(({ count, width, length }) => [count, width, length].join("|"));
const type = (key: number, field: "count" | "width" | "length" | "quarters" | "species", value: string) =>
  ({ do: "type", key, field, value }) as const;

describe("the grid of a tally", () => {
  it("begins with one blank row that says what the delivery says", () => {
    expect(empty().rows).toEqual([{ count: "", width: "", length: "", ...carried, key: 0 }]);
  });

  it("has a blank row for the next board as soon as something is typed, quarters and species carried down", () => {
    const grid = run(empty(), type(0, "quarters", "8"), type(0, "species", "black-walnut"), type(0, "width", "7"));
    expect(sizes(grid)).toEqual(["|7|", "||"]);
    expect(grid.rows[1]).toMatchObject({ quarters: "8", species: "black-walnut" });
  });

  it("carries quarters chosen afterwards to the blank row below, and to no row with a board in it", () => {
    const two = run(empty(), type(0, "width", "7"), type(1, "width", "8"), type(1, "quarters", "5"));
    expect(two.rows.map(({ quarters }) => quarters)).toEqual(["4", "5", "5"]);
    expect(changeGrid(two, type(0, "quarters", "6")).rows.map(({ quarters }) => quarters)).toEqual(["6", "5", "5"]);
  });

  it("puts a whole size typed in the width's box where it belongs when the box is left", () => {
    const grid = run(empty(), type(0, "width", "3 @ 8 x 10"), { do: "settle", key: 0, unit: "in" });
    expect(sizes(grid)).toEqual(["3|8|10'", "||"]);
    expect(settled({ ...carried, count: "", width: "210 x 3050", length: "" }, "in")).toMatchObject({
      width: "210 mm",
      length: "3050 mm",
    });
  });

  it("leaves a blank row blank", () => {
    expect(sizes(run(empty(), { do: "settle", key: 0, unit: "in" }))).toEqual(["||"]);
  });

  it("takes a row away and brings it back to its place", () => {
    const three = run(empty(), type(0, "width", "7"), type(1, "width", "8"), type(2, "width", "9"));
    const two = changeGrid(three, { do: "remove", key: 1 });
    expect(sizes(two)).toEqual(["|7|", "|9|", "||"]);
    expect(sizes(changeGrid(two, { do: "bring back" }))).toEqual(["|7|", "|8|", "|9|", "||"]);
    expect(changeGrid(three, { do: "remove", key: 3 })).toBe(three);
  });

  it("takes several pasted lines at once", () => {
    const grid = run(empty(), { do: "paste", key: 0, text: "8 x 10'\n2 @ 7 x 9', 5/4\n" });
    expect(sizes(grid)).toEqual(["|8|10'", "2|7|9'", "||"]);
    expect(grid.rows.at(-1)?.quarters).toBe("5");
    const more = run(grid, { do: "paste", key: grid.rows[0]!.key, text: "6 x 8'" });
    expect(sizes(more)).toEqual(["|8|10'", "|6|8'", "2|7|9'", "||"]);
    expect(new Set(more.rows.map(({ key }) => key)).size).toBe(4);
  });

  it("goes on from a kept tally", () => {
    const kept = [{ count: "2", width: "8", length: "10'", quarters: "8", species: "white-oak" }];
    const grid = changeGrid(empty(), { do: "replace", rows: [...kept, ...kept], carried });
    expect(sizes(grid)).toEqual(["2|8|10'", "2|8|10'", "||"]);
    expect(grid.rows[2]?.quarters).toBe("8");
  });
});
