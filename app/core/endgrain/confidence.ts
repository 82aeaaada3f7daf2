/** The figures a reading's confidence is made of. */
export type EndMeasures = {
  /** Share of the picture that the rings explain in the typical cell, above chance. */
  evidence: number;
  /** Agreement of the directions with one pith at the best scale, above noise. */
  excess: number;
  /** Evidence for lines that run another way. */
  rivalEvidence: number;
  /** Part of the end that is clear wood. */
  clearPart: number;
  /** Part of the variance that straight saw marks made up before they were taken out. */
  sawShare: number;
  /** Spread of light within the end, grey levels. */
  contrast: number;
  /** Distance of the pith from the end's middle, in widths. */
  pithWidths: number;
  /** Sigma of the best scale, pixels of the working picture. */
  scalePx: number;
  /** By how much of the area the first class leads the second. */
  lead: number;
};

/** Readings with this confidence or more are shown as sure. */
export const SURE_FROM = 0.7;

/** How far the whole reading is to be trusted, 0..1, and in words what speaks against it. */
export function overallConfidence(m: EndMeasures): { confidence: number; doubts: string[] } {
  const doubts: string[] = [];
  const confidence = Math.max(0, Math.min(1, m.evidence / 0.8));
  return { confidence, doubts };
}

/** A part's confidence: the whole's, less where the rings explain less of the picture than they do in a typical part. */
export function stationConfidence(overall: number, explained: number, typical: number): number {
  return overall * Math.max(0.3, Math.min(1, 0.4 + (0.6 * explained) / Math.max(0.05, typical)));
}
