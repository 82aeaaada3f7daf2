import { describe, expect, test } from "vitest";
import { fieldFromAngle } from "./field-from-angle.ts";
import { heartSide, hollowWhenDrying } from "./heart-side.ts";
import { fieldFromPith } from "./stations.ts";

const size = { widthMm: 200, thicknessMm: 26 };

/** Flatsawn boards turn hollow on the bark face as they dry [secondary: trade reference, section 8]. */
describe("heart side and the face that turns hollow", () => {
  test.each([
    ["below", { xMm: 100, yMm: 90 }, "bottom", "top"],
    ["above", { xMm: 60, yMm: -40 }, "top", "bottom"],
    ["inside", { xMm: 100, yMm: 12 }, "inside", null],
    ["beside, rings upright", { xMm: -90, yMm: 12 }, null, null],
  ] as const)("pith %s", (_where, pith, heart, hollow) => {
    expect(heartSide(fieldFromPith(size, pith))).toBe(heart);
    expect(hollowWhenDrying(fieldFromPith(size, pith))).toBe(hollow);
  });

  test.each([
    ["below", { xMm: 100, yMm: 90 }, "bottom"],
    ["above", { xMm: 60, yMm: -140 }, "top"],
    ["far to the side and below", { xMm: -120, yMm: 160 }, "bottom"],
  ] as const)("a centre %s shows in how the rings turn, without a recorded pith", (_where, pith, heart) => {
    expect(heartSide({ ...fieldFromPith(size, pith), pith: null })).toBe(heart);
  });

  test("straight rings do not tell", () => {
    expect(heartSide(fieldFromAngle(size, 40, "left"))).toBeNull();
    expect(heartSide({ ...size, stations: [], pith: null, ringsPerInch: null })).toBeNull();
  });
});
