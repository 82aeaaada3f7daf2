import { requireSize, requireWithin } from "#app/core/moisture/accepted-range.ts";

/** One pound-force in newtons, and one psi in pascals (exact, and from it). */
const newtonsPerLbf = 4.448_221_615_260_5;
const pascalsPerPsi = 6_894.757;

/** Glue-up pressures that makers of PVA glue ask for, psi. Trade reference, section 11 [secondary: adhesive makers]. */
export const pressuresPsi = { softwood: { low: 100, high: 150 }, hardwood: { low: 175, high: 250 } } as const;

/** Clamping force by kind, lbf: what a hand gets out of it. Trade reference, section 11 [secondary]. */
export const clampForcesLbf = { "pipe clamp": 1000, "parallel-jaw clamp": 370, "heavy I-bar clamp": 1350 } as const;

export interface GlueFace {
  lengthMm: number;
  widthMm: number;
}

export interface ClampPlan {
  /** Force over the whole joint. */
  forceN: number;
  clamps: number;
  /** Along the joint, from clamp to clamp. */
  spacingMm: number;
  /** What decides the number: force, or that pressure must reach every place. */
  decidedBy: "force" | "reach";
}

/**
 * How many clamps a joint needs: enough force for the pressure over its area, and close enough that what each presses, spreading 45° to either side
 * from the pad to the glue line, leaves no gap. Force = pressure × area; the spread is common practice (trade reference, section 11).
 *
 * @param face glue face; its length is the way the clamps stand along.
 * @param padToGlueMm from the clamp's pad to the glue line: a caul and the ply under it.
 */
export function clampsFor(face: GlueFace, pressurePsi: number, clampForceN: number, padToGlueMm: number): ClampPlan {
  requireSize("Length of the joint", face.lengthMm);
  requireSize("Width of the joint", face.widthMm);
  requireWithin("Pressure", pressurePsi, 1, 2_000, "psi");
  requireWithin("Clamp force", clampForceN, 1, 1e6, "N");
  requireSize("From pad to glue line", padToGlueMm);
  const forceN = ((pressurePsi * pascalsPerPsi) / 1e6) * face.lengthMm * face.widthMm;
  const byForce = Math.ceil(forceN / clampForceN - 1e-6);
  const byReach = Math.ceil(face.lengthMm / (2 * padToGlueMm) - 1e-9);
  const clamps = Math.max(1, byForce, byReach);
  return { forceN, clamps, spacingMm: face.lengthMm / clamps, decidedBy: byForce >= byReach ? "force" : "reach" };
}

/** Pounds-force as newtons. */
export function newtonsFromLbf(lbf: number): number {
  return lbf * newtonsPerLbf;
}

/** Newtons as pounds-force. */
export function lbfFromNewtons(newtons: number): number {
  return newtons / newtonsPerLbf;
}

/** Glue on one glue line, g/m²: PVA makers' range, from memory (trade reference, section 11). */
export const glueSpread = { low: 170, high: 250 } as const;

/** Grams of glue for so many glue lines of one face, low and high. */
export function glueGrams(face: GlueFace, lines: number): { low: number; high: number } {
  requireSize("Length of the joint", face.lengthMm);
  requireSize("Width of the joint", face.widthMm);
  requireWithin("Glue lines", lines, 0, 1_000);
  const areaM2 = (face.lengthMm * face.widthMm * lines) / 1e6;
  return { low: areaM2 * glueSpread.low, high: areaM2 * glueSpread.high };
}
