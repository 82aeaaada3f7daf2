import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { shareOut } from "./share-cost.ts";

describe("shareOut", () => {
  test("ten cents over three equal boards is 4, 3, 3", () => {
    expect(shareOut(10, [1, 1, 1])).toEqual([4, 3, 3]);
  });

  test("a board twice as large costs twice as much", () => {
    expect(shareOut(900, [1, 2])).toEqual([300, 600]);
  });

  test("boards without measure share equally; no boards share nothing", () => {
    expect(shareOut(100, [0, 0])).toEqual([50, 50]);
    expect(shareOut(100, [])).toEqual([]);
  });

  test("the shares are whole, never negative, and add up to the whole", () => {
    const weights = fc.array(fc.double({ min: 0, max: 500, noNaN: true }), { minLength: 1, maxLength: 60 });
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 5_000_000 }), weights, (total, parts) => {
        const shares = shareOut(total, parts);
        expect(shares.reduce((a, b) => a + b, 0)).toBe(total);
        for (const share of shares) expect(Number.isInteger(share) && share >= 0).toBe(true);
      }),
    );
  });
});
