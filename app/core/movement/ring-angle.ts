import { requireWithin } from "#app/core/moisture/accepted-range.ts";
import type { Growth } from "./growth.ts";

/** Growth along and across the rings, as fractions of the size (or coefficients: the blend is the same). */
export type RingGrowth = Pick<Growth, "radial" | "tangential">;

/** What a section of wood does with its rings at one angle, all as fractions or radians. */
export interface AngledGrowth {
  width: number;
  thickness: number;
  /** Radians by which a right angle closes, between the way right and the way down, for a ring that falls to the right. */
  shear: number;
}

/**
 * Growth of width and thickness with the rings at `signedDeg` to the wide face (0 flat, 90 quartered, positive where a
 * ring falls to the right, as in `RingStation`): width T cos2 + R sin2, thickness T sin2 + R cos2, shear (T - R) sin 2a.
 * The plane strain transformation; the same problem is treated by J. D. MacLean, FPL Report R1473 (1945) [derived].
 * RangeError outside -360 to 360 degrees.
 */
export function growthAtAngle({ radial, tangential }: RingGrowth, signedDeg: number): AngledGrowth {
  const angle = (requireWithin("Ring angle", signedDeg, -360, 360, "degrees") * Math.PI) / 180;
  const across = Math.sin(angle) ** 2;
  return {
    width: tangential * (1 - across) + radial * across,
    thickness: tangential * across + radial * (1 - across),
    shear: (tangential - radial) * Math.sin(2 * angle),
  };
}

/** How far a square corner turns with the rings at this angle, degrees, always positive: worst at 45 degrees. */
export function outOfSquareDeg(growth: RingGrowth, angleDeg: number): number {
  return Math.abs((growthAtAngle(growth, angleDeg).shear * 180) / Math.PI);
}
