import { requireSize, requireWithin } from "#app/core/moisture/accepted-range.ts";
import { glueDefaults } from "./shop-defaults.ts";
import { requireWhole } from "./whole-number.ts";

/** One pound-force in newtons, and one psi in pascals (exact, and from it). */
const newtonsPerLbf = 4.448_221_615_260_5;
const pascalsPerPsi = 6_894.757;

export interface GlueFace {
  lengthMm: number;
  widthMm: number;
}

export interface ClampPlan {
  /** Force over the whole joint. */
  forceN: number;
  /** In all rows. */
  clamps: number;
  /** Rows side by side across the face; more than one where pressure from a single row would not reach its edges. */
  rows: number;
  /** Along the joint, from clamp to clamp of one row; the first and last stand half of it from the ends. */
  spacingMm: number;
  /** What decides the number: force, or that pressure must reach every place. */
  decidedBy: "force" | "reach";
}

/**
 * How many clamps a joint needs: enough force for the pressure over its area, and close enough that what each presses, spreading 45° to either side
 * from the pad to the glue line, leaves no gap along the joint or across it. Force = pressure × area; the spread is common practice (trade reference,
 * section 11).
 *
 * @param face glue face; its length is the way the clamps stand along.
 * @param padToGlueMm from the clamp's pad to the nearest glue line: a caul and the ply under it.
 * @throws RangeError for a size, a pressure (1 to 2,000 psi) or a force (1 to 1,000,000 N) that is none.
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
  const rows = Math.ceil(face.widthMm / (2 * padToGlueMm) - 1e-9);
  const inRow = Math.max(Math.ceil(byForce / rows), byReach);
  const decidedBy = byForce >= rows * byReach ? "force" : "reach";
  return { forceN, clamps: rows * inRow, rows, spacingMm: face.lengthMm / inRow, decidedBy };
}

/** Pounds-force as newtons. */
export function newtonsFromLbf(lbf: number): number {
  return lbf * newtonsPerLbf;
}

/** Newtons as pounds-force. */
export function lbfFromNewtons(newtons: number): number {
  return newtons / newtonsPerLbf;
}

/**
 * Grams of glue for so many glue lines of one face, low and high, by the spread of PVA makers (from memory; trade reference, section 11).
 *
 * @throws RangeError for a size that is none, or lines that are no whole number from 0 to 1,000.
 */
export function glueGrams(face: GlueFace, lines: number): { low: number; high: number } {
  requireSize("Length of the joint", face.lengthMm);
  requireSize("Width of the joint", face.widthMm);
  requireWhole("Glue lines", lines, 0, 1_000);
  const areaM2 = (face.lengthMm * face.widthMm * lines) / 1e6;
  return { low: areaM2 * glueDefaults.spreadGramsPerM2.low, high: areaM2 * glueDefaults.spreadGramsPerM2.high };
}
