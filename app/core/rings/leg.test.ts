import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { fieldFromAngle } from "./field-from-angle.ts";
import { type LegSection, leastTurn, legGrain, turnToDiagonal } from "./leg.ts";
import { fieldFromPith } from "./stations.ts";
import { classOf, defaultClassLimits } from "./summary.ts";

const size = { widthMm: 210, thicknessMm: 55 };
const square = (xMm: number, side = 40): LegSection => ({
  middle: { xMm, yMm: 27.5 },
  widthMm: side,
  thicknessMm: side,
  turnDeg: 0,
});

describe("the four sides of a leg", () => {
  test("rift stock shows straight grain on all four, and only rift stock does (common practice, no source: checked here)", () => {
    for (let angle = 0; angle <= 90; angle += 0.5) {
      const { isStraight } = legGrain(fieldFromAngle(size, angle, "left"), square(100));
      expect(isStraight).toBe(classOf(angle, defaultClassLimits) === "rift");
    }
  });

  test("it does not hold near the pith, where the rings turn within the leg: rift at its middle, flat at a corner", () => {
    const field = fieldFromPith(size, { xMm: 60, yMm: 68 });
    const leg = square(100);
    const grain = legGrain(field, leg);
    expect(classOf(Math.abs(grain.signedDeg), defaultClassLimits)).toBe("rift");
    expect(grain.isStraight).toBe(false);
    expect(Math.max(...grain.sides.map(({ departsDeg }) => departsDeg))).toBeGreaterThan(10);
  });

  test("flat stock: arches on top and bottom, 18 degrees short of straight at 12; straight on the edges", () => {
    const { sides } = legGrain(fieldFromAngle(size, 12, "right"), square(100));
    const by = Object.fromEntries(sides.map((side) => [side.side, side]));
    expect(by.top).toMatchObject({ departsDeg: 18, straightShare: 0 });
    expect(by.bottom!.meanDeg).toBeCloseTo(12, 9);
    expect(by.left).toMatchObject({ departsDeg: 0, straightShare: 1 });
    expect(by.right!.meanDeg).toBeCloseTo(78, 9);
  });

  test("quartered stock is the other way about", () => {
    const { sides } = legGrain(fieldFromAngle(size, 90, "right"), square(100));
    expect(sides.map(({ departsDeg }) => Math.round(departsDeg))).toEqual([0, 30, 0, 30]);
  });

  test("angles round a pith are those of circles: top side straight above it is flat, its corners are at atan", () => {
    const { sides } = legGrain(fieldFromPith(size, { xMm: 100, yMm: 107.5 }), square(100));
    const top = sides[0]!;
    expect(top.leastDeg).toBeCloseTo(0, 6);
    // The outermost of 25 samples lies at 24/25 of the half side, 100 mm above the pith.
    expect(top.greatestDeg).toBeCloseTo((Math.atan((20 * 24) / 25 / 100) * 180) / Math.PI, 6);
  });
});

describe("turning a leg within thicker stock", () => {
  test.each([
    [0, 45],
    [10, -35],
    [45, 0],
    [70, 25],
    [90, 45],
  ])("rings at %d degrees come to the diagonal by a turn of %d", (angle, turn) => {
    const field = fieldFromAngle(size, angle, "right");
    const found = turnToDiagonal(field, square(100));
    expect(found.turnDeg).toBeCloseTo(turn, 6);
    expect(Math.abs(found.grain.signedDeg)).toBeCloseTo(45, 6);
    expect(found.grain.isStraight).toBe(true);
  });

  test("needs stock as thick as the turned square is high: 40 mm at 45 degrees takes 56.6, more than this board's 55", () => {
    const found = turnToDiagonal(fieldFromAngle(size, 0, "right"), square(100));
    expect(found.stockThicknessMm).toBeCloseTo(40 * Math.SQRT2, 6);
    expect(found.stockWidthMm).toBeCloseTo(40 * Math.SQRT2, 6);
    expect(found.fitsBoard).toBe(false);
    expect(turnToDiagonal(fieldFromAngle(size, 0, "right"), square(100, 38)).fitsBoard).toBe(true);
    expect(turnToDiagonal(fieldFromAngle(size, 0, "right"), square(10, 38)).fitsBoard).toBe(false);
  });

  test("a section that is not square, 60 by 30 turned by 35 degrees, needs its own height and width", () => {
    const turn = (35 * Math.PI) / 180;
    const found = turnToDiagonal(fieldFromAngle(size, 10, "right"), { ...square(100, 60), thicknessMm: 30 });
    expect(found.stockThicknessMm).toBeCloseTo(60 * Math.sin(turn) + 30 * Math.cos(turn), 6);
    expect(found.stockWidthMm).toBeCloseTo(60 * Math.cos(turn) + 30 * Math.sin(turn), 6);
  });

  test("only as far as all four sides need takes less: rings at 20 are straight from a turn of 10", () => {
    const found = leastTurn(fieldFromAngle(size, 20, "right"), square(100));
    expect(Math.abs(found!.turnDeg)).toBe(10);
    expect(found!.stockThicknessMm).toBeCloseTo(40 * (Math.cos(Math.PI / 18) + Math.sin(Math.PI / 18)), 6);
    expect(leastTurn(fieldFromAngle(size, 45, "right"), square(100))!.turnDeg).toBe(0);
  });

  test("no turn helps a leg with the pith in it", () => {
    expect(leastTurn(fieldFromPith(size, { xMm: 100, yMm: 27 }), square(100))).toBeNull();
  });

  test("is never more than 45 degrees, nor asks for thinner stock than the turned section", () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0, max: 90, noNaN: true }),
        fc.constantFrom("left" as const, "right" as const),
        fc.double({ min: 10, max: 60, noNaN: true }),
        (angle, falls, thicknessMm) => {
          const found = turnToDiagonal(fieldFromAngle(size, angle, falls), { ...square(100), thicknessMm });
          expect(Math.abs(found.turnDeg)).toBeLessThanOrEqual(45 + 1e-9);
          expect(Math.abs(found.grain.signedDeg)).toBeCloseTo(45, 6);
          expect(found.stockThicknessMm).toBeGreaterThanOrEqual(Math.min(40, thicknessMm) - 1e-9);
        },
      ),
    );
  });
});
