import { z } from "zod";
import type { LengthUnit } from "#app/core/lengths/length-unit.ts";
import { lengthField } from "#app/domain/shop/length-field.ts";

/** A piece that came back: a rectangle of the board it was cut from, from its near end and its left edge. */
export interface Offcut {
  alongMm: number;
  acrossMm: number;
  lengthMm: number;
  widthMm: number;
}

/** An offcut as typed. */
export function offcutForm(unit: LengthUnit) {
  return z.object({
    alongMm: lengthField(unit, { name: "distance from the near end", leastMm: 0 }),
    acrossMm: lengthField(unit, { name: "distance from the left edge", leastMm: 0 }),
    lengthMm: lengthField(unit, { name: "length", leastMm: 30, mostMm: 12_000 }),
    widthMm: lengthField(unit, { name: "width", leastMm: 10, mostMm: 1_500 }),
  });
}

const slackMm = 1;

/** Why an offcut cannot have come from its board, by field; null when it can. */
export function offcutProblem(
  offcut: Offcut,
  board: { lengthMm: number; widthMm: number; widthFarMm: number | null },
  others: Offcut[],
): { field: keyof Offcut; why: string } | null {
  if (offcut.alongMm + offcut.lengthMm > board.lengthMm + slackMm)
    return { field: "lengthMm", why: "That is past the far end of the board." };
  if (offcut.acrossMm + offcut.widthMm > Math.max(board.widthMm, board.widthFarMm ?? 0) + slackMm)
    return { field: "widthMm", why: "That is past the edge of the board." };
  const apart = (other: Offcut) =>
    offcut.alongMm + offcut.lengthMm <= other.alongMm + slackMm ||
    other.alongMm + other.lengthMm <= offcut.alongMm + slackMm ||
    offcut.acrossMm + offcut.widthMm <= other.acrossMm + slackMm ||
    other.acrossMm + other.widthMm <= offcut.acrossMm + slackMm;
  return others.every(apart) ? null : { field: "alongMm", why: "Another offcut was taken from there." };
}
