import { z } from "zod";
import type { LengthUnit } from "#app/core/lengths/parse-length.ts";
import { lengthField } from "#app/domain/shop/length-field.ts";

/** What can be wrong with a place on a board, in the trade's words (trade reference, section 15). */
export const defectKinds = [
  "knot",
  "check",
  "split",
  "shake",
  "wane",
  "pith",
  "stain",
  "decay",
  "bark pocket",
  "honeycomb",
  "reaction wood",
  "bird peck",
  "sapwood",
  "hole",
] as const;

export const defectFaces = ["both", "heart", "bark"] as const;

/** A defect as a rectangle on the board, from the near end and from the left edge seen from there. */
export interface Defect {
  id: string;
  kind: (typeof defectKinds)[number];
  face: (typeof defectFaces)[number];
  alongMm: number;
  acrossMm: number;
  lengthMm: number;
  widthMm: number;
  note: string;
}

/** A defect as typed, sizes in the shop's units. */
export function defectForm(unit: LengthUnit) {
  return z.object({
    kind: z.enum(defectKinds, { error: "Choose what it is." }),
    face: z.enum(defectFaces).default("both"),
    alongMm: lengthField(unit, { name: "distance from the near end", leastMm: 0 }),
    acrossMm: lengthField(unit, { name: "distance from the edge", leastMm: 0 }),
    lengthMm: lengthField(unit, { name: "length of the defect", leastMm: 1 }),
    widthMm: lengthField(unit, { name: "width of the defect", leastMm: 1 }),
    note: z.string().trim().max(200, "At most 200 characters.").default(""),
  });
}

export type DefectForm = z.infer<ReturnType<typeof defectForm>>;

/** A defect must lie on the board. */
export function offBoard(
  defect: DefectForm,
  board: { lengthMm: number; widthMm: number; widthFarMm: number | null },
): "alongMm" | "acrossMm" | null {
  const slackMm = 1;
  if (defect.alongMm + defect.lengthMm > board.lengthMm + slackMm) return "alongMm";
  if (defect.acrossMm + defect.widthMm > Math.max(board.widthMm, board.widthFarMm ?? 0) + slackMm) return "acrossMm";
  return null;
}
