import { describe, expect, test } from "vitest";
import { fieldFromPith } from "./stations.ts";
import { stripField } from "./strip-field.ts";

const size = { widthMm: 200, thicknessMm: 26 };
const pith = { xMm: -60, yMm: 150 };

// Geometry of circles: a strip's rings are those of the same pith, seen from the strip's own corner.
describe("stripField", () => {
  test("a strip shows what its own pith says", () => {
    const strip = stripField(fieldFromPith(size, pith, 9), 120, 200);
    const own = fieldFromPith({ widthMm: 80, thicknessMm: 26 }, { xMm: pith.xMm - 120, yMm: pith.yMm });
    expect(strip.widthMm).toBe(80);
    expect(strip.ringsPerInch).toBe(9);
    for (const [i, station] of strip.stations.entries())
      expect(Math.abs(station.angleDeg - (own.stations[i]?.angleDeg ?? 0))).toBeLessThan(0.5);
  });

  test("the whole width is the whole reading", () => {
    const field = fieldFromPith(size, pith);
    for (const [i, station] of stripField(field, 0, 200).stations.entries())
      expect(Math.abs(station.angleDeg - (field.stations[i]?.angleDeg ?? 0))).toBeLessThan(0.5);
  });

  test.each([
    [-20, 50],
    [150, 260],
    [80, 80],
    [90, 40],
    [Number.NaN, 40],
  ])("from %d to %d is no strip of it", (from, to) => {
    expect(() => stripField(fieldFromPith(size, pith), from, to)).toThrow(RangeError);
  });
});
