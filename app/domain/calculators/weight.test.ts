import { describe, expect, test } from "vitest";
import { printMass, shopMass } from "#app/domain/weight/mass-text.ts";
import { aShopLike, boxes } from "./shop.fixture.ts";
import { askWeight } from "./weight.ts";

const inches = aShopLike();

describe("the weight page", () => {
  test("bare: 8/4 sugar maple, 8 bf, at 8 % weighs 28.2 lb (Wood Handbook Eq. 4-9, 4-11, 4-14)", () => {
    const { answer } = askWeight(boxes({}), inches);
    expect(Math.abs(shopMass(answer?.boardKg ?? 0, "in") - 28.2)).toBeLessThan(0.2);
    expect(printMass(answer?.boardKg ?? 0, "in")).toBe("28.2 lb");
  });

  test("white ash at 12 %: 3.48 lb per board foot (same equations)", () => {
    const { answer } = askWeight(boxes({ species: "white-ash", moisture: "12" }), inches);
    expect(Math.abs((answer?.poundsPerBoardFoot ?? 0) - 3.48)).toBeLessThan(0.01);
  });

  test("three arms bear 3/16, 5/8 and 3/16, together the stack (equation of three moments)", () => {
    const { answer } = askWeight(boxes({ arms: "3" }), inches);
    if (!answer) throw new Error("no answer");
    expect(answer.arms.map(({ massKg }) => Math.round((massKg / answer.stackKg) * 16) / 16)).toEqual([
      3 / 16,
      5 / 8,
      3 / 16,
    ]);
  });

  test("a rating is read in the shop's unit, and going over it is said", () => {
    const { answer } = askWeight(boxes({ arms: "3", rating: "150" }), inches);
    expect(answer?.arms[1]?.ratedKg).toBeCloseTo(68.04, 1);
    expect(answer?.arms[1]?.state).toBe("over-rating");
  });

  test("more water than the wood can hold is refused with how much it can", () => {
    expect(askWeight(boxes({ moisture: "290" }), inches).refused).toMatch(/from 0 to \d+ %/);
  });

  test.each([
    ["count", "0"],
    ["arms", "1"],
    ["rating", "-5"],
    ["length", ""],
    ["moisture", "wet"],
  ])("%s = %j is refused beside its box", (name, typed) => {
    expect(askWeight(boxes({ [name]: typed }), inches).errors[name as "count"]).toHaveLength(1);
  });
});
