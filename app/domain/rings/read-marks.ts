import { z } from "zod";
import { type EndCorners, endPlane } from "#app/core/rings/perspective.ts";
import type { PointMm, RingField } from "#app/core/rings/ring-types.ts";
import { fieldFromPith } from "#app/core/rings/stations.ts";
import { readPhotoStrokes } from "#app/core/rings/strokes.ts";

/** A place on a photo, in its own pixels. */
export const picturePoint = z.object({ x: z.number().finite(), y: z.number().finite() });

/** What a person marked on a photo, in its pixels: the end's corners in order from the top left, strokes along rings, and the pith if they moved it. */
export const ringMarks = z.object({
  corners: z.array(picturePoint).length(4),
  strokes: z.array(z.array(picturePoint).min(2).max(2_000)).max(40),
  pith: picturePoint.nullable().default(null),
});

export type RingMarks = z.infer<typeof ringMarks>;
export type PicturePoint = z.infer<typeof picturePoint>;

/** Marks as the form sends them: JSON in one field. */
export const marksForm = z.object({
  marks: z
    .string()
    .max(500_000)
    .transform((text, context) => {
      const parsed = ringMarks.safeParse(safeJson(text));
      if (parsed.success) return parsed.data;
      context.addIssue({ code: "custom", message: "The marks did not arrive whole. Mark them again." });
      return z.NEVER;
    }),
});

function safeJson(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return null;
  }
}

interface EndSize {
  widthMm: number;
  thicknessMm: number;
}

/** What marks say of an end: the same on the page, while marking, and on the server, when they are kept. */
export type MarksRead =
  | { ok: true; field: RingField; confidence: number; doubts: string[]; from: "strokes" | "pith" }
  | { ok: false; why: string };

/** A pith put in its place by hand is good to some degrees: our own estimate. */
const movedPithConfidence = 0.7;

/** No tree has rings so wide: a kilometre. */
const farthestPithMm = 1_000_000;

/** Reads strokes, or a pith that was moved; null when there is neither, and the reader's own word stands. */
export function readMarks(marks: RingMarks, board: EndSize, ringsPerInch: number | null = null): MarksRead | null {
  const corners = marks.corners as unknown as EndCorners;
  if (marks.strokes.length > 0) {
    const read = readPhotoStrokes(marks.strokes, corners, board, ringsPerInch);
    if (!read.ok) return read;
    const { field, confidence, doubts } = read.reading;
    return { ok: true, field, confidence, doubts, from: "strokes" };
  }
  if (!marks.pith) return null;
  const plane = endPlane(corners, board);
  if (!plane.ok) return plane;
  const pith = plane.plane.toMm(marks.pith);
  // Beyond the horizon of a photo taken askew there is no place on the end at all.
  if (!(Math.hypot(pith.xMm, pith.yMm) <= farthestPithMm))
    return { ok: false, why: "The pith lies too far off. Drag it nearer, or draw along the rings." };
  const field = fieldFromPith(board, pith, ringsPerInch);
  return { ok: true, field, confidence: movedPithConfidence, doubts: [], from: "pith" };
}

/** Where the corners stand before anybody, or the reader, has moved them: a little inside the picture. */
export function startingMarks(widthPx: number, heightPx: number): RingMarks {
  const [left, right] = [widthPx * 0.06, widthPx * 0.94];
  const [top, bottom] = [heightPx * 0.2, heightPx * 0.8];
  return {
    corners: [
      { x: left, y: top },
      { x: right, y: top },
      { x: right, y: bottom },
      { x: left, y: bottom },
    ],
    strokes: [],
    pith: null,
  };
}

/** A place on the end, on the photo; null when the corners make no end or the place lies beyond the horizon. */
export function placeOnPhoto(marks: RingMarks, board: EndSize, place: PointMm): PicturePoint | null {
  const plane = endPlane(marks.corners as unknown as EndCorners, board);
  if (!plane.ok) return null;
  const point = plane.plane.toPx(place);
  return Number.isFinite(point.x) && Number.isFinite(point.y) ? point : null;
}
