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
    ["No. 3B Common", 8, [{ units: 24, cuttings: null }]],
    ["Selects", 16, [{ units: 160, cuttings: 4 }]],
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

  test("over 17 ft and a surface measure over 16, one cutting more for each 4, at most 7 (NHLA 2015 p. 22)", () => {
    expect(demandsOf(rule("FAS"), 20, 18)).toEqual([{ units: 200, cuttings: 5 }]);
    expect(demandsOf(rule("FAS"), 40, 18)).toEqual([{ units: 400, cuttings: 7 }]);
    expect(demandsOf(rule("FAS"), 20, 16)).toEqual([{ units: 200, cuttings: 4 }]);
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
    expect(graded.boardGrade).toBe("Selects");
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

  test("a smaller board with one face of FAS cuttings and the other No. 1 Common is Selects", () => {
    const small = { widthMm: 5 * inch, lengthMm: 10 * foot, heartFace: [], barkFace: [area(4.8, 1, 0.4, 3)] };
    expect(gradeBoard(small)).toMatchObject({
      surfaceMeasure: 4,
      better: { face: "heart", grade: "Selects" },
      poorer: { grade: "No. 1 Common" },
      boardGrade: "Selects",
    });
  });

  // A distributor's copy of the NHLA chart [secondary].
  test("the smallest boards are allowed one cutting, of more of the face", () => {
    expect(demandsOf(rule("Selects"), 3)).toEqual([{ units: 33, cuttings: 1 }]);
    expect(demandsOf(rule("No. 1 Common"), 1)).toEqual([{ units: 12, cuttings: 1 }]);
    expect(demandsOf(rule("No. 1 Common"), 2)).toEqual([{ units: 18, cuttings: 1 }]);
    expect(demandsOf(rule("No. 2A Common"), 1)).toEqual([{ units: 8, cuttings: 1 }]);
    const five = { widthMm: 5 * inch, lengthMm: 8 * foot, heartFace: [], barkFace: [] };
    expect(gradeBoard(five)).toMatchObject({ surfaceMeasure: 3, boardGrade: "Selects" });
    // 5 in by 6 ft, 30 units of clear wood, counts as 3 ft²: clear all over is enough, though SM x 11 is 33.
    expect(gradeBoard({ ...five, lengthMm: 6 * foot })).toMatchObject({ surfaceMeasure: 3, boardGrade: "Selects" });
    // An inch of 8 ft gone leaves 39.6 units of the 33; a foot and a half in the middle leaves 16 in the one cutting.
    expect(gradeBoard({ ...five, barkFace: [area(0, 0, 1 / 12, 5)] }).poorer.grade).toBe("Selects");
    expect(gradeBoard({ ...five, barkFace: [area(3.5, 0, 1.5, 5)] }).poorer.grade).not.toBe("Selects");
  });

  test("a kiln-dried board may be 1/4 in under a grade's least width, no more (NHLA 2023 p. 56)", () => {
    const dried = (widthIn: number, isKilnDried?: boolean) =>
      gradeBoard({ ...clear, widthMm: widthIn * inch, isKilnDried }).boardGrade;
    expect(dried(5.75, true)).toBe("FAS");
    expect(dried(5.75)).toBe("Selects");
    expect(dried(5.7, true)).toBe("Selects");
    expect(gradeBoard({ ...clear, widthMm: 5 * inch, isKilnDried: true }).poorer.tries[0]?.why).toBe(
      "A board of 6 in, or 5.75 in once kiln dried, by 8 ft at least.",
    );
  });

  test("an exact half foot of surface measure goes up, whatever a millimetre's noise says (AHEC for widths; NHLA, from memory)", () => {
    expect(gradeBoard({ ...clear, widthMm: 6.5 * inch }).surfaceMeasure).toBe(7);
    expect(gradeBoard({ ...clear, widthMm: 6.5 * inch - 0.001 }).surfaceMeasure).toBe(7);
  });

  test("a tapering board is as wide as it is a third from its narrow end, and may not pass by having less to ask of", () => {
    // 8 in at one end and 4 at the other: 5 1/3 in, too narrow for FAS. 12 and 6: 8 in, of which 6 are there from end to end, three quarters.
    expect(gradeBoard({ ...clear, widthFarMm: 4 * inch }).poorer.tries[0]?.why).toMatch(/^A board of 6 in/);
    const wide = gradeBoard({ ...clear, widthMm: 12 * inch, widthFarMm: 6 * inch });
    expect(wide).toMatchObject({ surfaceMeasure: 8, boardGrade: "No. 1 Common" });
  });

  test("the 97 % rule: two full-width cuttings of any length that make SM x 11.64 are FAS", () => {
    // 8 in by 12 ft, a check right across at 2 ft, 0.3 ft long: 93.6 of 96 units, but 2 ft is too short for FAS cuttings.
    const across = [area(2, 0, 0.3, 8)];
    const graded = gradeBoard({ ...clear, barkFace: across });
    expect(graded.poorer.tries[0]).toMatchObject({ grade: "FAS", passes: true, unitsNeeded: 93.12 });
    expect(gradeBoard({ ...clear, barkFace: [area(2, 0, 0.4, 8)] }).poorer.tries[0]?.passes).toBe(false);
  });

  test("stain bars clear cuttings but not sound ones, and sapwood neither", () => {
    const all = (kind: string) => [{ ...area(0, 0, 12, 8), kind }];
    expect(gradeBoard({ ...clear, barkFace: all("sapwood") }).boardGrade).toBe("FAS");
    expect(gradeBoard({ ...clear, barkFace: all("stain") }).poorer.grade).toBe("No. 2B Common");
    expect(gradeBoard({ ...clear, barkFace: all("decay") })).toMatchObject({
      better: { grade: null },
      poorer: { grade: null },
      boardGrade: null,
    });
  });

  test("No. 3B Common takes sound pieces of 36 in² that are 1 1/2 in wide", () => {
    // Of every 12 in the last 4 are rotten right across: 8 ft of 12, and each piece 8 by 8 in is too short for the others' 2 ft.
    const rot = Array.from({ length: 12 }, (_, i) => ({ ...area(i + 8 / 12, 0, 4 / 12, 8), kind: "decay" }));
    const graded = gradeBoard({ ...clear, heartFace: rot, barkFace: rot });
    expect(graded.boardGrade).toBe("No. 3B Common");
    expect(graded.poorer.tries.at(-1)?.unitsFound).toBeCloseTo(64, 6);
  });

  test("a tapering board is cut only where its narrow end's width reaches", () => {
    const graded = gradeBoard({ ...clear, widthFarMm: 7 * inch });
    for (const { widthMm, acrossMm } of graded.better.tries.at(-1)?.found?.cuttings ?? [])
      expect(acrossMm + widthMm).toBeLessThanOrEqual(7 * inch + 1e-6);
  });

  test("a better grade is never given to a face with one defect more, where both answers are proven", () => {
    const spot = fc.record({
      along: fc.integer({ min: 0, max: 11 }),
      across: fc.integer({ min: 0, max: 6 }),
      wide: fc.integer({ min: 1, max: 3 }),
    });
    const rank = (name: string | null) => {
      const at = gradeRules.findIndex((one) => one.name === name);
      return at === -1 ? gradeRules.length : at;
    };
    fc.assert(
      fc.property(fc.array(spot, { minLength: 1, maxLength: 4 }), (spots) => {
        const areas = spots.map(({ along, across, wide }) => area(along, across, 0.5, wide));
        const [fewer, more] = [areas.slice(1), areas].map((barkFace) => {
          const { better, poorer } = gradeBoard({ ...clear, barkFace });
          return better.face === "bark" ? better : poorer;
        });
        if (![fewer, more].every((face) => face?.tries.every((one) => one.isProven))) return;
        expect(rank(fewer?.grade ?? null)).toBeLessThanOrEqual(rank(more?.grade ?? null));
      }),
      { numRuns: 25 },
    );
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
