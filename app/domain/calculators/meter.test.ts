import { describe, expect, test } from "vitest";
import { askMeter } from "./meter.ts";
import { aShopLike, boxes } from "./shop.fixture.ts";

const inches = aShopLike();

describe("the meter page", () => {
  // Wood Handbook (2010) chapter 13: 0.5 points per 10 °F.
  test.each([
    ["12", "40", 13.5],
    ["9", "90", 8.0],
  ])("a pin reading of %s percent in wood at %s °F is %d percent", (reading, wood, expected) => {
    const { answer } = askMeter(boxes({ reading, wood, calibration: "70" }), inches);
    expect(answer?.corrected.moisturePct).toBeCloseTo(expected, 6);
  });

  test("without a wood temperature nothing is corrected, and that is said", () => {
    const { answer } = askMeter(boxes({ wood: "" }), inches);
    expect(answer?.corrected.correctionPct).toBe(0);
    expect(answer?.corrected.explanation).toMatch(/was not taken/);
  });

  test("a reading no hand meter follows is said to be one", () => {
    expect(askMeter(boxes({ reading: "38" }), inches).answer?.corrected.outsideRange).toMatch(/30 %/);
  });

  test.each([
    ["reading", "201"],
    ["reading", ""],
    ["wood", "500"],
    ["calibration", ""],
    ["meter", "guess"],
  ])("%s = %j is refused", (name, typed) => {
    expect(askMeter(boxes({ [name]: typed }), inches).errors[name as "wood"]).toHaveLength(1);
  });
});
