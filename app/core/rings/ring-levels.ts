import type { PointMm } from "./ring-types.ts";

/**
 * The centre of a family of concentric rings that may be as far off as one likes: (a, b, w) of length 1, the centre being at (a, b) / w in half
 * diagonals from the end's middle. With w = 0 the rings are straight lines square to (a, b). Nothing special happens in between, so a fit can
 * wander from "pith in the board" to "parallel lines" and back.
 */
export interface RingCentre {
  a: number;
  b: number;
  w: number;
}

/** Where the end's middle is and how long half its diagonal: the measure in which centres are kept. */
export interface EndFrame {
  middle: PointMm;
  halfMm: number;
}

/** A place in half diagonals from the middle. */
export interface Place {
  x: number;
  y: number;
}

/** Same length, kept to w ≥ 0. */
export function ringCentre(a: number, b: number, w: number): RingCentre {
  const length = Math.hypot(a, b, w) * (w < 0 ? -1 : 1);
  return { a: a / length, b: b / length, w: w / length };
}

/** Signed distance in half diagonals between a place and the ring through the middle; the same on the whole of any one ring. */
export function ringLevel({ a, b, w }: RingCentre, { x, y }: Place): number {
  const far = Math.hypot(a, b);
  if (far < w / 2) return Math.hypot(x - a / w, y - b / w);
  // |p - c| - |c| without the cancellation that it has for far centres.
  const curve = w / far;
  const out = -(x * a + y * b) / far;
  const square = curve * (x * x + y * y);
  return (2 * out + square) / (1 + Math.sqrt(Math.max(0, 1 + curve * (2 * out + square))));
}

/** Direction of the ring at a place, as an angle of the ring's normal in radians. */
export function normalRad({ a, b, w }: RingCentre, { x, y }: Place): number {
  return Math.atan2(w * y - b, w * x - a);
}

/** The centre in millimetres; one that is as good as infinitely far comes out at a million half diagonals. */
export function centreMm({ a, b, w }: RingCentre, { middle, halfMm }: EndFrame): PointMm {
  const scale = halfMm / Math.max(w, 1e-6);
  return { xMm: middle.xMm + a * scale, yMm: middle.yMm + b * scale };
}

/** Distance of the centre from the middle, in half diagonals. */
export function centreDistance({ a, b, w }: RingCentre): number {
  return Math.hypot(a, b) / Math.max(w, 1e-9);
}

/** A small step on the sphere of centres. */
export function stepped(centre: RingCentre, [e1, e2]: TangentPlane, s: number, t: number): RingCentre {
  return ringCentre(centre.a + s * e1.a + t * e2.a, centre.b + s * e1.b + t * e2.b, centre.w + s * e1.w + t * e2.w);
}

export type TangentPlane = [RingCentre, RingCentre];

/** Two directions square to a centre and to each other. */
export function tangentPlane({ a, b, w }: RingCentre): TangentPlane {
  const flat = Math.hypot(a, b);
  const e1 = flat > 1e-9 ? { a: -b / flat, b: a / flat, w: 0 } : { a: 1, b: 0, w: 0 };
  return [e1, { a: b * e1.w - w * e1.b, b: w * e1.a - a * e1.w, w: a * e1.b - b * e1.a }];
}
