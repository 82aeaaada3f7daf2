import { describe, expect, test } from "vitest";
import { fieldFromAngle } from "./field-from-angle.ts";

const size = { widthMm: 200, thicknessMm: 26 };

describe("fieldFromAngle", () => {
  test.each([0, 12, 30, 45, 60, 88, 90])("%d degrees is that all across, to a fifth of a degree", (angle) => {
    for (const station of fieldFromAngle(size, angle, "right").stations)
      expect(Math.abs(station.angleDeg - angle)).toBeLessThan(0.2);
  });

  test("falling to the left is the mirror of falling to the right", () => {
    expect(fieldFromAngle(size, 40, "right").stations[4]?.signedDeg).toBeCloseTo(40, 1);
    expect(fieldFromAngle(size, 40, "left").stations[4]?.signedDeg).toBeCloseTo(-40, 1);
  });

  test.each([-1, 91, Number.NaN])("%d is no ring angle", (angle) => {
    expect(() => fieldFromAngle(size, angle, "right")).toThrow(RangeError);
  });
});
