import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { bundleTally } from "./bundle-tally.ts";
import { tally } from "./tally.ts";

const inch = 25.4;
const foot = 304.8;
const ties = { quarters: 4, widthMm: 6 * inch, lengthMm: 9 * foot };

describe("a tally by surface measure", () => {
  // Half feet alternate: NHLA Measurement & Tally, from memory.
  it("sends exact half feet alternately up and down", () => {
    const lot = tally([ties, ties, ties]);
    expect(lot.lines.map((line) => line.surfaceMeasureFt2)).toEqual([5, 4, 5]);
    expect(lot).toMatchObject({ count: 3, surfaceMeasureFt2: 14, boardFeet: 14 });
    expect(lot.unroundedBoardFeet).toBeCloseTo(13.5, 9);
  });

  it("lets each thickness alternate by itself, as each is tallied by itself", () => {
    const lot = tally([ties, { ...ties, quarters: 8 }]);
    expect(lot.lines.map((line) => line.boardFeet)).toEqual([5, 10]);
  });

  it("knows a half foot in sizes kept to a hundredth of a millimetre", () => {
    // 3 3/8 in x 16 ft is exactly 4.5; 3 3/8 in is 85.725 mm and kept as 85.73.
    const lot = tally([{ quarters: 4, widthMm: 85.73, lengthMm: 4876.8, count: 2 }]);
    expect(lot.surfaceMeasureFt2).toBe(9);
  });

  it("counts stock under 4/4 as an inch in board feet, and as what it is in true volume", () => {
    // Hardwood-handbook glossary: under 1 in counts as 1 in.
    const lot = tally([{ quarters: 2, widthMm: 12 * inch, lengthMm: 8 * foot }]);
    expect(lot.boardFeet).toBe(8);
    expect(lot.volumeM3).toBeCloseTo(0.0127 * 0.3048 * 2.4384, 9);
  });

  it("keeps lengths as they are when asked", () => {
    // 5 3/4 in x 9 ft 7 in: 4.592 as measured rounds to 5, 4.3125 at 9 ft to 4 (AHEC length rule).
    const line = { quarters: 12, widthMm: 5.75 * inch, lengthMm: 115 * inch };
    expect(tally([line]).boardFeet).toBe(12);
    expect(tally([line], { lengths: "as measured" }).boardFeet).toBe(15);
    expect(tally([line]).unroundedBoardFeet).toBeCloseTo((3 * 5.75 * 115) / 144, 9);
  });

  it("is nothing for no boards", () => {
    expect(tally([])).toEqual({
      count: 0,
      surfaceMeasureFt2: 0,
      boardFeet: 0,
      unroundedBoardFeet: 0,
      volumeM3: 0,
      lines: [],
    });
  });

  it.each([
    [{ widthMm: 0 }, /Width must be/],
    [{ widthMm: Number.NaN }, /Width must be/],
    [{ widthFarMm: -1 }, /far end must be/],
    [{ lengthMm: -2 }, /Length must be/],
    [{ thicknessMm: 0 }, /Thickness must be/],
    [{ quarters: 0 }, /Quarters must be/],
    [{ count: 1.5 }, /whole number/],
    [{ count: -1 }, /count of boards/],
  ])("refuses %o", (wrong, reason) => {
    expect(() => tally([{ ...ties, ...wrong }])).toThrow(reason);
  });
});

const lineOf = fc.record({
  quarters: fc.constantFrom(2, 3, 4, 5, 6, 8, 12),
  widthMm: fc.integer({ min: 16, max: 160 }).map((eighths) => (eighths * inch) / 8),
  widthFarMm: fc.option(fc.integer({ min: 16, max: 160 }).map((eighths) => (eighths * inch) / 8)),
  lengthMm: fc.integer({ min: 12, max: 200 }).map((inches) => inches * inch),
  count: fc.integer({ min: 1, max: 5 }),
});
const lot = fc.array(lineOf, { minLength: 1, maxLength: 12 });

const totals = ({ count, surfaceMeasureFt2, boardFeet }: ReturnType<typeof tally>) => ({
  count,
  surfaceMeasureFt2,
  boardFeet,
});

describe("the totals of a tally", () => {
  it("do not depend on the order of the lines, nor do a bundle's", () => {
    fc.assert(
      fc.property(lot, fc.infiniteStream(fc.nat()), (lines, keys) => {
        const order = lines.map((line) => ({ line, key: keys.next().value }));
        const shuffled = order.sort((a, b) => a.key - b.key).map(({ line }) => line);
        expect(totals(tally(shuffled))).toEqual(totals(tally(lines)));
        expect(bundleTally(shuffled).widthIn).toBe(bundleTally(lines).widthIn);
        expect(bundleTally(shuffled).boardFeet).toBeCloseTo(bundleTally(lines).boardFeet, 6);
      }),
    );
  });

  it("do not depend on writing boards alike on one line or many", () => {
    fc.assert(
      fc.property(lot, (lines) => {
        const singles = lines.flatMap((line) => Array.from({ length: line.count }, () => ({ ...line, count: 1 })));
        expect(totals(tally(singles))).toEqual(totals(tally(lines)));
      }),
    );
  });

  it("do not depend on which end of a tapering board is near", () => {
    fc.assert(
      fc.property(lot, (lines) => {
        const turned = lines.map((line) => ({
          ...line,
          widthMm: line.widthFarMm ?? line.widthMm,
          widthFarMm: line.widthMm,
        }));
        expect(totals(tally(turned))).toEqual(totals(tally(lines)));
        expect(tally(turned).volumeM3).toBeCloseTo(tally(lines).volumeM3, 12);
      }),
    );
  });

  it("do not depend on measured thickness, nor on keeping sizes to a hundredth of a millimetre", () => {
    const kept = (mm: number) => Math.round(mm * 100) / 100;
    fc.assert(
      fc.property(lot, fc.double({ min: 5, max: 60, noNaN: true }), (lines, thicknessMm) => {
        const stored = lines.map((line) => ({
          ...line,
          thicknessMm,
          widthMm: kept(line.widthMm),
          widthFarMm: line.widthFarMm === null ? null : kept(line.widthFarMm),
          lengthMm: kept(line.lengthMm),
        }));
        expect(totals(tally(stored))).toEqual(totals(tally(lines)));
      }),
    );
  });

  it("keep within half a foot a board of the unrounded figure, lengths as measured", () => {
    fc.assert(
      fc.property(lot, (lines) => {
        const measured = tally(lines, { lengths: "as measured" });
        const most = lines.reduce((sum, line) => sum + (0.5 * line.count * Math.max(4, line.quarters)) / 4, 0);
        expect(Math.abs(measured.boardFeet - measured.unroundedBoardFeet)).toBeLessThanOrEqual(most + 0.01);
      }),
    );
  });

  it("are the sums of their lines", () => {
    fc.assert(
      fc.property(lot, (lines) => {
        const measured = tally(lines);
        const sum = (pick: (line: (typeof measured.lines)[number]) => number) =>
          measured.lines.reduce((a, line) => a + pick(line), 0);
        expect(sum((line) => line.boardFeet)).toBeCloseTo(measured.boardFeet, 9);
        expect(sum((line) => line.volumeM3)).toBeCloseTo(measured.volumeM3, 9);
        expect(sum((line) => line.count)).toBe(measured.count);
      }),
    );
  });
});

describe("an end tally", () => {
  // AHEC, Measurement: nearest inch, exact halves alternately up and down, lengths down to the whole foot.
  it("alternates half inches among boards of one length", () => {
    const half = { quarters: 4, widthMm: 5.5 * inch, lengthMm: 8.5 * foot };
    expect(bundleTally([half, half])).toMatchObject({ count: 2, widthIn: 11 });
    expect(bundleTally([half, { ...half, lengthMm: 10 * foot }])).toMatchObject({ widthIn: 12 });
  });

  // Three counts of one lot differ: trade reference, section 0, trap 8.
  it("differs from surface measure and from true volume", () => {
    const lines = [{ quarters: 4, widthMm: 5.25 * inch, lengthMm: 8.5 * foot, count: 10 }];
    expect(bundleTally(lines).boardFeet).toBeCloseTo((50 * 8) / 12, 9);
    expect(tally(lines).boardFeet).toBe(35);
    expect(tally(lines).unroundedBoardFeet).toBeCloseTo(37.1875, 9);
  });
});
