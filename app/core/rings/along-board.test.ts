import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { compareEnds, fieldAlong, seenFromNear } from "./along-board.ts";
import { fieldFromAngle } from "./field-from-angle.ts";
import { fieldFromPith } from "./stations.ts";

const size = { widthMm: 200, thicknessMm: 26 };
const pith = { xMm: -70, yMm: 180 };

// Geometry alone: a board sawn along a straight, round stem shows its far end as the mirror of its near end.
describe("rings along a board", () => {
  const near = fieldFromPith(size, pith, 10);
  const mirrored = fieldFromPith(size, { xMm: size.widthMm - pith.xMm, yMm: pith.yMm }, 10);

  test("a board sawn along a straight tree has ends that agree, and the same rings everywhere between", () => {
    expect(compareEnds(near, mirrored).turnDeg).toBeLessThan(0.01);
    for (const share of [0, 0.3, 1])
      for (const [i, station] of fieldAlong(near, mirrored, share).stations.entries())
        expect(station.signedDeg).toBeCloseTo(near.stations[i]?.signedDeg ?? 0, 6);
  });

  test("seen through and back again is where one was", () => {
    const back = seenFromNear(seenFromNear(near));
    for (const [i, station] of back.stations.entries())
      expect(station.signedDeg).toBeCloseTo(near.stations[i]?.signedDeg ?? 0, 9);
    expect(back.pith?.xMm).toBeCloseTo(pith.xMm, 9);
  });

  test("rings that turn by 20 degrees from end to end stand at 10 in the middle", () => {
    const turn = compareEnds(fieldFromAngle(size, 30, "right"), fieldFromAngle(size, 50, "left"));
    expect(turn.turnDeg).toBeCloseTo(20, 0);
    expect(
      fieldAlong(fieldFromAngle(size, 30, "right"), fieldFromAngle(size, 50, "left"), 0.5).stations[4]?.angleDeg,
    ).toBeCloseTo(40, 0);
  });

  test("past square the short way round is taken: 80 falling to 80 rising is 20 apart, not 160", () => {
    expect(compareEnds(fieldFromAngle(size, 80, "right"), fieldFromAngle(size, 80, "right")).turnDeg).toBeCloseTo(
      20,
      0,
    );
  });

  test("whatever the ends, angles between stay within 0 to 90", () => {
    const angle = fc.double({ min: 0, max: 90, noNaN: true });
    const side = fc.constantFrom("left" as const, "right" as const);
    fc.assert(
      fc.property(angle, side, angle, side, fc.double({ min: 0, max: 1, noNaN: true }), (a, sideA, b, sideB, share) => {
        for (const { angleDeg } of fieldAlong(fieldFromAngle(size, a, sideA), fieldFromAngle(size, b, sideB), share)
          .stations) {
          expect(angleDeg).toBeGreaterThanOrEqual(0);
          expect(angleDeg).toBeLessThanOrEqual(90);
        }
      }),
    );
  });

  test.each([-0.1, 1.1, Number.NaN])("%d is no share of a length", (share) => {
    expect(() => fieldAlong(near, mirrored, share)).toThrow(RangeError);
  });
});
