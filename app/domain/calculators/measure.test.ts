import { describe, expect, test } from "vitest";
import { askMeasure } from "./measure.ts";
import { aShopLike, boxes } from "./shop.fixture.ts";

const shop = aShopLike();

describe("the board-feet page", () => {
  test("bare, it works AHEC's example: 2 in x 6-1/4 in x 8 ft is 4 ft2 and 8 bf (AHEC grading guide, Measurement)", () => {
    const { answer } = askMeasure(boxes({}), shop);
    expect(answer?.measure.surfaceMeasureFt2).toBe(4);
    expect(answer?.measure.boardFeet).toBe(8);
    // 8.3333 bf unrounded: definition, 144 in3 per board foot [derived].
    expect(answer?.measure.unroundedBoardFeet).toBeCloseTo(8.3333, 3);
  });

  test("5-1/4 in x 8-1/2 ft counts as 5 in x 8 ft in a bundle (AHEC grading guide)", () => {
    const { answer } = askMeasure(boxes({ width: "5 1/4", length: "8 1/2'" }), shop);
    expect(answer?.bundle.widthIn).toBe(5);
    expect(answer?.countedFeet).toBe(8);
  });

  test("a taper from 10 to 7 in is tallied at 8 in, SM 8 (NHLA General Instructions, from memory)", () => {
    const { answer } = askMeasure(boxes({ quarters: "4", width: "7", widthFar: "10", length: "12'" }), shop);
    expect(answer?.tallyWidthMm).toBeCloseTo(8 * 25.4, 6);
    expect(answer?.measure.surfaceMeasureFt2).toBe(8);
    expect(answer?.isTapered).toBe(true);
  });

  test("27 x 200 mm x 2.5 m is 0.0135 m3 in a metric shop (definition)", () => {
    const { answer } = askMeasure(
      boxes({ quarters: "4", thickness: "27", width: "200", length: "2500", count: "1" }),
      aShopLike({ units: "mm" }),
    );
    expect(answer?.measure.volumeM3).toBeCloseTo(0.0135, 9);
  });

  test("says so where a figure lies outside what the trade sells", () => {
    const { answer } = askMeasure(boxes({ quarters: "3", length: "20'" }), shop);
    expect(answer?.beyond.join(" ")).toMatch(/under 4\/4.*longer/);
  });

  test.each([
    ["width", "", /length/i],
    ["width", "-4", /negative/],
    ["width", "8 1/0", /zero below the line/],
    ["width", "999999", /at most/i],
    ["count", "1.5", /whole number from 1 to 1000/],
    ["count", "NaN", /whole number/],
    ["quarters", "x", /quarters/],
    ["lengths", "banana", /Choose/],
  ])("%s = %j is refused beside its box, and keeps what was typed", (name, typed, message) => {
    const asked = askMeasure(boxes({ [name]: typed }), shop);
    expect(asked.answer).toBeNull();
    expect(asked.errors[name as "width"]?.join(" ")).toMatch(message);
    expect(asked.values[name as "width"]).toBe(typed);
  });
});
