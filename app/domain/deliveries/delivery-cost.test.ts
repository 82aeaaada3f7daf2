import { describe, expect, it } from "vitest";
import { boardCostsMinor, checkClaim, deliveryTotalMinor, printVolume } from "./delivery-cost.ts";

const measured = { boardFeet: 190, volumeM3: 0.45 };
const delivery = {
  claimedVolume: 200,
  claimedUnit: "bf",
  priceMinor: 875,
  priceBasis: "bf",
  freightMinor: 5000,
} as const;

describe("what a delivery costs", () => {
  it("is the price of what was claimed, and freight", () => {
    expect(deliveryTotalMinor(delivery, null)).toBe(200 * 875 + 5000);
    expect(deliveryTotalMinor({ ...delivery, priceBasis: "lump" }, null)).toBe(5875);
  });

  // 1 m³ = 423.776 bf: trade reference, section 1.
  it("turns a claim into the unit of the price", () => {
    expect(deliveryTotalMinor({ ...delivery, claimedVolume: 0.5, claimedUnit: "m3" }, null)).toBe(
      Math.round(875 * 0.5 * 423.776) + 5000,
    );
  });

  it("waits for the tally where nothing was claimed, then goes by the shop's own measure", () => {
    const unclaimed = { ...delivery, claimedVolume: null };
    expect(deliveryTotalMinor(unclaimed, null)).toBeNull();
    expect(deliveryTotalMinor(unclaimed, measured)).toBe(190 * 875 + 5000);
    expect(deliveryTotalMinor({ ...unclaimed, priceBasis: "m3", priceMinor: 200_000 }, measured)).toBe(95_000);
  });

  it("is unknown without a price, even where freight was paid", () => {
    expect(deliveryTotalMinor({ ...delivery, priceMinor: null }, measured)).toBeNull();
  });
});

describe("a claim against the tally", () => {
  it("leaves freight out", () => {
    expect(checkClaim(delivery, measured)).toMatchObject({
      differenceVolume: -10,
      differencePct: -5,
      differenceMinor: -8750,
    });
  });

  it("is nothing where nothing was claimed", () => {
    expect(checkClaim({ ...delivery, claimedVolume: null }, measured)).toBeNull();
  });

  it("prints volumes", () => {
    expect(printVolume(1212.504, "bf")).toBe("1,212.5 bf");
    expect(printVolume(0.5, "m3")).toBe("0.500 m³");
  });
});

describe("what each board is charged with", () => {
  const board = (widthIn: number) => ({ quarters: 4, widthMm: widthIn * 25.4, lengthMm: 2438.4 });

  it("is its share by measure, freight included, and the shares add up", () => {
    const costs = boardCostsMinor(delivery, [board(6), board(12), board(6)]);
    expect(costs).toEqual([45_000, 90_000, 45_000]);
    const thirds = boardCostsMinor({ ...delivery, priceBasis: "lump", priceMinor: 100, freightMinor: 0 }, [
      board(6),
      board(6),
      board(6),
    ]);
    expect(thirds).toEqual([34, 33, 33]);
  });

  it("is not known without a price", () => {
    expect(boardCostsMinor({ ...delivery, priceMinor: null }, [board(6)])).toBeNull();
  });
});
