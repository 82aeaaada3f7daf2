import { requireSize, requireWithin } from "#app/core/moisture/accepted-range.ts";

export interface PlyQuestion {
  /** Thickness of the finished part. */
  finishedMm: number;
  /** Measured thickness of one ply as it comes off the rack. */
  stockMm: number;
  /** What jointing takes off each face that is glued. */
  jointPerFaceMm: number;
  /** Least that must be left over the finished thickness, for squaring the blank. */
  allowanceMm: number;
}

export interface PlyPlan {
  plies: number;
  /** Thickness of the blank as it comes out of the clamps. */
  gluedMm: number;
  /** Each outer ply has one glue face, each inner one two. */
  outerPlyMm: number;
  innerPlyMm: number | null;
  /** What all glue faces together lose to the jointer. */
  lostAtGlueFacesMm: number;
  /** What is left to take off the blank in all. */
  toTakeOffMm: number;
  /** Share of the stock's thickness that ends in the part, 0 to 1. */
  yield: number;
}

const mostPlies = 12;

/**
 * The fewest plies of one stock that make a finished thickness: n plies give n × stock less two jointed faces at each glue line.
 * Arithmetic; allowances are the shop's own (trade reference, section 10: common practice).
 *
 * @returns null when twelve plies are not enough.
 * @throws RangeError for a size that is none.
 */
export function pliesNeeded({ finishedMm, stockMm, jointPerFaceMm, allowanceMm }: PlyQuestion): PlyPlan | null {
  requireSize("Finished thickness", finishedMm);
  requireSize("Stock thickness", stockMm);
  requireWithin("Jointing per face", jointPerFaceMm, 0, stockMm / 2, "mm");
  requireWithin("Allowance", allowanceMm, 0, 200, "mm");
  for (let plies = 1; plies <= mostPlies; plies++) {
    const gluedMm = plies * stockMm - 2 * (plies - 1) * jointPerFaceMm;
    if (gluedMm + 1e-9 < finishedMm + allowanceMm) continue;
    return {
      plies,
      gluedMm,
      outerPlyMm: stockMm - (plies > 1 ? jointPerFaceMm : 0),
      innerPlyMm: plies > 2 ? stockMm - 2 * jointPerFaceMm : null,
      lostAtGlueFacesMm: 2 * (plies - 1) * jointPerFaceMm,
      toTakeOffMm: gluedMm - finishedMm,
      yield: finishedMm / (plies * stockMm),
    };
  }
  return null;
}

/**
 * The same question over several stocks, the one that ends most of its thickness in the part first. A stock that cannot make it is left out.
 *
 * @throws RangeError for a size that is none.
 */
export function plyAlternatives(
  question: Omit<PlyQuestion, "stockMm">,
  stocksMm: readonly number[],
): { stockMm: number; plan: PlyPlan }[] {
  return stocksMm
    .flatMap((stockMm) => {
      const plan = pliesNeeded({ ...question, stockMm });
      return plan ? [{ stockMm, plan }] : [];
    })
    .sort((a, b) => b.plan.yield - a.plan.yield || a.plan.plies - b.plan.plies);
}

export interface GlueLine {
  /** From the finished blank's upper face. */
  atMm: number;
  /** From its middle, positive downwards; for a line that would lie in the middle of an even blank, how far it is off. */
  offMiddleMm: number;
}

/**
 * Where the glue lines lie in a blank once its two outer faces have been taken down, not always by the same amount.
 *
 * @param pliesMm thickness of each ply as glued, from the top.
 * @throws RangeError when more is taken off a side than its outer ply has.
 */
export function glueLines(pliesMm: readonly number[], takenTopMm: number, takenBottomMm: number): GlueLine[] {
  for (const ply of pliesMm) requireSize("Ply", ply);
  requireWithin("Taken off the top", takenTopMm, 0, pliesMm[0] ?? 0, "mm");
  requireWithin("Taken off the bottom", takenBottomMm, 0, pliesMm.at(-1) ?? 0, "mm");
  const left = pliesMm.reduce((sum, ply) => sum + ply, 0) - takenTopMm - takenBottomMm;
  let atMm = -takenTopMm;
  return pliesMm.slice(0, -1).map((ply) => {
    atMm += ply;
    return { atMm, offMiddleMm: atMm - left / 2 };
  });
}
