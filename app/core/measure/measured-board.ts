import { requireQuarters } from "#app/core/lengths/quarters.ts";
import { requireSize } from "#app/core/moisture/accepted-range.ts";

/** What a measure needs to know of a board. */
export interface MeasuredBoard {
  quarters: number;
  /** At the near end. */
  widthMm: number;
  /** At the far end; absent or null for a board of one width. */
  widthFarMm?: number | null;
  lengthMm: number;
  /** As measured. Absent or null where only the nominal thickness is known. Counts in true volume, never in board feet. */
  thicknessMm?: number | null;
}

/**
 * The width by which a board is tallied, mm: of a tapering board, the width one third of the length from the narrow end.
 * NHLA General Instructions [memory]. Which end is near makes no difference.
 *
 * @throws RangeError for a width that is no size.
 */
export function tallyWidthMm({ widthMm, widthFarMm }: Pick<MeasuredBoard, "widthMm" | "widthFarMm">): number {
  const near = requireSize("Width", widthMm);
  const far = widthFarMm == null ? near : requireSize("Width at the far end", widthFarMm);
  const narrow = Math.min(near, far);
  return narrow + (Math.max(near, far) - narrow) / 3;
}

/**
 * Nominal thickness in inches as board feet count it: stock under 4/4 counts as 1 in.
 * Hardwood-handbook glossary; Griffith, Advanced Projects in Woodwork (1912), "sold by surface measure" [confirmed].
 */
export function countedThicknessIn(quarters: number): number {
  return Math.max(4, requireQuarters(quarters)) / 4;
}
