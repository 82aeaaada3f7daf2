import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { glueBatches } from "./batches.ts";
import { clampsFor, glueGrams, newtonsFromLbf } from "./clamps.ts";

const inch = 25.4;

describe("clamps and glue", () => {
  test("trade reference, derived: 2 x 18 in at 175 psi is 6,300 lbf, seven clamps of 1,000", () => {
    const plan = clampsFor({ lengthMm: 18 * inch, widthMm: 2 * inch }, 175, newtonsFromLbf(1000), 3 * inch);
    expect(plan.forceN / newtonsFromLbf(1)).toBeCloseTo(6300, 0);
    expect(plan.clamps).toBe(7);
  });

  test("trade reference, derived: 3/4 x 36 in at 150 psi is 4,050 lbf", () => {
    expect(
      clampsFor({ lengthMm: 36 * inch, widthMm: 0.75 * inch }, 150, newtonsFromLbf(1000), 3 * inch).forceN /
        newtonsFromLbf(1),
    ).toBeCloseTo(4050, 0);
  });

  test("common practice: a face wider than twice the way to the glue line takes a second row, and force is shared among rows", () => {
    // 42 x 3 5/8 in through one ply of 1 in: 2 in of reach each way, so 21 along and 2 across.
    const bare = clampsFor({ lengthMm: 42 * inch, widthMm: 3.625 * inch }, 10, newtonsFromLbf(1000), inch);
    expect(bare).toMatchObject({ rows: 2, clamps: 42, decidedBy: "reach" });
    // The same under a caul of 2 in, at 175 psi: 26,644 lbf, 27 clamps in one row.
    const caul = clampsFor({ lengthMm: 42 * inch, widthMm: 3.625 * inch }, 175, newtonsFromLbf(1000), 3 * inch);
    expect(caul).toMatchObject({ rows: 1, clamps: 27, decidedBy: "force" });
  });

  test("clamps always have force enough, and no place is further from a pad than the spread reaches", () => {
    const size = fc.double({ min: 20, max: 1500, noNaN: true });
    const pad = fc.double({ min: 10, max: 150, noNaN: true });
    fc.assert(
      fc.property(size, size, pad, fc.integer({ min: 10, max: 300 }), (lengthMm, widthMm, padMm, psi) => {
        const plan = clampsFor({ lengthMm, widthMm }, psi, 4448, padMm);
        expect(plan.clamps * 4448).toBeGreaterThanOrEqual(plan.forceN * (1 - 1e-5));
        expect(plan.spacingMm).toBeLessThanOrEqual(2 * padMm + 1e-6);
        expect(widthMm / plan.rows).toBeLessThanOrEqual(2 * padMm + 1e-6);
        expect(Number.isInteger(plan.clamps / plan.rows)).toBe(true);
      }),
    );
  });

  test("half a clamp, half a glue line, or no number is refused with the range", () => {
    expect(() => glueBatches([{ id: "a", clamps: 2.5 }], 8, 60)).toThrow(/whole number from 1 to 10000; got 2.5/);
    expect(() => glueBatches([], Number.NaN, 60)).toThrow(RangeError);
    expect(() => glueGrams({ lengthMm: 100, widthMm: 50 }, 1.5)).toThrow(RangeError);
    expect(() => clampsFor({ lengthMm: 100, widthMm: 50 }, -1, 4448, 50)).toThrow(/1 to 2000 psi/);
  });

  test("common practice: through 3 in from pad to glue line one clamp serves 6 in of joint", () => {
    const plan = clampsFor({ lengthMm: 36 * inch, widthMm: 10 }, 1, newtonsFromLbf(1000), 3 * inch);
    expect(plan).toMatchObject({ clamps: 6, decidedBy: "reach" });
    expect(plan.spacingMm / inch).toBeCloseTo(6, 9);
  });

  test("glue over two lines of 0.1 m² is 34 to 50 g (PVA makers' range, from memory)", () => {
    expect(glueGrams({ lengthMm: 1000, widthMm: 100 }, 2)).toEqual({
      low: expect.closeTo(34, 9),
      high: expect.closeTo(50, 9),
    });
  });

  test("batches never use more clamps than the shop owns, and every blank is in one or named", () => {
    const blanks = fc.array(fc.integer({ min: 1, max: 14 }), { maxLength: 30 });
    fc.assert(
      fc.property(blanks, fc.integer({ min: 1, max: 20 }), (needs, owned) => {
        const { batches, tooMany } = glueBatches(
          needs.map((clamps, i) => ({ id: String(i), clamps })),
          owned,
          60,
        );
        for (const batch of batches) expect(batch.clamps).toBeLessThanOrEqual(owned);
        expect([...batches.flatMap((batch) => batch.ids), ...tooMany].map(Number).sort((a, b) => a - b)).toEqual(
          needs.map((_, i) => i),
        );
      }),
    );
  });

  test("a batch stays as long as its slowest blank", () => {
    const needs = [
      { id: "a", clamps: 4, clampMinutes: 90 },
      { id: "b", clamps: 4 },
      { id: "c", clamps: 4 },
    ];
    const { batches } = glueBatches(needs, 8, 45);
    expect(batches.map(({ ids, outMinute }) => [ids.join(), outMinute])).toEqual([
      ["a,b", 90],
      ["c", 135],
    ]);
  });

  test("the second batch goes in when the first comes out", () => {
    const { batches } = glueBatches(
      [
        { id: "a", clamps: 6 },
        { id: "b", clamps: 6 },
      ],
      8,
      45,
      10,
    );
    expect(batches.map(({ startsMinute, outMinute }) => [startsMinute, outMinute])).toEqual([
      [0, 55],
      [55, 110],
    ]);
  });
});
