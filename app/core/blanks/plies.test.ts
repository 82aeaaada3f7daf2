import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { glueLines, pliesNeeded, plyAlternatives } from "./plies.ts";

const inch = 25.4;

describe("plies and glue lines", () => {
  test("common practice, no source: two full plies of 4/4 glue up to about 2 in and mill to a 1 1/2 in blank", () => {
    const plan = pliesNeeded({
      finishedMm: 1.5 * inch,
      stockMm: inch,
      jointPerFaceMm: inch / 32,
      allowanceMm: inch / 4,
    });
    expect(plan?.plies).toBe(2);
    expect((plan?.gluedMm ?? 0) / inch).toBeCloseTo(1.9375, 6);
  });

  test("trade reference, derived: three plies of 4/4 surfaced to 13/16 in make 2 7/16 in", () => {
    expect(
      (pliesNeeded({ finishedMm: 2.4 * inch, stockMm: 0.8125 * inch, jointPerFaceMm: 0, allowanceMm: 0 })?.gluedMm ??
        0) / inch,
    ).toBeCloseTo(2.4375, 9);
  });

  test("of several stocks the one that wastes least comes first, then the fewer plies, and one that cannot is left out", () => {
    const blank = { finishedMm: 1.5 * inch, jointPerFaceMm: inch / 16, allowanceMm: inch / 4 };
    const found = plyAlternatives(blank, [inch, 2 * inch, 1.75 * inch, 0.125 * inch]);
    expect(found.map(({ stockMm, plan }) => [stockMm / inch, plan.plies])).toEqual([
      [1.75, 1],
      [2, 1],
      [1, 2],
    ]);
    expect((found[2]?.plan.lostAtGlueFacesMm ?? 0) / inch).toBeCloseTo(1 / 8, 9);
    expect(found[1]?.plan.lostAtGlueFacesMm).toBe(0);
  });

  test("taking all of it from one side leaves the glue line off the middle by half of what was taken", () => {
    const [even] = glueLines([inch, inch], inch / 4, inch / 4);
    expect(even?.offMiddleMm).toBeCloseTo(0, 9);
    const [one] = glueLines([inch, inch], inch / 2, 0);
    expect((one?.offMiddleMm ?? 0) / inch).toBeCloseTo(-0.25, 9);
  });

  test("common practice, no source: of a 2 in blank taken to 1 1/2 in from one side the line is 1/4 in off, and of one taken to 1 9/16 in, 7/32 in", () => {
    const off = (taken: number) => Math.abs(glueLines([inch, inch], taken * inch, 0)[0]?.offMiddleMm ?? 0) / inch;
    expect(off(1 / 2)).toBeCloseTo(1 / 4, 9);
    expect(off(7 / 16)).toBeCloseTo(7 / 32, 9);
  });

  test("glue lines always lie inside the blank, in order", () => {
    const plies = fc.array(fc.double({ min: 5, max: 60, noNaN: true }), { minLength: 2, maxLength: 6 });
    fc.assert(
      fc.property(
        plies,
        fc.double({ min: 0, max: 1, noNaN: true }),
        fc.double({ min: 0, max: 1, noNaN: true }),
        (sizes, top, bottom) => {
          const taken = [top * (sizes[0] ?? 0), bottom * (sizes.at(-1) ?? 0)] as const;
          const left = sizes.reduce((a, b) => a + b, 0) - taken[0] - taken[1];
          let before = -1e-9;
          for (const { atMm } of glueLines(sizes, ...taken)) {
            expect(atMm).toBeGreaterThanOrEqual(before);
            expect(atMm).toBeLessThanOrEqual(left + 1e-9);
            before = atMm;
          }
        },
      ),
    );
  });

  test("what cannot be is refused with the range, and what no stock makes is null", () => {
    expect(() => pliesNeeded({ finishedMm: -1, stockMm: inch, jointPerFaceMm: 0, allowanceMm: 0 })).toThrow(RangeError);
    expect(() => glueLines([inch, inch], 2 * inch, 0)).toThrow(/0 to 25.4/);
    expect(pliesNeeded({ finishedMm: 900, stockMm: inch, jointPerFaceMm: 1, allowanceMm: 0 })).toBeNull();
  });
});
