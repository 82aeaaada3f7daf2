import { axialMean, foldDeg } from "./angle.ts";
import { type RingDirection, ringDirection } from "./direction.ts";
import type { PointMm, RingField } from "./ring-types.ts";

/** A piece of a ring as it crosses a board's end. */
export interface RingCurve {
  /** Along the piece, from 0 at one end to 1 at the other. */
  at(share: number): PointMm;
  /** For a piece of a circle: its radius, and the angle it turns through in radians, positive clockwise as drawn (y down). */
  arc: { radiusMm: number; turnRad: number } | null;
}

export interface RingSpacing {
  /** Between one drawn ring and the next. */
  spacingMm: number;
  /** Makes rings uneven, as growth is: the same number, the same rings. Without it they are even. */
  seed?: number;
  /** How far pieces run on past the edges, so that nothing is missing where the drawing is cut off. Shorter pieces, past a corner, are left out. */
  bleedMm: number;
}

/** More rings than this can be told apart on no drawing. */
const mostRings = 600;
/** Of the spacing: how far a seed moves a ring. */
const unevenness = 0.22;

/** The rings of a board's end as they cross its rectangle, from the pith outwards (or from side to side): a list of pieces for each ring. */
export function ringCurves(field: RingField, spacing: RingSpacing): RingCurve[][] {
  const box = boxOf(field, spacing.bleedMm);
  const rings = field.pith ? circles(field.pith, box, spacing) : lines(field, box, spacing);
  return rings
    .map((pieces) => pieces.filter((piece) => isLonger(piece, spacing.bleedMm)))
    .filter((pieces) => pieces.length > 0);
}

function isLonger({ at }: RingCurve, leastMm: number): boolean {
  const [from, middle, to] = [at(0), at(0.5), at(1)];
  return (
    Math.hypot(to.xMm - from.xMm, to.yMm - from.yMm) > leastMm ||
    Math.hypot(middle.xMm - from.xMm, middle.yMm - from.yMm) > leastMm
  );
}

interface Box {
  left: number;
  right: number;
  top: number;
  bottom: number;
}

function boxOf({ widthMm, thicknessMm }: RingField, bleedMm: number): Box {
  return { left: -bleedMm, right: widthMm + bleedMm, top: -bleedMm, bottom: thicknessMm + bleedMm };
}

function inBox({ left, right, top, bottom }: Box, { xMm, yMm }: PointMm): boolean {
  return xMm >= left && xMm <= right && yMm >= top && yMm <= bottom;
}

function corners({ left, right, top, bottom }: Box): PointMm[] {
  return [left, right].flatMap((xMm) => [top, bottom].map((yMm) => ({ xMm, yMm })));
}

/** Places of rings between two distances, at whole multiples of the spacing. */
function ringPlaces(from: number, to: number, { spacingMm, seed }: RingSpacing): number[] {
  const first = Math.ceil(from / spacingMm);
  const count = Math.min(mostRings, Math.floor(to / spacingMm) - first + 1);
  return Array.from({ length: Math.max(0, count) }, (_, i) => {
    const ring = first + i;
    return spacingMm * (ring + (seed === undefined ? 0 : unevenness * scattered(ring, seed)));
  });
}

/** A fixed scatter of whole numbers over -1 to 1. */
function scattered(ring: number, seed: number): number {
  let bits = Math.imul(ring ^ Math.imul(seed, 0x9e3779b1), 0x85ebca6b);
  bits = Math.imul(bits ^ (bits >>> 13), 0xc2b2ae35);
  return ((bits ^ (bits >>> 16)) >>> 0) / 2 ** 31 - 1;
}

function circles(pith: PointMm, box: Box, spacing: RingSpacing): RingCurve[][] {
  const out = (p: PointMm) => Math.hypot(p.xMm - pith.xMm, p.yMm - pith.yMm);
  const nearest = out({
    xMm: Math.min(box.right, Math.max(box.left, pith.xMm)),
    yMm: Math.min(box.bottom, Math.max(box.top, pith.yMm)),
  });
  return ringPlaces(Math.max(nearest, spacing.spacingMm), Math.max(...corners(box).map(out)), spacing).map((radius) =>
    arcsInBox(pith, radius, box),
  );
}

/** The pieces of a circle inside a box: it is cut where it crosses the box's four lines, and the cuts with their middle inside are kept. */
function arcsInBox(centre: PointMm, radiusMm: number, box: Box): RingCurve[] {
  const point = (angle: number): PointMm => ({
    xMm: centre.xMm + radiusMm * Math.cos(angle),
    yMm: centre.yMm + radiusMm * Math.sin(angle),
  });
  const piece = (from: number, turnRad: number): RingCurve => ({
    at: (share) => point(from + share * turnRad),
    arc: { radiusMm, turnRad },
  });
  const cuts: number[] = [];
  for (const x of [box.left, box.right]) {
    const cos = (x - centre.xMm) / radiusMm;
    if (Math.abs(cos) < 1) cuts.push(Math.acos(cos), -Math.acos(cos));
  }
  for (const y of [box.top, box.bottom]) {
    const sin = (y - centre.yMm) / radiusMm;
    if (Math.abs(sin) < 1) cuts.push(Math.asin(sin), Math.PI - Math.asin(sin));
  }
  const full = 2 * Math.PI;
  const sorted = cuts.map((angle) => ((angle % full) + full) % full).sort((a, b) => a - b);
  if (sorted.length === 0) return inBox(box, point(0)) ? [piece(0, full)] : [];
  return sorted.flatMap((from, i) => {
    const turnRad = (sorted[i + 1] ?? sorted[0]! + full) - from;
    return turnRad > 1e-9 && inBox(box, point(from + turnRad / 2)) ? [piece(from, turnRad)] : [];
  });
}

/** Rings without a pith: lines that follow the directions read across the width, at even distances along a line square to them in the middle. */
function lines(field: RingField, box: Box, spacing: RingSpacing): RingCurve[][] {
  const direction = ringDirection(field);
  const meanDeg = axialMean(field.stations.map(({ signedDeg }) => signedDeg)).signedDeg;
  const mean = (meanDeg * Math.PI) / 180;
  const along = { x: Math.cos(mean), y: Math.sin(mean) };
  const middle = { xMm: field.widthMm / 2, yMm: field.thicknessMm / 2 };
  const reach = Math.hypot(box.right - box.left, box.bottom - box.top);
  const isStraight = field.stations.every(({ signedDeg }) => Math.abs(foldDeg(signedDeg - meanDeg)) < straightDeg);
  const steps = isStraight ? 1 : walkSteps;
  return ringPlaces(-reach, reach, spacing).map((offset) => {
    const seed = { xMm: middle.xMm - offset * along.y, yMm: middle.yMm + offset * along.x };
    const back = walked(direction, seed, -reach, mean, steps);
    return partsInBox([...back.reverse(), seed, ...walked(direction, seed, reach, mean, steps)], box);
  });
}

const walkSteps = 48;
/** Rings that nowhere turn further than this from their mean are drawn as straight lines. */
const straightDeg = 0.5;
/** A walk never turns further than this from the mean direction, so that it always gets across. */
const mostTurn = (65 * Math.PI) / 180;

/** Points along a ring from a seed, one way as far as `reach` along the mean direction (midpoint steps). */
function walked(direction: RingDirection, seed: PointMm, reach: number, mean: number, steps: number): PointMm[] {
  const step = reach / steps;
  const moved = (from: PointMm, at: PointMm, by: number): PointMm => {
    const deg = direction(at);
    const turn = (deg * Math.PI) / 180 - mean;
    const held = Math.max(-mostTurn, Math.min(mostTurn, turn - Math.PI * Math.round(turn / Math.PI)));
    const far = by / Math.cos(held);
    return { xMm: from.xMm + far * Math.cos(mean + held), yMm: from.yMm + far * Math.sin(mean + held) };
  };
  const points: PointMm[] = [];
  let at = seed;
  for (let i = 0; i < steps; i++) {
    at = moved(at, moved(at, at, step / 2), step);
    points.push(at);
  }
  return points;
}

/** The parts of a many-pointed line inside a box, cut where they cross its edges. */
function partsInBox(points: PointMm[], box: Box): RingCurve[] {
  const parts: PointMm[][] = [];
  let part: PointMm[] = [];
  for (let i = 0; i + 1 < points.length; i++) {
    const [a, b] = [points[i]!, points[i + 1]!];
    const span = spanInBox(a, b, box);
    if (!span) continue;
    const [from, to] = span;
    if (part.length === 0 || from > 0) {
      part = [between(a, b, from)];
      parts.push(part);
    }
    part.push(between(a, b, to));
  }
  return parts.map((line) => ({ at: alongLine(line), arc: null }));
}

/** From and to which share of the way from a to b lies in the box (Liang and Barsky's clipping, from memory). */
function spanInBox(a: PointMm, b: PointMm, box: Box): [number, number] | null {
  let [from, to] = [0, 1];
  const edges = [
    [b.xMm - a.xMm, box.left - a.xMm, box.right - a.xMm],
    [b.yMm - a.yMm, box.top - a.yMm, box.bottom - a.yMm],
  ] as const;
  for (const [step, low, high] of edges) {
    if (step === 0) {
      if (low > 0 || high < 0) return null;
      continue;
    }
    from = Math.max(from, Math.min(low / step, high / step));
    to = Math.min(to, Math.max(low / step, high / step));
  }
  return from < to ? [from, to] : null;
}

function between(a: PointMm, b: PointMm, share: number): PointMm {
  return { xMm: a.xMm + share * (b.xMm - a.xMm), yMm: a.yMm + share * (b.yMm - a.yMm) };
}

/** Points by their share of a many-pointed line's length. */
function alongLine(line: PointMm[]): (share: number) => PointMm {
  const lengths = [0];
  for (let i = 1; i < line.length; i++)
    lengths.push(lengths[i - 1]! + Math.hypot(line[i]!.xMm - line[i - 1]!.xMm, line[i]!.yMm - line[i - 1]!.yMm));
  return (share) => {
    const far = share * lengths.at(-1)!;
    const reached = lengths.findIndex((length) => length >= far);
    const after = reached === -1 ? line.length - 1 : Math.max(1, reached);
    const gap = lengths[after]! - lengths[after - 1]!;
    return between(line[after - 1]!, line[after]!, gap > 0 ? (far - lengths[after - 1]!) / gap : 1);
  };
}
