import type { BoardSummary, HoldMark } from "#app/domain/boards/board.ts";

/** A stretch of a board's length, from the near end. */
export interface Stretch {
  fromMm: number;
  toMm: number;
}

/** Why a hold was not placed. `held` names who has it, until when, and what else would do. */
export type HoldRefusal =
  | { ok: false; why: "missing" }
  | { ok: false; why: "not racked"; state: BoardSummary["state"] }
  | { ok: false; why: "length"; lengthMm: number }
  | { ok: false; why: "held"; by: HoldMark[]; free: Stretch[]; others: BoardSummary[] };

/** What stays free of a board's length beside the stretches already claimed; shorter rests than `leastMm` are left out. */
export function freeStretches(lengthMm: number, claimed: Stretch[], leastMm = 1): Stretch[] {
  const free: Stretch[] = [];
  let at = 0;
  for (const { fromMm, toMm } of [...claimed].sort((a, b) => a.fromMm - b.fromMm)) {
    if (fromMm - at >= leastMm) free.push({ fromMm: at, toMm: fromMm });
    at = Math.max(at, toMm);
  }
  if (lengthMm - at >= leastMm) free.push({ fromMm: at, toMm: lengthMm });
  return free;
}

/** The length still free, added up. */
export function freeLengthMm(lengthMm: number, claimed: Stretch[]): number {
  return freeStretches(lengthMm, claimed).reduce((sum, { fromMm, toMm }) => sum + toMm - fromMm, 0);
}
