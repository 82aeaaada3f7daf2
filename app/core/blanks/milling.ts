import { requireSize, requireWithin } from "#app/core/moisture/accepted-range.ts";
import { type PlyPlan, pliesNeeded } from "./plies.ts";

export interface Size {
  lengthMm: number;
  widthMm: number;
  thicknessMm: number;
}

export interface MillingAllowances {
  lengthMm: number;
  widthMm: number;
  thicknessMm: number;
  jointPerFaceMm: number;
}

export interface MillingStep {
  /** What is done. */
  step:
    | "rough length"
    | "joint a face and an edge"
    | "rip to rough width"
    | "joint the inner plies' other face"
    | "glue up"
    | "joint the blank's face and edge"
    | "plane to thickness"
    | "rip and plane to width"
    | "cut to length";
  /** The piece after it; plies before the glue-up, the blank from it on. Before the rip to rough width it is the least that the board must hold. */
  size: Size;
  pieces: number;
}

export interface MillingSheet {
  plies: PlyPlan;
  steps: MillingStep[];
}

/**
 * The sizes of a blank at each step from rough to finished. A face and an edge are jointed before anything is ripped, as a saw wants a straight edge on its
 * fence and a flat face on its table, and pieces are cut to length last (trade reference, section 10: common practice).
 *
 * A single ply is jointed once, and half of what is to come off goes with it; of several, each loses its jointing, and the blank is jointed anew.
 *
 * @param finished the part.
 * @param stockMm measured thickness of the rough stock.
 * @returns null when the stock cannot make the thickness.
 * @throws RangeError for a size or an allowance that is none.
 */
export function millingSheet(finished: Size, stockMm: number, allow: MillingAllowances): MillingSheet | null {
  requireSize("Finished length", finished.lengthMm);
  requireSize("Finished width", finished.widthMm);
  requireWithin("Length allowance", allow.lengthMm, 0, 1_000, "mm");
  requireWithin("Width allowance", allow.widthMm, 0, 500, "mm");
  const plies = pliesNeeded({
    finishedMm: finished.thicknessMm,
    stockMm,
    jointPerFaceMm: allow.jointPerFaceMm,
    allowanceMm: allow.thicknessMm,
  });
  if (!plies) return null;
  const lengthMm = finished.lengthMm + allow.lengthMm;
  const widthMm = finished.widthMm + allow.widthMm;
  // Half of the width's allowance goes when the blank's edge is jointed, the rest when it is ripped and planed to width.
  const jointedMm = widthMm - allow.widthMm / 2;
  const step = (
    name: MillingStep["step"],
    pieces: number,
    thicknessMm: number,
    width = widthMm,
    length = lengthMm,
  ): MillingStep => ({
    step: name,
    pieces,
    size: { lengthMm: length, widthMm: width, thicknessMm },
  });
  const glued = plies.plies > 1;
  const halfwayMm = finished.thicknessMm + plies.toTakeOffMm / 2;
  const steps = [
    step("rough length", plies.plies, stockMm, widthMm + allow.jointPerFaceMm),
    step("joint a face and an edge", plies.plies, glued ? plies.outerPlyMm : halfwayMm),
    step("rip to rough width", plies.plies, glued ? plies.outerPlyMm : halfwayMm),
    ...(plies.innerPlyMm === null
      ? []
      : [step("joint the inner plies' other face", plies.plies - 2, plies.innerPlyMm)]),
    ...(glued
      ? [step("glue up", 1, plies.gluedMm), step("joint the blank's face and edge", 1, halfwayMm, jointedMm)]
      : []),
    step("plane to thickness", 1, finished.thicknessMm, glued ? jointedMm : widthMm),
    step("rip and plane to width", 1, finished.thicknessMm, finished.widthMm),
    step("cut to length", 1, finished.thicknessMm, finished.widthMm, finished.lengthMm),
  ];
  return { plies, steps };
}

/**
 * How many rough lengths a board gives when it is split: each part's length and allowance, and a kerf between.
 *
 * @throws RangeError for a size, an allowance (0 to 1,000 mm) or a kerf (0 to 20 mm) that is none.
 */
export function roughLengths(boardMm: number, partMm: number, allowanceMm: number, kerfMm: number): number {
  requireSize("Board", boardMm);
  requireSize("Part", partMm);
  requireWithin("Allowance", allowanceMm, 0, 1_000, "mm");
  requireWithin("Kerf", kerfMm, 0, 20, "mm");
  return Math.floor((boardMm + kerfMm) / (partMm + allowanceMm + kerfMm) + 1e-9);
}
