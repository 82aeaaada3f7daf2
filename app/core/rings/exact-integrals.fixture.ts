import type { PointMm } from "./ring-types.ts";
import type { EndSize } from "./stations.ts";

/*
 * For tests: what rings round a pith do over a rectangle, in closed form. With x and y counted from the pith the ring angle is atan(|x| / |y|) and twice
 * the signed direction has cosine (y² - x²) / r² and sine -2xy / r²; each below is an antiderivative in x and y [own integration].
 */

/** A stretch of the width and all of the thickness. */
export interface Slice {
  fromMm: number;
  toMm: number;
}

/** Mean acute ring angle over a slice, degrees. */
export function exactAngleDeg(size: EndSize, pith: PointMm, slice: Slice): number {
  const over = (x: number, y: number) => evenly(x, y, angleOver);
  return (mean(over, size, pith, slice) * 180) / Math.PI;
}

/** Axial mean direction over a slice, degrees. */
export function exactSignedDeg(size: EndSize, pith: PointMm, slice: Slice): number {
  const cos = mean((x, y) => evenly(x, y, cosOver), size, pith, slice);
  const sin = mean(sinOver, size, pith, slice);
  return (Math.atan2(sin, cos) * 90) / Math.PI;
}

/** Share of a slice with ring angles below a limit of more than 0 and less than 90 degrees. */
export function exactShareBelow(size: EndSize, pith: PointMm, slice: Slice, limitDeg: number): number {
  const slope = Math.tan((limitDeg * Math.PI) / 180);
  return mean((x, y) => evenly(x, y, (a, b) => areaBelow(a, b, slope)), size, pith, slice);
}

type Antiderivative = (x: number, y: number) => number;

function mean(over: Antiderivative, { thicknessMm }: EndSize, pith: PointMm, { fromMm, toMm }: Slice): number {
  const [left, right, top, bottom] = [fromMm - pith.xMm, toMm - pith.xMm, -pith.yMm, thicknessMm - pith.yMm];
  const whole = over(right, bottom) - over(left, bottom) - over(right, top) + over(left, top);
  return whole / ((right - left) * (bottom - top));
}

/** Carries an antiderivative from the quarter x, y > 0 of an integrand even in both to the whole plane. */
function evenly(x: number, y: number, quarter: Antiderivative): number {
  return Math.min(Math.abs(x), Math.abs(y)) < 1e-9
    ? 0
    : Math.sign(x) * Math.sign(y) * quarter(Math.abs(x), Math.abs(y));
}

function angleOver(a: number, b: number): number {
  const square = a * a + b * b;
  return (
    a * b * Math.atan(a / b) +
    (a * a * Math.log(square / (a * a))) / 2 -
    (square * Math.log(square) - b * b * Math.log(b * b) - a * a * Math.log(a * a)) / 4
  );
}

function cosOver(a: number, b: number): number {
  return b * b * Math.atan(a / b) - a * a * Math.atan(b / a);
}

function sinOver(x: number, y: number): number {
  const square = x * x + y * y;
  return square < 1e-18 ? 0 : (square - square * Math.log(square)) / 2;
}

/** Area of 0…a by 0…b with x below slope times y. */
function areaBelow(a: number, b: number, slope: number): number {
  return slope * b <= a ? (slope * b * b) / 2 : a * b - (a * a) / (2 * slope);
}
