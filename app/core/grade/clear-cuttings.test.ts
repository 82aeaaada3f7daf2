import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { clearCuttings } from "./clear-cuttings.ts";
import { areaOf, type FaceArea, overlap } from "./empty-rectangles.ts";

const face = { lengthMm: 8, widthMm: 5 };
const least = [
  { lengthMm: 3, widthMm: 1 },
  { lengthMm: 2, widthMm: 2 },
];

/** Every choice of whole-millimetre rectangles, one after another: the best clear area of so many. Best lies on whole numbers as every edge and size does. */
function byTryingAll(defects: readonly FaceArea[], most: number): number {
  const places: FaceArea[] = [];
  for (let alongMm = 0; alongMm < face.lengthMm; alongMm++)
    for (let acrossMm = 0; acrossMm < face.widthMm; acrossMm++)
      for (let lengthMm = 1; alongMm + lengthMm <= face.lengthMm; lengthMm++)
        for (let widthMm = 1; acrossMm + widthMm <= face.widthMm; widthMm++) {
          const place = { alongMm, acrossMm, lengthMm, widthMm };
          const fits = least.some((one) => lengthMm >= one.lengthMm && widthMm >= one.widthMm);
          if (fits && !defects.some((defect) => overlap(defect, place))) places.push(place);
        }
  places.sort((a, b) => areaOf(b) - areaOf(a));
  let best = 0;
  const choose = (from: number, chosen: FaceArea[], area: number): void => {
    best = Math.max(best, area);
    if (chosen.length === most) return;
    for (let i = from; i < places.length; i++) {
      const place = places[i] as FaceArea;
      if (area + (most - chosen.length) * areaOf(place) <= best) return;
      if (!chosen.some((other) => overlap(other, place))) choose(i + 1, [...chosen, place], area + areaOf(place));
    }
  };
  choose(0, [], 0);
  return best;
}

const defects = fc.array(
  fc.record({
    alongMm: fc.integer({ min: 0, max: 7 }),
    acrossMm: fc.integer({ min: 0, max: 4 }),
    lengthMm: fc.integer({ min: 1, max: 2 }),
    widthMm: fc.integer({ min: 1, max: 2 }),
  }),
  { maxLength: 5 },
);

describe("clear cuttings against trying every choice", () => {
  test.each([1, 2, 3])("%d of them, wherever the answer says that it is the best", (most) => {
    let proven = 0;
    fc.assert(
      fc.property(defects, (blocked) => {
        const found = clearCuttings(face, blocked, least, most);
        const best = byTryingAll(blocked, most);
        if (found.isBest) {
          proven++;
          expect(found.areaMm2).toBeCloseTo(best, 3);
        }
        expect(found.areaMm2).toBeLessThanOrEqual(best + 1e-6);
        expect(found.atMostMm2).toBeGreaterThanOrEqual(best - 1e-6);
      }),
      { numRuns: 40 },
    );
    expect(proven).toBeGreaterThan(20);
  });

  test("a cutting gives way where its neighbour's least size needs the room", () => {
    // 6 by 7 beside the corner's knot is the largest, but what is then left past it is 4 long of the 5 it must be: 5 by 7 and 5 by 4 are more.
    const knot = [{ alongMm: 6, acrossMm: 0, lengthMm: 4, widthMm: 3 }];
    const found = clearCuttings({ lengthMm: 10, widthMm: 7 }, knot, [{ lengthMm: 5, widthMm: 4 }], 2);
    expect(found).toEqual({
      cuttings: [
        { alongMm: 0, acrossMm: 0, lengthMm: 5, widthMm: 7 },
        { alongMm: 5, acrossMm: 3, lengthMm: 5, widthMm: 4 },
      ],
      areaMm2: 55,
      isBest: true,
      atMostMm2: 55,
    });
  });

  test("windmill sails about a knot: four cuttings take all that is clear", () => {
    const knot = [{ alongMm: 3, acrossMm: 2, lengthMm: 2, widthMm: 1 }];
    expect(clearCuttings(face, knot, least, 4)).toMatchObject({ areaMm2: 38, isBest: true });
  });

  test("a size or a place that is none is refused", () => {
    const knot = { alongMm: 3, acrossMm: 2, lengthMm: 2, widthMm: 1 };
    expect(() => clearCuttings(face, [{ ...knot, alongMm: Number.NaN }], least, 1)).toThrow(RangeError);
    expect(() => clearCuttings(face, [{ ...knot, widthMm: 0 }], least, 1)).toThrow(RangeError);
    expect(() => clearCuttings(face, [], least, 0)).toThrow(RangeError);
  });
});
