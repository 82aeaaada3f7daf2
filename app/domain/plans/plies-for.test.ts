import { describe, expect, test } from "vitest";
import { pliesFor } from "./plies-for.ts";

const inch = 25.4;
const shop = { allowanceThicknessMm: inch / 4, jointPerFaceMm: inch / 16 };

describe("pliesFor", () => {
  test("common practice, no source: a leg of 1 1/2 in is two plies of 4/4", () => {
    expect(pliesFor(1.5 * inch, [4], shop)).toEqual({ quarters: 4, plies: 2 });
  });

  test("of two plies of 4/4 and one of 8/4, as much wood, the single one is taken", () => {
    expect(pliesFor(1.5 * inch, [4, 8], shop)).toEqual({ quarters: 8, plies: 1 });
  });

  test("4/4 cleans to 3/4 (common practice), and 5/4 is not opened for it", () => {
    expect(pliesFor(0.75 * inch, [4, 5, 8], shop)).toEqual({ quarters: 4, plies: 1 });
  });

  test("what no stock can make is said", () => {
    expect(pliesFor(40 * inch, [4, 8], shop)).toBeNull();
    expect(pliesFor(inch, [], shop)).toBeNull();
  });
});
