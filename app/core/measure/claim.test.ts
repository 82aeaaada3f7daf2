import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { chargeMinor, compareClaim } from "./claim.ts";
import { grossFromNet, kilnAllowancePct, netFromGross } from "./kiln-allowance.ts";
import { grossForYield, yieldPct } from "./yield.ts";

// Arithmetic from the definitions; the 7 % allowance is common practice (trade reference, section 1).
describe("claimed against measured", () => {
  it("gives the difference in volume, percent and money", () => {
    const compared = compareClaim(
      { volume: 200, unit: "bf" },
      { boardFeet: 190, volumeM3: 0.45 },
      { price: { minor: 875, basis: "bf" } },
    );
    expect(compared).toEqual({
      unit: "bf",
      claimedVolume: 200,
      expectedVolume: 200,
      measuredVolume: 190,
      differenceVolume: -10,
      differencePct: -5,
      chargedMinor: 175_000,
      differenceMinor: -8_750,
    });
  });

  it("holds cubic metres against cubic metres, at a lump sum in proportion", () => {
    const compared = compareClaim(
      { volume: 0.5, unit: "m3" },
      { boardFeet: 999, volumeM3: 0.525 },
      { price: { minor: 100_000, basis: "lump" } },
    );
    expect(compared.differencePct).toBeCloseTo(5, 9);
    expect(compared).toMatchObject({ chargedMinor: 100_000, differenceMinor: 5_000 });
  });

  it("expects less of a claim tallied before the kiln", () => {
    const gross = compareClaim(
      { volume: 1000, unit: "bf", isGross: true },
      { boardFeet: 930, volumeM3: 2 },
      { price: { minor: 500, basis: "bf" } },
    );
    expect(gross).toMatchObject({
      expectedVolume: 930,
      differenceVolume: 0,
      chargedMinor: 500_000,
      differenceMinor: 0,
    });
  });

  it("says nothing of money without a price", () => {
    const compared = compareClaim({ volume: 10, unit: "bf" }, { boardFeet: 9, volumeM3: 0.02 });
    expect(compared).toMatchObject({ chargedMinor: null, differenceMinor: null });
  });

  it("charges by either unit of volume", () => {
    expect(chargeMinor({ minor: 100, basis: "bf" }, 1, "m3")).toBe(42_378);
    expect(chargeMinor({ minor: 200_000, basis: "m3" }, 423.776, "bf")).toBe(200_000);
  });

  it("keeps money in whole minor units, and a shortage costs what a surplus of its size would", () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 0, max: 10_000 }),
        fc.integer({ min: 2, max: 5000 }),
        fc.nat(1999),
        (minor, volume, off) => {
          const by = (off / 2000) * volume;
          const at = (boardFeet: number) =>
            compareClaim({ volume, unit: "bf" }, { boardFeet, volumeM3: 0 }, { price: { minor, basis: "bf" } });
          const short = at(volume - by).differenceMinor!;
          const over = at(volume + by).differenceMinor!;
          expect(Number.isSafeInteger(short)).toBe(true);
          expect(Math.abs(short + over)).toBeLessThanOrEqual(1);
        },
      ),
    );
  });

  it.each([
    [{ volume: 0, unit: "bf" as const }, 875],
    [{ volume: Number.NaN, unit: "m3" as const }, 875],
    [{ volume: 10, unit: "bf" as const }, 8.75],
    [{ volume: 10, unit: "bf" as const }, -1],
  ])("refuses %o at %f", (claim, minor) => {
    expect(() => compareClaim(claim, { boardFeet: 1, volumeM3: 1 }, { price: { minor, basis: "bf" } })).toThrow(
      RangeError,
    );
  });
});

describe("before and after the kiln", () => {
  it("takes 7 % by custom, and gives it back", () => {
    expect(kilnAllowancePct.usual).toBe(7);
    expect(netFromGross(1000)).toBe(930);
    expect(grossFromNet(930)).toBe(1000);
  });

  it.each([-1, 51, Number.NaN])("refuses an allowance of %f %%", (allowancePct) => {
    expect(() => netFromGross(1000, allowancePct)).toThrow(/0 to 50/);
  });
});

describe("yield", () => {
  it("refuses more parts than there was wood, and a yield of nothing", () => {
    expect(() => yieldPct(11, 10)).toThrow(RangeError);
    expect(() => yieldPct(0, 0)).toThrow(RangeError);
    expect(() => grossForYield(10, 0)).toThrow(/1 to 100/);
  });
});
