import { describe, expect, test } from "vitest";
import { askAir } from "./air.ts";
import { aShopLike, boxes } from "./shop.fixture.ts";

const inches = aShopLike();
const metric = aShopLike({ units: "mm" });

describe("the air page", () => {
  // Wood Handbook (2021) Table 4-2, printed to a tenth of a point.
  test.each([
    ["70", "50", 9.2],
    ["80", "65", 11.7],
    ["40", "30", 6.3],
  ])("at %s °F and %s percent humidity an inch shop reads %d percent", (temperature, humidity, expected) => {
    const { answer } = askAir(boxes({ temperature, humidity }), inches);
    expect(Math.abs((answer?.settles?.moisturePct ?? 0) - expected)).toBeLessThanOrEqual(0.1);
    expect(answer?.settles?.outsideRange).toBeNull();
  });

  test("at 20 °C and 65 % a metric shop reads 12.0 % (Wood Handbook Eq. 4-5)", () => {
    const { answer } = askAir(boxes({ temperature: "20", humidity: "65" }), metric);
    expect(answer?.settles?.moisturePct).toBeCloseTo(12.0, 1);
  });

  test("back from what it gave to the humidity it came from", () => {
    const there = askAir(boxes({ temperature: "70", humidity: "50" }), inches).answer?.settles?.moisturePct ?? 0;
    const { answer } = askAir(boxes({ temperature: "70", humidity: "", moisture: there.toFixed(4) }), inches);
    expect(answer?.means?.humidityPct).toBeCloseTo(50, 1);
  });

  test("outside the published table is said, not refused", () => {
    expect(askAir(boxes({ temperature: "0", humidity: "50" }), inches).answer?.settles?.outsideRange).toMatch(/30 °F/);
    expect(askAir(boxes({ temperature: "70", humidity: "97" }), inches).answer?.settles?.outsideRange).toMatch(/95 %/);
  });

  test.each([
    [{ humidity: "101" }, "humidity"],
    [{ humidity: "", moisture: "" }, "humidity"],
    [{ temperature: "warm" }, "temperature"],
    [{ temperature: "1e9" }, "temperature"],
    [{ moisture: "-1" }, "moisture"],
  ] as const)("%j is refused beside its box", (given, name) => {
    const asked = askAir(boxes(given), inches);
    expect(asked.errors[name]).toHaveLength(1);
    expect(asked.answer).toBeNull();
  });

  test("a moisture that no air gives is refused with the range, not with a failure", () => {
    const asked = askAir(boxes({ temperature: "-20", humidity: "", moisture: "40" }), metric);
    expect(asked.refused).toMatch(/at this temperature/);
  });
});
