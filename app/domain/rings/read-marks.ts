import { z } from "zod";
import type { EndCorners } from "#app/core/rings/perspective.ts";
import { readPhotoStrokes, type StrokesResult } from "#app/core/rings/strokes.ts";

const point = z.object({ x: z.number().finite(), y: z.number().finite() });

/** What a person marked on a photo: the end's corners in order from the top left, and strokes along rings, in the picture's own pixels. */
export const ringMarks = z.object({
  corners: z.array(point).length(4),
  strokes: z.array(z.array(point).min(2).max(2_000)).max(40),
});

export type RingMarks = z.infer<typeof ringMarks>;
export type PicturePoint = z.infer<typeof point>;

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

/** Reads marks with the board's real size. The same on the page, while marking, and on the server, when they are kept. */
export function readMarks(marks: RingMarks, board: { widthMm: number; thicknessMm: number }): StrokesResult {
  return readPhotoStrokes(marks.strokes, marks.corners as unknown as EndCorners, board);
}

/** Where the corners stand before anybody has moved them: a little inside the picture. */
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
  };
}
