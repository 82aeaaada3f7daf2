import { describe, expect, test } from "vitest";
import { askLeg } from "./leg.ts";
import { askRings } from "./rings.ts";
import { aShopLike, boxes } from "./shop.fixture.ts";

const shop = aShopLike();

describe("the ring page", () => {
  test("a pith level with the board and beside it makes it quartered, under it flat (geometry)", () => {
    const quartered = askRings(boxes({ pithAcross: "-20", pithDown: "1/2" }), shop).answer;
    const flat = askRings(boxes({ pithAcross: "4", pithDown: "40" }), shop).answer;
    expect(quartered?.ringClass).toBe("quartered");
    expect(flat?.ringClass).toBe("flat");
  });

  test("50 degrees is rift in AWS and quartered by the Wood Handbook's 45: both are shown (AWS 2009 App. B; WH ch. 3)", () => {
    const { answer } = askRings(boxes({ rings: "angle", angle: "50" }), shop);
    const by = (source: RegExp) => answer?.published.find((row) => source.test(row.source))?.ringClass;
    expect(by(/^Architectural Woodwork Standards/)).toBe("rift");
    expect(by(/^Wood Handbook/)).toBe("quartered");
    expect(by(/^European/)).toBeNull();
  });

  test("the shop's own limits decide what it is called here", () => {
    const own = aShopLike({ classLimits: { flatBelowDeg: 45, quarteredAboveDeg: 75 } });
    expect(askRings(boxes({ rings: "angle", angle: "40" }), own).answer?.ringClass).toBe("flat");
  });

  test("shares sum to one", () => {
    const { flat, rift, quartered } = askRings(boxes({}), shop).answer!.shares;
    expect(flat + rift + quartered).toBeCloseTo(1, 9);
  });

  test("a strip wider than the board is answered with the reason, not refused", () => {
    const { answer } = askRings(boxes({ strip: "9" }), shop);
    expect(answer?.strip).toMatchObject({ ok: false });
  });

  test.each([
    [{ least: "60", greatest: "30" }, "greatest"],
    [{ share: "101" }, "share"],
    [{ width: "1e3" }, "width"],
    [{ pithDown: "" }, "pithDown"],
  ] as const)("%j is refused beside its box", (given, name) => {
    expect(askRings(boxes(given), shop).errors[name]).toHaveLength(1);
  });
});

describe("the leg page", () => {
  test("rift stock shows straight grain on all four sides (common practice)", () => {
    const { answer } = askLeg(boxes({ rings: "angle", angle: "45" }), shop);
    expect(answer?.asItLies.isStraight).toBe(true);
    expect(Math.abs(answer?.diagonal.turnDeg ?? 9)).toBeLessThan(0.01);
  });

  test("flat stock does not, and turned by 45 degrees it needs stock 1.41 times as thick (geometry)", () => {
    const { answer } = askLeg(boxes({ rings: "angle", angle: "0" }), shop);
    expect(answer?.asItLies.isStraight).toBe(false);
    expect(answer?.diagonal.grain.isStraight).toBe(true);
    expect((answer?.diagonal.stockThicknessMm ?? 0) / 38.1).toBeCloseTo(Math.SQRT2, 6);
    expect(answer?.diagonal.fitsBoard).toBe(false);
  });

  test("a leg off the board is refused beside its box", () => {
    expect(askLeg(boxes({ middle: "20" }), shop).errors.middle).toHaveLength(1);
  });
});
