import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { curveAt } from "./approach-curve.ts";
import { type DryingFit, fitDrying, isFit } from "./drying-fit.ts";
import { dayAfter } from "./drying-readings.ts";
import { moistureAhead } from "./moisture-ahead.ts";

// The model is our own; these are checks of the arithmetic against curves that are known because they were made here.
const made = (days: number[], startPct: number, emcPct: number, halfLife: number) =>
  days.map((at) => ({ at, moisturePct: emcPct + (startPct - emcPct) * 0.5 ** (at / halfLife) }));

function fitted(readings: Parameters<typeof fitDrying>[0], emcPct: number): DryingFit {
  const fit = fitDrying(readings, emcPct);
  if (!isFit(fit)) throw new Error(fit.why);
  return fit;
}

describe("fitting an approach to equilibrium", () => {
  it("finds the curve that readings lie on, drying or wetting", () => {
    const days = fc.uniqueArray(fc.integer({ min: 0, max: 60 }), { minLength: 6, maxLength: 12 });
    const start = fc.double({ min: 2, max: 28, noNaN: true });
    fc.assert(
      fc.property(days, start, fc.double({ min: 4, max: 80, noNaN: true }), (at, startPct, halfLife) => {
        const readings = made(at, startPct, 8, halfLife);
        const fit = fitted(readings, 8);
        for (const { at: day, moisturePct } of readings) {
          expect(Math.abs(curveAt(fit.curve, day - Math.min(...at)) - moisturePct)).toBeLessThan(0.15);
        }
      }),
    );
  });

  it("finds the half life and the noise", () => {
    const readings = made([0, 5, 10, 15, 20, 30, 40], 16, 7, 12).map(({ at, moisturePct }, i) => ({
      at,
      moisturePct: moisturePct + (i % 2 ? 0.2 : -0.2),
    }));
    const fit = fitted(readings, 7);
    expect(fit.halfLifeDays).toBeGreaterThan(10.5);
    expect(fit.halfLifeDays).toBeLessThan(13.5);
    expect(fit.noisePct).toBeGreaterThan(0.15);
    expect(fit.noisePct).toBeLessThan(0.35);
  });

  it("disbelieves a stray reading, names it, and keeps the curve", () => {
    const readings = made([0, 4, 8, 12, 16, 20, 24], 15, 7, 10);
    readings[3]!.moisturePct += 6;
    const fit = fitted(readings, 7);
    expect(fit.outliers).toEqual([3]);
    expect(fit.halfLifeDays).toBeCloseTo(10, 0);
  });

  it("takes readings in any order and as dates", () => {
    const start = new Date("2026-03-01T08:00:00Z");
    const readings = made([0, 6, 12, 18], 14, 7, 9).map(({ at, moisturePct }) => ({
      at: dayAfter(start, at),
      moisturePct,
    }));
    expect(fitted(readings.toReversed(), 7).halfLifeDays).toBeCloseTo(9, 0);
  });

  it("leaves out what no hand meter can read, and says so", () => {
    const fit = fitted([{ at: -10, moisturePct: 55 }, ...made([0, 6, 12, 18], 28, 8, 9)], 8);
    expect(fit.outsideRange).toBe("1 of 5 readings are above 30 % and were left out.");
    expect(fit.series.days).toEqual([0, 6, 12, 18]);
  });

  it("needs three different days", () => {
    expect(fitDrying([], 8)).toEqual({ why: "Three readings on different days are needed; there are 0 so far." });
    const sameDay = [0, 0.1, 0.2, 0.3].map((at) => ({ at, moisturePct: 12 }));
    expect(fitDrying(sameDay, 8)).toEqual({ why: "Three readings on different days are needed; there is 1 so far." });
  });

  it("refuses bad readings", () => {
    expect(() => fitDrying([{ at: Number.NaN, moisturePct: 9 }], 8)).toThrow(/valid date or a finite number/);
    expect(() => fitDrying([{ at: 1, moisturePct: -2 }], 8)).toThrow(/Reading must be a number from 0 to 600 %/);
    expect(() =>
      fitDrying(
        [
          { at: 1, moisturePct: 9 },
          { at: new Date(0), moisturePct: 9 },
        ],
        8,
      ),
    ).toThrow(/all as dates/);
    expect(() => fitDrying([], 45)).toThrow(/0 to 30 %/);
  });
});

describe("the range of moisture to come", () => {
  it("holds the true curve and widens beyond the readings", () => {
    const readings = made([0, 7, 14, 21, 28], 15, 7.5, 14);
    const ahead = moistureAhead(fitted(readings, 7.5), [0, 14, 28, 70]);
    for (const { day, lowPct, highPct } of ahead) {
      const truth = 7.5 + 7.5 * 0.5 ** (day / 14);
      expect(truth).toBeGreaterThan(lowPct);
      expect(truth).toBeLessThan(highPct);
    }
    expect(ahead[3]!.highPct - ahead[3]!.lowPct).toBeGreaterThan(ahead[1]!.highPct - ahead[1]!.lowPct);
  });
});
