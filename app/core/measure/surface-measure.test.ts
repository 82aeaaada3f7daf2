import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { alternatingRounder } from "./alternating-rounder.ts";
import { countedThicknessIn, tallyWidthMm } from "./measured-board.ts";
import { boardFeet, surfaceMeasureFt2, wholeFeet } from "./surface-measure.ts";

const inches = (width: number, feet: number) => ({ widthMm: width * 25.4, lengthMm: feet * 304.8 });

describe("surface measure", () => {
  // AHEC, Measurement: SM = W(in) x L(ft) / 12, lengths down to whole feet.
  it("is width in inches by length in feet over twelve", () => {
    expect(surfaceMeasureFt2(inches(6, 8))).toBeCloseTo(4, 9);
    expect(surfaceMeasureFt2(inches(8.25, 10.5))).toBeCloseTo(6.875, 9);
    expect(surfaceMeasureFt2(inches(8.25, 10.5), "as measured")).toBeCloseTo(7.21875, 9);
  });

  // NHLA General Instructions, from memory: one third of the length from the narrow end.
  it("of a tapering board takes the width a third from the narrow end, whichever end that is", () => {
    expect(tallyWidthMm({ widthMm: 228.6, widthFarMm: 152.4 })).toBeCloseTo(177.8, 9);
    expect(tallyWidthMm({ widthMm: 152.4, widthFarMm: 228.6 })).toBeCloseTo(177.8, 9);
    expect(tallyWidthMm({ widthMm: 200, widthFarMm: null })).toBe(200);
  });

  it("drops a length just short of a foot, and keeps one that is whole", () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 60 }), (feet) => {
        expect(wholeFeet(feet * 304.8)).toBe(feet);
        expect(wholeFeet(feet * 304.8 - 25.4 / 64)).toBe(feet - 1);
      }),
    );
  });

  it.each([0, -1, Number.NaN, Number.POSITIVE_INFINITY])("refuses a length of %f mm", (lengthMm) => {
    expect(() => surfaceMeasureFt2({ widthMm: 200, lengthMm })).toThrow(/Length must be a number from/);
    expect(() => surfaceMeasureFt2({ widthMm: 200, lengthMm }, "as measured")).toThrow(RangeError);
  });

  // NHLA 2023 p. 9 para. 18: 5/4 counts 1 1/4; hardwood-handbook glossary: under an inch counts as an inch.
  it("times the nominal thickness is board feet", () => {
    expect([2, 3, 4, 5, 6, 8].map(countedThicknessIn)).toEqual([1, 1, 1, 1.25, 1.5, 2]);
    expect(boardFeet(6, 5)).toBe(7.5);
  });
});

describe("rounding as a tally does", () => {
  const rounded = (values: number[]) => values.map(alternatingRounder());

  // NHLA 2015 p. 7 para. 16: to the nearest whole square foot.
  it("goes to the nearest whole", () => {
    expect(rounded([4.49, 4.51, 7.21875, 0.4])).toEqual([4, 5, 7, 0]);
  });

  // NHLA Measurement & Tally, from memory: halves alternate. Beginning upward is common practice.
  it("takes exact halves up and down in turn", () => {
    expect(rounded([4.5, 4.5, 3.5, 2.5])).toEqual([5, 4, 4, 2]);
    expect(rounded([4.5, 6.2, 4.5])).toEqual([5, 6, 4]);
  });

  it("starts anew for every tally", () => {
    expect([rounded([4.5]), rounded([4.5])]).toEqual([[5], [5]]);
  });

  it("never strays by more than half a foot in all, however many halves there are", () => {
    fc.assert(
      fc.property(fc.array(fc.nat(30), { maxLength: 80 }), (wholes) => {
        const halves = wholes.map((whole) => whole + 0.5);
        const drift = rounded(halves).reduce((sum, value, index) => sum + value - halves[index]!, 0);
        expect(Math.abs(drift)).toBeLessThanOrEqual(0.5);
      }),
    );
  });
});
