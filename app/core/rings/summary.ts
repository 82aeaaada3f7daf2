import { ringDirection } from "./direction.ts";
import type { ClassLimits, ClassShares, RingClass, RingField } from "./ring-types.ts";

/** Flat below 30 degrees, quartered above 60: common practice, and the bins of AWS 2009 and of NHLA's description of usage. */
export const defaultClassLimits: ClassLimits = { flatBelowDeg: 30, quarteredAboveDeg: 60 };

/** Samples of the end: across its width and down its thickness. Shares of rings round a pith come out within 0.003. */
const across = 144;
const down = 24;

/** The class of one angle under a shop's limits. Where the limits meet there is no rift, and their own angle counts as quartered. */
export function classOf(angleDeg: number, { flatBelowDeg, quarteredAboveDeg }: ClassLimits): RingClass {
  if (angleDeg < flatBelowDeg) return "flat";
  return angleDeg > quarteredAboveDeg || flatBelowDeg === quarteredAboveDeg ? "quartered" : "rift";
}

/** Share of the end's area in each class under a shop's limits. They sum to 1. RangeError for an end without a reading. */
export function classShares(field: RingField, limits: ClassLimits): ClassShares {
  const direction = ringDirection(field);
  const counts: ClassShares = { flat: 0, rift: 0, quartered: 0 };
  for (let i = 0; i < across; i++)
    for (let j = 0; j < down; j++) {
      const xMm = ((i + 0.5) / across) * field.widthMm;
      const yMm = ((j + 0.5) / down) * field.thicknessMm;
      counts[classOf(Math.abs(direction({ xMm, yMm })), limits)] += 1;
    }
  const all = across * down;
  return { flat: counts.flat / all, rift: counts.rift / all, quartered: counts.quartered / all };
}

/** The class that most of the end's area is in; rift where two lead alike. */
export function dominantClass(field: RingField, limits: ClassLimits): RingClass {
  const { flat, rift, quartered } = classShares(field, limits);
  if (flat > rift && flat > quartered) return "flat";
  return quartered > rift && quartered > flat ? "quartered" : "rift";
}

/** Least, greatest and mean ring angle over the stations of an end, in degrees to 0.1. RangeError for an end without stations. */
export function angleSummary(field: RingField): { least: number; greatest: number; mean: number } {
  const angles = field.stations.map((station) => station.angleDeg);
  if (angles.length === 0) throw new RangeError("The rings of this end have not been read: no station has an angle.");
  const tenth = (value: number) => Math.round(value * 10) / 10;
  return {
    least: tenth(Math.min(...angles)),
    greatest: tenth(Math.max(...angles)),
    mean: tenth(angles.reduce((a, b) => a + b, 0) / angles.length),
  };
}

/** What is wrong with a shop's limits, or null. They are degrees from 0 to 90, the first no higher than the second. */
export function classLimitsProblem({ flatBelowDeg, quarteredAboveDeg }: ClassLimits): string | null {
  const isAngle = (deg: number) => deg >= 0 && deg <= 90;
  if (!isAngle(flatBelowDeg) || !isAngle(quarteredAboveDeg)) return "A limit is an angle from 0 to 90 degrees.";
  return flatBelowDeg > quarteredAboveDeg ? "Flat must end at or below the angle where quartered begins." : null;
}
