import { requireSize, requireWithin } from "#app/core/moisture/accepted-range.ts";
import type { RingField } from "#app/core/rings/ring-types.ts";

/** The signed ring angle at any position across the width, 0 (left) to 1 (right), in degrees without jumps of 180. */
export type RingCourse = (position: number) => number;

/**
 * Follows the rings across a board's end from its stations: straight between them, on in the same line to the edges, and
 * through upright without a jump (a ring at 89 degrees has one at 91, not -89, beside it). Stations that carry no
 * confidence are passed over. RangeError where none is left, or a size or angle makes no sense.
 */
export function ringCourse(field: RingField): RingCourse {
  requireSize("Width", field.widthMm);
  requireSize("Thickness", field.thicknessMm);
  const read = field.stations.filter(({ confidence }) => confidence > 0).sort((a, b) => a.position - b.position);
  if (read.length === 0) throw new RangeError("The rings of this end have not been read: no station has an angle.");
  const at: number[] = [];
  const angles: number[] = [];
  for (const { position, signedDeg } of read) {
    requireWithin("Station", position, 0, 1);
    requireWithin("Ring angle", signedDeg, -90, 90, "degrees");
    const before = angles.at(-1) ?? signedDeg;
    at.push(position);
    angles.push(signedDeg + 180 * Math.round((before - signedDeg) / 180));
  }
  if (angles.length === 1) return () => angles[0]!;
  return (position) => {
    const next = at.findIndex((station) => station > position);
    const right = next === -1 ? at.length - 1 : Math.max(1, next);
    const [from, to] = [at[right - 1]!, at[right]!];
    const share = to > from ? (position - from) / (to - from) : 0;
    return angles[right - 1]! + (angles[right]! - angles[right - 1]!) * share;
  };
}

/** A field whose rings stand at one angle everywhere, for a part or a blank of which only the angle is known. */
export function evenField(widthMm: number, thicknessMm: number, signedDeg: number): RingField {
  const angleDeg = Math.abs(requireWithin("Ring angle", signedDeg, -90, 90, "degrees"));
  return {
    widthMm: requireSize("Width", widthMm),
    thicknessMm: requireSize("Thickness", thicknessMm),
    stations: [{ position: 0.5, angleDeg, signedDeg, confidence: 1 }],
    pith: null,
    ringsPerInch: null,
  };
}

/** True where the pith lies within the section, so that no rings run clear across it. */
export function isPithInside({ pith, widthMm, thicknessMm }: RingField): boolean {
  return pith !== null && pith.xMm > 0 && pith.xMm < widthMm && pith.yMm > 0 && pith.yMm < thicknessMm;
}
