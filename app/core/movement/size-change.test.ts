import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { allSpecies, speciesByCode } from "#app/core/species/species.ts";
import {
  changeByCoefficient,
  changeByShrinkage,
  coefficientFromShrinkage,
  growthByShrinkage,
  shrinkageToPct,
} from "./size-change.ts";

const moisture = fc.double({ min: 0, max: 30, noNaN: true });
const size = fc.double({ min: 1, max: 3000, noNaN: true });

describe("change of size by coefficient (Wood Handbook Eq. 13-2)", () => {
  it("gives the handbook's own example: white fir, flatsawn, 232 mm, 8 to 11 % (confirmed)", () => {
    const coefficient = speciesByCode("white-fir")!.coefficients!.tangential!;
    expect(changeByCoefficient(232, coefficient, 8, 11)).toBeCloseTo(1.7, 1);
    expect(232 + changeByCoefficient(232, coefficient, 8, 11)).toBeCloseTo(233.7, 1);
    expect(changeByCoefficient(9.15 * 25.4, coefficient, 8, 11) / 25.4).toBeCloseTo(0.067, 3);
  });

  it("is nothing for no change, and there and back leaves no more than the square of the change", () => {
    fc.assert(
      fc.property(size, fc.double({ min: 0.0005, max: 0.005, noNaN: true }), moisture, moisture, (mm, c, from, to) => {
        expect(changeByCoefficient(mm, c, from, from)).toBe(0);
        const there = changeByCoefficient(mm, c, from, to);
        fc.pre(mm + there > 1);
        const back = changeByCoefficient(mm + there, c, to, from);
        expect(Math.abs(there + back)).toBeLessThanOrEqual(mm * (c * (to - from)) ** 2 + 1e-9);
      }),
    );
  });

  it("refuses a negative size, a coefficient in percent, and a moisture that is no number", () => {
    expect(() => changeByCoefficient(-5, 0.002, 8, 10)).toThrow(
      /Size must be a number from 0.001 to 100000 mm; got -5/,
    );
    expect(() => changeByCoefficient(100, 0.2, 8, 10)).toThrow(/Coefficient must be/);
    expect(() => changeByCoefficient(100, 0.002, 8, Number.NaN)).toThrow(/Moisture after must be/);
  });
});

describe("change of size by shrinkage (Wood Handbook Eq. 13-3)", () => {
  it("takes the whole shrinkage from green to ovendry, and none above 30 %", () => {
    expect(changeByShrinkage(100, 8.6, 30, 0)).toBeCloseTo(-8.6, 10);
    expect(changeByShrinkage(100, 8.6, 60, 0)).toBeCloseTo(-8.6, 10);
    expect(changeByShrinkage(100, 8.6, 60, 35)).toBe(0);
    expect(changeByShrinkage(100, 4.9, 22, 0, 22)).toBeCloseTo(-4.9, 10);
  });

  it("is zero there and back, and the same in one step as in two", () => {
    const shrinkage = fc.double({ min: 1, max: 13, noNaN: true });
    fc.assert(
      fc.property(size, shrinkage, moisture, moisture, moisture, (mm, s, from, via, to) => {
        const there = changeByShrinkage(mm, s, from, to);
        fc.pre(mm + there > 0.01);
        expect(there + changeByShrinkage(mm + there, s, to, from)).toBeCloseTo(0, 6);
        const first = changeByShrinkage(mm, s, from, via);
        expect(first + changeByShrinkage(mm + first, s, via, to)).toBeCloseTo(there, 6);
      }),
    );
  });

  it("agrees with shrinkage in proportion to moisture (Eq. 4-9): walnut, 7.8 % to 12 %, 4.68 % (derived)", () => {
    expect(shrinkageToPct(7.8, 12)).toBeCloseTo(4.68, 2);
    expect(growthByShrinkage(7.8, 30, 12) * 100).toBeCloseTo(-shrinkageToPct(7.8, 12), 10);
  });

  it("refuses a shrinkage that no wood has", () => {
    expect(() => changeByShrinkage(100, 0, 8, 10)).toThrow(/Shrinkage must be a number from 0.01 to 30 %/);
  });
});

describe("coefficients from shrinkage", () => {
  it("reproduce the 71 pairs of Table 13-5 that follow from Tables 4-3 and 4-4, and no others, to 0.00002", () => {
    const follows = allSpecies().filter(({ coefficients, shrinkage }) => {
      if (!coefficients?.radial || !coefficients.tangential || !shrinkage) return false;
      const { radialPct, tangentialPct, startsAtPct } = shrinkage;
      return (
        Math.abs(coefficientFromShrinkage(radialPct, startsAtPct) - coefficients.radial) <= 0.0000251 &&
        Math.abs(coefficientFromShrinkage(tangentialPct, startsAtPct) - coefficients.tangential) <= 0.0000251
      );
    });
    expect(follows).toHaveLength(71);
  });

  it("show that the printed line 'Oak, black' is California black oak's (trade reference, trap 4)", () => {
    expect(coefficientFromShrinkage(3.6)).toBeCloseTo(0.00123, 5);
    expect(coefficientFromShrinkage(6.6)).toBeCloseTo(0.0023, 5);
  });
});
