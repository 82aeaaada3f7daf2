import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { glueBatches } from "./batches.ts";
import { cautionsFor } from "./cautions.ts";
import { clampsFor, glueGrams, newtonsFromLbf } from "./clamps.ts";
import { millingSheet, roughLengths } from "./milling.ts";
import { planerPasses, resawing } from "./passes.ts";
import { glueLines, pliesNeeded, plyAlternatives } from "./plies.ts";
import { bendingLeftPct, combinedSlope, d245BendingPct, hankinson, slopeDeg } from "./slope-of-grain.ts";

const inch = 25.4;

describe("plies and glue lines", () => {
  test("common practice, no source: two full plies of 4/4 glue up to about 2 in and mill to a 1 1/2 in blank", () => {
    const plan = pliesNeeded({
      finishedMm: 1.5 * inch,
      stockMm: inch,
      jointPerFaceMm: inch / 32,
      allowanceMm: inch / 4,
    });
    expect(plan?.plies).toBe(2);
    expect((plan?.gluedMm ?? 0) / inch).toBeCloseTo(1.9375, 6);
  });

  test("trade reference, derived: three plies of 4/4 surfaced to 13/16 in make 2 7/16 in", () => {
    expect(
      (pliesNeeded({ finishedMm: 2.4 * inch, stockMm: 0.8125 * inch, jointPerFaceMm: 0, allowanceMm: 0 })?.gluedMm ??
        0) / inch,
    ).toBeCloseTo(2.4375, 9);
  });

  test("of several stocks the one that wastes least comes first, then the fewer plies, and one that cannot is left out", () => {
    const blank = { finishedMm: 1.5 * inch, jointPerFaceMm: inch / 16, allowanceMm: inch / 4 };
    const found = plyAlternatives(blank, [inch, 2 * inch, 1.75 * inch, 0.125 * inch]);
    expect(found.map(({ stockMm, plan }) => [stockMm / inch, plan.plies])).toEqual([
      [1.75, 1],
      [2, 1],
      [1, 2],
    ]);
    expect((found[2]?.plan.lostAtGlueFacesMm ?? 0) / inch).toBeCloseTo(1 / 8, 9);
    expect(found[1]?.plan.lostAtGlueFacesMm).toBe(0);
  });

  test("taking all of it from one side leaves the glue line off the middle by half of what was taken", () => {
    const [even] = glueLines([inch, inch], inch / 4, inch / 4);
    expect(even?.offMiddleMm).toBeCloseTo(0, 9);
    const [one] = glueLines([inch, inch], inch / 2, 0);
    expect((one?.offMiddleMm ?? 0) / inch).toBeCloseTo(-0.25, 9);
  });

  test("glue lines always lie inside the blank, in order", () => {
    const plies = fc.array(fc.double({ min: 5, max: 60, noNaN: true }), { minLength: 2, maxLength: 6 });
    fc.assert(
      fc.property(
        plies,
        fc.double({ min: 0, max: 1, noNaN: true }),
        fc.double({ min: 0, max: 1, noNaN: true }),
        (sizes, top, bottom) => {
          const taken = [top * (sizes[0] ?? 0), bottom * (sizes.at(-1) ?? 0)] as const;
          const left = sizes.reduce((a, b) => a + b, 0) - taken[0] - taken[1];
          let before = -1e-9;
          for (const { atMm } of glueLines(sizes, ...taken)) {
            expect(atMm).toBeGreaterThanOrEqual(before);
            expect(atMm).toBeLessThanOrEqual(left + 1e-9);
            before = atMm;
          }
        },
      ),
    );
  });

  test("what cannot be is refused with the range, and what no stock makes is null", () => {
    expect(() => pliesNeeded({ finishedMm: -1, stockMm: inch, jointPerFaceMm: 0, allowanceMm: 0 })).toThrow(RangeError);
    expect(() => glueLines([inch, inch], 2 * inch, 0)).toThrow(/0 to 25.4/);
    expect(pliesNeeded({ finishedMm: 900, stockMm: inch, jointPerFaceMm: 1, allowanceMm: 0 })).toBeNull();
  });
});

describe("planing and resawing", () => {
  test("common practice, no source: 2 in to 1 9/16 in by two saw passes leaves 1/16 in for the planer, where planing alone needs about twenty", () => {
    const takeOff = (2 - 1.5) * inch;
    const saw = resawing(takeOff, 3.75 * inch, 3.125 * inch, inch / 8, inch / 16);
    expect(saw?.sawPasses).toBe(2);
    expect((saw?.leftForPlanerMm ?? 0) / inch).toBeCloseTo(1 / 16, 9);
    // At a 40th of an inch a pass.
    expect(planerPasses(takeOff, inch / 40)).toBe(20);
  });

  test("common practice, no source: 3 3/4 in stands taller than a 10 in table saw cuts in one pass, about 3 1/8 in", () => {
    expect(cautionsFor({ rip: { heightMm: 3.75 * inch, bladeHeightMm: 3.125 * inch } }).map(({ id }) => id)).toEqual([
      "rip-tall",
    ]);
    expect(cautionsFor({ rip: { heightMm: 3 * inch, bladeHeightMm: 3.125 * inch } })).toEqual([]);
  });

  test("two passes that do not meet, or nothing to saw off, is no resawing", () => {
    expect(resawing(12, 8 * inch, 3.125 * inch, 3, 2)).toBeNull();
    expect(resawing(4, 3 * inch, 3.125 * inch, 3, 2)).toBeNull();
  });
});

describe("milling steps", () => {
  test("common practice, no source: an 86 in board split in two gives two rough lengths for a part of just over 41 in", () => {
    expect(roughLengths(86 * inch, 41.25 * inch, 1.625 * inch, inch / 8)).toBe(2);
    expect(roughLengths(86 * inch, 43 * inch, 1 * inch, inch / 8)).toBe(1);
  });

  test("trade reference, derived: a 1 3/4 square blank 28 in long begins 2 x 2 x 29 in with 1/4, 1/4 and 1 in allowed", () => {
    const allow = { lengthMm: inch, widthMm: inch / 4, thicknessMm: inch / 4, jointPerFaceMm: 0 };
    const sheet = millingSheet(
      { lengthMm: 28 * inch, widthMm: 1.75 * inch, thicknessMm: 1.75 * inch },
      2 * inch,
      allow,
    );
    const rough = sheet?.steps.find(({ step }) => step === "rip to rough width")?.size;
    expect([rough?.thicknessMm, rough?.widthMm, rough?.lengthMm].map((mm) => (mm ?? 0) / inch)).toEqual(
      [2, 2, 29].map((n) => expect.closeTo(n, 9)),
    );
  });

  test("common practice, no source: 3 3/4 in rough is ripped for a blank of 3 5/8 x 1 1/2 x 42 in", () => {
    const allow = { lengthMm: inch, widthMm: inch / 8, thicknessMm: inch / 4, jointPerFaceMm: inch / 32 };
    const sheet = millingSheet({ lengthMm: 42 * inch, widthMm: 3.625 * inch, thicknessMm: 1.5 * inch }, inch, allow);
    expect(sheet?.plies.plies).toBe(2);
    expect((sheet?.steps.find(({ step }) => step === "rip to rough width")?.size.widthMm ?? 0) / inch).toBeCloseTo(
      3.75,
      9,
    );
    expect(sheet?.steps.at(-1)?.size).toEqual({ lengthMm: 42 * inch, widthMm: 3.625 * inch, thicknessMm: 1.5 * inch });
  });

  test("of three plies only the inner one is jointed on both faces", () => {
    const allow = { lengthMm: inch, widthMm: inch / 4, thicknessMm: inch / 4, jointPerFaceMm: inch / 16 };
    const steps =
      millingSheet({ lengthMm: 700, widthMm: 60, thicknessMm: 2.5 * inch }, inch, allow)?.steps.map(
        ({ step, pieces, size }) => [step, pieces, size.thicknessMm / inch],
      ) ?? [];
    expect(steps.slice(2, 5)).toEqual([
      ["joint a face", 3, 0.9375],
      ["joint the inner plies' other face", 1, 0.875],
      ["glue up", 1, 2.75],
    ]);
  });

  test("no step makes a piece larger, but the glue-up its thickness", () => {
    const size = fc.record({
      lengthMm: fc.integer({ min: 100, max: 2000 }),
      widthMm: fc.integer({ min: 20, max: 200 }),
      thicknessMm: fc.integer({ min: 10, max: 90 }),
    });
    fc.assert(
      fc.property(size, fc.integer({ min: 15, max: 55 }), (finished, stock) => {
        const sheet = millingSheet(finished, stock, { lengthMm: 25, widthMm: 6, thicknessMm: 6, jointPerFaceMm: 1 });
        for (const [i, step] of (sheet?.steps ?? []).entries()) {
          const before = sheet?.steps[i - 1]?.size;
          if (!before) continue;
          expect(step.size.lengthMm).toBeLessThanOrEqual(before.lengthMm);
          expect(step.size.widthMm).toBeLessThanOrEqual(before.widthMm);
          if (step.step !== "glue up") expect(step.size.thicknessMm).toBeLessThanOrEqual(before.thicknessMm + 1e-9);
        }
      }),
    );
  });
});

describe("clamps and glue", () => {
  test("trade reference, derived: 2 x 18 in at 175 psi is 6,300 lbf, seven clamps of 1,000", () => {
    const plan = clampsFor({ lengthMm: 18 * inch, widthMm: 2 * inch }, 175, newtonsFromLbf(1000), 3 * inch);
    expect(plan.forceN / newtonsFromLbf(1)).toBeCloseTo(6300, 0);
    expect(plan.clamps).toBe(7);
  });

  test("trade reference, derived: 3/4 x 36 in at 150 psi is 4,050 lbf", () => {
    expect(
      clampsFor({ lengthMm: 36 * inch, widthMm: 0.75 * inch }, 150, newtonsFromLbf(1000), 3 * inch).forceN /
        newtonsFromLbf(1),
    ).toBeCloseTo(4050, 0);
  });

  test("common practice: through 3 in from pad to glue line one clamp serves 6 in of joint", () => {
    const plan = clampsFor({ lengthMm: 36 * inch, widthMm: 10 }, 1, newtonsFromLbf(1000), 3 * inch);
    expect(plan).toMatchObject({ clamps: 6, decidedBy: "reach" });
    expect(plan.spacingMm / inch).toBeCloseTo(6, 9);
  });

  test("glue over two lines of 0.1 m² is 34 to 50 g (PVA makers' range, from memory)", () => {
    expect(glueGrams({ lengthMm: 1000, widthMm: 100 }, 2)).toEqual({
      low: expect.closeTo(34, 9),
      high: expect.closeTo(50, 9),
    });
  });

  test("batches never use more clamps than the shop owns, and every blank is in one or named", () => {
    const blanks = fc.array(fc.integer({ min: 1, max: 14 }), { maxLength: 30 });
    fc.assert(
      fc.property(blanks, fc.integer({ min: 1, max: 20 }), (needs, owned) => {
        const { batches, tooMany } = glueBatches(
          needs.map((clamps, i) => ({ id: String(i), clamps })),
          owned,
          60,
        );
        for (const batch of batches) expect(batch.clamps).toBeLessThanOrEqual(owned);
        expect([...batches.flatMap((batch) => batch.ids), ...tooMany].map(Number).sort((a, b) => a - b)).toEqual(
          needs.map((_, i) => i),
        );
      }),
    );
  });

  test("a batch stays as long as its slowest blank", () => {
    const needs = [
      { id: "a", clamps: 4, clampMinutes: 90 },
      { id: "b", clamps: 4 },
      { id: "c", clamps: 4 },
    ];
    const { batches } = glueBatches(needs, 8, 45);
    expect(batches.map(({ ids, outMinute }) => [ids.join(), outMinute])).toEqual([
      ["a,b", 90],
      ["c", 135],
    ]);
  });

  test("the second batch goes in when the first comes out", () => {
    const { batches } = glueBatches(
      [
        { id: "a", clamps: 6 },
        { id: "b", clamps: 6 },
      ],
      8,
      45,
      10,
    );
    expect(batches.map(({ startsMinute, outMinute }) => [startsMinute, outMinute])).toEqual([
      [0, 55],
      [55, 110],
    ]);
  });
});

describe("slope of grain", () => {
  test("1 in 15 is 3.81 degrees (arctangent)", () => expect(slopeDeg(15)).toBeCloseTo(3.81, 2));

  test.each([
    [10, 81],
    [15, 89],
  ])("Wood Handbook Table 5-12, from memory: at 1 in %d, %d %% of the bending strength is left", (oneIn, left) => {
    expect(bendingLeftPct(oneIn)).toBe(left);
  });

  test("ASTM D245, as quoted: 61 % at 1 in 10", () => expect(d245BendingPct[10]).toBe(61));

  test("Hankinson, white oak in compression at 15 degrees (Wood Handbook Table 5-3b values): 5,319 psi", () => {
    expect(Math.abs(hankinson(7440, 1070, 15) - 5319)).toBeLessThan(2);
  });

  test("trade reference, derived: 1 in 12 and 1 in 16 together are 1 in 9.6", () =>
    expect(combinedSlope(12, 16)).toBeCloseTo(9.6, 9));

  test("less slope never leaves less strength", () => {
    fc.assert(
      fc.property(
        fc.double({ min: 5, max: 90, noNaN: true }),
        fc.double({ min: 0, max: 30, noNaN: true }),
        (oneIn, more) => {
          expect(bendingLeftPct(oneIn + more) ?? 0).toBeGreaterThanOrEqual(bendingLeftPct(oneIn) ?? 0);
        },
      ),
    );
  });
});

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
