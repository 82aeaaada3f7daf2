import { describe, expect, test } from "vitest";
import { readyWords } from "#app/domain/moisture/ready-words.ts";
import { askReady } from "./ready.ts";
import { aShopLike, boxes } from "./shop.fixture.ts";

const shop = aShopLike();
const air = { temperature: "68", humidity: "40", place: "this-shop" };

/** Exact readings of an approach from 14.2 % to what the air holds (7.7 %), half the gap every 14 days. */
const approach = (days: number[]) => {
  const emc = askReady(boxes({ ...air }), shop).answer?.view.emcPct ?? 0;
  return days.map((day) => `${day} ${(emc + (14.2 - emc) * 2 ** (-day / 14)).toFixed(2)}`).join("\n");
};

describe("the readiness page", () => {
  test("finds the day that the curve it was given comes within the target (closed form of the approach)", () => {
    const { answer } = askReady(boxes({ ...air, readings: approach([0, 5, 10, 15, 20, 25, 30]) }), shop);
    const emc = answer?.view.emcPct ?? 0;
    const due = 14 * Math.log2((14.2 - emc) / 1);
    expect(answer?.view.forecast.state).toBe("forecast");
    expect(Math.abs((answer?.view.readyDay?.likely ?? 0) - due)).toBeLessThan(4);
    expect(answer?.view.readyDay?.earliest).toBeLessThan(due);
    expect(answer?.view.readyDay?.latest).toBeGreaterThan(due);
  });

  test("the air's figure is that of Wood Handbook Table 4-2: 68 °F and 40 % hold wood at 7.7 %", () => {
    expect(askReady(boxes(air), shop).answer?.view.emcPct).toBeCloseTo(7.7, 1);
  });

  test("two readings are not enough, and that is said, not guessed", () => {
    const { answer } = askReady(boxes({ ...air, readings: "0 12\n7 11" }), shop);
    if (!answer) throw new Error("no answer");
    expect(answer.view.readyDay).toBeNull();
    expect(answer.view.ahead).toEqual([]);
    expect(readyWords(answer.view).headline).toMatch(/not yet known/);
    expect(readyWords(answer.view).detail).toMatch(/Three readings/);
  });

  test("a room too damp for the target says that it will never be ready there", () => {
    const { answer } = askReady(
      boxes({ ...air, humidity: "75", place: "dry-southwest", readings: "0 18\n10 16.5\n20 15.6\n30 15\n40 14.7" }),
      shop,
    );
    if (!answer) throw new Error("no answer");
    expect(readyWords(answer.view).headline).toBe("Not in this air");
  });

  test("readings above 30 % are left out and that is said", () => {
    const { answer } = askReady(boxes({ ...air, readings: "0 45\n10 14\n20 12\n30 11\n40 10" }), shop);
    if (!answer) throw new Error("no answer");
    expect(answer.view.readings).toHaveLength(4);
    expect(readyWords(answer.view).cautions.join(" ")).toMatch(/above 30 %/);
  });

  test("dates are kept as dates, and days counted from the first", () => {
    const { answer } = askReady(boxes({ ...air, readings: "2026-10-29 10.1\n2026-10-01 14.2\n2026-10-15 11.6" }), shop);
    expect(answer?.view.startsAt?.toISOString()).toBe("2026-10-01T12:00:00.000Z");
    expect(answer?.view.readings.map(({ day }) => day)).toEqual([0, 14, 28]);
  });

  test.each([
    ["", /at least one/],
    ["yesterday 12", /Line 1/],
    ["0 12\n2026-02-31 12", /Line 2/],
    ["0 12\n2026-10-01 11", /not both/],
    ["0 999", /not wood/],
    ["0 12\n".repeat(300), /At most 200/],
  ])("readings %j are refused beside the box", (readings, message) => {
    const asked = askReady(boxes({ ...air, readings }), shop);
    expect(asked.errors.readings?.[0]).toMatch(message);
    expect(asked.values.readings).toBe(readings);
  });

  test("an unknown place is refused", () => {
    expect(askReady(boxes({ ...air, place: "moon" }), shop).errors.place).toHaveLength(1);
  });
});
