import type { ClassLimits, ClassShares, RingClass, RingField } from "./ring-types.ts";

/** Least, greatest and mean ring angle over the stations of an end, in degrees to 0.1. */
export function angleSummary(field: RingField): { least: number; greatest: number; mean: number } {
  const angles = field.stations.map((station) => station.angleDeg);
  const tenth = (value: number) => Math.round(value * 10) / 10;
  return {
    least: tenth(Math.min(...angles)),
    greatest: tenth(Math.max(...angles)),
    mean: tenth(angles.reduce((a, b) => a + b, 0) / angles.length),
  };
}

/** The class of one angle under a shop's limits. */
export function classOf(angleDeg: number, limits: ClassLimits): RingClass {
  if (angleDeg < limits.flatBelowDeg) return "flat";
  return angleDeg > limits.quarteredAboveDeg ? "quartered" : "rift";
}

/** Share of the width in each class, by stations. They sum to 1. */
export function stationShares(field: RingField, limits: ClassLimits): ClassShares {
  const shares: ClassShares = { flat: 0, rift: 0, quartered: 0 };
  for (const station of field.stations) shares[classOf(station.angleDeg, limits)] += 1 / field.stations.length;
  return shares;
}

/** The class most of the width is in. */
export function dominantClass(field: RingField, limits: ClassLimits): RingClass {
  const shares = stationShares(field, limits);
  return (Object.keys(shares) as RingClass[]).reduce(
    (best, name) => (shares[name] > shares[best] ? name : best),
    "rift",
  );
}
