import { foldDeg, signedRingDeg } from "./angle.ts";
import type { PointMm, RingField } from "./ring-types.ts";
import { pithStation } from "./stations.ts";

/** Direction of the ring at a point of a board's end: -90 to 90 degrees, positive where the ring falls to the right. */
export type RingDirection = (point: PointMm) => number;

/**
 * The rings of a reading as a direction at every point, inside the end and a little beyond. With a pith they are circles round it, turned at each
 * place by what the stations read there differ from such circles (real rings are not quite round); without one the direction is taken from the
 * stations alone, straight between them. Stations without confidence are passed over. RangeError where there is neither pith nor station.
 */
export function ringDirection(field: RingField): RingDirection {
  const { pith, widthMm } = field;
  const read = field.stations
    .map((station, index) => ({ ...station, index }))
    .filter(({ confidence }) => confidence > 0)
    .sort((a, b) => a.position - b.position);
  if (!pith) {
    if (read.length === 0) throw new RangeError("The rings of this end have not been read: no pith and no station.");
    const course = straightBetween(unfolded(read.map(({ position, signedDeg }) => ({ position, deg: signedDeg }))));
    return ({ xMm }) => foldDeg(course(xMm / widthMm));
  }
  const turns = read.map(({ position, signedDeg, index }) => {
    const round = pithStation(field, pith, index, field.stations.length);
    // In the slice that holds the pith the mean direction means nothing, and so does a difference from it.
    return { position, deg: foldDeg(signedDeg - round.station.signedDeg) * round.strength ** 2 };
  });
  if (turns.every(({ deg }) => Math.abs(deg) < 0.05)) return (point) => signedRingDeg(point, pith);
  const turn = straightBetween(turns);
  return (point) => foldDeg(signedRingDeg(point, pith) + turn(Math.min(1, Math.max(0, point.xMm / widthMm))));
}

interface Knot {
  position: number;
  deg: number;
}

/** The same lines without jumps of 180 degrees from one to the next: a ring at 89 has one at 91, not -89, beside it. */
function unfolded(knots: Knot[]): Knot[] {
  let before = 0;
  return knots.map(({ position, deg }, i) => {
    before = i === 0 ? deg : deg + 180 * Math.round((before - deg) / 180);
    return { position, deg: before };
  });
}

/** Straight from knot to knot, level beyond the first and last. */
function straightBetween(knots: Knot[]): (position: number) => number {
  return (position) => {
    const right = knots.findIndex((knot) => knot.position > position);
    const after = right === -1 ? knots.at(-1) : knots[right];
    const before = knots[right - 1] ?? after;
    if (!before || !after) return 0;
    const gap = after.position - before.position;
    return gap > 0 ? before.deg + ((after.deg - before.deg) * (position - before.position)) / gap : after.deg;
  };
}
