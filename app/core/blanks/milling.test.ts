import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { cautionsFor } from "./cautions.ts";
import { millingSheet, roughLengths } from "./milling.ts";
import { planerPasses, resawing } from "./passes.ts";

const inch = 25.4;

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
    const rough = sheet?.steps.find(({ step }) => step === "rough length")?.size;
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
    expect(steps.slice(1, 5)).toEqual([
      ["joint a face and an edge", 3, 0.9375],
      ["rip to rough width", 3, 0.9375],
      ["joint the inner plies' other face", 1, 0.875],
      ["glue up", 1, 2.75],
    ]);
  });

  test("common practice, no source: nothing is ripped before it has a straight edge and a flat face, nor cut to length before the last step", () => {
    const allow = { lengthMm: inch, widthMm: inch / 4, thicknessMm: inch / 4, jointPerFaceMm: inch / 16 };
    for (const thicknessMm of [0.7 * inch, 1.5 * inch, 2.5 * inch]) {
      const names =
        millingSheet({ lengthMm: 700, widthMm: 60, thicknessMm }, inch, allow)?.steps.map(({ step }) => step) ?? [];
      expect(names.indexOf("joint a face and an edge")).toBeGreaterThan(0);
      expect(names.indexOf("rip to rough width")).toBeGreaterThan(names.indexOf("joint a face and an edge"));
      expect(names.at(-1)).toBe("cut to length");
      expect(new Set(names).size).toBe(names.length);
    }
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
