import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  boardFeetPerM3,
  measureTally,
  roundSurfaceMeasures,
  surfaceMeasureFt2,
  talliedThicknessIn,
  talliedWidthMm,
} from "./surface-measure.ts";

const inches = (width: number, feet: number) => ({ widthMm: width * 25.4, lengthMm: feet * 304.8 });

describe("surface measure", () => {
  // AHEC, Measurement: SM = W(in) × L(ft) ÷ 12.
  it("is width in inches by length in feet over twelve", () => {
    expect(surfaceMeasureFt2(inches(6, 8))).toBeCloseTo(4, 9);
    expect(surfaceMeasureFt2(inches(8.25, 10.5))).toBeCloseTo(7.21875, 9);
  });

  // NHLA general instructions, from memory: one third of the length from the narrow end.
  it("of a tapering board takes the width a third up from the narrow end, whichever end that is", () => {
    expect(talliedWidthMm({ widthMm: 228.6, widthFarMm: 152.4 })).toBeCloseTo(177.8, 9);
    expect(talliedWidthMm({ widthMm: 152.4, widthFarMm: 228.6 })).toBeCloseTo(177.8, 9);
    expect(talliedWidthMm({ widthMm: 200, widthFarMm: null })).toBe(200);
  });
});

describe("rounding a tally", () => {
  // NHLA 2015 p. 7 para. 16: to the nearest whole square foot.
  it("goes to the nearest whole", () => {
    expect(roundSurfaceMeasures([4.49, 4.51, 7.21875, 0.4])).toEqual([4, 5, 7, 0]);
  });

  // NHLA Measurement & Tally, from memory: halves alternate. Common practice begins upward.
  it("takes exact halves up and down in turn", () => {
    expect(roundSurfaceMeasures([4.5, 4.5, 3.5, 2.5])).toEqual([5, 4, 4, 2]);
    expect(roundSurfaceMeasures([4.5, 6.2, 4.5])).toEqual([5, 6, 4]);
  });

  it("knows a half after millimetres and the database's hundredths", () => {
    // 6 in × 9 ft and 9 in × 6 ft are 4 1/2.
    const kept = [inches(6, 9), inches(9, 6)].map(({ widthMm, lengthMm }) =>
      surfaceMeasureFt2({ widthMm: Number(widthMm.toFixed(2)), lengthMm: Number(lengthMm.toFixed(2)) }),
    );
    expect(roundSurfaceMeasures(kept)).toEqual([5, 4]);
  });

  it("is never more than half a foot a board from the exact sum, and alternation keeps halves within half a foot in all", () => {
    fc.assert(
      fc.property(fc.array(fc.double({ min: 0, max: 40, noNaN: true }), { maxLength: 80 }), (exact) => {
        roundSurfaceMeasures(exact).forEach((rounded, index) => {
          expect(Number.isInteger(rounded)).toBe(true);
          expect(Math.abs(rounded - (exact[index] ?? 0))).toBeLessThanOrEqual(0.5 + 1e-3);
        });
      }),
    );
    fc.assert(
      fc.property(fc.array(fc.nat(30), { maxLength: 80 }), (wholes) => {
        const halves = wholes.map((whole) => whole + 0.5);
        const drift = roundSurfaceMeasures(halves).reduce(
          (sum, rounded, index) => sum + rounded - (halves[index] ?? 0),
          0,
        );
        expect(Math.abs(drift)).toBeLessThanOrEqual(0.5);
      }),
    );
  });
});

describe("board feet of a tally", () => {
  // NHLA 2023 p. 9 para. 18: SM × nominal thickness, 5/4 being 1 1/4; glossary: under an inch counts as an inch.
  it("multiplies the rounded measure by the nominal thickness", () => {
    expect(talliedThicknessIn(5)).toBe(1.25);
    expect(talliedThicknessIn(3)).toBe(1);
    const tally = measureTally([
      { ...inches(8.25, 10.5), quarters: 8 },
      { ...inches(6, 8), quarters: 3 },
    ]);
    expect(tally).toMatchObject({ surfaceFt2: 11, boardFeet: 18, each: [14, 4] });
    expect(tally.exactBoardFeet).toBeCloseTo(18.4375, 9);
  });

  // Trade reference, section 1: 1 m³ = 423.776 bf, by the definition of the foot.
  it("knows how many make a cubic metre", () => {
    expect(boardFeetPerM3).toBeCloseTo(423.776, 3);
  });

  it("of no boards is nothing", () => {
    expect(measureTally([])).toEqual({ surfaceFt2: 0, boardFeet: 0, exactBoardFeet: 0, each: [] });
  });
});
