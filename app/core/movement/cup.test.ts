import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { concentricField } from "./concentric-field.fixture.ts";
import { type Cup, cupFromPithDistanceMm, expectedCup, isCup } from "./cup.ts";
import { deformedSection, fittingExaggeration } from "./deformed-section.ts";
import { evenField } from "./ring-course.ts";
import { sectionMovement } from "./section-movement.ts";

/** Northern red oak, Table 4-3, green to 8 %. */
const redOak = { radial: -0.04 * (22 / 30), tangential: -0.086 * (22 / 30) };
const wetting = { radial: 0.008, tangential: 0.016 };

function cup(...args: Parameters<typeof expectedCup>): Cup {
  const result = expectedCup(...args);
  if (!isCup(result)) throw new Error(result.why);
  return result;
}

describe("the cup of a flat board", () => {
  // Own geometry (trade reference section 8): no published estimate was found to check against.
  it("of red oak 8 in wide, green to 8 %, is 0.106 in at 4 in from the pith and 0.063 in at 8 in (derived)", () => {
    expect(cupFromPithDistanceMm(8, 4, redOak)).toBeCloseTo(0.106, 3);
    expect(cupFromPithDistanceMm(8, 8, redOak)).toBeCloseTo(0.063, 3);
  });

  it("found from the stations is the same as from the pith", () => {
    const width = fc.double({ min: 60, max: 300, noNaN: true });
    fc.assert(
      fc.property(width, fc.double({ min: 50, max: 500, noNaN: true }), (widthMm, distance) => {
        const field = concentricField(widthMm, 25, { xMm: widthMm / 2, yMm: 12.5 + distance }, 31);
        const fromPith = cupFromPithDistanceMm(widthMm, distance, redOak);
        expect(Math.abs(cup({ ...field, pith: null }, redOak).heightMm - fromPith)).toBeLessThan(
          0.02 * fromPith + 0.01,
        );
      }),
    );
  });

  it("turns the bark face hollow in drying and the heart face in wetting, whichever way up (secondary)", () => {
    const heartDown = concentricField(200, 25, { xMm: 100, yMm: 110 });
    const heartUp = concentricField(200, 25, { xMm: 100, yMm: -85 });
    for (const pith of ["kept", "left out"]) {
      const known = (field: typeof heartDown) => (pith === "kept" ? field : { ...field, pith: null });
      expect(cup(known(heartDown), redOak)).toMatchObject({ hollowFace: "top", hollowSide: "bark" });
      expect(cup(known(heartUp), redOak)).toMatchObject({ hollowFace: "bottom", hollowSide: "bark" });
      expect(cup(known(heartDown), wetting)).toMatchObject({ hollowFace: "bottom", hollowSide: "heart" });
    }
  });

  it("is quartered by halving the width of a board far from the pith", () => {
    const at = (widthMm: number) => cupFromPithDistanceMm(widthMm, 2000, redOak);
    expect(at(200) / at(100)).toBeCloseTo(4, 1);
  });

  it("is nothing for a quartered board or rings all one way, and not given with the pith inside", () => {
    expect(cup(evenField(200, 25, 90), redOak)).toMatchObject({ hollowFace: null, hollowSide: null });
    expect(cup(evenField(200, 25, 30), redOak).heightMm).toBeLessThan(1e-9);
    const quartered = concentricField(150, 25, { xMm: -400, yMm: 12.5 });
    expect(cup(quartered, redOak).heightMm).toBeLessThan(0.05);
    expect(expectedCup(concentricField(150, 50, { xMm: 75, yMm: 25 }), redOak)).toEqual({
      why: "The pith is in the board: expect it to check there rather than to cup.",
    });
  });
});

describe("the section drawn before and after", () => {
  const field = concentricField(150, 25, { xMm: 60, yMm: 120 }, 31);
  const extent = (points: Array<{ xMm: number }>) =>
    Math.max(...points.map(({ xMm }) => xMm)) - Math.min(...points.map(({ xMm }) => xMm));

  it("starts as the board's outline and changes width by the movement reckoned", () => {
    const { before, after } = deformedSection(field, redOak);
    expect(before[0]).toEqual({ xMm: 0, yMm: 0 });
    expect(extent(before)).toBe(150);
    expect(after).toHaveLength(before.length);
    expect(extent(after) - 150).toBeCloseTo(sectionMovement(field, redOak).widthChangeMm, 0);
  });

  it("is nearly the same drawn from the pith and from the stations alone", () => {
    const fromPith = deformedSection(field, redOak).after;
    const fromStations = deformedSection({ ...field, pith: null }, redOak).after;
    const apart = fromPith.map((p, i) => Math.hypot(p.xMm - fromStations[i]!.xMm, p.yMm - fromStations[i]!.yMm));
    expect(Math.max(...apart)).toBeLessThan(0.25); // of a movement of up to 5 mm
  });

  it("draws a square leg with its rings corner to corner as a diamond", () => {
    const { after } = deformedSection(evenField(45, 45, 45), redOak, 5);
    const [topLeft, topRight, bottomRight, bottomLeft] = [0, 24, 30, 54].map((i) => after[i]!);
    const falling = Math.hypot(bottomRight!.xMm - topLeft!.xMm, bottomRight!.yMm - topLeft!.yMm);
    const rising = Math.hypot(topRight!.xMm - bottomLeft!.xMm, topRight!.yMm - bottomLeft!.yMm);
    expect(falling).toBeLessThan(rising - 4);
    expect(Math.hypot(topRight!.xMm - topLeft!.xMm, topRight!.yMm - topLeft!.yMm)).toBeCloseTo(
      Math.hypot(bottomLeft!.xMm - topLeft!.xMm, bottomLeft!.yMm - topLeft!.yMm),
      6,
    );
  });

  it("keeps the board where it lies: no growth, no move", () => {
    const { before, after } = deformedSection(field, { radial: 0, tangential: 0 }, 20);
    after.forEach((point, i) => {
      expect(point.xMm).toBeCloseTo(before[i]!.xMm, 9);
      expect(point.yMm).toBeCloseTo(before[i]!.yMm, 9);
    });
  });

  it("shows a dried flatsawn board hollow on the bark face, and offers an exaggeration that can be seen", () => {
    const flat = concentricField(200, 25, { xMm: 100, yMm: 140 });
    const { after, exaggeration } = deformedSection(flat, wetting, fittingExaggeration(wetting));
    expect(exaggeration).toBe(5);
    expect(after[12]!.yMm).toBeLessThan((after[0]!.yMm + after[24]!.yMm) / 2); // wetting lifts the middle of the bark face
    expect(fittingExaggeration(redOak)).toBe(1);
    expect(() => deformedSection(flat, redOak, 40)).toThrow(/use a smaller exaggeration/);
    expect(() => deformedSection(flat, redOak, Number.NaN)).toThrow(/Exaggeration must be/);
  });
});
