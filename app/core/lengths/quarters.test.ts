import { describe, expect, it } from "vitest";
import { kilnDriedMinimumMm, kilnDriedMinimumWidthMm } from "./kiln-dried-minimum.ts";
import { nominalThicknessMm, printQuarters, surfacedThicknessMm } from "./quarters.ts";

describe("stock in quarters of an inch", () => {
  it("is written and measured in quarters", () => {
    expect(printQuarters(5)).toBe("5/4");
    expect(nominalThicknessMm(4)).toBe(25.4);
    expect(nominalThicknessMm(5)).toBe(31.75);
    expect(nominalThicknessMm(3)).toBe(19.05);
  });

  it.each([0, -4, Number.NaN, 41])("refuses %f quarters", (quarters) => {
    expect(() => nominalThicknessMm(quarters)).toThrow(RangeError);
  });

  // Trade reference, section 1: minimum NHLA 2023 p. 56 (5/4 confirmed, others derived); S2S agreeing trade tables
  // (secondary; 10/4 from memory).
  it.each([
    [2, 7 / 16, 5 / 16],
    [3, 11 / 16, 9 / 16],
    [4, 15 / 16, 13 / 16],
    [5, 1 + 3 / 16, 1 + 1 / 16],
    [6, 1 + 7 / 16, 1 + 5 / 16],
    [7, 1 + 11 / 16, 1 + 1 / 2],
    [8, 1 + 7 / 8, 1 + 3 / 4],
    [10, 2 + 3 / 8, 2 + 1 / 4],
    [12, 2 + 7 / 8, 2 + 3 / 4],
    [14, 3 + 3 / 8, 3 + 1 / 4],
    [16, 3 + 7 / 8, 3 + 3 / 4],
  ])("%i quarters: kiln-dried at least %f in, surfaced %f in", (quarters, leastIn, surfacedIn) => {
    expect(kilnDriedMinimumMm(nominalThicknessMm(quarters))! / 25.4).toBeCloseTo(leastIn, 9);
    expect(surfacedThicknessMm(quarters)! / 25.4).toBeCloseTo(surfacedIn, 9);
  });

  it("has no surfaced thickness for quarters outside the tables", () => {
    expect(surfacedThicknessMm(9)).toBeNull();
  });

  // Trade reference, section 1, rows 3/8 and 5/8.
  it("reaches down to 3/8 in", () => {
    expect(kilnDriedMinimumMm(9.525)! / 25.4).toBeCloseTo(5 / 16, 9);
    expect(kilnDriedMinimumMm(15.875)! / 25.4).toBeCloseTo(9 / 16, 9);
    expect(kilnDriedMinimumMm(6)).toBeNull();
  });

  // NHLA 2023 p. 56: minimum width 1/4 in scant, the admitted 10 % 1/2 in scant.
  it("lets a 6 in FAS board come out of the kiln 5 3/4 in wide", () => {
    const minimum = kilnDriedMinimumWidthMm(152.4);
    expect(minimum.mostPiecesMm / 25.4).toBeCloseTo(5.75, 9);
    expect(minimum.tenPercentMm / 25.4).toBeCloseTo(5.5, 9);
  });
});
