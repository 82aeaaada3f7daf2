import { describe, expect, test } from "vitest";
import { cautionsFor, severities } from "./cautions.ts";

const inch = 25.4;

describe("cautions", () => {
  test("each has words that defer or say what to do, and a source", () => {
    const all = cautionsFor({
      piece: { lengthMm: 100, widthMm: 40, thicknessMm: 5 },
      rip: { heightMm: 100, bladeHeightMm: 79 },
      resawing: true,
      dust: { words: "Dust irritates.", strongSensitiser: true },
      trade: { words: "Listed." },
      armLoadShare: 1.2,
      liftKg: 40,
      gluing: { temperatureC: 4, moisturesPct: [6, 9] },
    });
    expect(all.length).toBeGreaterThan(9);
    for (const caution of all) {
      expect(caution.words.length * caution.source.length).toBeGreaterThan(0);
      expect(["confirmed", "confirmed-secondary", "memory", "practice"]).toContain(caution.confidence);
    }
    const ranks = all.map(({ severity }) => severities.indexOf(severity));
    expect(ranks).toEqual([...ranks].sort((a, b) => a - b));
    expect(new Set(ranks)).toEqual(new Set([0, 1, 2]));
  });

  test("plies exactly 2 points apart by the meter are within 2 points", () => {
    // 8.8 - 6.8 in binary is a hair more than 2.
    expect(cautionsFor({ gluing: { moisturesPct: [6.8, 8.8] } })).toEqual([]);
    expect(cautionsFor({ gluing: { moisturesPct: [6.8, 8.9] } }).map(({ id }) => id)).toEqual(["glue-moisture"]);
  });

  test("taller than two passes reach is no table saw's work, and a narrow rip asks for a push stick", () => {
    const ids = (rip: { heightMm: number; bladeHeightMm: number; fenceGapMm?: number }) =>
      cautionsFor({ rip }).map(({ id }) => id);
    expect(ids({ heightMm: 7 * inch, bladeHeightMm: 3.125 * inch })).toEqual(["rip-too-tall"]);
    expect(ids({ heightMm: inch, bladeHeightMm: 3.125 * inch, fenceGapMm: 2 * inch })).toEqual(["rip-narrow"]);
  });

  test.each([
    { liftKg: Number.NaN },
    { armLoadShare: -1 },
    { piece: { lengthMm: Number.NaN, widthMm: 40, thicknessMm: 20 } },
    { gluing: { moisturesPct: [8, Number.NaN] } },
    { jointer: { minLengthMm: Number.NaN, maxWidthMm: 200 } },
    { planer: { minLengthMm: 300, maxWidthMm: Number.NaN } },
  ])("a figure that is none is refused, and hides no caution: %j", (situation) => {
    expect(() => cautionsFor(situation)).toThrow(RangeError);
  });

  test("an ordinary piece raises none", () => {
    expect(
      cautionsFor({
        piece: { lengthMm: 900, widthMm: 100, thicknessMm: 25 },
        liftKg: 8,
        gluing: { temperatureC: 20, moisturesPct: [7.4, 8.2] },
      }),
    ).toEqual([]);
  });
});
