import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { blankMovement } from "./blank-movement.ts";
import { concentricField } from "./concentric-field.fixture.ts";
import { growthAtAngle, outOfSquareDeg } from "./ring-angle.ts";
import { evenField, ringCourse } from "./ring-course.ts";
import { sectionMovement } from "./section-movement.ts";

/** Sugar maple, Table 13-5, from 8 to 12 %. */
const maple = { radial: 4 * 0.00165, tangential: 4 * 0.00353 };

describe("growth at a ring angle (plane strain transformation, derived)", () => {
  it("is flatsawn at 0, quartersawn at 90 and the mean at 45 degrees", () => {
    expect(growthAtAngle(maple, 0)).toEqual({ width: maple.tangential, thickness: maple.radial, shear: 0 });
    expect(growthAtAngle(maple, 90).width).toBeCloseTo(maple.radial, 12);
    const diagonal = growthAtAngle(maple, 45);
    expect(diagonal.width).toBeCloseTo(diagonal.thickness, 12);
    expect(diagonal.width).toBeCloseTo((maple.radial + maple.tangential) / 2, 12);
  });

  it("always shares one sum between width and thickness, and is worst for squareness at 45 degrees", () => {
    fc.assert(
      fc.property(fc.double({ min: -90, max: 90, noNaN: true }), (angle) => {
        const { width, thickness } = growthAtAngle(maple, angle);
        expect(width + thickness).toBeCloseTo(maple.radial + maple.tangential, 12);
        expect(outOfSquareDeg(maple, angle)).toBeLessThanOrEqual(outOfSquareDeg(maple, 45) + 1e-12);
      }),
    );
    expect(outOfSquareDeg(maple, 45)).toBeCloseTo(0.431, 3); // worked-examples.json, derived
  });
});

describe("a board's section", () => {
  it("moves as its rings stand when they stand one way", () => {
    const leg = sectionMovement(evenField(44.45, 44.45, 45), maple);
    expect(leg.widthChangeMm).toBeCloseTo(leg.thicknessChangeMm, 10);
    expect(leg.outOfSquareDeg).toBeCloseTo(0.431, 3);
    expect(leg.longerDiagonal).toBe("falling");
    expect(leg.diagonalDifferenceMm).toBeCloseTo(44.45 * Math.SQRT2 * 4 * (0.00353 - 0.00165), 6);
    expect(sectionMovement(evenField(44.45, 44.45, -45), maple).longerDiagonal).toBe("rising");
    expect(sectionMovement(evenField(44.45, 30, 0), maple)).toMatchObject({ longerDiagonal: null, outOfSquareDeg: 0 });
  });

  it("lies between the flat and the quartered answer when its rings curve, and is thicker at quartered edges", () => {
    const wide = sectionMovement(concentricField(250, 25, { xMm: 125, yMm: 85 }), maple);
    expect(wide.widthChangeMm).toBeGreaterThan(250 * maple.radial);
    expect(wide.widthChangeMm).toBeLessThan(250 * maple.tangential);
    expect(wide.thicknessChangeLeftMm).toBeGreaterThan(1.5 * wide.thicknessChangeMiddleMm);
    expect(wide.thicknessChangeLeftMm).toBeCloseTo(wide.thicknessChangeRightMm, 6);
    expect(wide.outOfSquareDeg).toBeLessThan(1e-9);
  });

  it("agrees with the exact mean for rings round a pith: width (T - R) R a / w from the arc (own geometry)", () => {
    const [width, distance] = [200, 120];
    const field = concentricField(width, 20, { xMm: 100, yMm: 130 }, 41);
    // The mean of cos2 over the width is the angle at the pith over the width, times the distance.
    const meanCos2 = (2 * Math.atan(width / 2 / distance) * distance) / width;
    const expected = width * (maple.radial + (maple.tangential - maple.radial) * meanCos2);
    expect(Math.abs(sectionMovement(field, maple).widthChangeMm - expected)).toBeLessThan(expected * 0.001);
  });

  it("moves there and back to where it was, to second order", () => {
    const back = { radial: -maple.radial, tangential: -maple.tangential };
    const pith = fc.record({
      xMm: fc.double({ min: -100, max: 300, noNaN: true }),
      yMm: fc.double({ min: 40, max: 400, noNaN: true }),
    });
    fc.assert(
      fc.property(pith, (at) => {
        const field = concentricField(150, 30, at);
        const there = sectionMovement(field, maple);
        const grown = { ...field, widthMm: 150 + there.widthChangeMm, thicknessMm: 30 + there.thicknessChangeMm };
        const again = sectionMovement(grown, back);
        expect(Math.abs(there.widthChangeMm + again.widthChangeMm)).toBeLessThan(150 * maple.tangential ** 2);
      }),
    );
  });

  it("refuses an end that was not read and sizes that cannot be", () => {
    const field = evenField(100, 25, 10);
    expect(() => sectionMovement({ ...field, stations: [] }, maple)).toThrow(/have not been read/);
    expect(() => sectionMovement({ ...field, widthMm: 0 }, maple)).toThrow(/Width must be/);
    expect(() => evenField(100, 25, 120)).toThrow(/Ring angle must be a number from -90 to 90 degrees/);
  });
});

describe("the course of the rings", () => {
  it("passes upright without a jump", () => {
    const station = (position: number, signedDeg: number, confidence = 1) => ({
      position,
      signedDeg,
      angleDeg: Math.abs(signedDeg),
      confidence,
    });
    const field = { ...evenField(100, 25, 0), stations: [station(0.25, 84), station(0.75, -86), station(0.5, 3, 0)] };
    const course = ringCourse(field);
    expect(course(0.25)).toBe(84);
    expect(course(0.5)).toBeCloseTo(89, 10);
    expect(course(0.75)).toBe(94);
    expect(course(1)).toBeCloseTo(99, 10);
  });
});

describe("a blank of plies", () => {
  it("adds thicknesses and holds the plies to their mean width (own rule of mixtures)", () => {
    const flat = { field: evenField(92, 20, 0), growth: maple };
    const quartered = { field: evenField(92, 20, 90), growth: maple };
    const mixed = blankMovement([flat, quartered]);
    expect(mixed.widthChangeMm).toBeCloseTo((92 * (maple.radial + maple.tangential)) / 2, 10);
    expect(mixed.thicknessChangeMm).toBeCloseTo(20 * (maple.radial + maple.tangential), 10);
    expect(mixed.plyMismatchMm).toBeCloseTo(92 * (maple.tangential - maple.radial), 10);
    expect(blankMovement([flat, flat]).plyMismatchMm).toBe(0);
    expect(() => blankMovement([])).toThrow(RangeError);
    expect(() => blankMovement([flat, { ...flat, field: evenField(80, 20, 0) }])).toThrow(/as the first ply/);
  });
});
