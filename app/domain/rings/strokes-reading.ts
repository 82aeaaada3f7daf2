/** Which method made a reading from strokes; raised whenever the fit changes. */
export const strokesMethod = "strokes-1";

/** The same for an angle set by eye. */
export const angleMethod = "angle-1";
