/** A point on a board's end: origin at its top left corner, x across the width, y down the thickness. */
export interface PointMm {
  xMm: number;
  yMm: number;
}

/** What the rings do in one slice of the width. */
export interface RingStation {
  /** Middle of the slice, 0 at the left edge to 1 at the right. */
  position: number;
  /** Acute angle between the rings and the wide face: 0 flat, 90 quartered. */
  angleDeg: number;
  /** The same with its side, -90 to 90; positive where a ring falls to the right. */
  signedDeg: number;
  /** 0 to 1. */
  confidence: number;
}

/** The rings of a board's end, as read or set. */
export interface RingField {
  widthMm: number;
  thicknessMm: number;
  stations: RingStation[];
  /** Where the rings are centred, inside or outside the board; null when they are as good as straight. */
  pith: PointMm | null;
  ringsPerInch: number | null;
}

/** Where a shop's classes end. Published definitions differ: see definitions.ts. */
export interface ClassLimits {
  flatBelowDeg: number;
  quarteredAboveDeg: number;
}

/** Shares of the end's area; they sum to 1. */
export interface ClassShares {
  flat: number;
  rift: number;
  quartered: number;
}

export type RingClass = "flat" | "rift" | "quartered";
