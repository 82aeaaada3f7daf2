/** The figures a reading's confidence is made of. */
export type EndMeasures = {
  /** Share of the picture that the rings explain in the typical cell, above chance. */
  evidence: number;
  /** Agreement of the directions with one pith at the best scale, above noise. */
  excess: number;
  /** Evidence for lines that run another way. */
  rivalEvidence: number;
  /** Agreement of the finest texture with the rings read: negative where rays or rows of pores run square to them. */
  fineAgreement: number;
  /** Part of the end that is clear wood. */
  clearPart: number;
  /** Part of the variance that straight saw marks made up before they were taken out. */
  sawShare: number;
  /** Distance of the pith from the end's middle, in widths. */
  pithWidths: number;
  /** Whether the usual colour could be wood's; null for a grey picture. */
  woodColoured: boolean | null;
};

/** What is known of the wood besides the photograph. The method is proven on photographs of softwoods only. */
export type WoodStructure = "softwood" | "ring-porous" | "diffuse-porous";

/**
 * Readings with this confidence or more are shown as sure. Set with `npm run bench:rings -- --calibrate`: of the development
 * photographs and the generated ends together, those above it had their class right in at least 98 of 100.
 */
export const SURE_FROM = 0.9;

/** Below this nothing repeats along the rings any more than along any other lines. */
export const NO_RINGS_BELOW = 0.08;

/** Further than this and a board of any width would come from a tree no one has seen: the lines are straight. */
const STRAIGHT_FROM_WIDTHS = 5;
/** On softwood the finest texture agrees with the rings; the six ring-porous photographs lie below, the others above. */
const POROUS_BELOW = 0.05;

/**
 * How far the whole reading is to be trusted, 0..1, and what speaks against it in words. The base is the evidence: readings
 * were about even between right and wrong at 0.32 and all right above 0.5 (development photographs and generated ends); each
 * doubt takes its part off.
 */
export function overallConfidence(m: EndMeasures, structure?: WoodStructure): { confidence: number; doubts: string[] } {
  const doubts: string[] = [];
  let confidence = 1 / (1 + Math.exp(-(m.evidence - 0.32) / 0.045));
  const doubt = (factor: number, words: string) => {
    if (factor >= 1) return;
    confidence *= factor;
    if (factor < 0.97) doubts.push(words);
  };
  if (m.evidence < 0.4) doubts.push("The rings are faint: little repeats along them.");
  doubt(0.6 + 2.5 * m.excess, "The directions hardly agree on one pith.");
  doubt(
    1 - 0.4 * Math.max(0, Math.min(1, m.rivalEvidence / Math.max(0.05, m.evidence))),
    "Other lines in the picture run another way.",
  );
  doubt(0.5 + 0.55 * m.clearPart, "Part of the end is covered or cracked.");
  doubt(m.sawShare > 0.3 ? 0.95 : 1, "Strong saw marks were taken out.");
  doubt(
    m.pithWidths > STRAIGHT_FROM_WIDTHS ? 0.4 : 1,
    "The lines are as good as straight: a face, saw marks or a pattern look like this.",
  );
  doubt(m.woodColoured === false ? 0.5 : 1, "The colours are not those of wood.");
  const porous = structure ? structure !== "softwood" : m.fineAgreement < POROUS_BELOW;
  doubt(porous ? 0.92 : 1, "Pores or rays: on photographs of such wood the method is less proven.");
  return { confidence: Math.max(0, Math.min(1, confidence)), doubts };
}

/**
 * A part's confidence: the whole's, less where the rings explain little of the picture (on the development photographs one
 * part in five was over 5 degrees out where they explain a quarter, one in forty at a half) and where the angle turns fast,
 * beside the pith.
 */
export function stationConfidence(overall: number, explained: number, spreadDeg: number): number {
  const seen = 1 / (1 + Math.exp(-(explained - 0.22) / 0.06));
  const steady = 1 - 0.15 * Math.max(0, Math.min(1, (spreadDeg - 8) / 20));
  return overall * seen * steady;
}
