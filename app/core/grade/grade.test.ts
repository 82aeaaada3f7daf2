import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { clearCuttings, type FaceArea } from "./clear-cuttings.ts";
import { gradeBoard } from "./grade-board.ts";
import { cuttingUnits, demandsOf, gradeRules } from "./nhla.ts";

const inch = 25.4;
const foot = 12 * inch;
const area = (alongFt: number, acrossIn: number, lengthFt: number, widthIn: number): FaceArea => ({
  alongMm: alongFt * foot,
  acrossMm: acrossIn * inch,
  lengthMm: lengthFt * foot,
  widthMm: widthIn * inch,
});
const rule = (name: string) => gradeRules.find((one) => one.name === name) as (typeof gradeRules)[number];

// NHLA standard grade summary chart, as trade reprints give it [derived in the trade reference's worked examples].
describe("the grades' demands", () => {
  test.each([
    [
      "FAS",
      8,
      [
        { units: 80, cuttings: 2 },
        { units: 88, cuttings: 3 },
      ],
    ],
    [
      "No. 1 Common",
      6,
      [
        { units: 48, cuttings: 2 },
        { units: 54, cuttings: 3 },
      ],
    ],
    [
      "No. 2A Common",
      5,
      [
        { units: 30, cuttings: 2 },
        { units: 40, cuttings: 3 },
      ],
    ],
  ])("%s at a surface measure of %d", (name, sm, demands) => {
    expect(demandsOf(rule(name), sm)).toEqual(demands);
  });

  test.each([
    [4, 5, 20],
    [3.5, 4.5, 15.75],
    [2.25, 20 / 12, 3.75],
  ])("a cutting of %d in by %d ft is %d units (1 in by 1 ft is one)", (widthIn, lengthFt, units) => {
    expect(cuttingUnits(widthIn * inch * lengthFt * foot)).toBeCloseTo(units, 9);
  });

  test("a clear piece of 3 in by 6 ft is no FAS cutting: it needs 4 by 5 or 3 by 7", () => {
    expect(clearCuttings({ lengthMm: 6 * foot, widthMm: 3 * inch }, [], rule("FAS").leastCuttings, 4).cuttings).toEqual(
      [],
    );
  });
});

describe("grading a board", () => {
  const clear = { widthMm: 8 * inch, lengthMm: 12 * foot, heartFace: [], barkFace: [] };

  test("a clear board 8 in by 12 ft is FAS, surface measure 8", () => {
    expect(gradeBoard(clear)).toMatchObject({ surfaceMeasure: 8, boardGrade: "FAS", poorer: { grade: "FAS" } });
  });

  test("one knot at the edge leaves enough: two cuttings of 80 units", () => {
    const graded = gradeBoard({ ...clear, barkFace: [area(5, 0, 0.5, 2)] });
    expect(graded.boardGrade).toBe("FAS");
    const last = graded.poorer.tries.at(-1);
    expect(last?.unitsFound ?? 0).toBeGreaterThanOrEqual(80);
  });

  test("a poorer face of No. 1 Common makes FAS One Face, and Selects when the board is too small for it", () => {
    // Between the knots lie 3, 4.6 and 3.6 ft of the full width: too short for FAS, 89 units for No. 1 Common, which asks for 64.
    const spots = [area(3, 3, 0.4, 2), area(8, 2, 0.4, 3)];
    expect(gradeBoard({ ...clear, barkFace: spots })).toMatchObject({
      better: { grade: "FAS" },
      poorer: { face: "bark", grade: "No. 1 Common" },
      boardGrade: "FAS One Face",
    });
  });

  test("too narrow for FAS, clear though it be, and it says why", () => {
    const graded = gradeBoard({ ...clear, widthMm: 5 * inch });
    expect(graded.boardGrade).toBe("No. 1 Common");
    expect(graded.poorer.tries[0]).toMatchObject({
      grade: "FAS",
      passes: false,
      why: "A board of 6 in by 8 ft at least.",
    });
  });

  test("a board full of knots makes none, and it says that it is no certificate", () => {
    const knots = Array.from({ length: 24 }, (_, i) => area(i * 0.5, (i % 4) * 2, 0.2, 2));
    const graded = gradeBoard({ ...clear, heartFace: knots, barkFace: knots });
    expect(graded.boardGrade).not.toBe("FAS");
    expect(graded.notice).toMatch(/no inspector's certificate/);
  });

  test("a size that is none is refused", () => {
    expect(() => gradeBoard({ ...clear, widthMm: 0 })).toThrow(RangeError);
    expect(() => gradeBoard({ ...clear, lengthMm: Number.NaN })).toThrow(RangeError);
  });
});

describe("clear cuttings", () => {
  const face = { lengthMm: 3000, widthMm: 200 };
  const anything = [{ widthMm: 10, lengthMm: 10 }];

  test("the largest clear piece beside one knot is the longer side of it, or the strip past it", () => {
    const knot = { alongMm: 1000, acrossMm: 80, lengthMm: 100, widthMm: 40 };
    expect(clearCuttings(face, [knot], anything, 1).cuttings).toEqual([
      { alongMm: 1100, acrossMm: 0, lengthMm: 1900, widthMm: 200 },
    ]);
  });

  test("cuttings lie on the face, apart from each other and from every defect, and are never smaller than allowed", () => {
    const defect = fc.record({
      alongMm: fc.integer({ min: 0, max: 2900 }),
      acrossMm: fc.integer({ min: 0, max: 190 }),
      lengthMm: fc.integer({ min: 5, max: 300 }),
      widthMm: fc.integer({ min: 5, max: 120 }),
    });
    const least = [{ widthMm: 60, lengthMm: 400 }];
    const apart = (a: FaceArea, b: FaceArea) =>
      a.alongMm + a.lengthMm <= b.alongMm + 1e-6 ||
      b.alongMm + b.lengthMm <= a.alongMm + 1e-6 ||
      a.acrossMm + a.widthMm <= b.acrossMm + 1e-6 ||
      b.acrossMm + b.widthMm <= a.acrossMm + 1e-6;
    fc.assert(
      fc.property(fc.array(defect, { maxLength: 8 }), fc.integer({ min: 1, max: 4 }), (defects, most) => {
        const { cuttings } = clearCuttings(face, defects, least, most);
        expect(cuttings.length).toBeLessThanOrEqual(most);
        for (const [i, one] of cuttings.entries()) {
          expect(
            one.alongMm >= 0 &&
              one.acrossMm >= 0 &&
              one.alongMm + one.lengthMm <= 3000.001 &&
              one.acrossMm + one.widthMm <= 200.001,
          ).toBe(true);
          expect(one.widthMm >= 60 - 1e-6 && one.lengthMm >= 400 - 1e-6).toBe(true);
          for (const spot of defects) expect(apart(one, spot)).toBe(true);
          for (const other of cuttings.slice(i + 1)) expect(apart(one, other)).toBe(true);
        }
      }),
      { numRuns: 60 },
    );
  });

  test("more cuttings never give less clear area", () => {
    const spots = [area(2, 1, 0.3, 2), area(5, 4, 0.3, 2), area(8, 0, 0.3, 3)];
    const one = clearCuttings(face, spots, anything, 1).areaMm2;
    expect(clearCuttings(face, spots, anything, 2).areaMm2).toBeGreaterThanOrEqual(one);
  });
});
