import fc from "fast-check";
import { expect, test } from "vitest";
import { roundTicks } from "./plot.tsx";

test("ticks are round and within the range", () => {
  expect(roundTicks(0, 100)).toEqual([0, 20, 40, 60, 80, 100]);
  expect(roundTicks(4.3, 9.1)).toEqual([5, 6, 7, 8, 9]);
});

test("whatever the range, ticks rise, lie within it, and are few", () => {
  fc.assert(
    fc.property(
      fc.double({ min: -1e4, max: 1e4, noNaN: true }),
      fc.double({ min: 0.01, max: 1e4, noNaN: true }),
      (from, span) => {
        const ticks = roundTicks(from, from + span);
        expect(ticks.length).toBeLessThanOrEqual(7);
        for (const [i, tick] of ticks.entries()) {
          expect(tick).toBeGreaterThanOrEqual(from - 1e-4 * span - 1e-6);
          expect(tick).toBeLessThanOrEqual(from + span + 1e-4 * span + 1e-6);
          if (i > 0) expect(tick).toBeGreaterThan(ticks[i - 1]!);
        }
      },
    ),
  );
});
