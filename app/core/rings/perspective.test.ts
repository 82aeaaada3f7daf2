import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { type EndCorners, endPlane } from "./perspective.ts";

const size = { widthMm: 210, thicknessMm: 27 };
const seen: EndCorners = [
  { x: 100, y: 80 },
  { x: 900, y: 120 },
  { x: 870, y: 260 },
  { x: 120, y: 200 },
];

function planeOf(corners: EndCorners) {
  const result = endPlane(corners, size);
  if (!result.ok) throw new Error(result.why);
  return result.plane;
}

/** Projective geometry: straight lines stay straight and cross where they crossed. */
describe("the plane of an end", () => {
  test("the corners are the rectangle's, both ways", () => {
    const { toMm, toPx } = planeOf(seen);
    const rectangle = [
      { xMm: 0, yMm: 0 },
      { xMm: 210, yMm: 0 },
      { xMm: 210, yMm: 27 },
      { xMm: 0, yMm: 27 },
    ];
    rectangle.forEach((corner, i) => {
      expect(toMm(seen[i]!).xMm).toBeCloseTo(corner.xMm, 8);
      expect(toMm(seen[i]!).yMm).toBeCloseTo(corner.yMm, 8);
      expect(toPx(corner).x).toBeCloseTo(seen[i]!.x, 8);
      expect(toPx(corner).y).toBeCloseTo(seen[i]!.y, 8);
    });
  });

  test("the crossing of the diagonals is the middle of the end", () => {
    const [a, b, c, d] = seen;
    const det = (a.x - c.x) * (b.y - d.y) - (a.y - c.y) * (b.x - d.x);
    const [one, two] = [a.x * c.y - a.y * c.x, b.x * d.y - b.y * d.x];
    const crossing = {
      x: (one * (b.x - d.x) - (a.x - c.x) * two) / det,
      y: (one * (b.y - d.y) - (a.y - c.y) * two) / det,
    };
    const middle = planeOf(seen).toMm(crossing);
    expect(middle.xMm).toBeCloseTo(105, 6);
    expect(middle.yMm).toBeCloseTo(13.5, 6);
  });

  test("there and back is where one was, for any end that is accepted", () => {
    const off = fc.double({ min: -120, max: 120, noNaN: true });
    const corner = (x: number, y: number) => fc.tuple(off, off).map(([dx, dy]) => ({ x: x + dx, y: y + dy }));
    const corners = fc.tuple(corner(200, 200), corner(1000, 200), corner(1000, 500), corner(200, 500));
    const share = fc.double({ min: 0, max: 1, noNaN: true });
    fc.assert(
      fc.property(corners, share, share, (some, u, v) => {
        const result = endPlane(some, size);
        fc.pre(result.ok);
        if (!result.ok) return;
        const back = result.plane.toMm(result.plane.toPx({ xMm: u * 210, yMm: v * 27 }));
        expect(back.xMm).toBeCloseTo(u * 210, 5);
        expect(back.yMm).toBeCloseTo(v * 27, 5);
      }),
    );
  });

  test("beyond the horizon there is no place on the end", () => {
    const steep: EndCorners = [
      { x: 400, y: 100 },
      { x: 600, y: 100 },
      { x: 1000, y: 500 },
      { x: 0, y: 500 },
    ];
    // The two long sides meet at (500, 0): the horizon is the line y = 0.
    expect(planeOf(steep).toMm({ x: 500, y: -10 }).xMm).toBeNaN();
    expect(planeOf(steep).toMm({ x: 500, y: 5 }).xMm).toBeCloseTo(105, 6);
  });
});

describe("corners that cannot be an end are refused with a reason", () => {
  const [a, b, c, d] = seen;
  test.each([
    ["crossed", [a, c, b, d]],
    ["wrong way round", [a, d, c, b]],
    ["concave", [a, b, { x: 300, y: 130 }, d]],
    ["in a line", [0, 1, 2, 3].map((i) => ({ x: i * 100, y: i * 10 }))],
    ["in a line", [a, b, { x: (b.x + d.x) / 2, y: (b.y + d.y) / 2 }, d]],
    ["too close", [a, b, c, { x: a.x + 1, y: a.y + 1 }]],
    ["not numbers", [a, b, c, { x: Number.NaN, y: 5 }]],
    ["not numbers", [a, b, c]],
  ] as Array<[string, Array<{ x: number; y: number }>]>)("%s", (fault, corners) => {
    const result = endPlane(corners as unknown as EndCorners, size);
    expect(result).toMatchObject({ ok: false, fault });
    if (!result.ok) expect(result.why).toMatch(/\.$/);
  });
});
