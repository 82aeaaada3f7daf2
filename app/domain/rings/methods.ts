/** Which method made a reading by hand; raised whenever the same marks could read differently. The photo reader names its own. */
export const strokesMethod = "strokes-2";

/** A pith put in its place on a photo. */
export const pithMethod = "pith-1";

/** An angle set by eye. */
export const angleMethod = "angle-1";
