import type { PointMm } from "./ring-types.ts";
import { type EndSize, requireEndSize } from "./stations.ts";

/** A point in a picture, in its pixels, y down. */
export interface PointPx {
  x: number;
  y: number;
}

/** The four corners of a board's end in a picture: top left, top right, bottom right, bottom left. */
export type EndCorners = readonly [PointPx, PointPx, PointPx, PointPx];

/** Carries points between a picture and the flat end in millimetres, perspective taken out. */
export interface EndPlane {
  /** NaN for a place at or beyond the horizon of the end's plane, where no mark on the end can be. */
  toMm(point: PointPx): PointMm;
  toPx(point: PointMm): PointPx;
}

export type CornerFault = "not numbers" | "too close" | "in a line" | "crossed" | "concave" | "wrong way round";

export type PlaneResult = { ok: true; plane: EndPlane } | { ok: false; fault: CornerFault; why: string };

const whys: Record<CornerFault, string> = {
  "not numbers": "Mark all four corners of the end: one of them is not a number.",
  "too close": "Two corners are on top of each other: each side of the end must be at least 4 pixels long.",
  "in a line": "Three corners are in one line: move them to the corners of the end.",
  crossed: "The corners cross: go round the end, top left, top right, bottom right, bottom left.",
  concave: "One corner lies inside the triangle of the others: move it out to the corner of the end.",
  "wrong way round": "The corners go round the wrong way: top left, top right, bottom right, bottom left.",
};

const leastSidePx = 4;
/** Sine of the least turn at a corner, about 3 degrees: flatter ones leave no end to look at. */
const leastTurn = 0.05;

/**
 * The plane of a board's end from where its corners lie in a picture and how large it really is.
 *
 * @param size of the end in millimetres, both above zero.
 * @returns the way there and back, or why these corners cannot be an end seen from the front.
 */
export function endPlane(corners: EndCorners, size: EndSize): PlaneResult {
  const { widthMm, thicknessMm } = requireEndSize({ widthMm: size.widthMm, thicknessMm: size.thicknessMm });
  const fault = cornerFault(corners);
  if (fault) return { ok: false, fault, why: whys[fault] };
  const square = squareToCorners(corners);
  const back = adjugate(square);
  return {
    ok: true,
    plane: {
      toPx: ({ xMm, yMm }) => {
        const [x, y, w] = mapped(square, xMm / widthMm, yMm / thicknessMm);
        return { x: x / w, y: y / w };
      },
      toMm: ({ x, y }) => {
        const [u, v, w] = mapped(back, x, y);
        // The adjugate keeps the sign of w for every place on the corners' side of the horizon.
        if (!(w > 0)) return { xMm: Number.NaN, yMm: Number.NaN };
        return { xMm: (u / w) * widthMm, yMm: (v / w) * thicknessMm };
      },
    },
  };
}

function cornerFault(corners: EndCorners): CornerFault | null {
  if (corners.length !== 4 || corners.some(({ x, y }) => !Number.isFinite(x) || !Number.isFinite(y)))
    return "not numbers";
  const sides = corners.map((p, i) => ({ x: corners[(i + 1) % 4]!.x - p.x, y: corners[(i + 1) % 4]!.y - p.y }));
  const lengths = sides.map(({ x, y }) => Math.hypot(x, y));
  if (lengths.some((length) => length < leastSidePx)) return "too close";
  const turns = sides.map((side, i) => {
    const next = (i + 1) % 4;
    return (side.x * sides[next]!.y - side.y * sides[next]!.x) / (lengths[i]! * lengths[next]!);
  });
  if (turns.some((turn) => Math.abs(turn) < leastTurn)) return "in a line";
  const rightTurns = turns.filter((turn) => turn > 0).length;
  if (rightTurns === 4) return null;
  if (rightTurns === 0) return "wrong way round";
  return rightTurns === 2 ? "crossed" : "concave";
}

/** The 3 × 3 matrix, row by row, that takes the unit square to four corners (closed form: P. Heckbert, Fundamentals of texture mapping, 1989). */
function squareToCorners(corners: EndCorners): number[] {
  const [a, b, c, d] = corners;
  const sum = { x: a.x - b.x + c.x - d.x, y: a.y - b.y + c.y - d.y };
  const right = { x: b.x - c.x, y: b.y - c.y };
  const bottom = { x: d.x - c.x, y: d.y - c.y };
  const area = right.x * bottom.y - bottom.x * right.y;
  const g = (sum.x * bottom.y - bottom.x * sum.y) / area;
  const h = (right.x * sum.y - sum.x * right.y) / area;
  return [b.x - a.x + g * b.x, d.x - a.x + h * d.x, a.x, b.y - a.y + g * b.y, d.y - a.y + h * d.y, a.y, g, h, 1];
}

/** The inverse of a 3 × 3 matrix up to a positive factor, given a positive determinant. */
function adjugate(matrix: readonly number[]): number[] {
  const [a, b, c, d, e, f, g, h, i] = matrix as [
    number,
    number,
    number,
    number,
    number,
    number,
    number,
    number,
    number,
  ];
  return [
    e * i - f * h,
    c * h - b * i,
    b * f - c * e,
    f * g - d * i,
    a * i - c * g,
    c * d - a * f,
    d * h - e * g,
    b * g - a * h,
    a * e - b * d,
  ];
}

function mapped(matrix: readonly number[], x: number, y: number): [number, number, number] {
  const row = (i: number) => matrix[i]! * x + matrix[i + 1]! * y + matrix[i + 2]!;
  return [row(0), row(3), row(6)];
}
