import { requireWithin } from "#app/core/moisture/accepted-range.ts";
import type { RingField } from "#app/core/rings/ring-types.ts";
import type { RingGrowth } from "./ring-angle.ts";
import { sectionMovement } from "./section-movement.ts";

/** One ply of a face-laminated blank: its rings (width and thickness as in the blank) and its species' growth. */
export interface Ply {
  field: RingField;
  growth: RingGrowth;
}

/** What a change of moisture does to a blank; millimetres, negative for shrinking. */
export interface BlankMovement {
  widthChangeMm: number;
  thicknessChangeMm: number;
  /** How differently the plies want to move in width: what the glue lines have to hold. */
  plyMismatchMm: number;
  plyWidthChangesMm: number[];
}

/**
 * Change of a blank glued up face to face: thicknesses add; in width the plies hold each other to their mean, weighed by
 * thickness (own rule of mixtures, plies taken as equally stiff). RangeError without a ply or with plies of different
 * widths.
 */
export function blankMovement(plies: readonly Ply[]): BlankMovement {
  requireWithin("Number of plies", plies.length, 1, 100);
  const widthMm = plies[0]!.field.widthMm;
  for (const { field } of plies) {
    requireWithin("Ply width", field.widthMm, widthMm - 0.01, widthMm + 0.01, "mm (as the first ply)");
  }
  const moved = plies.map(({ field, growth }) => sectionMovement(field, growth));
  const thicknessMm = plies.reduce((sum, { field }) => sum + field.thicknessMm, 0);
  const plyWidthChangesMm = moved.map(({ widthChangeMm }) => widthChangeMm);
  return {
    widthChangeMm:
      plies.reduce((sum, { field }, i) => sum + plyWidthChangesMm[i]! * field.thicknessMm, 0) / thicknessMm,
    thicknessChangeMm: moved.reduce((sum, { thicknessChangeMm }) => sum + thicknessChangeMm, 0),
    plyMismatchMm: Math.max(...plyWidthChangesMm) - Math.min(...plyWidthChangesMm),
    plyWidthChangesMm,
  };
}
