import type { PointMm } from "./ring-types.ts";

/** A point in a picture, in its pixels, y down. */
export interface PointPx {
  x: number;
  y: number;
}

/** The four corners of a board's end in a picture: top left, top right, bottom right, bottom left. */
export type EndCorners = readonly [PointPx, PointPx, PointPx, PointPx];

/** Carries points between a picture and the flat end in millimetres, perspective taken out. */
export interface EndPlane {
  toMm(point: PointPx): PointMm;
  toPx(point: PointMm): PointPx;
}

export type PlaneResult = { ok: true; plane: EndPlane } | { ok: false; why: string };

const leastAreaPx = 16;

/**
 * The plane of a board's end from where its corners lie in a picture and how large it really is: the projective map that takes the four corners to the
 * rectangle (Hartley and Zisserman, Multiple View Geometry, 2nd ed., section 4.1; from memory).
 *
 * @param size of the end in millimetres, both above zero.
 * @returns why not, when the corners do not go round a four-sided shape in order.
 */
export function endPlane(corners: EndCorners, size: { widthMm: number; thicknessMm: number }): PlaneResult {
  const why = cornersProblem(corners);
  if (why) return { ok: false, why };
  const { widthMm, thicknessMm } = size;
  const target = [
    { x: 0, y: 0 },
    { x: widthMm, y: 0 },
    { x: widthMm, y: thicknessMm },
    { x: 0, y: thicknessMm },
  ];
  const forward = homography(corners, target);
  const back = homography(target, corners);
  if (!forward || !back) return { ok: false, why: "The corners lie too close to one line." };
  return {
    ok: true,
    plane: {
      toMm: (point) => {
        const { x, y } = apply(forward, point);
        return { xMm: x, yMm: y };
      },
      toPx: (point) => apply(back, { x: point.xMm, y: point.yMm }),
    },
  };
}

function cornersProblem(corners: EndCorners): string | null {
  if (corners.some(({ x, y }) => !Number.isFinite(x) || !Number.isFinite(y))) return "A corner is not a number.";
  const turns = corners.map((corner, i) => {
    const next = corners[(i + 1) % 4] as PointPx;
    const after = corners[(i + 2) % 4] as PointPx;
    return (next.x - corner.x) * (after.y - next.y) - (next.y - corner.y) * (after.x - next.x);
  });
  // Going round once, every turn is to the same side; y points down, so top left first turns to the positive side.
  if (turns.every((turn) => turn < 0))
    return "The corners go round the wrong way: top left comes first, then top right.";
  if (turns.some((turn) => turn <= leastAreaPx))
    return "The corners cross, or one lies between the others: put each on its own corner of the board's end.";
  return null;
}

type Matrix = readonly number[];

function apply(h: Matrix, { x, y }: PointPx): PointPx {
  const [a, b, c, d, e, f, g, i] = h as [number, number, number, number, number, number, number, number];
  const w = g * x + i * y + 1;
  return { x: (a * x + b * y + c) / w, y: (d * x + e * y + f) / w };
}

/** Eight equations in eight unknowns, two for each corner, the ninth entry being 1. */
function homography(from: readonly PointPx[], to: readonly PointPx[]): Matrix | null {
  const rows = from.flatMap(({ x, y }, i) => {
    const { x: u, y: v } = to[i] as PointPx;
    return [
      [x, y, 1, 0, 0, 0, -u * x, -u * y, u],
      [0, 0, 0, x, y, 1, -v * x, -v * y, v],
    ];
  });
  return solve(rows);
}

/** Gauss elimination with the largest pivot, on rows that carry their right side last. */
function solve(rows: number[][]): number[] | null {
  const n = rows.length;
  for (let column = 0; column < n; column++) {
    let best = column;
    for (let row = column + 1; row < n; row++)
      if (Math.abs(at(rows, row, column)) > Math.abs(at(rows, best, column))) best = row;
    if (Math.abs(at(rows, best, column)) < 1e-12) return null;
    [rows[column], rows[best]] = [rows[best] as number[], rows[column] as number[]];
    for (let row = 0; row < n; row++) {
      if (row === column) continue;
      const factor = at(rows, row, column) / at(rows, column, column);
      const target = rows[row] as number[];
      for (let k = column; k <= n; k++) target[k] = (target[k] as number) - factor * at(rows, column, k);
    }
  }
  return rows.map((row, i) => (row[n] as number) / (row[i] as number));
}

function at(rows: number[][], row: number, column: number): number {
  return (rows[row] as number[])[column] as number;
}
