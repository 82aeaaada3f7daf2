import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { axialMean, foldDeg, ringAngleDeg, signedRingDeg } from "./angle.ts";

/** Concentric circles, plane geometry: the tangent is square to the radius. */
describe("ring angle round a pith at (0, 0)", () => {
  const pith = { xMm: 0, yMm: 0 };
  test.each([
    ["straight above the pith rings lie flat", 0, -50, 0],
    ["straight below too", 0, 50, 0],
    ["beside it they stand", 50, 0, 90],
    ["halfway between, 45: above right, falling to the right", 30, -30, 45],
    ["above left, falling to the left", -30, -30, -45],
    ["below right, falling to the left", 30, 30, -45],
    ["30: a point at 30 degrees from upright", 10, -10 * Math.sqrt(3), 30],
    ["60", 10 * Math.sqrt(3), -10, 60],
  ])("%s", (_words, xMm, yMm, signed) => {
    expect(ringAngleDeg({ xMm, yMm }, pith)).toBeCloseTo(Math.abs(signed), 9);
    expect(Math.abs(foldDeg(signedRingDeg({ xMm, yMm }, pith) - signed))).toBeCloseTo(0, 9);
  });

  test("at the pith there is no ring, and no NaN", () => {
    expect(signedRingDeg(pith, pith)).toBe(0);
  });

  test("a step along the direction stays on the ring", () => {
    const side = fc.double({ min: -300, max: 300, noNaN: true });
    fc.assert(
      fc.property(side, side, side, side, (xMm, yMm, px, py) => {
        const from = Math.hypot(xMm - px, yMm - py);
        fc.pre(from > 1);
        const angle = (signedRingDeg({ xMm, yMm }, { xMm: px, yMm: py }) * Math.PI) / 180;
        const step = 1e-4;
        const to = Math.hypot(xMm + step * Math.cos(angle) - px, yMm + step * Math.sin(angle) - py);
        expect(Math.abs(to - from)).toBeLessThan(1e-7);
      }),
    );
  });

  test("angles are 0 to 90, signed ones -90 to 90", () => {
    const side = fc.double({ min: -1e6, max: 1e6, noNaN: true });
    fc.assert(
      fc.property(side, side, side, side, (xMm, yMm, px, py) => {
        const signed = signedRingDeg({ xMm, yMm }, { xMm: px, yMm: py });
        expect(Math.abs(signed)).toBeLessThanOrEqual(90);
        expect(ringAngleDeg({ xMm, yMm }, { xMm: px, yMm: py })).toBe(Math.abs(signed));
      }),
    );
  });
});

describe("directions of lines", () => {
  test.each([
    [0, 0],
    [90, 90],
    [-90, 90],
    [91, -89],
    [180, 0],
    [-135, 45],
    [450, 90],
  ])("%d is the same line as %d", (deg, folded) => {
    expect(foldDeg(deg)).toBeCloseTo(folded, 9);
  });

  test("89 and -89 are two degrees apart: their mean is upright, not flat", () => {
    const { signedDeg, strength } = axialMean([89, -89]);
    expect(Math.abs(signedDeg)).toBeCloseTo(90, 6);
    expect(strength).toBeGreaterThan(0.99);
  });

  test("lines every way have no mean to speak of", () => {
    expect(axialMean([0, 45, 90, -45]).strength).toBeCloseTo(0, 9);
  });
});
