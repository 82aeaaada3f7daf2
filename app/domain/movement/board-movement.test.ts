import { describe, expect, test } from "vitest";
import { fieldFromPith } from "#app/core/rings/stations.ts";
import { placeFor } from "#app/domain/moisture/places.ts";
import { boardMovement, largestStep } from "./board-movement.ts";
import { printChange, printSmall } from "./change-text.ts";

const place = placeFor("most-of-us", { targetHumidityPct: 40, targetTemperatureC: 20 });
const size = { widthMm: 232, thicknessMm: 25.4 };
const rings = fieldFromPith(size, { xMm: 116, yMm: 90 });

describe("how a board on the rack will move", () => {
  test("white fir read as flat, 232 mm, 8 to 10 %: between all flat and all quartered (Wood Handbook Eq. 13-2, C 0.00245 and 0.00112)", () => {
    const found = boardMovement({ species: "white-fir", ...size, rings, moisturePct: 8 }, place);
    if (!found.ok) throw new Error(found.why);
    const damp = found.steps.find(({ moved }) => moved.toPct === 10)!;
    expect(damp.moved.section.widthChangeMm).toBeLessThan(232 * 0.00245 * 2);
    expect(damp.moved.section.widthChangeMm).toBeGreaterThan(232 * 0.00112 * 2);
    expect(found.isRange).toBe(false);
  });

  test("without a reading both extremes are given: 1.14 mm flat, 0.52 mm quartered (same equation)", () => {
    const found = boardMovement({ species: "white-fir", ...size, rings: null, moisturePct: 8 }, place);
    if (!found.ok) throw new Error(found.why);
    const damp = found.steps.filter(({ moved }) => moved.toPct === 10).map(({ moved }) => moved.section.widthChangeMm);
    expect(found.isRange).toBe(true);
    expect(damp[0]).toBeCloseTo(232 * 0.00245 * 2, 6);
    expect(damp[1]).toBeCloseTo(232 * 0.00112 * 2, 6);
  });

  test("the reading's own size does not stand in the way of a board planed since", () => {
    const found = boardMovement({ species: "white-oak", widthMm: 200, thicknessMm: 20, rings, moisturePct: 12 }, place);
    if (!found.ok) throw new Error(found.why);
    expect(found.steps[0]?.moved.widthMm).toBe(200);
  });

  test("the step drawn is the one that moves most", () => {
    const found = boardMovement({ species: "white-oak", ...size, rings, moisturePct: 12 }, place);
    if (!found.ok) throw new Error(found.why);
    expect(largestStep(found.steps)?.moved.toPct).toBe(6);
  });

  test("what is missing is said", () => {
    expect(boardMovement({ species: "white-oak", ...size, rings, moisturePct: null }, place)).toMatchObject({
      ok: false,
    });
    expect(boardMovement({ species: "shop-own", ...size, rings, moisturePct: 8 }, place)).toMatchObject({ ok: false });
  });

  test("a soaking wet board counts from where shrinkage begins", () => {
    const found = boardMovement({ species: "white-oak", ...size, rings, moisturePct: 70 }, place);
    if (!found.ok) throw new Error(found.why);
    expect(found.steps[0]?.moved.growth.outsideRange).toMatch(/above 30 %/);
  });
});

test("small changes are written with a sign, finer than a rule", () => {
  expect(printChange(1.7018, "in")).toBe("+0.067 in");
  expect(printChange(-1.7, "mm")).toBe("−1.70 mm");
  expect(printChange(-0.001, "mm")).toBe("0.00 mm");
  expect(printSmall(-1.7, "mm")).toBe("1.70 mm");
});
