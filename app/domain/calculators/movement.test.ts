import { describe, expect, test } from "vitest";
import { cupWords } from "#app/domain/movement/movement-words.ts";
import { hasCup } from "#app/domain/movement/section-movement.ts";
import { askMovement } from "./movement.ts";
import { aShopLike, boxes } from "./shop.fixture.ts";

const inches = aShopLike();
const metric = aShopLike({ units: "mm" });
const flat = { rings: "angle", angle: "0" };

describe("the movement page", () => {
  test("white fir, flatsawn, 232 mm, 8 to 11 %: +1.7 mm (Wood Handbook ch. 13, example below Eq. 13-2)", () => {
    const { answer } = askMovement(boxes({ ...flat, species: "white-fir", width: "232", from: "8", to: "11" }), metric);
    expect(Math.abs((answer?.moved.section.widthChangeMm ?? 0) - 1.7)).toBeLessThan(0.05);
    expect(answer?.moved.growth.formula).toBe("Eq. 13-2");
  });

  test("northern red oak, flatsawn, 8 in, green to 7 %: -0.5275 in (Wood Handbook Eq. 13-3, Table 4-3)", () => {
    const { answer } = askMovement(
      boxes({ ...flat, species: "northern-red-oak", width: "8", from: "30", to: "7" }),
      inches,
    );
    expect(Math.abs((answer?.moved.section.widthChangeMm ?? 0) / 25.4 + 0.5275)).toBeLessThan(0.0005);
    expect(answer?.moved.growth.formula).toBe("Eq. 13-3");
  });

  test("white oak at 60 degrees, 6 in, 6 to 9 %: 0.0407 in (plane strain and Eq. 13-2)", () => {
    const given = { rings: "angle", angle: "60", species: "white-oak", width: "6", from: "6", to: "9" };
    const { answer } = askMovement(boxes(given), inches);
    expect(Math.abs((answer?.moved.section.widthChangeMm ?? 0) / 25.4 - 0.0407)).toBeLessThan(0.0005);
  });

  test("a board over the pith dries hollow on its bark face (secondary), drawn larger than it is", () => {
    const { answer } = askMovement(boxes({}), inches);
    if (!answer) throw new Error("no answer");
    expect(hasCup(answer.moved.cup) && answer.moved.cup.hollowSide).toBe("bark");
    expect(cupWords(answer.moved, "in")).toMatch(/^0\.0\d\d in at most, bark face hollow$/);
    expect(answer.moved.drawn.exaggeration).toBeGreaterThan(1);
    expect(answer.moved.drawn.rings).toContain("M");
  });

  test("with the pith inside no cup is invented", () => {
    const { answer } = askMovement(boxes({ pithDown: "1/2" }), inches);
    if (!answer) throw new Error("no answer");
    expect(cupWords(answer.moved, "in")).toMatch(/pith is in the board/);
  });

  test("a place above or left of the board is written with a minus sign", () => {
    const asked = askMovement(boxes({ pithAcross: "-3 1/2", pithDown: "-2" }), inches);
    expect(asked.errors).toEqual({});
    expect(asked.answer && hasCup(asked.answer.moved.cup)).toBe(true);
  });

  test("the disagreement of the tables for mahogany is said (trade reference, trap 6)", () => {
    const { answer } = askMovement(boxes({ ...flat, species: "genuine-mahogany", from: "8", to: "12" }), inches);
    expect(answer?.moved.otherTable?.basis).toBe("shrinkage-table");
  });

  test.each([
    ["species", "plastic"],
    ["width", "0"],
    ["thickness", "two"],
    ["from", "-1"],
    ["to", "Infinity"],
    ["angle", "91"],
    ["pithAcross", "--4"],
    ["basis", "guess"],
    ["rings", "guess"],
  ])("%s = %j is refused beside its box", (name, typed) => {
    const asked = askMovement(boxes({ [name]: typed }), inches);
    expect(asked.errors[name as "width"]).toHaveLength(1);
    expect(asked.answer).toBeNull();
  });
});
