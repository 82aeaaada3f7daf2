import { describe, expect, it } from "vitest";
import { airDryingDays, yearPerInchRule } from "./air-drying.ts";
import { readiness, regionTarget, regionTargets, shopTarget } from "./interior-targets.ts";
import { plySpread } from "./plies.ts";

describe("readiness", () => {
  it("aims at the moisture that the shop's own air holds", () => {
    const target = shopTarget(40, 20);
    expect(target.targetPct).toBeCloseTo(7.7, 1); // Wood Handbook Table 4-2, 68 °F, 40 %
    expect(readiness(8.5, target)).toBe("ready");
    expect(readiness(9, target)).toBe("too-wet");
    expect(readiness(6, target)).toBe("too-dry");
  });

  it("knows the published averages indoors, 8, 6 and 11 % (secondary)", () => {
    expect(regionTargets.map(({ interior }) => interior.averagePct)).toEqual([8, 6, 11]);
  });

  it("differs by the place where the piece will live (ranges of pieces from memory)", () => {
    expect(readiness(9.5, regionTarget("most-of-us"))).toBe("ready");
    expect(readiness(9.5, regionTarget("dry-southwest"))).toBe("too-wet");
    expect(readiness(7, regionTarget("damp-coast"))).toBe("too-dry");
  });

  it("refuses a tolerance of nothing", () => {
    expect(() => shopTarget(40, 20, 0)).toThrow(/0.1 to 5 points/);
  });
});

describe("plies", () => {
  it("may be 2 points apart and no more (common practice)", () => {
    expect(plySpread([8.1, 10.1, 9])).toEqual({ spreadPct: 2, limitPct: 2, isWithin: true, wettest: 1, driest: 0 });
    expect(plySpread([7, 9.2]).isWithin).toBe(false);
    expect(plySpread([7]).spreadPct).toBe(0);
    expect(() => plySpread([])).toThrow(RangeError);
  });
});

describe("air drying", () => {
  it("takes one-inch northern red oak 70-200 days to 20 % (USDA handbooks, from memory) and thicker stock longer", () => {
    expect(airDryingDays("northern-red-oak", 25.4)).toEqual({ shortestDays: 70, longestDays: 200, outsideRange: null });
    expect(airDryingDays("northern-red-oak", 50.8)?.longestDays).toBeCloseTo(565.7, 1);
    expect(airDryingDays("ipe", 25.4)).toBeNull();
    expect(airDryingDays("white-oak", 120)?.outsideRange).toMatch(/1 in lumber/);
  });

  it("knows the old rule of a year per inch (common practice)", () => {
    expect(yearPerInchRule(50.8)).toBe(2);
  });
});
