import type { RingField } from "#app/core/rings/ring-types.ts";

export const boardEnds = ["near", "far"] as const;
export type BoardEndName = (typeof boardEnds)[number];

/** How a reading came about. "photo" is the reader working by itself; "parent" was handed down to an offcut. */
export const readingSources = ["strokes", "angle", "photo", "parent"] as const;
export type ReadingSource = (typeof readingSources)[number];

/** One reading of one end: what was read, from what, how and by whom. Kept for good; the newest of an end counts. */
export interface RingReading {
  id: string;
  boardEnd: BoardEndName;
  source: ReadingSource;
  methodVersion: string;
  photoId: string | null;
  /** Corners and strokes in the picture's pixels, or the angle chosen. */
  inputs: unknown;
  field: RingField;
  confidence: number;
  readBy: string;
  readAt: Date;
}

const sourceWords: Record<ReadingSource, string> = {
  strokes: "marked on a photo",
  angle: "set by eye",
  photo: "read from a photo",
  parent: "from the board it was cut from",
};

/** How a reading was made, in words. */
export function readingWords(source: ReadingSource): string {
  return sourceWords[source];
}
