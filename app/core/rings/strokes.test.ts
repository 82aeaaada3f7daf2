import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { type EndCorners, endPlane } from "./perspective.ts";
import type { PointMm } from "./ring-types.ts";
import { fieldFromPith } from "./stations.ts";
import { readPhotoStrokes, readStrokes, type Stroke, type StrokesResult } from "./strokes.ts";

const size = { widthMm: 210, thicknessMm: 27 };

/** A slow and a quick waver of the hand, as parts of its greatest: where along the stroke (mm) it is how far off. */
const waver = (mm: number, phase: number) => (2 * Math.sin(mm * 0.44 + phase) + Math.sin(mm * 1.6 + 3 * phase)) / 3;

/** A stroke along the ring through a point, 20 mm each way or as far as it stays on the end. Exact geometry of circles but for the hand. */
function strokeThrough(pith: PointMm, start: PointMm, handMm = 0): Stroke {
  const radius = Math.hypot(start.xMm - pith.xMm, start.yMm - pith.yMm);
  const from = Math.atan2(start.yMm - pith.yMm, start.xMm - pith.xMm);
  const walk = (sense: 1 | -1) => {
    const points: PointMm[] = [];
    for (let mm = sense > 0 ? 0 : 0.8; mm < Math.min(20, Math.PI * radius); mm += 0.8) {
      const angle = from + (sense * mm) / radius;
      const r = radius + handMm * waver(sense * mm, start.xMm);
      const point = { xMm: pith.xMm + r * Math.cos(angle), yMm: pith.yMm + r * Math.sin(angle) };
      if (point.xMm < 0 || point.xMm > size.widthMm || point.yMm < 0 || point.yMm > size.thicknessMm) break;
      points.push(point);
    }
    return points;
  };
  return [...walk(-1).reverse(), ...walk(1)];
}

function three(pith: PointMm, handMm = 0): Stroke[] {
  return [0.15, 0.5, 0.85].map((share) => strokeThrough(pith, { xMm: 210 * share, yMm: 13 }, handMm));
}

function reading(result: StrokesResult) {
  if (!result.ok) throw new Error(result.why);
  return result.reading;
}

function offBy(result: StrokesResult, pith: PointMm): number[] {
  const truth = fieldFromPith(size, pith).stations;
  return reading(result).field.stations.map(({ angleDeg }, i) => Math.abs(angleDeg - truth[i]!.angleDeg));
}

const boards = [
  ["flat", { xMm: 105, yMm: 120 }],
  ["rift", { xMm: -80, yMm: 190 }],
  ["quartered", { xMm: -150, yMm: 14 }],
  ["quartered, far", { xMm: -400, yMm: 10 }],
  ["pith inside", { xMm: 90, yMm: 12 }],
  ["pith above", { xMm: 150, yMm: -40 }],
] as const;

describe("strokes along the rings of a known pith", () => {
  test.each(boards)("%s: exact strokes give the rings back", (_way, pith) => {
    const result = readStrokes(three(pith), size);
    expect(Math.max(...offBy(result, pith))).toBeLessThan(0.3);
    expect(reading(result).strayMm).toBeLessThan(0.05);
    expect(reading(result).confidence).toBeGreaterThan(0.8);
    expect(reading(result).doubts).toEqual([]);
  });

  test.each(boards)("%s: and so do two strokes near the edges", (_way, pith) => {
    const [left, , right] = three(pith);
    const off = offBy(readStrokes([left!, right!], size), pith);
    expect(Math.max(...off)).toBeLessThan(0.5);
  });

  test("wherever the pith is, a hand that wavers by 0.3 mm is within 3 degrees where the reading is confident, 8 anywhere", () => {
    const pithAnywhere = fc.record({
      xMm: fc.double({ min: -300, max: 510, noNaN: true }),
      yMm: fc.double({ min: -300, max: 327, noNaN: true }),
    });
    fc.assert(
      fc.property(pithAnywhere, (pith) => {
        const result = readStrokes(
          three(pith, 0.3).filter((stroke) => stroke.length > 6),
          size,
        );
        if (!result.ok) return;
        const off = offBy(result, pith);
        result.reading.field.stations.forEach(({ confidence }, i) => {
          expect(off[i]).toBeLessThan(confidence >= 0.7 ? 3 : 8);
        });
      }),
    );
  });

  test("neither the order of the strokes nor the way they were drawn matters", () => {
    const [a, b, c] = three({ xMm: -80, yMm: 190 }, 0.3);
    const there = reading(readStrokes([a!, b!, c!], size)).field;
    const turned = reading(readStrokes([c!, [...a!].reverse(), b!], size)).field;
    turned.stations.forEach(({ angleDeg }, i) => {
      expect(angleDeg).toBeCloseTo(there.stations[i]!.angleDeg, 3);
    });
  });

  test("a stroke along a ray among three along rings is named and does not bend them", () => {
    const pith = { xMm: 105, yMm: 150 };
    const ray: Stroke = Array.from({ length: 12 }, (_, i) => ({ xMm: 150 + i * 0.7, yMm: 25 - i * 2 }));
    const result = readStrokes([...three(pith, 0.2), ray], size);
    expect(Math.max(...offBy(result, pith))).toBeLessThan(2);
    expect(reading(result).doubts).toEqual([expect.stringMatching(/^Stroke 4 does not run with the others/)]);
    expect(reading(result).confidence).toBeLessThan(0.6);
  });

  test("a stroke along a saw mark, aslant across the rings, does not bend the others either", () => {
    const pith = { xMm: 105, yMm: 150 };
    const sawMark: Stroke = Array.from({ length: 12 }, (_, i) => ({ xMm: 130 + i * 2, yMm: 3 + i * 2 }));
    const result = readStrokes([...three(pith, 0.2), sawMark], size);
    // Measured: 1.0 degree; plain least squares is 8.7 off.
    expect(Math.max(...offBy(result, pith))).toBeLessThan(1.5);
    expect(reading(result).strokeStrayMm[3]).toBeGreaterThan(2);
  });

  test("a place far from every stroke is trusted less", () => {
    const pith = { xMm: -80, yMm: 190 };
    const near = [0.1, 0.25].map((share) => strokeThrough(pith, { xMm: 210 * share, yMm: 13 }, 0.3));
    const { stations } = reading(readStrokes(near, size)).field;
    expect(stations[1]!.confidence).toBeGreaterThan(0.85);
    expect(stations[8]!.confidence).toBeLessThan(0.55);
  });

  test("one stroke is believed less than three, and asks for another", () => {
    const strokes = three({ xMm: 105, yMm: 150 });
    const one = reading(readStrokes(strokes.slice(0, 1), size));
    expect(one.confidence).toBeLessThan(reading(readStrokes(strokes, size)).confidence);
    expect(one.doubts).toEqual([expect.stringMatching(/draw another/)]);
  });
});

describe("straight strokes", () => {
  const line = (x: number): Stroke => Array.from({ length: 12 }, (_, i) => ({ xMm: x + i * 2, yMm: 2 + i * 2 }));

  test("that run parallel are straight rings, without a pith", () => {
    const { field } = reading(readStrokes([line(20), line(90), line(160)], size));
    expect(field.pith).toBeNull();
    for (const station of field.stations) expect(station.signedDeg).toBeCloseTo(45, 1);
  });

  test("with a rings-per-inch count keep it", () => {
    expect(reading(readStrokes([line(20), line(90)], size, 11)).field.ringsPerInch).toBe(11);
  });
});

describe("strokes that cannot be read", () => {
  const good = three({ xMm: 105, yMm: 150 });
  test.each([
    ["none", [], /Draw along a ring/],
    [
      "a dab",
      [
        ...good,
        [
          { xMm: 5, yMm: 5 },
          { xMm: 6, yMm: 5 },
        ],
      ],
      /^Stroke 4 is too short/,
    ],
    ["one point", [[{ xMm: 5, yMm: 5 }]], /^Stroke 1 is too short/],
    [
      "not a number",
      [
        good[0]!,
        [
          { xMm: 5, yMm: 5 },
          { xMm: Number.NaN, yMm: 5 },
        ],
      ],
      /^Stroke 2 runs off/,
    ],
    [
      "far off the end",
      [
        [
          { xMm: 5, yMm: 5 },
          { xMm: 900, yMm: 5 },
        ],
      ],
      /^Stroke 1 runs off/,
    ],
    ["too many", Array.from({ length: 41 }, () => good[0]!), /At most 40/],
  ])("%s", (_what, strokes: Stroke[], why) => {
    const result = readStrokes(strokes, size);
    expect(result.ok).toBe(false);
    if (!result.ok) expect(result.why).toMatch(why);
  });

  test("whatever is drawn, angles stay within 0 to 90 and confidence within 0 to 1", () => {
    const point = fc.record({
      xMm: fc.double({ min: 0, max: 210, noNaN: true }),
      yMm: fc.double({ min: 0, max: 27, noNaN: true }),
    });
    const scribbles = fc.array(fc.array(point, { minLength: 2, maxLength: 12 }), { minLength: 1, maxLength: 4 });
    fc.assert(
      fc.property(scribbles, (strokes) => {
        const result = readStrokes(strokes, size);
        if (!result.ok) return;
        const { field, confidence, strayMm } = result.reading;
        for (const value of [confidence, ...field.stations.map((station) => station.confidence)]) {
          expect(value).toBeGreaterThanOrEqual(0);
          expect(value).toBeLessThanOrEqual(1);
        }
        expect(strayMm).toBeLessThan(120);
        for (const { angleDeg } of field.stations) {
          expect(angleDeg).toBeGreaterThanOrEqual(0);
          expect(angleDeg).toBeLessThanOrEqual(90);
        }
      }),
    );
  });
});

describe("strokes on a photo", () => {
  const corners: EndCorners = [
    { x: 300, y: 420 },
    { x: 2600, y: 600 },
    { x: 2500, y: 940 },
    { x: 320, y: 860 },
  ];

  test("seen askew give the same rings as seen straight", () => {
    const pith = { xMm: -80, yMm: 190 };
    const plane = endPlane(corners, size);
    if (!plane.ok) throw new Error(plane.why);
    const strokes = three(pith).map((stroke) => stroke.map(plane.plane.toPx));
    expect(Math.max(...offBy(readPhotoStrokes(strokes, corners, size), pith))).toBeLessThan(0.3);
  });

  test("between corners that cross are refused", () => {
    const [a, b, c, d] = corners;
    const result = readPhotoStrokes([], [a, c, b, d], size);
    expect(result).toMatchObject({ ok: false, why: expect.stringMatching(/cross/) });
  });
});
