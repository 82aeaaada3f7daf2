import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { type RingCurve, ringCurves } from "./ring-curves.ts";
import { fieldFromPith } from "./stations.ts";

const size = { widthMm: 210, thicknessMm: 27 };
const spacing = { spacingMm: 2.5, bleedMm: 1 };
const pithAnywhere = fc.record({
  xMm: fc.double({ min: -900, max: 900, noNaN: true }),
  yMm: fc.double({ min: -900, max: 900, noNaN: true }),
});

/** Greatest difference in distance from the pith along a piece. */
function wander({ at }: RingCurve, pith: { xMm: number; yMm: number }): number {
  const radii = [0, 0.2, 0.4, 0.6, 0.8, 1].map((share) => {
    const { xMm, yMm } = at(share);
    return Math.hypot(xMm - pith.xMm, yMm - pith.yMm);
  });
  return Math.max(...radii) - Math.min(...radii);
}

describe("rings as they cross an end", () => {
  test("round a pith keep their distance from it, and none that crosses the end is missing", () => {
    fc.assert(
      fc.property(pithAnywhere, (pith) => {
        const rings = ringCurves(fieldFromPith(size, pith), spacing);
        for (const pieces of rings) for (const piece of pieces) expect(wander(piece, pith)).toBeLessThan(1e-6);
        // Along the middle of the thickness, from mid width to the right edge, one ring is crossed for each spacing.
        const radius = (xMm: number) => Math.hypot(xMm - pith.xMm, 13.5 - pith.yMm);
        const drawn = new Set(rings.flat().map(({ arc }) => Math.round(arc!.radiusMm / 2.5)));
        for (let x = 105; x <= 210; x += 0.5) {
          const ring = Math.round(radius(x) / 2.5);
          if (ring > 0 && Math.abs(radius(x) / 2.5 - ring) < 0.02) expect(drawn.has(ring)).toBe(true);
        }
      }),
    );
  });

  test.each([
    ["flat", { xMm: 95, yMm: 150 }, 4],
    ["arched the other way", { xMm: 95, yMm: -123 }, 4],
    ["rift", { xMm: -90, yMm: 170 }, 2.5],
    ["quartered", { xMm: -220, yMm: 20 }, 0.5],
  ] as const)(
    "told only what a %s board does station by station follow much the same circles",
    (_way, pith, mostMm) => {
      // Stations say nothing of how the rings turn down the thickness: hence some millimetres of wander over up to 210.
      const rings = ringCurves({ ...fieldFromPith(size, pith), pith: null }, spacing);
      expect(rings.length).toBeGreaterThan(9);
      for (const piece of rings.flat()) expect(wander(piece, pith)).toBeLessThan(mostMm);
    },
  );

  test("end outside the edges by no more than the bleed", () => {
    fc.assert(
      fc.property(pithAnywhere, fc.boolean(), (pith, known) => {
        const field = fieldFromPith(size, pith);
        for (const { at } of ringCurves(known ? field : { ...field, pith: null }, spacing).flat())
          for (const share of [0, 0.5, 1]) {
            expect(Math.abs(at(share).xMm - 105)).toBeLessThanOrEqual(106 + 1e-6);
            expect(Math.abs(at(share).yMm - 13.5)).toBeLessThanOrEqual(14.5 + 1e-6);
          }
      }),
    );
  });

  test("made uneven by a seed stay in order", () => {
    const radii = ringCurves(fieldFromPith(size, { xMm: 95, yMm: 150 }), { ...spacing, seed: 5 }).map(
      ([first]) => first!.arc!.radiusMm,
    );
    radii.forEach((radius, i) => {
      if (i > 0) expect(radius).toBeGreaterThan(radii[i - 1]! + 1);
    });
    expect(new Set(radii.map((radius) => (radius / 2.5) % 1)).size).toBeGreaterThan(5);
  });
});
