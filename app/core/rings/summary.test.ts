import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { exactShareBelow } from "./exact-integrals.fixture.ts";
import { fieldFromAngle } from "./field-from-angle.ts";
import { fieldFromPith } from "./stations.ts";
import {
  angleSummary,
  classLimitsProblem,
  classOf,
  classShares,
  defaultClassLimits,
  dominantClass,
} from "./summary.ts";

const size = { widthMm: 210, thicknessMm: 27 };
const whole = { fromMm: 0, toMm: 210 };
const pithAnywhere = fc.record({
  xMm: fc.double({ min: -600, max: 800, noNaN: true }),
  yMm: fc.double({ min: -600, max: 600, noNaN: true }),
});
const someLimits = fc
  .tuple(fc.double({ min: 1, max: 89, noNaN: true }), fc.double({ min: 1, max: 89, noNaN: true }))
  .map(([a, b]) => ({ flatBelowDeg: Math.min(a, b), quarteredAboveDeg: Math.max(a, b) }));

describe("classes", () => {
  // Flat below 30, rift 30 to 60, quartered above: the product's own words; AWS 2009 appendix B and NHLA usage have the same bins.
  test.each([
    [0, "flat"],
    [29.9, "flat"],
    [30, "rift"],
    [45, "rift"],
    [60, "rift"],
    [60.1, "quartered"],
    [90, "quartered"],
  ] as const)("%d degrees is %s by default", (angle, expected) => {
    expect(classOf(angle, defaultClassLimits)).toBe(expected);
  });

  test("parted in two at 45 (Wood Handbook, secondary) there is no rift", () => {
    const two = { flatBelowDeg: 45, quarteredAboveDeg: 45 };
    expect(classOf(44.9, two)).toBe("flat");
    expect(classOf(45, two)).toBe("quartered");
    expect(classShares(fieldFromAngle(size, 45, "right"), two)).toEqual({ flat: 0, rift: 0, quartered: 1 });
  });

  test.each([
    [{ flatBelowDeg: 30, quarteredAboveDeg: 60 }, true],
    [{ flatBelowDeg: 45, quarteredAboveDeg: 45 }, true],
    [{ flatBelowDeg: 61, quarteredAboveDeg: 60 }, false],
    [{ flatBelowDeg: -1, quarteredAboveDeg: 60 }, false],
    [{ flatBelowDeg: 30, quarteredAboveDeg: 91 }, false],
    [{ flatBelowDeg: Number.NaN, quarteredAboveDeg: 60 }, false],
  ])("limits %j are usable: %s", (limits, usable) => {
    expect(classLimitsProblem(limits) === null).toBe(usable);
  });
});

describe("class shares by area", () => {
  test("are those of the closed-form areas, within half a per cent", () => {
    fc.assert(
      fc.property(pithAnywhere, someLimits, (pith, limits) => {
        const shares = classShares(fieldFromPith(size, pith), limits);
        const flat = exactShareBelow(size, pith, whole, limits.flatBelowDeg);
        const notQuartered = exactShareBelow(size, pith, whole, limits.quarteredAboveDeg);
        expect(Math.abs(shares.flat - flat)).toBeLessThan(0.006);
        expect(Math.abs(shares.quartered - (1 - notQuartered))).toBeLessThan(0.006);
      }),
    );
  });

  test("sum to one, also where stations stray from the pith's circles, and mirroring keeps them", () => {
    const strays = fc.array(fc.double({ min: -15, max: 15, noNaN: true }), { minLength: 9, maxLength: 9 });
    fc.assert(
      fc.property(pithAnywhere, someLimits, strays, (pith, limits, stray) => {
        const round = fieldFromPith(size, pith);
        const stations = round.stations.map((station, i) => {
          const signedDeg = Math.max(-90, Math.min(90, station.signedDeg + stray[i]!));
          return { ...station, signedDeg, angleDeg: Math.abs(signedDeg) };
        });
        const shares = classShares({ ...round, stations }, limits);
        expect(shares.flat + shares.rift + shares.quartered).toBeCloseTo(1, 12);
        const mirrored = classShares(
          {
            ...round,
            pith: { xMm: 210 - pith.xMm, yMm: pith.yMm },
            stations: stations
              .map((station) => ({ ...station, position: 1 - station.position, signedDeg: -station.signedDeg }))
              .reverse(),
          },
          limits,
        );
        expect(mirrored.flat).toBeCloseTo(shares.flat, 2);
        expect(mirrored.quartered).toBeCloseTo(shares.quartered, 2);
      }),
    );
  });

  test("a wide flatsawn board is quartered at both edges (common practice, no source): 16 in wide, pith 2 in below", () => {
    const wide = fieldFromPith({ widthMm: 406, thicknessMm: 26 }, { xMm: 203, yMm: 26 + 51 });
    expect(wide.stations[0]!.angleDeg).toBeGreaterThan(60);
    expect(wide.stations[4]!.angleDeg).toBeLessThan(30);
    expect(wide.stations[8]!.angleDeg).toBeGreaterThan(60);
    const shares = classShares(wide, defaultClassLimits);
    expect(Math.min(shares.flat, shares.rift, shares.quartered)).toBeGreaterThan(0.1);
  });
});

test.each([
  ["flat", { xMm: 105, yMm: 200 }],
  ["rift", { xMm: -80, yMm: 190 }],
  ["quartered", { xMm: -150, yMm: 14 }],
] as const)("most of a board with its pith there is %s", (expected, pith) => {
  expect(dominantClass(fieldFromPith(size, pith), defaultClassLimits)).toBe(expected);
});

test("least, greatest and mean angle of a board set to 33 degrees", () => {
  expect(angleSummary(fieldFromAngle(size, 33, "left"))).toEqual({ least: 33, greatest: 33, mean: 33 });
  expect(() => angleSummary({ ...size, stations: [], pith: null, ringsPerInch: null })).toThrow(/not been read/);
});
