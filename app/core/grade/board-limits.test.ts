import { describe, expect, test } from "vitest";
import { commonSideLimitsBroken, fasLimitsBroken } from "./board-limits.ts";
import { gradeBoard } from "./grade-board.ts";

const inch = 25.4;
/** 8 in by 12 ft, a surface measure of 8. */
const face = { widthMm: 8 * inch, lengthMm: 144 * inch };
const spot = (kind: string | undefined, along: number, across: number, long: number, wide: number) => ({
  kind,
  alongMm: along * inch,
  acrossMm: across * inch,
  lengthMm: long * inch,
  widthMm: wide * inch,
});

// Limits of FAS: NHLA summary chart as the trade reference, section 2, and a distributor's copy of it give them [secondary].
describe("FAS's limits at a surface measure of 8", () => {
  const broken = (...defects: ReturnType<typeof spot>[]) => fasLimitsBroken(face, defects, 8);

  test("a clear face breaks none", () => expect(broken()).toEqual([]));

  test("pith no longer in inches than the surface measure, its pieces added", () => {
    expect(broken(spot("pith", 60, 4, 8, 0.3))).toEqual([]);
    expect(broken(spot("pith", 60, 4, 8.1, 0.3))).toEqual(["Pith 8.1 in long; it allows 8 in, the surface measure."]);
    expect(broken(spot("pith", 30, 4, 5, 0.3), spot("pith", 90, 4, 5, 0.3))).toHaveLength(1);
  });

  test("splits of both ends together no longer than twice it, or 12 in where that is more", () => {
    expect(broken(spot("split", 0, 4, 8, 0.1), spot("split", 136, 4, 8, 0.1))).toEqual([]);
    expect(broken(spot("split", 0, 4, 16.5, 0.1))).toEqual(["Splits 16.5 in long together; it allows 16 in."]);
    expect(fasLimitsBroken(face, [spot("split", 0, 4, 12, 0.1)], 4)).toEqual([]);
    expect(fasLimitsBroken(face, [spot("split", 0, 4, 12.5, 0.1)], 4)).toHaveLength(1);
  });

  test("knots and holes no wider than a third of it", () => {
    expect(broken(spot("knot", 60, 2, 2.6, 2.6))).toEqual([]);
    expect(broken(spot("knot", 60, 2, 3, 2.6))).toEqual([
      "A knot or hole 2.8 in across; it allows 2.67 in, a third of the surface measure.",
    ]);
    expect(broken(spot("hole", 60, 2, 3, 3))).toHaveLength(1);
  });

  test("wane along no more than half of either edge, overlapping pieces counted once", () => {
    expect(broken(spot("wane", 0, 0, 72, 0.5), spot("wane", 72, 7.5, 72, 0.5))).toEqual([]);
    expect(broken(spot("wane", 0, 0, 50, 0.5), spot("wane", 40, 0, 30, 0.3))).toEqual([]);
    expect(broken(spot("wane", 0, 0, 50, 0.5), spot("wane", 80, 0, 30, 0.3))).toEqual([
      "Wane along 56 % of the length; it allows half.",
    ]);
  });

  test("each end's first foot no more than a quarter unsound, and only what lies in it", () => {
    expect(broken(spot("decay", 0, 0, 12, 2))).toEqual([]);
    expect(broken(spot("decay", 132, 0, 12, 2.4))).toEqual([
      "The far end's first foot is 30 % unsound; it allows 25 %.",
    ]);
    expect(broken(spot("decay", 12, 0, 100, 8))).toEqual([]);
    expect(broken(spot("stain", 0, 0, 12, 8))).toEqual([]);
    expect(broken(spot("wane", 0, 0, 12, 3))).toEqual([]);
  });

  test("a defect without a kind breaks no limit", () => {
    expect(broken(spot(undefined, 0, 0, 144, 8))).toEqual([]);
  });

  test("Selects of 4 and 5 in add the wane of both edges, and it may be a third of the width", () => {
    const narrow = { widthMm: 5 * inch, lengthMm: 96 * inch };
    const ofNarrow = (...wane: ReturnType<typeof spot>[]) => fasLimitsBroken(narrow, wane, 3, { narrow: true });
    expect(ofNarrow(spot("wane", 0, 0, 24, 0.8), spot("wane", 0, 4.2, 24, 0.8))).toEqual([]);
    expect(ofNarrow(spot("wane", 0, 0, 30, 0.5), spot("wane", 0, 4.5, 30, 0.5))).toEqual([
      "Wane along 63 % of the length, edges added; it allows half.",
    ]);
    expect(ofNarrow(spot("wane", 0, 0, 24, 1), spot("wane", 0, 4, 24, 1))).toEqual([
      "Wane 40 % of the width; it allows a third.",
    ]);
  });
});

test("the No. 1 Common side takes wane up to a third of the width, edges added, and half of the length of either", () => {
  const broken = (...wane: ReturnType<typeof spot>[]) => commonSideLimitsBroken(face, wane, false);
  expect(broken(spot("wane", 0, 0, 72, 1.3), spot("wane", 72, 6.7, 72, 1.3))).toEqual([]);
  expect(broken(spot("wane", 0, 0, 20, 1.6), spot("wane", 0, 6.4, 20, 1.6))).toEqual([
    "Wane 40 % of the width; it allows a third.",
  ]);
  expect(broken(spot("wane", 0, 0, 80, 0.5))).toHaveLength(1);
});

describe("the limits in a board's grade", () => {
  const board = { ...face, heartFace: [], barkFace: [] };

  test.each([
    ["pith", spot("pith", 60, 0, 20, 0.3), /^Pith 20 in long/],
    ["wane", spot("wane", 0, 0, 100, 0.4), /^Wane along 69 %/],
    ["a split", spot("split", 0, 7, 18, 0.1), /^Splits 18 in/],
  ])("%s past its limit keeps a face with cuttings enough from FAS, and it says why", (_, defect, why) => {
    const graded = gradeBoard({ ...board, barkFace: [defect] });
    const tried = graded.poorer.tries[0];
    expect(tried).toMatchObject({ grade: "FAS", passes: false, why: expect.stringMatching(why), isProven: true });
    expect(tried?.unitsFound ?? 0).toBeGreaterThanOrEqual(tried?.unitsNeeded ?? Number.POSITIVE_INFINITY);
    expect(graded.poorer.grade).toBe("No. 1 Common");
  });

  test("too much wane on the No. 1 Common side keeps the board from FAS One Face, and it says why", () => {
    const some = gradeBoard({ ...board, barkFace: [spot("wane", 0, 0, 70, 2), spot("knot", 72, 3, 4, 4)] });
    expect(some).toMatchObject({ boardGrade: "FAS One Face", whyNotOneFace: null });
    const most = gradeBoard({ ...board, barkFace: [spot("wane", 0, 0, 100, 0.4)] });
    expect(most).toMatchObject({
      better: { grade: "FAS" },
      boardGrade: "No. 1 Common",
      whyNotOneFace: "Wane along 69 % of the length; it allows half.",
    });
  });
});
