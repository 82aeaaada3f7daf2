import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { endPlane } from "./perspective.ts";
import type { PointMm } from "./ring-types.ts";
import { fieldFromPith } from "./stations.ts";
import { readStrokes, type Stroke } from "./strokes.ts";

const size = { widthMm: 210, thicknessMm: 27 };

/** A stroke along the ring through a point, as far as it stays on the end; the hand wavers by up to `wobbleMm`. Exact geometry of circles. */
function strokeThrough(pith: PointMm, start: PointMm, wobbleMm = 0): Stroke {
  const radius = Math.hypot(start.xMm - pith.xMm, start.yMm - pith.yMm);
  const from = Math.atan2(start.yMm - pith.yMm, start.xMm - pith.xMm);
  const points: PointMm[] = [];
  for (const sense of [-1, 1]) {
    const side: PointMm[] = [];
    for (let i = sense > 0 ? 0 : 1; i < 400; i++) {
      const angle = from + (sense * i * 0.8) / radius;
      const r = radius + wobbleMm * Math.sin(i * 1.7 + from * 9);
      const point = { xMm: pith.xMm + r * Math.cos(angle), yMm: pith.yMm + r * Math.sin(angle) };
      if (point.xMm < 0 || point.xMm > size.widthMm || point.yMm < 0 || point.yMm > size.thicknessMm) break;
      side.push(point);
    }
    if (sense < 0) points.push(...side.reverse());
    else points.push(...side);
  }
  return points;
}

function reading(strokes: Stroke[]) {
  const result = readStrokes(strokes, size);
  if (!result.ok) throw new Error(result.why);
  return result.reading;
}

function worstAngle(strokes: Stroke[], pith: PointMm): number {
  const truth = fieldFromPith(size, pith).stations;
  return Math.max(
    ...reading(strokes).field.stations.map((station, i) => Math.abs(station.angleDeg - (truth[i]?.angleDeg ?? 0))),
  );
}

describe("readStrokes", () => {
  test.each([
    ["flat", { xMm: 105, yMm: 120 }],
    ["rift", { xMm: -80, yMm: 190 }],
    ["quartered", { xMm: -150, yMm: 14 }],
    ["pith inside", { xMm: 90, yMm: 12 }],
  ])("three exact strokes on a %s board give its rings back", (_way, pith) => {
    const strokes = [0.2, 0.5, 0.8].map((share) => strokeThrough(pith, { xMm: size.widthMm * share, yMm: 13 }));
    expect(worstAngle(strokes, pith)).toBeLessThan(0.6);
    expect(reading(strokes).confidence).toBeGreaterThan(0.8);
  });

  test("a wavering hand still reads a rift board to a few degrees", () => {
    const pith = { xMm: -80, yMm: 190 };
    const strokes = [0.15, 0.5, 0.85].map((share) => strokeThrough(pith, { xMm: size.widthMm * share, yMm: 13 }, 0.3));
    expect(worstAngle(strokes, pith)).toBeLessThan(5);
  });

  test("straight parallel strokes are parallel rings, without a pith", () => {
    const line = (x: number): Stroke => Array.from({ length: 12 }, (_, i) => ({ xMm: x + i * 2, yMm: 2 + i * 2 }));
    const { field } = reading([line(20), line(90), line(160)]);
    expect(field.pith).toBeNull();
    for (const station of field.stations) expect(station.signedDeg).toBeCloseTo(45, 0);
  });

  test("one stroke is believed less than three", () => {
    const pith = { xMm: 105, yMm: 150 };
    const three = [0.2, 0.5, 0.8].map((share) => strokeThrough(pith, { xMm: size.widthMm * share, yMm: 13 }));
    expect(reading(three.slice(0, 1)).confidence).toBeLessThan(reading(three).confidence);
  });

  test("dabs are no strokes", () => {
    expect(
      readStrokes(
        [
          [
            { xMm: 5, yMm: 5 },
            { xMm: 6, yMm: 5 },
          ],
        ],
        size,
      ).ok,
    ).toBe(false);
    expect(readStrokes([], size).ok).toBe(false);
  });

  test("whatever is drawn, angles stay within 0 to 90 and confidence within 0 to 1", () => {
    const point = fc.record({
      xMm: fc.double({ min: 0, max: 210, noNaN: true }),
      yMm: fc.double({ min: 0, max: 27, noNaN: true }),
    });
    fc.assert(
      fc.property(
        fc.array(fc.array(point, { minLength: 2, maxLength: 12 }), { minLength: 1, maxLength: 4 }),
        (strokes) => {
          const result = readStrokes(strokes, size);
          if (!result.ok) return;
          expect(result.reading.confidence).toBeGreaterThanOrEqual(0);
          expect(result.reading.confidence).toBeLessThanOrEqual(1);
          for (const { angleDeg } of result.reading.field.stations) {
            expect(angleDeg).toBeGreaterThanOrEqual(0);
            expect(angleDeg).toBeLessThanOrEqual(90);
          }
        },
      ),
    );
  });
});

describe("endPlane", () => {
  const square = [
    { x: 100, y: 80 },
    { x: 900, y: 120 },
    { x: 870, y: 260 },
    { x: 120, y: 200 },
  ] as const;

  test("the corners are the rectangle's, and there and back is where one was", () => {
    const result = endPlane(square, size);
    if (!result.ok) throw new Error(result.why);
    const { plane } = result;
    expect(plane.toMm(square[2]).xMm).toBeCloseTo(210, 6);
    expect(plane.toMm(square[2]).yMm).toBeCloseTo(27, 6);
    const inside = { x: 512.5, y: 170.25 };
    const back = plane.toPx(plane.toMm(inside));
    expect(back.x).toBeCloseTo(inside.x, 6);
    expect(back.y).toBeCloseTo(inside.y, 6);
  });

  test("straight lines stay straight: the middle of the diagonals is the middle of the end", () => {
    const result = endPlane(square, size);
    if (!result.ok) throw new Error(result.why);
    const middle = crossing(square[0], square[2], square[1], square[3]);
    expect(result.plane.toMm(middle).xMm).toBeCloseTo(105, 6);
    expect(result.plane.toMm(middle).yMm).toBeCloseTo(13.5, 6);
  });

  test.each([
    ["crossed", [square[0], square[2], square[1], square[3]]],
    ["the wrong way round", [square[0], square[3], square[2], square[1]]],
    ["one inside the others", [square[0], square[1], { x: 400, y: 130 }, square[3]]],
    ["all on one line", [0, 1, 2, 3].map((i) => ({ x: i * 100, y: i * 10 }))],
    ["one spot", [0, 1, 2, 3].map(() => ({ x: 5, y: 5 }))],
    ["not numbers", [0, 1, 2, 3].map(() => ({ x: Number.NaN, y: 5 }))],
  ])("corners that are %s are refused with a reason", (_what, corners) => {
    expect(endPlane(corners as never, size)).toMatchObject({ ok: false });
  });
});

function crossing(
  a: { x: number; y: number },
  b: { x: number; y: number },
  c: { x: number; y: number },
  d: { x: number; y: number },
) {
  const det = (a.x - b.x) * (c.y - d.y) - (a.y - b.y) * (c.x - d.x);
  const one = a.x * b.y - a.y * b.x;
  const two = c.x * d.y - c.y * d.x;
  return { x: (one * (c.x - d.x) - (a.x - b.x) * two) / det, y: (one * (c.y - d.y) - (a.y - b.y) * two) / det };
}
