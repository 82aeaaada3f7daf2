import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { exactShareBelow } from "./exact-integrals.fixture.ts";
import { fieldFromAngle } from "./field-from-angle.ts";
import { fieldFromPith } from "./stations.ts";
import { bestStrip, type StripDemand, suitingStrips, windowShare } from "./strips.ts";

const size = { widthMm: 210, thicknessMm: 27 };
const rift = { leastDeg: 30, greatestDeg: 60 };
const legs: StripDemand = { widthMm: 50, window: rift, leastShare: 0.9, kerfMm: 3 };

function strip(...demand: Parameters<typeof bestStrip>) {
  const result = bestStrip(...demand);
  if (!result.ok) throw new Error(result.why);
  return result.strip;
}

describe("share of a stretch within a window", () => {
  test("is that of the closed-form areas", () => {
    const pith = { xMm: -40, yMm: 110 };
    const field = fieldFromPith(size, pith);
    for (const [fromMm, toMm] of [
      [0, 210],
      [20, 60],
      [33.3, 151.7],
    ] as const) {
      const slice = { fromMm, toMm };
      const exact = exactShareBelow(size, pith, slice, 60) - exactShareBelow(size, pith, slice, 30);
      expect(windowShare(field, fromMm, toMm, rift)).toBeCloseTo(exact, 2);
    }
  });

  test("of neighbouring stretches adds up by width, and windows that part 0 to 90 sum to one", () => {
    fc.assert(
      fc.property(fc.double({ min: 1, max: 209, noNaN: true }), fc.integer({ min: -200, max: 400 }), (at, x) => {
        const field = fieldFromPith(size, { xMm: x, yMm: 100.5 });
        const parts = windowShare(field, 0, at, rift) * at + windowShare(field, at, 210, rift) * (210 - at);
        expect(parts).toBeCloseTo(windowShare(field, 0, 210, rift) * 210, 6);
        const below = windowShare(field, 0, 210, { leastDeg: 0, greatestDeg: 41 });
        const above = windowShare(field, 0, 210, { leastDeg: 41.000001, greatestDeg: 90 });
        expect(below + above).toBeCloseTo(1, 9);
      }),
    );
  });

  test.each([
    [-1, 5],
    [5, 5],
    [0, 211],
    [0, Number.NaN],
  ])("a stretch from %d to %d is none", (from, to) => {
    expect(() => windowShare(fieldFromPith(size, { xMm: 0, yMm: 0 }), from, to, rift)).toThrow(/from 0 to 210/);
  });
});

describe("the strip that suits best", () => {
  // Pith 60 mm under the middle of the thickness, at mid width: rings at x mm from the middle stand at atan(x / 60).
  const flat = fieldFromPith(size, { xMm: 105, yMm: 73.5 });

  test("of a flatsawn board lies towards an edge, where the rings are rift", () => {
    const found = strip(flat, legs);
    expect(found.suits).toBe(true);
    expect(found.toMm - found.fromMm).toBeCloseTo(50, 9);
    // Rift runs from 60 tan 30 = 35 mm to 60 tan 60 = 104 mm from the middle.
    expect(Math.abs(found.fromMm + 25 - 105)).toBeGreaterThan(50);
    expect(found.meanDeg).toBeGreaterThan(40);
    expect(found.meanDeg).toBeLessThan(55);
  });

  test("says where to rip, which side falls away and what is left, the kerf taken off the offcut", () => {
    const { fromMm, toMm, rips, leftMm, rightMm } = strip(flat, {
      ...legs,
      widthMm: 40,
      window: { leastDeg: 0, greatestDeg: 20 },
    });
    expect(Math.abs(fromMm - 85)).toBeLessThan(1.5);
    expect(rips).toEqual([
      { atMm: fromMm, away: "left" },
      { atMm: toMm, away: "right" },
    ]);
    expect(leftMm + 3).toBeCloseTo(fromMm, 9);
    expect(rightMm + 3).toBeCloseTo(210 - toMm, 9);
  });

  test("of an evenly rift board lies at an edge: one rip does", () => {
    const found = strip(fieldFromAngle(size, 45, "left"), legs);
    expect(found).toMatchObject({ fromMm: 0, suits: true, rips: [{ atMm: 50, away: "right" }] });
    expect(found.share).toBeCloseTo(1, 9);
  });

  test("as wide as the board needs no rip", () => {
    expect(strip(fieldFromAngle(size, 45, "left"), { ...legs, widthMm: 210 })).toMatchObject({ rips: [], rightMm: 0 });
  });

  test("that cannot meet the share says so", () => {
    expect(strip(fieldFromAngle(size, 10, "left"), legs)).toMatchObject({ share: 0, suits: false });
  });

  test.each([
    [{ widthMm: 211 }, /too narrow/],
    [{ widthMm: 0 }, /above zero/],
    [{ window: { leastDeg: 60, greatestDeg: 30 } }, /lesser first/],
    [{ leastShare: 1.1 }, /0 to 1/],
    [{ kerfMm: Number.NaN }, /kerf/],
  ])("%j is refused", (part, why) => {
    expect(bestStrip(flat, { ...legs, ...part })).toMatchObject({ ok: false, why: expect.stringMatching(why) });
    expect(suitingStrips(flat, { ...legs, ...part })).toEqual([]);
  });

  test("no other place has a larger share", () => {
    fc.assert(
      fc.property(fc.integer({ min: -100, max: 310 }), fc.integer({ min: 0, max: 160 }), (x, from) => {
        const field = fieldFromPith(size, { xMm: x + 0.5, yMm: 90 });
        expect(strip(field, legs).share).toBeGreaterThanOrEqual(windowShare(field, from, from + 50, rift) - 0.0051);
      }),
      { numRuns: 30 },
    );
  });
});

describe("strips side by side", () => {
  test("of a wide flatsawn board come from both edges, none from the middle", () => {
    const field = fieldFromPith({ widthMm: 300, thicknessMm: 27 }, { xMm: 150, yMm: 93.5 });
    const found = suitingStrips(field, { ...legs, widthMm: 40 });
    expect(found.length).toBeGreaterThanOrEqual(4);
    for (const { fromMm, toMm, suits } of found) {
      expect(suits).toBe(true);
      expect(fromMm < 150 && toMm > 150).toBe(false);
    }
    found.forEach(({ fromMm }, i) => {
      const before = found[i - 1];
      if (before) expect(fromMm - before.toMm).toBeGreaterThanOrEqual(3);
    });
  });

  test("of an evenly rift board are as many as the width holds: 4 × 50 + 3 × 3 mm of kerf in 210", () => {
    expect(suitingStrips(fieldFromAngle(size, 45, "left"), legs)).toHaveLength(4);
    expect(suitingStrips(fieldFromAngle({ ...size, widthMm: 208 }, 45, "left"), legs)).toHaveLength(3);
  });
});
