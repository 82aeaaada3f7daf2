import { describe, expect, test } from "vitest";
import { askClaim } from "./claim.ts";
import { aShopLike, boxes } from "./shop.fixture.ts";

const shop = aShopLike();

describe("the claim page", () => {
  test("two boards of 6 in x 9 ft tally 4 and 5, together 9 bf (half feet alternate: NHLA, from memory)", () => {
    const { answer } = askClaim(boxes({ boards: "2 @ 6 x 9'", claimed: "10", price: "5.00" }), shop);
    expect(answer?.tally.boardFeet).toBe(9);
    expect(answer?.compared.differenceVolume).toBe(-1);
    // 10 bf at 5.00 are charged 50.00; a tenth of it is not there: 5.00 [arithmetic].
    expect(answer?.compared.differenceMinor).toBe(-500);
  });

  test("a green tally of 1000 bf at 7 % leaves 930 (arithmetic; the 7 % is common practice)", () => {
    const { answer } = askClaim(boxes({ claimed: "1000", tallied: "gross", allowance: "7" }), shop);
    expect(answer?.compared.expectedVolume).toBe(930);
    expect(answer?.beyond).toEqual([]);
  });

  test("an allowance that no kiln takes is said", () => {
    const { answer } = askClaim(boxes({ tallied: "gross", allowance: "20" }), shop);
    expect(answer?.beyond).toHaveLength(1);
  });

  test("names the line that cannot be read", () => {
    const asked = askClaim(boxes({ boards: "8 x 10'\n\n8 x -3'" }), shop);
    expect(asked.errors.boards?.[0]).toMatch(/^Line 3: /);
  });

  test.each([
    ["boards", "", /at least one/],
    ["boards", "8 x 10'\n".repeat(300), /At most 200/],
    ["claimed", "0", /from 0.001/],
    ["price", "cheap", /amount/],
    ["basis", "pound", /Choose/],
  ])("%s = %j is refused", (name, typed, message) => {
    expect(askClaim(boxes({ [name]: typed }), shop).errors[name as "boards"]?.[0]).toMatch(message);
  });
});
