import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { bendingLeftPct, combinedSlope, d245BendingPct, hankinson, slopeDeg } from "./slope-of-grain.ts";

describe("slope of grain", () => {
  test("1 in 15 is 3.81 degrees (arctangent)", () => expect(slopeDeg(15)).toBeCloseTo(3.81, 2));

  test.each([
    [10, 81],
    [15, 89],
  ])("Wood Handbook Table 5-12, from memory: at 1 in %d, %d %% of the bending strength is left", (oneIn, left) => {
    expect(bendingLeftPct(oneIn)).toBe(left);
  });

  test("ASTM D245, as quoted: 61 % at 1 in 10", () => expect(d245BendingPct[10]).toBe(61));

  test("Hankinson, white oak in compression at 15 degrees (Wood Handbook Table 5-3b values): 5,319 psi", () => {
    expect(Math.abs(hankinson(7440, 1070, 15) - 5319)).toBeLessThan(2);
  });

  test("trade reference, derived: 1 in 12 and 1 in 16 together are 1 in 9.6", () =>
    expect(combinedSlope(12, 16)).toBeCloseTo(9.6, 9));

  test("less slope never leaves less strength", () => {
    fc.assert(
      fc.property(
        fc.double({ min: 5, max: 90, noNaN: true }),
        fc.double({ min: 0, max: 30, noNaN: true }),
        (oneIn, more) => {
          expect(bendingLeftPct(oneIn + more) ?? 0).toBeGreaterThanOrEqual(bendingLeftPct(oneIn) ?? 0);
        },
      ),
    );
  });
});
