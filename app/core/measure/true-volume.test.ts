import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { trueBoardFeet, volumeM3 } from "./true-volume.ts";
import { convertVolume } from "./volume-units.ts";

const width = fc.double({ min: 20, max: 900, noNaN: true });

describe("true volume", () => {
  it("adds up over a crosscut anywhere along a board, tapering or not", () => {
    fc.assert(
      fc.property(
        width,
        fc.option(width),
        fc.double({ min: 300, max: 6000, noNaN: true }),
        fc.double({ min: 0.01, max: 0.99, noNaN: true }),
        fc.constantFrom(3, 4, 5, 8),
        (widthMm, widthFarMm, lengthMm, share, quarters) => {
          const atCutMm = widthMm + ((widthFarMm ?? widthMm) - widthMm) * share;
          const near = { quarters, widthMm, widthFarMm: atCutMm, lengthMm: lengthMm * share };
          const far = { quarters, widthMm: atCutMm, widthFarMm, lengthMm: lengthMm * (1 - share) };
          const whole = volumeM3({ quarters, widthMm, widthFarMm, lengthMm });
          // A board of one width has no far width; the far piece then has its own.
          const parts = volumeM3(near) + volumeM3(widthFarMm === null ? { ...far, widthFarMm: atCutMm } : far);
          expect(Math.abs(parts - whole)).toBeLessThanOrEqual(whole * 1e-9);
        },
      ),
    );
  });

  it("of a kiln-dried 4/4 board at 15/16 in is 6 % under its nominal (trade reference, section 7, derived)", () => {
    const board = { quarters: 4, widthMm: 203.2, lengthMm: 3048 };
    expect(trueBoardFeet({ ...board, thicknessMm: 23.8125 }) / trueBoardFeet(board)).toBeCloseTo(0.9375, 9);
  });

  it("is said in either unit and back", () => {
    fc.assert(
      fc.property(fc.double({ min: 0.001, max: 1e6, noNaN: true }), (volume) => {
        const back = convertVolume(convertVolume(volume, "bf", "m3"), "m3", "bf");
        expect(Math.abs(back - volume)).toBeLessThanOrEqual(volume * 1e-12);
      }),
    );
    expect(convertVolume(7, "bf", "bf")).toBe(7);
  });
});
