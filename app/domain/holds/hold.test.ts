import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { freeLengthMm, freeStretches } from "./hold.ts";

describe("freeStretches", () => {
  test("an unclaimed board is free from end to end", () => {
    expect(freeStretches(2400, [])).toEqual([{ fromMm: 0, toMm: 2400 }]);
  });

  test("claims at both ends leave the middle", () => {
    expect(
      freeStretches(2400, [
        { fromMm: 1800, toMm: 2400 },
        { fromMm: 0, toMm: 600 },
      ]),
    ).toEqual([{ fromMm: 600, toMm: 1800 }]);
  });

  test("a whole claim leaves nothing", () => {
    expect(freeStretches(2400, [{ fromMm: 0, toMm: 2400 }])).toEqual([]);
  });

  test("free and claimed lengths add up to the board, and never overlap", () => {
    const cuts = fc.uniqueArray(fc.integer({ min: 1, max: 2999 }), { minLength: 2, maxLength: 8 });
    fc.assert(
      fc.property(cuts, (points) => {
        const sorted = [...points].sort((a, b) => a - b);
        const claimed = [];
        for (let i = 0; i + 1 < sorted.length; i += 2) claimed.push({ fromMm: sorted[i]!, toMm: sorted[i + 1]! });
        const taken = claimed.reduce((sum, c) => sum + c.toMm - c.fromMm, 0);
        expect(freeLengthMm(3000, claimed) + taken).toBe(3000);
        for (const free of freeStretches(3000, claimed))
          for (const c of claimed) expect(free.toMm <= c.fromMm || free.fromMm >= c.toMm).toBe(true);
      }),
    );
  });
});
