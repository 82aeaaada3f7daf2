import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { parseLength } from "./parse-length.ts";
import { type Denominator, lengthParts, printLength } from "./print-length.ts";

describe("a length as the shop writes it", () => {
  it.each([
    [209.55, "8 1/4"],
    [203.2, "8"],
    [22.225, "7/8"],
    [0.396875, "1/64"],
    [0, "0"],
    [0.1, "0"],
    // DECIMAL(7,2) keeps 8 1/64 in as 203.60.
    [203.6, "8 1/64"],
    [-3.175, "-1/8"],
  ])("%f mm is %s in", (mm, expected) => {
    expect(printLength(mm, "in")).toBe(expected);
  });

  it("writes tenths of a millimetre, and none where there is none", () => {
    expect(printLength(210, "mm")).toBe("210");
    expect(printLength(210.46, "mm")).toBe("210.5");
    expect(printLength(-0.04, "mm")).toBe("0");
  });

  it("rounds to the coarser part asked for, carrying into the whole", () => {
    expect(printLength(8.97 * 25.4, "in", { denominator: 16 })).toBe("9");
    expect(printLength(8.26 * 25.4, "in", { denominator: 8 })).toBe("8 1/4");
  });

  it("writes feet and inches when asked", () => {
    expect(printLength(2197.1, "in", { feet: true })).toBe("7' 2 1/2\"");
    expect(printLength(2133.6, "in", { feet: true })).toBe("7'");
    expect(printLength(209.55, "in", { feet: true })).toBe('8 1/4"');
    expect(printLength(3050, "mm", { feet: true })).toBe("3050");
  });

  it("takes a length apart for setting", () => {
    expect(lengthParts(209.55, "in")).toEqual({ sign: "", whole: 8, numerator: 1, denominator: 4, unit: "in" });
    expect(lengthParts(203.2, "in")).toEqual({ sign: "", whole: 8, numerator: 0, denominator: 1, unit: "in" });
    expect(lengthParts(-210.5, "mm")).toEqual({ sign: "-", whole: 210.5, numerator: 0, denominator: 1, unit: "mm" });
  });

  it("refuses what is no number", () => {
    expect(() => printLength(Number.NaN, "in")).toThrow(RangeError);
    expect(() => lengthParts(Number.POSITIVE_INFINITY, "mm")).toThrow(RangeError);
  });
});

describe("printing and parsing lose nothing", () => {
  const read = (text: string, unit: "in" | "mm") => {
    const parsed = parseLength(text, unit, { zero: true });
    return parsed.ok ? parsed.mm : parsed.why;
  };

  it("on the 1/64 in grid, with and without feet", () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 50_000 }), fc.boolean(), (sixtyFourths, feet) => {
        const mm = (sixtyFourths * 396_875) / 1e6;
        expect(read(printLength(mm, "in", { feet }), "in")).toBe(mm);
      }),
    );
  });

  it("on the 0.1 mm grid", () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 200_000 }), (tenths) => {
        expect(read(printLength(tenths / 10, "mm"), "mm")).toBe(tenths / 10);
      }),
    );
  });

  it("off the grid by no more than half a step", () => {
    const denominators: Denominator[] = [2, 4, 8, 16, 32, 64];
    fc.assert(
      fc.property(
        fc.double({ min: 0, max: 19_900, noNaN: true }),
        fc.constantFrom(...denominators),
        (mm, denominator) => {
          const back = Number(read(printLength(mm, "in", { denominator }), "in"));
          expect(Math.abs(back - mm)).toBeLessThanOrEqual(25.4 / denominator / 2 + 1e-6);
        },
      ),
    );
  });

  it("and what is kept to a hundredth of a millimetre still prints as it was typed", () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 50_000 }), (sixtyFourths) => {
        const kept = Math.round(sixtyFourths * 39.6875) / 100;
        expect(printLength(kept, "in")).toBe(printLength(sixtyFourths * 0.396875, "in"));
      }),
    );
  });
});
